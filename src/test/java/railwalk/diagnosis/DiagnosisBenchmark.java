package railwalk.diagnosis;

import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import railwalk.readings.Reading;

/**
 * Thread CPU time of a whole diagnosis with the next probe on the fixed-bias sample amplifier, once
 * the compiler has warmed up; limits of first order, the sampled ones have {@code BandsBenchmark}.
 * Run by hand, as the solver's benchmark.
 */
public final class DiagnosisBenchmark {
  private static final ThreadMXBean THREADS = ManagementFactory.getThreadMXBean();

  private DiagnosisBenchmark() {}

  public static void main(String[] args) throws Exception {
    FaultCampaign campaign = new FaultCampaign(Path.of("test-netlists", "amps", "millrace.cir"), 0);
    Fault fault =
        campaign.faults.stream()
            .filter(f -> f.element().equals("R30") && f.kind() == FaultKind.RESISTOR_HIGH)
            .findFirst()
            .orElseThrow();
    List<Reading> readings = campaign.patient(fault, 164e3, new Random(1)).read(campaign.points);
    for (int count : new int[] {6, readings.size()}) {
      double[] seconds = new double[9];
      for (int i = -4; i < seconds.length; i++) {
        long before = THREADS.getCurrentThreadCpuTime();
        campaign.diagnose(readings.subList(0, count));
        if (i >= 0) {
          seconds[i] = (THREADS.getCurrentThreadCpuTime() - before) / 1e9;
        }
      }
      Arrays.sort(seconds);
      System.out.printf(
          "%d faults tried, %d readings: %.2f s%n",
          campaign.faults.size(), count, seconds[seconds.length / 2]);
    }
  }
}
