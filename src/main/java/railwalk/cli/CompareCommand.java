package railwalk.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.BenchConditions;
import railwalk.app.CannotDo;
import railwalk.app.ChartFormat;
import railwalk.app.CompareJob;
import railwalk.render.pdf.Paper;

/** Compares readings with the chart and names the part at fault. */
final class CompareCommand implements Command {
  /** Exit code when something other than a healthy amplifier explains the readings best. */
  private static final int FAULT_FOUND = 1;

  private static final List<ChartFormat> FORMATS =
      List.of(ChartFormat.PDF, ChartFormat.TEXT, ChartFormat.JSON);

  @Override
  public String name() {
    return "compare";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class))
            .addPositional(
                CommandTree.argument(
                        "READINGS",
                        "1..*",
                        "A CSV sheet of readings, or readings such as b1=352 V1.6=171.",
                        List.class)
                    .toBuilder()
                    .index("1..*")
                    .auxiliaryTypes(String.class)
                    .build())
            .addOption(
                OptionSpec.builder("-o", "--output")
                    .paramLabel("FILE")
                    .type(Path.class)
                    .description("Write the report to this file: a PDF, or what --as says.")
                    .build())
            .addOption(
                OptionSpec.builder("--save")
                    .paramLabel("FILE")
                    .type(Path.class)
                    .description("Write the readings with expected volts and verdicts as a sheet.")
                    .build())
            .addOption(
                OptionSpec.builder("--learn")
                    .paramLabel("FILE")
                    .type(Path.class)
                    .description("Write the netlist with each ? replaced by the value found.")
                    .build())
            .addOption(ChartCommand.formatOption(FORMATS))
            .addOption(LineOption.spec())
            .addOption(MeterOption.spec())
            .addOption(PaperOption.spec());
    spec.usageMessage()
        .description(
            "Compare readings with the chart: solved at the line and for the meter of this bench,"
                + " judged, the likeliest fault named, the next reading chosen.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    List<String> words = given.matchedPositionalValue(1, List.of());
    Optional<ChartFormat> format = Optional.ofNullable(given.matchedOptionValue("--as", null));
    Optional<Path> output = Optional.ofNullable(given.matchedOptionValue("-o", null));
    if (format.isEmpty() && output.isPresent()) {
      ChartCommand.refuseOtherSuffix(output.get());
    }
    if (format.isPresent() && format.get() == ChartFormat.PDF && output.isEmpty()) {
      throw new CannotDo("--as pdf needs -o FILE");
    }
    Paper paper = PaperOption.given(given);
    BenchConditions conditions =
        new BenchConditions(LineOption.given(given), MeterOption.given(given));
    boolean sheet = words.size() == 1 && !words.get(0).contains("=");
    CompareJob job =
        Progress.during(
            console,
            "trying faults …",
            () ->
                sheet
                    ? CompareJob.ofFile(netlist, Path.of(words.get(0)), conditions)
                    : CompareJob.ofWords(netlist, words, conditions));
    console.err().print(job.remarks());
    Optional<Path> save = Optional.ofNullable(given.matchedOptionValue("--save", null));
    if (save.isPresent()) {
      Path target = console.folder().resolve(save.get());
      job.save(target, sheet ? Optional.of(Path.of(words.get(0))) : Optional.empty());
      console.err().println("wrote " + target);
    }
    if (output.isPresent()) {
      Path target = console.folder().resolve(output.get());
      job.write(target, format.orElse(ChartFormat.PDF), paper);
      console.err().println("wrote " + target);
    } else {
      console.out().print(job.print(format.orElse(ChartFormat.TEXT)));
    }
    if (output.isPresent() && format.isEmpty()) {
      console.out().print(job.print(ChartFormat.TEXT));
    }
    Optional<Path> learn = Optional.ofNullable(given.matchedOptionValue("--learn", null));
    if (learn.isPresent()) {
      Path target = console.folder().resolve(learn.get());
      job.learn(target);
      console.err().println("wrote " + target);
    }
    return job.healthy() ? Main.DONE : FAULT_FOUND;
  }
}
