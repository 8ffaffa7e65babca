package railwalk.findings;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.HashSet;
import java.util.Set;
import java.util.stream.Stream;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Element;
import railwalk.circuit.Fuse;
import railwalk.circuit.Node;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;
import railwalk.units.Quantity;

/** A capacitor from a wire of the line to the chassis that is not marked as fit for that. */
final class LineCapacitors {
  private LineCapacitors() {}

  static Stream<Finding> check(Scene scene) {
    Set<Node> line = wallWires(scene);
    Node chassis = scene.circuit().node("chassis").orElse(scene.circuit().reference());
    if (line.isEmpty() || line.contains(chassis)) {
      return Stream.empty();
    }
    return scene.circuit().elements(Capacitor.class).stream()
        .filter(capacitor -> !capacitor.safetyRated())
        .filter(capacitor -> capacitor.nodes().contains(chassis))
        .filter(capacitor -> capacitor.nodes().stream().anyMatch(line::contains))
        .map(
            capacitor ->
                FindingCode.LINE_CAPACITOR.of(
                    scene.words(),
                    capacitor.name(),
                    capacitor.name()
                        + " ("
                        + Quantity.of(capacitor.farads(), "F")
                        + ") joins the {line} to the chassis and is not marked as safety-rated"));
  }

  /** Returns the nodes that metal, fuses and switches in any position join to the wall. */
  static Set<Node> wallWires(Scene scene) {
    Set<Node> wires = new HashSet<>();
    Deque<Node> open = new ArrayDeque<>();
    scene.circuit().elements(Winding.class).stream()
        .filter(Winding::wall)
        .forEach(wall -> open.addAll(wall.nodes()));
    while (!open.isEmpty()) {
      Node node = open.remove();
      if (wires.add(node)) {
        scene.at(node).stream()
            .filter(LineCapacitors::isMetal)
            .map(Element::nodes)
            .forEach(open::addAll);
      }
    }
    return wires;
  }

  private static boolean isMetal(Element element) {
    return element instanceof Wire || element instanceof Fuse || element instanceof Switch;
  }
}
