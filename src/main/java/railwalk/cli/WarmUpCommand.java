package railwalk.cli;

import java.nio.file.Path;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.BenchConditions;
import railwalk.app.CannotDo;
import railwalk.app.WarmUpJob;

/** Follows a netlist from switch-on. */
final class WarmUpCommand implements Command {
  @Override
  public String name() {
    return "warmup";
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
            "Follow the supply for a minute from switch-on, cold, in every state and hot: highest"
                + " volts and when, against the capacitors' ratings.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    PaperOutput.checkBesideScreen(given);
    BenchConditions conditions = new BenchConditions(LineOption.given(given), Optional.empty());
    PaperOutput.putBesideScreen(
        Progress.during(console, "warming up …", () -> WarmUpJob.of(netlist, conditions)),
        given,
        console);
    return Main.DONE;
  }
}
