package railwalk.cli;

import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.CannotDo;
import railwalk.app.TubesJob;

/** Lists the tube types, or shows one. */
final class TubesCommand implements Command {
  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named("tubes", this)
            .addPositional(
                CommandTree.argument(
                    "TYPE", "0..1", "A type or one of its other names.", String.class));
    spec.usageMessage()
        .description(
            "List the tube types, or show one with its pins, limits and how well its law meets the"
                + " published figures.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    String type = given.matchedPositionalValue(0, "");
    console.out().print(type.isEmpty() ? TubesJob.list() : TubesJob.show(type));
    return Main.DONE;
  }
}
