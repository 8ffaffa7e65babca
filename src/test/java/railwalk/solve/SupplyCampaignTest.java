package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.circuit.Node;
import railwalk.walk.Walk;

/**
 * Seeded random supplies of twelve arrangements, values over decades and loads from none to
 * overload: all must settle in both engines, whatever they look like, and to the same volts. A
 * short run goes with every build, the long one with the {@code slow} profile.
 */
class SupplyCampaignTest {
  private static final String[] ARRANGEMENTS = {
    "half-wave",
    "centre tap",
    "bridge",
    "full-wave doubler",
    "half-wave doubler",
    "choke input",
    "back bias",
    "two polarities",
    "bias off a tap",
    "bias through a capacitor",
    "tube centre tap",
    "hybrid bridge"
  };

  @Test
  void shortRunSettles() {
    run(204);
  }

  @Test
  @Tag("slow")
  void longRunSettles() {
    run(2004);
  }

  /** What a supply came to. */
  private record Tally(int all, int settled, int compared, double worst) {}

  private static void run(int count) {
    Map<String, Tally> tallies = new TreeMap<>();
    for (int seed = 0; seed < count; seed++) {
      String arrangement = ARRANGEMENTS[seed % ARRANGEMENTS.length];
      Circuit circuit = supply(arrangement, new Random(seed));
      Tally before = tallies.getOrDefault(arrangement, new Tally(0, 0, 0, 0));
      SolveOutcome outcome = OperatingPointSolver.solve(circuit, Walk.of(circuit));
      boolean settled = outcome instanceof SolveOutcome.Solved;
      double difference = Double.NaN;
      if (outcome instanceof SolveOutcome.Solved solved) {
        difference = difference(solved.point(), seed);
      }
      boolean compared = !Double.isNaN(difference);
      tallies.put(
          arrangement,
          new Tally(
              before.all + 1,
              before.settled + (settled ? 1 : 0),
              before.compared + (compared ? 1 : 0),
              compared ? Math.max(before.worst, difference) : before.worst));
    }
    tallies.forEach(
        (name, t) ->
            System.out.printf(
                "%-26s %d of %d settle, %d in time too, engines differ by %.2f of 1 %% at most%n",
                name, t.settled, t.all, t.compared, t.worst));
    assertThat(tallies.values())
        .allSatisfy(
            t -> {
              assertThat(t.settled).isEqualTo(t.all);
              assertThat(t.compared).isEqualTo(t.all);
              assertThat(t.worst).isLessThanOrEqualTo(1);
            });
  }

  /**
   * Returns the greatest difference between the engines over all nodes, as a share of 1 % of the
   * node's volts or 0.05 V, whichever is more; NaN when time stepping does not settle.
   */
  private static double difference(OperatingPoint averaged, int seed) {
    if (!(TimeStepping.of(averaged) instanceof CycleOutcome.Settled settled)) {
      System.out.printf("seed %d does not settle in time%n", seed);
      return Double.NaN;
    }
    double worst = 0;
    for (Node node : averaged.circuit().nodes()) {
      double mean = settled.cycle().meanVolts(node);
      double limit = Math.max(0.05, 0.01 * Math.abs(mean));
      double difference = Math.abs(averaged.volts(node) - mean) / limit;
      if (difference > 1) {
        System.out.printf(
            "seed %d, %s: %.4f against %.4f V%n", seed, node.name(), averaged.volts(node), mean);
      }
      worst = Math.max(worst, Double.isNaN(difference) ? 0 : difference);
    }
    return worst;
  }

  private static double between(Random random, double low, double high) {
    return low * Math.pow(high / low, random.nextDouble());
  }

