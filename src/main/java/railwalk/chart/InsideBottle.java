package railwalk.chart;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Wire;

/** Tells the nodes that no probe reaches: a filament's middle and the like. */
final class InsideBottle {
  private InsideBottle() {}

  /** Returns the nodes that join parts of one tube only, and none of its pins. */
  static Set<Node> nodes(Circuit circuit) {
    return circuit.elementsByNode().entrySet().stream()
        .filter(entry -> isInside(entry.getKey(), entry.getValue(), circuit))
        .map(Map.Entry::getKey)
        .collect(Collectors.toSet());
  }

  private static boolean isInside(Node node, List<Element> parts, Circuit circuit) {
    List<String> bottles = parts.stream().flatMap(p -> bottle(p).stream()).distinct().toList();
    return bottles.size() == 1
        && parts.stream().allMatch(part -> bottle(part).isPresent())
        && circuit
            .bottle(bottles.get(0))
            .filter(b -> !b.pins().isEmpty() && !b.pins().containsValue(node))
            .isPresent();
  }

  private static Optional<String> bottle(Element part) {
    if (part instanceof AmplifierSection section) {
      return Optional.of(section.bottle());
    }
    if (part instanceof RectifierSection section) {
      return Optional.of(section.bottle());
    }
    if (part instanceof RegulatorSection section) {
      return Optional.of(section.bottle());
    }
    if (part instanceof Filament filament) {
      return Optional.of(filament.bottle());
    }
    return part instanceof Wire wire && !wire.bottle().isEmpty()
        ? Optional.of(wire.bottle())
        : Optional.empty();
  }
}
