package railwalk.app;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import railwalk.chart.ChartInput;
import railwalk.chart.OhmsPages;
import railwalk.diagnosis.ColdOhms;
import railwalk.diagnosis.NoOperatingPoint;

/** What an ohmmeter reads at every point of the unplugged amplifier. */
public final class OhmsJob {
  private OhmsJob() {}

  /** Returns the cold ohms of {@code netlist}. */
  public static BenchPaper of(Path netlist) throws CannotDo {
    TracedAmplifier amplifier =
        TracedAmplifier.under(new BenchConditions(Optional.empty(), Optional.empty()), netlist);
    try {
      ColdOhms ohms = ColdOhms.of(amplifier.circuit());
      ChartInput input =
          new ChartInput(
              amplifier.fileName(),
              List.of(SolvedColumns.first(amplifier)),
              amplifier.diagnostics());
      return new BenchPaper(new OhmsPages(input, ohms).chart());
    } catch (NoOperatingPoint failure) {
      throw new CannotDo(String.valueOf(failure.getMessage()));
    }
  }
}
