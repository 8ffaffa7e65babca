package railwalk.cli;

import java.nio.file.Path;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.PositionalParamSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.CannotDo;
import railwalk.app.WalkJob;

/** Prints the DC paths with the arithmetic. */
final class WalkCommand implements Command {
  @Override
  public String name() {
    return "walk";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class))
            .addPositional(
                PositionalParamSpec.builder()
                    .paramLabel("POINT")
                    .index("1")
                    .arity("0..1")
                    .type(String.class)
                    .description("A node, a pin such as V1.6, or an electrode such as V1A.plate.")
                    .build());
    spec.usageMessage()
        .description(
            "Print the way of the direct current down the supplies, resistor by resistor, or why one"
                + " point stands where it does.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    String point = given.matchedPositionalValue(1, "");
    console
        .out()
        .print(
            Progress.during(
                console,
                "solving …",
                () -> point.isEmpty() ? WalkJob.supplies(netlist) : WalkJob.to(netlist, point)));
    return Main.DONE;
  }
}
