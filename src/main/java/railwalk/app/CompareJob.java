package railwalk.app;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import railwalk.chart.BenchReport;
import railwalk.chart.ChartInput;
import railwalk.device.Catalogue;
import railwalk.diagnosis.Diagnosis;
import railwalk.diagnosis.NoOperatingPoint;
import railwalk.readings.ReadingSheet;
import railwalk.readings.SheetReader;
import railwalk.readings.SheetReading;
import railwalk.render.json.JsonRenderer;
import railwalk.render.pdf.Paper;
import railwalk.render.pdf.PdfRenderer;
import railwalk.render.text.TextRenderer;
import railwalk.source.DiagnosticPrinter;
import railwalk.source.FileBytes;

/** Readings against an amplifier: each judged, the fault named, the next reading chosen. */
public final class CompareJob {
  private final BenchReport report;
  private final Diagnosis diagnosis;
  private final String remarks;
  private final String meter;
  private final OpenValues open;

  private CompareJob(
      BenchReport report, Diagnosis diagnosis, String remarks, String meter, OpenValues open) {
    this.open = open;
    this.meter = meter;
    this.report = report;
    this.diagnosis = diagnosis;
    this.remarks = remarks;
  }

  /** Compares {@code netlist} with the sheet in {@code readings}. */
  public static CompareJob ofFile(Path netlist, Path readings, BenchConditions conditions)
      throws CannotDo {
    String text;
    try {
      text = FileBytes.decode(Files.readAllBytes(readings));
    } catch (IOException failure) {
      throw new CannotDo("cannot read " + readings + ": " + WholeFile.reason(failure));
    }
    String name = String.valueOf(readings.getFileName());
    OpenValues open =
        OpenValues.solve(netlist, circuit -> SheetReader.read(name, text, circuit), conditions);
    return of(open, SheetReader.read(name, text, open.amplifier().circuit()), conditions);
  }

  /** Compares {@code netlist} with readings written as {@code point=value}. */
  public static CompareJob ofWords(Path netlist, List<String> words, BenchConditions conditions)
      throws CannotDo {
    OpenValues open =
        OpenValues.solve(netlist, circuit -> SheetReader.ofWords(words, circuit), conditions);
    return of(open, SheetReader.ofWords(words, open.amplifier().circuit()), conditions);
  }

  private static CompareJob of(OpenValues open, SheetReading read, BenchConditions conditions)
      throws CannotDo {
    TracedAmplifier amplifier = open.amplifier();
    String remarks = DiagnosticPrinter.print(read.diagnostics());
    ReadingSheet sheet = read.sheet();
    if (sheet.readings().isEmpty()) {
      throw new CannotDo(
          remarks.isEmpty() ? "no reading to compare with" : remarks + "no reading is left");
    }
    BenchConditions bench = conditions.over(sheet);
    TracedAmplifier benched = amplifier.with(bench.applyTo(amplifier.circuit()));
    try {
      Diagnosis diagnosis =
          Diagnosis.of(amplifier.circuit(), benched.circuit(), sheet, Catalogue.standard().types());
      ChartInput input =
          new ChartInput(
              benched.fileName(), List.of(SolvedColumns.first(benched)), benched.diagnostics());
      BenchReport report = BenchReport.of(input, diagnosis, open.values());
      return new CompareJob(report, diagnosis, remarks, bench.meter().orElse(""), open);
    } catch (NoOperatingPoint failure) {
      throw new CannotDo(String.valueOf(failure.getMessage()));
    }
  }

  /** Returns whether a healthy amplifier explains the readings best. */
  public boolean healthy() {
    return diagnosis.healthy();
  }

  /** Returns what is to be said about rows of the sheet that do not count; empty when nothing. */
  public String remarks() {
    return remarks;
  }

  /** Returns the report in one of the kinds that are text. */
  public String print(ChartFormat format) throws CannotDo {
    return switch (format) {
      case TEXT -> new TextRenderer().render(report.chart());
      case JSON -> new JsonRenderer().render(report.figures());
      case CSV -> throw new CannotDo("a bench report is written as text, json or pdf");
      case PDF -> throw new IllegalArgumentException("a PDF is not text");
    };
  }

  /** Writes the report to {@code target}, whole or not at all. */
  public void write(Path target, ChartFormat format, Paper paper) throws CannotDo {
    byte[] bytes =
        format == ChartFormat.PDF
            ? new PdfRenderer().render(report.chart(), paper)
            : print(format).getBytes(StandardCharsets.UTF_8);
    WholeFile.write(target, bytes);
  }

  /**
   * Writes the readings with what was expected and the verdicts to {@code target}, a sheet that can
   * be compared again, whole or not at all.
   *
   * @param given the sheet that was read, which is never overwritten; empty when there was none
   */
  public void save(Path target, Optional<Path> given) throws CannotDo {
    if (given.isPresent() && isSame(target, given.get())) {
      throw new CannotDo(
          "--save " + target + ": this is the sheet that was read; name another file");
    }
    double lineVolts = diagnosis.benched().circuit().line().volts();
    String text = SavedSheet.text(diagnosis.readings(), lineVolts, meter);
    WholeFile.write(target, text.getBytes(StandardCharsets.UTF_8));
  }

  /**
   * Writes the netlist with the values found in place of its question marks, whole or not at all.
   */
  public void learn(Path target) throws CannotDo {
    open.learn(target);
  }

  static boolean isSame(Path target, Path given) throws CannotDo {
    try {
      return Files.exists(target) && Files.isSameFile(target, given);
    } catch (IOException failure) {
      throw new CannotDo("cannot write " + target + ": " + WholeFile.reason(failure));
    }
  }
}
