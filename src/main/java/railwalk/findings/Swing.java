package railwalk.findings;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Fuse;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;

/**
 * The alternating volts that windings put on the nodes around them, at no load and counted from
 * where the supply current comes home.
 *
 * @param rmsVolts by node; negative in opposite phase
 * @param ends by node the winding's end it is joined to
 */
record Swing(Map<Node, Double> rmsVolts, Map<Node, Node> ends) {

  /** Returns the swing of all nodes that windings and leads join to {@code home}. */
  static Swing from(Circuit circuit, Map<Node, List<Element>> elementsByNode, Node home) {
    Map<Node, Double> volts = new HashMap<>(Map.of(home, 0.0));
    Map<Node, Node> ends = new HashMap<>(Map.of(home, home));
    Deque<Node> open = new ArrayDeque<>(Set.of(home));
    while (!open.isEmpty()) {
      Node node = open.remove();
      double here = volts.getOrDefault(node, 0.0);
      for (Element element : elementsByNode.getOrDefault(node, List.of())) {
        if (element instanceof Winding winding) {
          double scale = circuit.line().scale(winding.atLineVolts());
          for (Winding.Section section : winding.sections()) {
            double rise = section.openRmsVolts() * scale;
            if (section.a().equals(node) && volts.putIfAbsent(section.b(), here - rise) == null) {
              ends.put(section.b(), section.b());
              open.add(section.b());
            }
            if (section.b().equals(node) && volts.putIfAbsent(section.a(), here + rise) == null) {
              ends.put(section.a(), section.a());
              open.add(section.a());
            }
          }
        } else if (isLead(element) && !node.equals(home)) {
          for (Node next : element.nodes()) {
            if (volts.putIfAbsent(next, here) == null) {
              ends.put(next, ends.getOrDefault(node, node));
              open.add(next);
            }
          }
        }
      }
    }
    return new Swing(volts, ends);
  }

  private static boolean isLead(Element element) {
    return element instanceof Resistor
        || element instanceof Fuse
        || element instanceof Lamp
        || element instanceof Wire
        || (element instanceof Switch contact && contact.position() > 0);
  }

  /** Returns whether two nodes are driven by different ends of windings that swing together. */
  boolean together(Node a, Node b) {
    double swing = rmsVolts.getOrDefault(a, 0.0) * rmsVolts.getOrDefault(b, 0.0);
    Node endOfA = ends.get(a);
    return swing > 0 && endOfA != null && !endOfA.equals(ends.get(b));
  }
}
