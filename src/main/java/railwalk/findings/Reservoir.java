package railwalk.findings;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.Node;
import railwalk.circuit.Switch;
import railwalk.circuit.Wire;
import railwalk.walk.DcStep;

/**
 * What a rectifier's output charges directly: the capacitors that nothing but metal parts from it.
 *
 * @param nodes that metal joins to the output
 * @param capacitors from them to elsewhere
 */
record Reservoir(Set<Node> nodes, List<Capacitor> capacitors) {
  /** Below this a capacitor at a rectifier is there against noise. */
  private static final double SMALLEST_FARADS = 0.5e-6;

  static Reservoir at(Scene scene, Node output) {
    Set<Node> nodes = new LinkedHashSet<>();
    Deque<Node> open = new ArrayDeque<>(Set.of(output));
    while (!open.isEmpty()) {
      Node node = open.remove();
      if (node.equals(scene.circuit().reference()) || !nodes.add(node)) {
        continue;
      }
      scene.at(node).stream().filter(Reservoir::isMetal).map(Element::nodes).forEach(open::addAll);
    }
    List<Capacitor> capacitors = new ArrayList<>();
    for (Capacitor capacitor : scene.circuit().elements(Capacitor.class)) {
      if (nodes.contains(capacitor.a()) != nodes.contains(capacitor.b())
          && capacitor.farads() >= SMALLEST_FARADS) {
        capacitors.add(capacitor);
      }
    }
    return new Reservoir(nodes, atFoot(scene, output, nodes, capacitors));
  }

  /**
   * Returns those of the capacitors that go straight to where the current comes home, if there are
   * any: the others charge through what lifts that off the reference, a field coil or a resistor.
   */
  private static List<Capacitor> atFoot(
      Scene scene, Node output, Set<Node> nodes, List<Capacitor> capacitors) {
    List<DcStep> there = scene.paths().to(output).there();
    if (there.isEmpty()) {
      return capacitors;
    }
    Set<Node> home = joined(scene, there.get(0).from());
    List<Capacitor> straight =
        capacitors.stream()
            .filter(c -> home.contains(nodes.contains(c.a()) ? c.b() : c.a()))
            .toList();
    return straight.isEmpty() ? capacitors : straight;
  }

  /** Returns {@code node} and what plain metal joins to it; the reference ends the search. */
  private static Set<Node> joined(Scene scene, Node start) {
    Set<Node> nodes = new LinkedHashSet<>();
    Deque<Node> open = new ArrayDeque<>(Set.of(start));
    while (!open.isEmpty()) {
      Node node = open.remove();
      if (nodes.add(node) && !node.equals(scene.circuit().reference())) {
        scene.at(node).stream()
            .filter(Reservoir::isMetal)
            .map(Element::nodes)
            .forEach(open::addAll);
      }
    }
    return nodes;
  }

  private static boolean isMetal(Element element) {
    return element instanceof Wire
        || element instanceof Fuse
        || element instanceof Filament
        || (element instanceof Switch contact && contact.position() > 0);
  }

  /** Returns the capacitance, each capacitor with the one in series below it if there is one. */
  double farads(Scene scene) {
    return capacitors.stream().mapToDouble(capacitor -> farads(scene, capacitor)).sum();
  }

  private double farads(Scene scene, Capacitor capacitor) {
    Node foot = nodes.contains(capacitor.a()) ? capacitor.b() : capacitor.a();
    if (foot.equals(scene.circuit().reference())) {
      return capacitor.farads();
    }
    double below =
        scene.at(foot).stream()
            .filter(e -> e instanceof Capacitor && !capacitors.contains(e))
            .mapToDouble(e -> ((Capacitor) e).farads())
            .filter(farads -> farads >= SMALLEST_FARADS)
            .sum();
    return below == 0
        ? capacitor.farads()
        : capacitor.farads() * below / (capacitor.farads() + below);
  }
}
