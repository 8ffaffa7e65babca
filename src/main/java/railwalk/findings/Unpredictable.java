package railwalk.findings;

import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/** Nodes without a DC path that no other finding tells of, the wall's own wires left out. */
final class Unpredictable {
  private Unpredictable() {}

  static Stream<Finding> check(Scene scene) {
    Set<Node> told = new HashSet<>();
    for (AmplifierSection section : scene.circuit().elements(AmplifierSection.class)) {
      told.addAll(section.nodes());
    }
    told.addAll(LineCapacitors.wallWires(scene));
    List<Node> nodes =
        scene.circuit().nodes().stream()
            .filter(node -> !scene.predictable(node) && !told.contains(node))
            .filter(node -> !scene.at(node).isEmpty())
            .toList();
    if (nodes.isEmpty()) {
      return Stream.empty();
    }
    Element first = scene.at(nodes.get(0)).get(0);
    String names = nodes.stream().map(Node::name).collect(Collectors.joining(", "));
    return Stream.of(
        FindingCode.NOT_PREDICTABLE.of(
            scene.words(),
            first.name(),
            "volts not predictable, no DC path to the reference: " + names));
  }
}
