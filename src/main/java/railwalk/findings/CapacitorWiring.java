package railwalk.findings;

import java.util.stream.Stream;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;

/**
 * A capacitor across nothing: both ends on one node, or a bypass or filter capacitor whose hot end
 * no other part touches. A coupling capacitor with an open end is an amplifier's output.
 */
final class CapacitorWiring {
  private CapacitorWiring() {}

  static Stream<Finding> check(Scene scene) {
    return scene.circuit().elements(Capacitor.class).stream()
        .filter(capacitor -> !capacitor.nodes().contains(chassisOf(scene.circuit())))
        .flatMap(capacitor -> check(scene, capacitor));
  }

  /** Returns the chassis where it stands apart, else a node that no capacitor has. */
  private static Node chassisOf(Circuit circuit) {
    return circuit
        .node("chassis")
        .filter(node -> !node.equals(circuit.reference()))
        .orElse(new Node(-1, ""));
  }

  private static Stream<Finding> check(Scene scene, Capacitor capacitor) {
    if (capacitor.a().equals(capacitor.b())) {
      return Stream.of(
          finding(scene, capacitor, "both its ends are on node " + capacitor.a().name()));
    }
    Node reference = scene.circuit().reference();
    return capacitor.nodes().stream()
        .filter(node -> !node.equals(reference) && capacitor.nodes().contains(reference))
        .filter(node -> scene.at(node).size() == 1)
        .filter(node -> !onPin(scene, node))
        .map(node -> finding(scene, capacitor, "no other part is on node " + node.name()));
  }

  private static boolean onPin(Scene scene, Node node) {
    return scene.circuit().bottles().stream().anyMatch(b -> b.pins().containsValue(node));
  }

  private static Finding finding(Scene scene, Capacitor capacitor, String reason) {
    return FindingCode.CAPACITOR_NOWHERE.of(
        scene.words(), capacitor.name(), capacitor.name() + " stands across nothing: " + reason);
  }
}
