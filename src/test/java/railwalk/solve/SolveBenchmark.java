package railwalk.solve;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Resistor;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.walk.SupplyMap;
import railwalk.walk.Walk;

/**
 * Thread CPU time of the solver once the compiler has warmed up, on the fixed-bias sample
 * amplifier. Run by hand: {@code java -cp target/classes:target/test-classes:…
 * railwalk.solve.SolveBenchmark}. Each figure is the median of the batches.
 */
public final class SolveBenchmark {
  private static final ThreadMXBean THREADS = ManagementFactory.getThreadMXBean();

  private SolveBenchmark() {}

  private interface Task {
    void run();
  }

  public static void main(String[] args) throws IOException {
    Circuit circuit =
        NetlistReader.read(Path.of("test-netlists/amps/millrace.cir"), Catalogue.standard())
            .circuit()
            .orElseThrow();
    SupplyMap map = Walk.of(circuit);
    Circuit changed = fivePercentOff(circuit);
    CoupledSolver solver = new CoupledSolver(circuit, map, false);
    if (!(solver.startCold() && solver.settle())) {
      throw new IllegalStateException(solver.failure());
    }
    CoupledSolver nominal = new CoupledSolver(circuit, map, false);
    nominal.startFrom(solver);
    System.out.printf(
        "%d DC unknowns, %d cycle unknowns, %d states%n",
        solver.dc.size, solver.supplies.get(0).net.size, solver.supplies.get(0).net.stores.size());
    double[] guess = new double[solver.dc.size];
    DcSolver held = new DcSolver(solver.dc, new Trace(false));
    measure(
        "DC network, supply nodes held, from the standard guess",
        2000,
        () -> {
          Arrays.fill(guess, 0);
          must(held.settle(guess));
        });
    measure(
        "DC network, supply nodes held, one part 5 % off, from the nominal solution",
        2000,
        () -> {
          System.arraycopy(nominal.x, 0, guess, 0, guess.length);
          solver.dc.load(changed);
          must(held.settle(guess));
        });
    solver.dc.load(circuit);
    CoupledSolver again = new CoupledSolver(circuit, map, false);
    measure(
        "with supplies, from the standard guess",
        200,
        () -> {
          again.reset();
          must(again.startCold() && again.settle());
        });
    CoupledSolver off = new CoupledSolver(changed, map, false);
    measure(
        "with supplies, one part 5 % off, from the nominal solution",
        300,
        () -> {
          off.startFrom(nominal);
          must(off.settle());
        });
    measure("whole solve with topology and report", 100, () -> SampleAmps.solve(circuit));
  }

  private static void must(boolean settled) {
    if (!settled) {
      throw new IllegalStateException("did not settle");
    }
  }

  private static Circuit fivePercentOff(Circuit circuit) {
    List<Element> parts =
        circuit.elements().stream()
            .map(
                e ->
                    e instanceof Resistor r && r.name().equals("R16")
                        ? (Element)
                            new Resistor(
                                r.name(),
                                r.a(),
                                r.b(),
                                1.05 * r.ohms(),
                                r.ratedWatts(),
                                r.tolerance())
                        : e)
            .toList();
    return circuit.withElements(parts);
  }

  private static void measure(String name, int batch, Task task) {
    for (int i = 0; i < 10 * batch; i++) {
      task.run();
    }
    double[] micros = new double[15];
    for (int b = 0; b < micros.length; b++) {
      long before = THREADS.getCurrentThreadCpuTime();
      for (int i = 0; i < batch; i++) {
        task.run();
      }
      micros[b] = (THREADS.getCurrentThreadCpuTime() - before) / 1e3 / batch;
    }
    Arrays.sort(micros);
    System.out.printf("%-76s %9.1f us%n", name, micros[micros.length / 2]);
  }
}
