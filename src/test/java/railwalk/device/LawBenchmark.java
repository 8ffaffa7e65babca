package railwalk.device;

import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.util.Random;

/**
 * Thread-CPU time of one law evaluation with derivatives and grid current, by hand:
 *
 * <pre>
 * mvn -q test-compile &amp;&amp; java -cp target/classes:target/test-classes railwalk.device.LawBenchmark
 * </pre>
 *
 * Prints the best of 25 batches per type; half the points have the grid near zero, so that grid
 * current is drawn.
 */
public final class LawBenchmark {
  private static final int POINTS = 1024;
  private static final int BATCH = 200;

  private LawBenchmark() {}

  /** Runs it. */
  public static void main(String[] args) {
    ThreadMXBean threads = ManagementFactory.getThreadMXBean();
    for (String name : new String[] {"12AX7", "6SN7GT", "EL84", "6L6GC", "EF86", "12AX7", "EL84"}) {
      TubeType type = Catalogue.standard().find(name).orElseThrow();
      AmplifierLaw law = (AmplifierLaw) type.sections().get(0).law();
      double[][] volts = volts();
      SectionCurrents out = new SectionCurrents();
      double sum = 0;
      long best = Long.MAX_VALUE;
      for (int batch = 0; batch < 40; batch++) {
        long start = threads.getCurrentThreadCpuTime();
        for (int i = 0; i < BATCH; i++) {
          for (double[] v : volts) {
            law.evaluate(v[0], v[1], v[2], out);
            sum += out.plateAmps + out.gridByGridSiemens;
          }
        }
        if (batch >= 15) {
          best = Math.min(best, threads.getCurrentThreadCpuTime() - start);
        }
      }
      System.out.printf(
          "%-7s %6.1f ns per evaluation (%.3g)%n", name, (double) best / BATCH / POINTS, sum);
    }
  }

  private static double[][] volts() {
    Random random = new Random(1);
    double[][] volts = new double[POINTS][];
    for (int i = 0; i < POINTS; i++) {
      double grid = i % 2 == 0 ? -random.nextDouble() : -12 * random.nextDouble();
      volts[i] = new double[] {350 * random.nextDouble(), 300 * random.nextDouble(), grid};
    }
    return volts;
  }
}
