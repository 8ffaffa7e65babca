package railwalk.cli;

import java.nio.file.Path;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.BenchConditions;
import railwalk.app.CannotDo;
import railwalk.app.SettleJob;

/** Steps a netlist through time until it settles. */
final class SettleCommand implements Command {
  @Override
  public String name() {
    return "settle";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class))
            .addOption(PaperOutput.besideScreen())
            .addOption(LineOption.spec())
            .addOption(PaperOption.spec());
    spec.usageMessage()
        .description(
            "Step the whole netlist through time, no average taken, until one line period is like"
                + " the next: means, ripple, winding and rectifier currents, inverse volts.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    PaperOutput.checkBesideScreen(given);
    BenchConditions conditions = new BenchConditions(LineOption.given(given), Optional.empty());
    PaperOutput.putBesideScreen(
        Progress.during(console, "stepping …", () -> SettleJob.of(netlist, conditions)),
        given,
        console);
    return Main.DONE;
  }
}
