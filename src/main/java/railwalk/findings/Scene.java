package railwalk.findings;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Words;
import railwalk.solve.OperatingPoint;
import railwalk.walk.DcPaths;
import railwalk.walk.SupplyMap;

/**
 * What a check looks at.
 *
 * @param point null while the circuit is not solved: then only what the wiring shows is told
 */
record Scene(
    Circuit circuit,
    SupplyMap map,
    @Nullable OperatingPoint point,
    Map<Node, List<Element>> elementsByNode,
    DcPaths paths) {

  Words words() {
    return circuit.words();
  }

  boolean predictable(Node node) {
    return !map.undefined().contains(node);
  }

  /** Returns the parts at {@code node}. */
  List<Element> at(Node node) {
    return elementsByNode.getOrDefault(node, List.of());
  }

  /** Returns a section's name with its type: "V3 (6V6GT)". */
  String named(String section, String bottle) {
    Optional<Bottle> tube = circuit.bottle(bottle);
    return tube.map(b -> section + " (" + b.type().name() + ")").orElse(section);
  }
}
