package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.Test;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.circuit.Element;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Wire;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.walk.RippleGroup;

/**
 * Where ripple groups end: the ripple left at their ports is below 0.3 % of the volts, or what
 * hangs there has no memory (no filter stage, no coil of known inductance), so that a current and
 * its slope are all there is to see of it. Volts are held to time stepping, which cuts nothing out.
 */
class PortRippleTest {
  private static final double RULE = 0.003;
  private static final double OMEGA = 2 * Math.PI * 60;
  private static final double LOAD_OHMS = 5000;

  /** ωCR of the hardest resistive load. */
  private static final double OMEGA_CR = 4;

  @Test
  void resistiveLoadOnASmallReservoir() {
    for (boolean fullWave : new boolean[] {false, true}) {
      for (boolean split : new boolean[] {false, true}) {
        CircuitBuilder b = new CircuitBuilder().line(120, 60);
        if (fullWave) {
          b.winding("VHT", new double[] {300, 300}, 100, "h1", "0", "h2")
              .diode("D1", "h1", "b1")
              .diode("D2", "h2", "b1");
        } else {
          b.winding("VHT", "h1", "0", 300, 100).diode("D1", "h1", "b1");
        }
        b.c("C1", "b1", "0", OMEGA_CR / (OMEGA * LOAD_OHMS));
        if (split) {
          b.r("R1", "b1", "x", 0.4 * LOAD_OHMS).r("R2", "x", "0", 0.6 * LOAD_OHMS);
        } else {
          b.r("R1", "b1", "0", LOAD_OHMS);
        }
        SolvedPoint point = (SolvedPoint) SampleAmps.solve(b.build());
        int ports = point.reports().get(0).net().group.ports().size();
        String name =
            (fullWave ? "full-wave" : "half-wave") + (split ? ", seen through a port" : ", inside");
        assertThat(ports).as(name).isEqualTo(split ? 1 : 0);
        assertThat(disagreement(name, point)).as(name).isLessThan(1);
      }
    }
  }

  @Test
  void aStageWhoseCapacitorsStandInSeries() throws IOException {
    grows(
        "capacitors in series",
        "D1 h1 b1 1N4007",
        "C1 b1 0 10u",
        "R1 b1 b2 1k",
        "C2 b2 m 47u",
        "C3 m 0 47u",
        "R2 b2 m 220k",
        "R3 m 0 220k",
        "R4 b2 0 4k7");
  }

  @Test
  void twoStagesThatPartAtANodeWithoutCapacitor() throws IOException {
    grows(
        "two stages part",
        "D1 h1 b1 1N4007",
        "C1 b1 0 10u",
        "R1 b1 x 220",
        "R2 x b2 470",
        "C2 b2 0 47u",
        "R3 b2 0 4k7",
        "R4 x b3 10k",
        "C3 b3 0 10u",
        "R5 b3 0 47k",
        "R6 x p 47k",
        "XV1 6V6GT 3=p 4=p 5=0 8=k",
        "R7 k 0 500");
  }

  @Test
  void anOutputTransformerKeepsTheRippleFromATriode() throws IOException {
    grows(
        "output transformer",
        "D1 h1 b1 1N4007",
        "C1 b1 0 10u",
        "LOT b1 p 15 rdc=150",
        "XV1 6B4G 3=p 5=0 2=k 7=k",
        "R1 k 0 750");
  }

  @Test
  void aStageBehindAnOverloadedReservoir() throws IOException {
    grows(
        "overloaded reservoir",
        "D1 h1 b1 1N4007",
        "C1 b1 0 2u",
        "R1 b1 b2 470",
        "C2 b2 0 22u",
        "R2 b2 b3 220",
        "C3 b3 0 4.7u",
        "R3 b3 p 47",
        "LOT p pp rdc=100",
        "XV1 6V6GT 3=pp 4=b3 5=0 8=k",
        "R4 k 0 200");
  }

  @Test
  void twoSuppliesIntoOneRail() throws IOException {
    grows(
        "two supplies",
        "VB g1 0 RMS 200 rdc=100",
        "D1 h1 b1 1N4007",
        "D2 g1 c1 1N4007",
        "C1 b1 0 10u",
        "C2 c1 0 10u",
        "R1 b1 x 1k",
        "R2 c1 x 1k",
        "C3 x 0 47u",
        "R3 x 0 4k7");
  }

