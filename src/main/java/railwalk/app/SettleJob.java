package railwalk.app;

import java.nio.file.Path;
import java.util.List;
import railwalk.chart.Chart;
import railwalk.chart.ChartInput;
import railwalk.chart.PeriodChart;
import railwalk.render.pdf.Paper;
import railwalk.render.pdf.PdfRenderer;
import railwalk.render.text.TextRenderer;
import railwalk.solve.CycleOutcome;
import railwalk.solve.TimeStepping;

/** Steps an amplifier through time until every line period is like the one before. */
public final class SettleJob {
  private final Chart chart;

  private SettleJob(Chart chart) {
    this.chart = chart;
  }

  /** Returns the settled period of {@code netlist}; refuses where it does not settle. */
  public static SettleJob of(Path netlist, BenchConditions conditions) throws CannotDo {
    TracedAmplifier amplifier = TracedAmplifier.under(conditions, netlist);
    ChartInput input =
        new ChartInput(
            amplifier.fileName(), List.of(SolvedColumns.first(amplifier)), amplifier.diagnostics());
    CycleOutcome outcome = TimeStepping.of(input.first().point());
    if (outcome instanceof CycleOutcome.NotSettled not) {
      throw new CannotDo("does not settle: node " + not.node() + ": " + not.reason());
    }
    return new SettleJob(PeriodChart.of(input, ((CycleOutcome.Settled) outcome).cycle()));
  }

  /** Returns the pages as text. */
  public String print() {
    return new TextRenderer().render(chart);
  }

  /** Writes the pages to {@code target} as a PDF, whole or not at all. */
  public void write(Path target, Paper paper) throws CannotDo {
    WholeFile.write(target, new PdfRenderer().render(chart, paper));
  }
}
