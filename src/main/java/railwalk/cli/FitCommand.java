package railwalk.cli;

import java.nio.file.Path;
import java.util.List;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.CannotDo;
import railwalk.app.FitJob;

/** Fits the constants of tube types anew. */
final class FitCommand implements Command {
  private static final String ALL = "--all";
  private static final String WRITE = "--write";

  @Override
  public String name() {
    return "fit";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("TYPE", "0..*", "Tube types to fit.", List.class).toBuilder()
                    .index("0..*")
                    .auxiliaryTypes(String.class)
                    .build())
            .addOption(
                OptionSpec.builder(ALL).description("Fit every type of the catalogue.").build())
            .addOption(
                OptionSpec.builder(WRITE)
                    .paramLabel("DIR")
                    .type(Path.class)
                    .description("Write the data files with the new constants into DIR.")
                    .build());
    spec.usageMessage()
        .description(
            "Work out tube types' constants from the published points in their data files, and print"
                + " how well each point is met.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    List<String> named = given.matchedPositionalValue(0, List.of());
    boolean all = given.matchedOptionValue(ALL, false);
    if (all != named.isEmpty()) {
      throw new CannotDo("which tube types? Name them, or fit every one with --all");
    }
    List<String> types = all ? FitJob.all() : named;
    Path folder = given.matchedOptionValue(WRITE, null);
    console.out().print(Progress.during(console, "fitting …", () -> FitJob.run(types, folder)));
    return Main.DONE;
  }
}
