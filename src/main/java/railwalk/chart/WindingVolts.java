package railwalk.chart;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Winding;
import railwalk.units.Quantity;
import railwalk.walk.SupplyMap;
import railwalk.walk.SupplyNode;

/**
 * The AC volts of windings, at no load on the chart's line, and the nodes that carry them: a low DC
 * figure there says nothing of the danger.
 */
final class WindingVolts {
  /** Below this a winding is no danger of its own. */
  private static final double WORTH_A_WARNING_RMS = 30;

  private final Circuit circuit;
  private final Set<Node> quiet = new HashSet<>();
  private final Map<Node, String> warnings = new HashMap<>();

  WindingVolts(Circuit circuit, SupplyMap map) {
    this.circuit = circuit;
    quiet.add(circuit.reference());
    map.supplyNodes().stream().map(SupplyNode::node).forEach(quiet::add);
    circuit.elements(Winding.class).forEach(this::warnAtEnds);
    circuit.elements(Winding.class).forEach(this::warnBehind);
  }

  /** Returns a warning where {@code node} carries high AC besides its DC volts. */
  Optional<String> at(Node node) {
    return Optional.ofNullable(warnings.get(node));
  }

  /** Returns the volts rms between two ends or taps. */
  static double between(Winding winding, int a, int b, Circuit circuit) {
    double written =
        winding.sections().subList(Math.min(a, b), Math.max(a, b)).stream()
            .mapToDouble(Winding.Section::openRmsVolts)
            .sum();
    return written * circuit.line().scale(winding.atLineVolts());
  }

  /** Returns the tap that the others are told against; −1 where the winding has none. */
  static int returnTap(Winding winding, Circuit circuit) {
    int reference = winding.nodes().indexOf(circuit.reference());
    return reference < 0 && winding.sections().size() == 2 ? 1 : reference;
  }

  private void warnAtEnds(Winding winding) {
    List<Node> ends = winding.nodes();
    int tap = returnTap(winding, circuit);
    int last = ends.size() - 1;
    for (int i = 0; i <= last; i++) {
      double rms = tap < 0 ? between(winding, 0, last, circuit) : between(winding, i, tap, circuit);
      if (rms >= WORTH_A_WARNING_RMS && !quiet.contains(ends.get(i))) {
        String against = tap < 0 ? " across " + winding.name() : " to " + ends.get(tap).name();
        warnings.putIfAbsent(ends.get(i), "carries AC: " + Quantity.volts(rms) + " rms" + against);
      }
    }
  }

  /** Warns at the nodes that hang on the winding's ends through parts that let AC pass. */
  private void warnBehind(Winding winding) {
    double rms = greatestRms(winding);
    if (rms < WORTH_A_WARNING_RMS) {
      return;
    }
    String warning =
        "carries AC from " + winding.name() + ", up to " + Quantity.volts(rms) + " rms";
    Map<Node, List<Element>> parts = circuit.elementsByNode();
    Deque<Node> open = new ArrayDeque<>();
    winding.nodes().stream().filter(warnings::containsKey).forEach(open::add);
    Set<Node> seen = new HashSet<>(open);
    while (!open.isEmpty()) {
      for (Element part : parts.getOrDefault(open.remove(), List.of())) {
        for (Node node : passes(part) ? part.nodes() : List.<Node>of()) {
          if (!quiet.contains(node) && seen.add(node)) {
            warnings.putIfAbsent(node, warning);
            open.add(node);
          }
        }
      }
    }
  }

  private double greatestRms(Winding winding) {
    int last = winding.sections().size();
    int tap = returnTap(winding, circuit);
    return tap < 0
        ? between(winding, 0, last, circuit)
        : Math.max(between(winding, 0, tap, circuit), between(winding, tap, last, circuit));
  }

  private static boolean passes(Element part) {
    return !(part instanceof Capacitor
        || part instanceof Winding
        || part instanceof Diode
        || part instanceof RectifierSection
        || part instanceof RegulatorSection
        || part instanceof AmplifierSection);
  }
}
