package railwalk.spread;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import railwalk.circuit.Circuit;
import railwalk.circuit.State;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.walk.Walk;

/**
 * Thread CPU time of the sampled bands of all nodes, 2,048 builds, once the compiler has warmed up.
 * Run by hand: {@code java -cp target/classes:target/test-classes:… railwalk.spread.BandsBenchmark
 * [NAME…]}. Each figure is the median of seven runs.
 */
public final class BandsBenchmark {
  private static final ThreadMXBean THREADS = ManagementFactory.getThreadMXBean();
  private static final int WARM_UP = 4;
  private static final int RUNS = 7;

  private BandsBenchmark() {}

  public static void main(String[] args) throws IOException {
    List<String> names = args.length == 0 ? List.of("millrace") : List.of(args);
    for (String name : names) {
      Circuit circuit =
          NetlistReader.read(Path.of("test-netlists/amps", name + ".cir"), Catalogue.standard())
              .circuit()
              .orElseThrow();
      measure(name, circuit);
      for (State state : circuit.states()) {
        measure(name + ", " + state.name(), circuit.inState(state));
      }
    }
  }

  private static void measure(String name, Circuit circuit) {
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, Walk.of(circuit));
    OperatingPoint point = ((SolveOutcome.Solved) outcome).point();
    double[] seconds = new double[RUNS];
    double first = 0;
    int unsettled = 0;
    for (int run = -WARM_UP; run < RUNS; run++) {
      long before = THREADS.getCurrentThreadCpuTime();
      Bands bands = SampledBands.of(point);
      double took = (THREADS.getCurrentThreadCpuTime() - before) / 1e9;
      first = run == -WARM_UP ? took : first;
      seconds[Math.max(0, run)] = took;
      unsettled = Objects.requireNonNull(bands.sampling()).unsettled();
    }
    Arrays.sort(seconds);
    System.out.printf(
        "%-28s %3d draws a build, %d unsettled: %.2f s (first run %.2f s)%n",
        name, RandomBuild.draws(circuit), unsettled, seconds[RUNS / 2], first);
  }
}