  private static Circuit supply(String arrangement, Random random) {
    double rms = between(random, 5, 500);
    double ohms = rms * (0.01 + 0.5 * random.nextDouble());
    double farads = between(random, 1e-6, 300e-6);
    double load = rms * rms / between(random, 1e-3, 100);
    CircuitBuilder b = new CircuitBuilder().line(120, 60);
    double[] halves = {rms, rms};
    switch (arrangement) {
      case "half-wave" -> b.winding("VH", "h1", "0", rms, ohms).diode("D1", "h1", "b1");
      case "centre tap" ->
          b.winding("VH", halves, ohms, "h1", "0", "h2")
              .diode("D1", "h1", "b1")
              .diode("D2", "h2", "b1");
      case "bridge" ->
          b.winding("VH", "h1", "h2", rms, ohms)
              .diode("D1", "h1", "b1")
              .diode("D2", "h2", "b1")
              .diode("D3", "0", "h1")
              .diode("D4", "0", "h2");
      case "full-wave doubler" ->
          b.winding("VH", "h1", "m", rms, ohms)
              .diode("D1", "h1", "b1")
              .diode("D2", "0", "h1")
              .c("CU", "b1", "m", farads)
              .c("CL", "m", "0", farads);
      case "half-wave doubler" ->
          b.winding("VH", "h1", "0", rms, ohms)
              .c("CX", "h1", "x", farads)
              .diode("D1", "0", "x")
              .diode("D2", "x", "b1");
      case "choke input" ->
          b.winding("VH", halves, ohms, "h1", "0", "h2")
              .diode("D1", "h1", "x")
              .diode("D2", "h2", "x")
              .l("L1", "x", "b1", 0.5 + 10 * random.nextDouble(), ohms / 2);
      case "back bias" ->
          b.winding("VH", halves, ohms, "h1", "ct", "h2")
              .rectifier(SampleAmps.type("GZ34"), "V1", "h1", "h2", "b1")
              .c("CT", "b1", "ct", farads)
              .r("RB", "ct", "0", 0.05 * load);
      case "two polarities" ->
          b.winding("VH", halves, ohms, "h1", "0", "h2")
              .diode("D1", "h1", "b1")
              .diode("D2", "h2", "b1")
              .diode("D3", "n1", "h1")
              .diode("D4", "n1", "h2")
              .c("CN", "n1", "0", farads)
              .r("RN", "n1", "0", load);
      case "bias off a tap" ->
          b.winding("VH", new double[] {0.8 * rms, 0.2 * rms, rms}, ohms, "h1", "t", "0", "h2")
              .rectifier(SampleAmps.type("5Y3GT"), "V1", "h1", "h2", "b1")
              .r("RT", "t", "tx", 0.3 * load)
              .diode("D1", "n1", "tx")
              .c("CN", "n1", "0", farads)
              .r("RN", "n1", "0", load);
      case "bias through a capacitor" ->
          b.winding("VH", halves, ohms, "h1", "0", "h2")
              .diode("D1", "h1", "b1")
              .diode("D2", "h2", "b1")
              .c("CB", "h1", "x", 0.1e-6)
              .diode("D3", "x", "0")
              .r("RX", "x", "n1", load)
              .c("CN", "n1", "0", farads)
              .r("RN", "n1", "0", 2 * load);
      case "tube centre tap" ->
          b.winding("VH", halves, ohms, "h1", "0", "h2")
              .rectifier(SampleAmps.type("5Y3GT"), "V1", "h1", "h2", "b1");
      default ->
          b.winding("VH", "h1", "h2", rms, ohms)
              .rectifier(SampleAmps.type("GZ34"), "V1", "h1", "h2", "b1")
              .diode("D3", "0", "h1")
              .diode("D4", "0", "h2");
    }
    b.c("C1", "b1", "0", farads);
    addFilter(b, random, farads, load);
    return b.build();
  }

  private static void addFilter(CircuitBuilder b, Random random, double farads, double load) {
    String from = "b1";
    int stages = random.nextInt(4);
    for (int s = 0; s < stages; s++) {
      String to = "b" + (s + 2);
      if (random.nextInt(4) == 0) {
        b.l("LF" + s, from, to, 1 + 10 * random.nextDouble(), 50);
      } else {
        b.r("RF" + s, from, to, load * between(random, 1e-3, 1));
      }
      b.c("CF" + s, to, "0", farads * random.nextDouble() + 1e-6);
      from = to;
    }
    if (random.nextInt(10) > 0) {
      b.r("RL", from, "0", load);
    }
  }
}
