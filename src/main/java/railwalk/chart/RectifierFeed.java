package railwalk.chart;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import railwalk.circuit.Bottle;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Winding;
import railwalk.units.Quantity;
import railwalk.walk.RippleGroup;

/**
 * What feeds one output of a ripple group: its rectifiers and the windings behind them. Found by
 * going from the output against the current, through whatever stands in between.
 *
 * @param rectifiers in netlist order
 * @param driven nodes on their winding's side, what stands between rectifier and winding included
 */
record RectifierFeed(
    Circuit circuit, RippleGroup group, Node output, List<Element> rectifiers, Set<Node> driven) {

  /** Returns what feeds {@code output} of {@code group}. */
  static RectifierFeed of(Circuit circuit, RippleGroup group, Node output) {
    Set<Node> direct = reach(circuit, group, Set.of(output));
    List<Element> near = rectifiersAt(group, direct);
    Set<Node> ends =
        near.stream()
            .flatMap(e -> e.nodes().stream())
            .filter(n -> !direct.contains(n) && !n.equals(circuit.reference()))
            .collect(Collectors.toSet());
    Set<Node> driven = reach(circuit, group, ends);
    List<Element> all =
        rectifiersAt(group, driven).stream()
            .filter(
                e -> near.contains(e) || e.nodes().stream().noneMatch(group.outputs()::contains))
            .toList();
    return new RectifierFeed(circuit, group, output, all, driven);
  }

  private static List<Element> rectifiersAt(RippleGroup group, Set<Node> nodes) {
    return group.elements().stream()
        .filter(RectifierFeed::isRectifier)
        .filter(e -> e.nodes().stream().anyMatch(nodes::contains))
        .toList();
  }

  private static boolean isRectifier(Element element) {
    return element instanceof RectifierSection || element instanceof Diode;
  }

  /** Returns the nodes joined to {@code start} by parts that let current through both ways. */
  private static Set<Node> reach(Circuit circuit, RippleGroup group, Set<Node> start) {
    Set<Node> reached = new LinkedHashSet<>();
    Deque<Node> open = new ArrayDeque<>(start);
    while (!open.isEmpty()) {
      Node node = open.remove();
      if (node.equals(circuit.reference()) || !reached.add(node)) {
        continue;
      }
      group.elements().stream()
          .filter(e -> !(e instanceof Capacitor || e instanceof Winding || isRectifier(e)))
          .filter(e -> e.nodes().contains(node))
          .forEach(e -> open.addAll(e.nodes()));
    }
    return reached;
  }

  /** Returns the names of the rectifiers, a tube's once: "V6", "D1 D2 D3 D4". */
  String names() {
    return rectifiers.stream()
        .map(e -> e instanceof RectifierSection tube ? tube.bottle() : e.name())
        .distinct()
        .collect(Collectors.joining(" "));
  }

  /** Returns the rectifier tubes. */
  List<Bottle> tubes() {
    return rectifiers.stream()
        .filter(RectifierSection.class::isInstance)
        .map(e -> ((RectifierSection) e).bottle())
        .distinct()
        .flatMap(name -> circuit.bottle(name).stream())
        .toList();
  }

  /** Returns the types of the rectifier tubes. */
  String types() {
    return tubes().stream().map(t -> t.type().name()).distinct().collect(Collectors.joining(" "));
  }

  /** Returns the arrangement in words. */
  String arrangement() {
    int index = group.outputs().indexOf(output);
    return index < 0 ? "" : group.arrangements().get(index);
  }

  /** Returns the volts of each winding it uses, at no load: "325-0-325 V rms". */
  List<String> windingVolts() {
    return group.elements().stream()
        .filter(Winding.class::isInstance)
        .map(Winding.class::cast)
        .flatMap(this::windingVolts)
        .toList();
  }

  private Stream<String> windingVolts(Winding winding) {
    List<Node> ends = winding.nodes();
    List<Integer> used =
        Stream.iterate(0, i -> i < ends.size(), i -> i + 1)
            .filter(i -> driven.contains(ends.get(i)))
            .toList();
    if (used.isEmpty()) {
      return Stream.empty();
    }
    int first = used.get(0);
    int last = used.get(used.size() - 1);
    int tap = WindingVolts.returnTap(winding, circuit);
    if (tap < 0) {
      int far = first != last ? last : first == 0 ? ends.size() - 1 : 0;
      return Stream.of(rms(winding, first, far) + " V rms");
    }
    List<String> figures = new ArrayList<>();
    for (int i = Math.min(first, tap); i <= Math.max(last, tap); i++) {
      if (used.contains(i)) {
        figures.add(rms(winding, i, tap));
      } else if (i == tap && used.size() > 1) {
        figures.add("0");
      }
    }
    return Stream.of(String.join("-", figures) + " V rms");
  }

  private String rms(Winding winding, int a, int b) {
    return Quantity.plainVolts(WindingVolts.between(winding, a, b, circuit));
  }
}
