package railwalk.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.TypeConversionException;
import railwalk.app.BandKind;
import railwalk.app.BenchConditions;
import railwalk.app.CannotDo;
import railwalk.app.ChartFormat;
import railwalk.app.ChartJob;
import railwalk.render.pdf.Paper;

/** Prints the voltage chart of a netlist. */
final class ChartCommand implements Command {
  @Override
  public String name() {
    return "chart";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class))
            .addOption(
                OptionSpec.builder("-o", "--output")
                    .paramLabel("FILE")
                    .type(Path.class)
                    .description("Write to this file.")
                    .build())
            .addOption(formatOption(List.of(ChartFormat.values())))
            .addOption(LineOption.spec())
            .addOption(MeterOption.spec())
            .addOption(
                OptionSpec.builder("--line-sweep")
                    .description("Add a page with the main points at 90 to 110 %% of the line.")
                    .build())
            .addOption(bandsOption())
            .addOption(PaperOption.spec());
    spec.usageMessage()
        .description(
            "Print the voltage chart of a netlist. Without --as it is written as NAME-chart.pdf in"
                + " the current folder and printed as text. With --as it goes to standard output,"
                + " or to the file that -o names; a PDF always goes to a file.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    Optional<ChartFormat> format = Optional.ofNullable(given.matchedOptionValue("--as", null));
    Optional<Path> output = Optional.ofNullable(given.matchedOptionValue("-o", null));
    Paper paper = PaperOption.given(given);
    BenchConditions conditions =
        new BenchConditions(LineOption.given(given), MeterOption.given(given));
    if (format.isEmpty() && output.isPresent()) {
      refuseOtherSuffix(output.get());
    }
    boolean lineSweep = given.hasMatchedOption("--line-sweep");
    BandKind bands = given.matchedOptionValue("--bands", BandKind.FIRST_ORDER);
    ChartJob job =
        Progress.during(
            console, "solving …", () -> ChartJob.of(netlist, conditions, lineSweep, bands));
    if (output.isPresent() || format.orElse(ChartFormat.PDF) == ChartFormat.PDF) {
      Path target = console.folder().resolve(output.orElse(Path.of(ChartJob.pdfName(netlist))));
      job.write(target, format.orElse(ChartFormat.PDF), paper);
      console.err().println("wrote " + target);
    } else {
      console.out().print(job.print(format.get()));
    }
    if (format.isEmpty()) {
      console.out().print(job.print(ChartFormat.TEXT));
    }
    return Main.DONE;
  }

  /** A file called chart.csv with a PDF in it is never what was meant. */
  static void refuseOtherSuffix(Path output) throws CannotDo {
    String name = String.valueOf(output.getFileName()).toLowerCase(Locale.ROOT);
    String suffix = name.substring(name.lastIndexOf('.') + 1).replace("txt", "text");
    Optional<ChartFormat> other = ChartFormat.of(suffix).filter(f -> f != ChartFormat.PDF);
    if (other.isPresent()) {
      throw new CannotDo(
          "without --as the file is a PDF: for " + output + " add --as " + other.get().word());
    }
  }

  private static OptionSpec bandsOption() {
    List<String> words = List.of(BandKind.FIRST_ORDER.word(), BandKind.SAMPLED.word());
    return OptionSpec.builder("--bands")
        .paramLabel("KIND")
        .type(BandKind.class)
        .converters(
            word ->
                BandKind.of(word)
                    .orElseThrow(
                        () ->
                            new TypeConversionException(
                                "expected one of " + String.join(", ", words))))
        .completionCandidates(words)
        .description("How the bands are found: first-order, or sampled from 2,048 builds.")
        .build();
  }

  /** Returns the option that chooses one of {@code formats}. */
  static OptionSpec formatOption(List<ChartFormat> formats) {
    List<String> words = formats.stream().map(ChartFormat::word).toList();
    return OptionSpec.builder("--as")
        .paramLabel("FORMAT")
        .type(ChartFormat.class)
        .converters(
            word ->
                ChartFormat.of(word)
                    .filter(formats::contains)
                    .orElseThrow(
                        () ->
                            new TypeConversionException(
                                "expected one of " + String.join(", ", words))))
        .completionCandidates(words)
        .description("One format only: " + String.join(", ", words) + ".")
        .build();
  }
}
