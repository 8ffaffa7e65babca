package railwalk.cli;

import java.nio.file.Path;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.BenchConditions;
import railwalk.app.BiasJob;
import railwalk.app.CannotDo;

/** Prints how the output tubes idle and where their bias belongs. */
final class BiasCommand implements Command {
  @Override
  public String name() {
    return "bias";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class))
            .addOption(PaperOutput.spec())
            .addOption(LineOption.spec())
            .addOption(PaperOption.spec());
    spec.usageMessage()
        .description(
            "Print the bias sheet: idle currents and watts of the output tubes, what to read where,"
                + " and the bias for 50, 60 and 70 %% of the plate's watts.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    PaperOutput.check(given);
    BenchConditions conditions = new BenchConditions(LineOption.given(given), Optional.empty());
    PaperOutput.put(
        Progress.during(console, "solving …", () -> BiasJob.of(netlist, conditions)),
        given,
        console);
    return Main.DONE;
  }
}
