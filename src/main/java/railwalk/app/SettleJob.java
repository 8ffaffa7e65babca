package railwalk.app;

import java.nio.file.Path;
import java.util.List;
import railwalk.chart.ChartInput;
import railwalk.chart.PeriodChart;
import railwalk.solve.CycleOutcome;
import railwalk.solve.TimeStepping;

/** Steps an amplifier through time until every line period is like the one before. */
public final class SettleJob {
  private SettleJob() {}

  /** Returns the settled period of {@code netlist}; refuses where it does not settle. */
  public static BenchPaper of(Path netlist, BenchConditions conditions) throws CannotDo {
    TracedAmplifier amplifier = TracedAmplifier.under(conditions, netlist);
    ChartInput input =
        new ChartInput(
            amplifier.fileName(), List.of(SolvedColumns.first(amplifier)), amplifier.diagnostics());
    CycleOutcome outcome = TimeStepping.of(input.first().point());
    if (outcome instanceof CycleOutcome.NotSettled not) {
      throw new CannotDo("does not settle: node " + not.node() + ": " + not.reason());
    }
    return new BenchPaper(PeriodChart.of(input, ((CycleOutcome.Settled) outcome).cycle()));
  }
}
