package railwalk.app;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import railwalk.chart.Chart;
import railwalk.chart.ChartBuilder;
import railwalk.chart.ChartInput;
import railwalk.render.csv.CsvRenderer;
import railwalk.render.json.JsonRenderer;
import railwalk.render.pdf.Paper;
import railwalk.render.pdf.PdfRenderer;
import railwalk.render.text.TextRenderer;

/**
 * From a netlist to its voltage chart: read, walk, solve every state, find the bands, look for what
 * is wrong, build the chart. The chart is then written or printed in any format.
 */
public final class ChartJob {
  private final Chart chart;

  private ChartJob(Chart chart) {
    this.chart = chart;
  }

  /** Makes the chart of {@code netlist} under the bench's conditions. */
  public static ChartJob of(Path netlist, BenchConditions conditions) throws CannotDo {
    return of(netlist, conditions, false, BandKind.FIRST_ORDER);
  }

  /**
   * Makes the chart of {@code netlist} under the bench's conditions.
   *
   * @param lineSweep whether it has a page with the main points at 90 to 110 % of the line
   * @param bands how the bands are found
   */
  public static ChartJob of(
      Path netlist, BenchConditions conditions, boolean lineSweep, BandKind bands) throws CannotDo {
    TracedAmplifier amplifier = TracedAmplifier.under(conditions, netlist);
    ChartInput input =
        new ChartInput(
            amplifier.fileName(),
            SolvedColumns.of(amplifier, bands),
            amplifier.diagnostics(),
            lineSweep ? LineSweep.of(amplifier.circuit()) : List.of());
    return new ChartJob(new ChartBuilder().build(input));
  }

  /** Returns the name of the PDF that a chart of {@code netlist} gets: {@code NAME-chart.pdf}. */
  public static String pdfName(Path netlist) {
    String name = String.valueOf(netlist.getFileName());
    int dot = name.lastIndexOf('.');
    return (dot > 0 ? name.substring(0, dot) : name) + "-chart.pdf";
  }

  /** Returns the chart in one of the kinds that are text. */
  public String print(ChartFormat format) {
    return switch (format) {
      case TEXT -> new TextRenderer().render(chart);
      case CSV -> new CsvRenderer().render(chart);
      case JSON -> new JsonRenderer().render(chart);
      case PDF -> throw new IllegalArgumentException("a PDF is not text");
    };
  }

  /** Writes the chart to {@code target}, whole or not at all. */
  public void write(Path target, ChartFormat format, Paper paper) throws CannotDo {
    byte[] bytes =
        format == ChartFormat.PDF
            ? new PdfRenderer().render(chart, paper)
            : print(format).getBytes(StandardCharsets.UTF_8);
    WholeFile.write(target, bytes);
  }
}
