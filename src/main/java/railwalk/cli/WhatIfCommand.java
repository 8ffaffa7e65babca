package railwalk.cli;

import java.nio.file.Path;
import java.util.List;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.BenchConditions;
import railwalk.app.CannotDo;
import railwalk.app.WhatIfJob;

/** Shows what supposed faults would read. */
final class WhatIfCommand implements Command {
  @Override
  public String name() {
    return "whatif";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class))
            .addPositional(
                CommandTree.argument(
                        "FAULT",
                        "1..*",
                        "One fault each, in quotes: \"R5 open\", \"R7 x3\", \"R5 =150k\","
                            + " \"C8 leak=10M\", \"V3 weak=0.5\", \"V2 type=12AU7\", \"line=108\".",
                        List.class)
                    .toBuilder()
                    .index("1..*")
                    .auxiliaryTypes(String.class)
                    .build())
            .addOption(PaperOutput.spec())
            .addOption(LineOption.spec())
            .addOption(MeterOption.spec())
            .addOption(PaperOption.spec());
    spec.usageMessage()
        .description(
            "Chart the amplifier with one or more faults in it beside the healthy one, and say what"
                + " they put in danger.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    List<String> faults = given.matchedPositionalValue(1, List.of());
    PaperOutput.check(given);
    BenchConditions conditions =
        new BenchConditions(LineOption.given(given), MeterOption.given(given));
    PaperOutput.put(
        Progress.during(console, "solving …", () -> WhatIfJob.of(netlist, faults, conditions)),
        given,
        console);
    return Main.DONE;
  }
}
