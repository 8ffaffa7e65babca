package railwalk.chart;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/**
 * One step of the way down a supply: a dropper, or several side by side, from one node to the next.
 */
record Rung(List<Element> parts, Node from, Node to) {
  /** Below this a part is a contact, not a resistance. */
  private static final double NOTABLE_WATTS = 1e-6;

  Rung {
    parts = List.copyOf(parts);
  }

  /** Returns the steps that lead to a supply node, in feeding order. */
  static List<Rung> to(SupplyNode supply) {
    ArrayDeque<Rung> rungs = new ArrayDeque<>();
    List<Element> droppers = supply.droppers();
    Node at = supply.node();
    int last = droppers.size() - 1;
    while (last >= 0) {
      Node from = farEnd(droppers.get(last), at, last == 0 ? List.of() : nodesBefore(supply, last));
      int first = last;
      Set<Node> ends = Set.of(from, at);
      while (first > 0 && new HashSet<>(droppers.get(first - 1).nodes()).equals(ends)) {
        first--;
      }
      rungs.addFirst(new Rung(droppers.subList(first, last + 1), from, at));
      at = from;
      last = first - 1;
    }
    return List.copyOf(rungs);
  }

  /**
   * Returns the end of {@code part} away from {@code at}; one of {@code wanted} where it has it.
   */
  private static Node farEnd(Element part, Node at, List<Node> wanted) {
    List<Node> others = part.nodes().stream().filter(n -> !n.equals(at)).toList();
    return others.stream()
        .filter(wanted::contains)
        .findFirst()
        .orElseGet(() -> others.isEmpty() ? at : others.get(0));
  }

  private static List<Node> nodesBefore(SupplyNode supply, int index) {
    List<Node> nodes = new ArrayList<>(supply.droppers().get(index - 1).nodes());
    Node parent = supply.parent();
    if (parent != null) {
      nodes.add(parent);
    }
    return nodes;
  }

  /** Returns the current that flows towards the far end, negative in a negative supply. */
  double amps(OperatingPoint point) {
    return parts.stream()
        .mapToDouble(
            part -> {
              double amps = PartLoad.of(part, from, to, point).amps();
              return flowsOn(part, point) ? amps : -amps;
            })
        .sum();
  }

  private boolean flowsOn(Element part, OperatingPoint point) {
    double drop = point.volts(from) - point.volts(to);
    if (Math.abs(drop) > 1e-9) {
      return drop > 0;
    }
    return part.nodes().get(0).equals(from) == point.amps(part) >= 0;
  }

  /** Returns the names, "R5" or "R5 || R6". */
  String names() {
    return parts.stream().map(Element::name).collect(Collectors.joining(" || "));
  }

  /** Returns the values, "4.7 kΩ" or "4.7 kΩ || 10 kΩ". */
  String values() {
    return parts.stream()
        .map(part -> PartFace.of(part).value())
        .filter(value -> !value.isEmpty())
        .collect(Collectors.joining(" || "));
  }

  /** Returns the sign of the first part. */
  Ladder.Symbol symbol() {
    return PartFace.of(parts.get(0)).symbol();
  }

  /** Returns current and heat in a few signs: "5.1 mA · 26 mW"; the current alone without heat. */
  String load(OperatingPoint point) {
    double watts =
        parts.stream().mapToDouble(part -> PartLoad.of(part, from, to, point).watts()).sum();
    String current = Quantity.amps(Math.abs(amps(point)));
    return watts < NOTABLE_WATTS ? current : current + " · " + Quantity.watts(watts);
  }
}