  private static void grows(String name, String... lines) throws IOException {
    String text = "title\n.line 120 60\nVA h1 0 RMS 250 rdc=100\n" + String.join("\n", lines);
    Circuit circuit =
        NetlistReader.readText("x.cir", text + "\n", Catalogue.standard()).circuit().orElseThrow();
    SolvedPoint point = (SolvedPoint) SampleAmps.solve(circuit);
    keepsTheRule(name, point);
    assertThat(disagreement(name, point)).isLessThan(1);
  }

  @Test
  void everyNetlistKeepsTheRule() throws IOException {
    for (Path file : EnginesTest.netlists()) {
      Circuit circuit = NetlistReader.read(file, Catalogue.standard()).circuit().orElseThrow();
      keepsTheRule(file.getFileName().toString(), (SolvedPoint) SampleAmps.solve(circuit));
    }
  }

  /** Prints the greatest port ripple below the rule and each one above it. */
  private static void keepsTheRule(String name, SolvedPoint point) {
    double greatest = 0;
    List<String> above = new ArrayList<>();
    Map<Node, Double> ripples = OperatingPointSolver.portRipples(point);
    for (CycleReport report : point.reports()) {
      RippleGroup group = report.net().group;
      for (Node port : group.ports()) {
        double ripple = ripples.getOrDefault(port, 0.0);
        if (ripple <= RULE) {
          greatest = Math.max(greatest, ripple);
          continue;
        }
        above.add(String.format("%s %.2f %%", port.name(), 100 * ripple));
        assertThat(withMemory(point.circuit(), group, port))
            .as("%s: port %s ripples by %.2f %%", name, port.name(), 100 * ripple)
            .isEmpty();
      }
    }
    System.out.printf(
        "%-36s ports within the rule %.3f %%, without memory: %s%n", name, 100 * greatest, above);
  }

  /** Returns the stores that series parts outside the group lead to from a port, tubes aside. */
  private static List<String> withMemory(Circuit circuit, RippleGroup group, Node port) {
    Set<Element> inside = new HashSet<>(group.elements());
    Set<Node> amplifying = new HashSet<>();
    circuit.elements(AmplifierSection.class).forEach(s -> amplifying.addAll(s.nodes()));
    List<String> stores = new ArrayList<>();
    Set<Node> seen = new HashSet<>(Set.of(port, circuit.reference()));
    Deque<Node> open = new ArrayDeque<>(List.of(port));
    while (!open.isEmpty()) {
      Node node = open.remove();
      for (Element part : circuit.elements()) {
        boolean series =
            part instanceof Resistor
                || part instanceof Inductor
                || part instanceof Fuse
                || part instanceof Lamp
                || part instanceof Wire
                || (part instanceof Switch s && s.position() == 1);
        if (inside.contains(part) || !part.nodes().contains(node)) {
          continue;
        }
        if (part instanceof Capacitor c && c.farads() >= 0.5e-6) {
          stores.add(c.name());
        }
        if (part instanceof Inductor l && !Double.isNaN(l.henries())) {
          stores.add(l.name());
        }
        if (series) {
          for (Node next : part.nodes().subList(0, 2)) {
            if (seen.add(next) && !amplifying.contains(next)) {
              open.add(next);
            }
          }
        }
      }
    }
    return stores;
  }

  /** Returns the greatest difference of any node from time stepping, over 0.2 % or 0.05 V. */
  private static double disagreement(String name, OperatingPoint point) {
    LineCycle cycle = ((CycleOutcome.Settled) TimeStepping.of(point)).cycle();
    double worst = 0;
    for (Node node : point.circuit().nodes()) {
      double mean = cycle.meanVolts(node);
      double limit = Math.max(0.05, 0.002 * Math.abs(mean));
      double error = Math.abs(point.volts(node) - mean) / limit;
      worst = Double.isNaN(error) ? worst : Math.max(worst, error);
    }
    System.out.printf("%-36s %.2f of 0.2 %% or 0.05 V from time stepping%n", name, worst);
    return worst;
  }
}
