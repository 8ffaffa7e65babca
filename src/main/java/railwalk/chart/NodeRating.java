package railwalk.chart;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.units.Quantity;

/**
 * What the filter capacitors at a node stand: the weakest way through them to the reference, the
 * ratings of capacitors stacked on one another added up.
 *
 * @param volts NaN where no rated capacitor leads to the reference
 * @param capacitors of that way
 */
record NodeRating(double volts, List<Capacitor> capacitors) {
  /** Smaller capacitors at a supply node are there against noise. */
  private static final double SMALLEST_FARADS = 0.5e-6;

  private static final int MOST_STACKED = 4;
  private static final NodeRating NONE = new NodeRating(Double.NaN, List.of());

  static NodeRating of(Circuit circuit, Node node) {
    Set<Node> passed = new HashSet<>();
    passed.add(node);
    return weakest(circuit, node, passed, new ArrayList<>());
  }

  private static NodeRating weakest(
      Circuit circuit, Node node, Set<Node> passed, List<Capacitor> stack) {
    NodeRating weakest = NONE;
    for (Capacitor capacitor : circuit.elements(Capacitor.class)) {
      boolean here = capacitor.nodes().contains(node) && capacitor.farads() >= SMALLEST_FARADS;
      if (!here || Double.isNaN(capacitor.ratedVolts()) || stack.contains(capacitor)) {
        continue;
      }
      Node other = capacitor.a().equals(node) ? capacitor.b() : capacitor.a();
      stack.add(capacitor);
      NodeRating found = NONE;
      if (other.equals(circuit.reference())) {
        double sum = stack.stream().mapToDouble(Capacitor::ratedVolts).sum();
        found = new NodeRating(sum, List.copyOf(stack));
      } else if (stack.size() < MOST_STACKED && passed.add(other)) {
        found = weakest(circuit, other, passed, stack);
        passed.remove(other);
      }
      stack.remove(stack.size() - 1);
      if (!Double.isNaN(found.volts) && !(weakest.volts <= found.volts)) {
        weakest = found;
      }
    }
    return weakest;
  }

  boolean isKnown() {
    return !Double.isNaN(volts);
  }

  /** Returns the capacitors' names: "C1 + C2". */
  String names() {
    return String.join(" + ", capacitors.stream().map(Capacitor::name).toList());
  }

  /** Returns names and rating: "C1 450 V". */
  String words() {
    return names() + " " + Quantity.volts(volts);
  }
}
