package railwalk.cli;

import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.CannotDo;
import railwalk.app.FitJob;

/** Fits the constants of a tube type anew. */
final class FitCommand implements Command {
  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named("fit", this)
            .addPositional(CommandTree.argument("TYPE", "1", "A tube type.", String.class));
    spec.usageMessage()
        .description(
            "Work out a tube type's constants from the published points in its data file, and print"
                + " the file with the new constants in place of the old.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    String type = given.matchedPositionalValue(0, "");
    console.out().print(Progress.during(console, "fitting …", () -> FitJob.run(type)));
    return Main.DONE;
  }
}
