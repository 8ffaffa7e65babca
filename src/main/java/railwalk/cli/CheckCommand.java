package railwalk.cli;

import java.nio.file.Path;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.CannotDo;
import railwalk.app.CheckJob;

/** Prints diagnostics and findings only. */
final class CheckCommand implements Command {
  @Override
  public String name() {
    return "check";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class));
    spec.usageMessage()
        .description(
            "Print what is wrong or doubtful in a netlist and in the amplifier it describes. The exit"
                + " code is 1 when an error stands in the way of a chart.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    CheckJob check = Progress.during(console, "checking …", () -> CheckJob.of(netlist));
    console.out().print(check.report());
    return check.errors() == 0 ? Main.DONE : Main.FOUND_ERRORS;
  }
}
