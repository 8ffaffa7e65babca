package railwalk.solve;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;

/**
 * Thread CPU time of a minute of warm-up once the compiler has warmed up itself, from cold and hot,
 * on the fixed-bias sample amplifier. Run by hand: {@code java -cp
 * target/classes:target/test-classes:… railwalk.solve.WarmUpBenchmark [NETLIST]}. Median of the
 * rounds.
 */
public final class WarmUpBenchmark {
  private static final ThreadMXBean THREADS = ManagementFactory.getThreadMXBean();
  private static final double MINUTE_SECONDS = 60;

  private WarmUpBenchmark() {}

  public static void main(String[] args) throws IOException {
    String netlist = args.length == 0 ? "test-netlists/amps/millrace.cir" : args[0];
    Circuit circuit =
        NetlistReader.read(Path.of(netlist), Catalogue.standard()).circuit().orElseThrow();
    OperatingPoint running = SampleAmps.solve(circuit);
    for (boolean hot : new boolean[] {false, true}) {
      double[] millis = new double[15];
      int instants = 0;
      for (int round = -15; round < millis.length; round++) {
        long before = THREADS.getCurrentThreadCpuTime();
        WarmUpOutcome outcome =
            WarmUp.of(List.of(new WarmUp.Stretch(running, MINUTE_SECONDS)), hot);
        millis[Math.max(0, round)] = (THREADS.getCurrentThreadCpuTime() - before) / 1e6;
        if (outcome instanceof WarmUpOutcome.Lost lost) {
          throw new IllegalStateException(lost.toString());
        }
        instants = ((WarmUpOutcome.Followed) outcome).course().seconds().length;
      }
      Arrays.sort(millis);
      System.out.printf(
          "a minute from switch-on, %s: %d instants, %.0f ms%n",
          hot ? "hot" : "cold", instants, millis[millis.length / 2]);
    }
  }
}
