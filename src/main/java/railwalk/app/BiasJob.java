package railwalk.app;

import java.nio.file.Path;
import java.util.List;
import railwalk.chart.BiasPages;
import railwalk.chart.ChartInput;
import railwalk.chart.Column;
import railwalk.diagnosis.BiasSheet;
import railwalk.units.Quantity;

/** How the output tubes idle and where their bias belongs. */
public final class BiasJob {
  private BiasJob() {}

  /** Returns the bias sheet of {@code netlist}. */
  public static BenchPaper of(Path netlist, BenchConditions conditions) throws CannotDo {
    TracedAmplifier amplifier = TracedAmplifier.under(conditions, netlist);
    Column column = SolvedColumns.first(amplifier);
    BiasSheet sheet = BiasSheet.of(column.point());
    if (sheet.tubes().isEmpty()) {
      throw new CannotDo(
          amplifier
              .circuit()
              .words()
              .say(
                  amplifier.fileName()
                      + " has no output {tube}: no {plate} hangs on a coil and none is rated "
                      + Quantity.watts(BiasSheet.OUTPUT_WATTS)
                      + " or more"));
    }
    ChartInput input =
        new ChartInput(amplifier.fileName(), List.of(column), amplifier.diagnostics());
    return new BenchPaper(new BiasPages(input, sheet).chart());
  }
}
