package railwalk.cli;

import java.nio.file.Path;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.CannotDo;
import railwalk.app.OhmsJob;

/** Prints what an ohmmeter reads in the unplugged amplifier. */
final class OhmsCommand implements Command {
  @Override
  public String name() {
    return "ohms";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class))
            .addOption(PaperOutput.spec())
            .addOption(PaperOption.spec());
    spec.usageMessage()
        .description(
            "Print the cold ohms of every pin and supply node: unplugged, discharged, tubes out.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    PaperOutput.check(given);
    PaperOutput.put(
        Progress.during(console, "solving …", () -> OhmsJob.of(netlist)), given, console);
    return Main.DONE;
  }
}
