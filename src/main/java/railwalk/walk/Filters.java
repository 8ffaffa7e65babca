package railwalk.walk;

import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RegulatorSection;
import railwalk.device.ZenerLaw;

/**
 * The nodes that something holds steady against ground: a filter or decoupling capacitor, two of
 * them in series, a regulator tube or a zener.
 */
final class Filters {
  /**
   * Smallest capacitor that makes a supply node of what is no electrode: at 0.047 µF it decouples
   * an old radio's screen or first plate; tone and stability capacitors are smaller (common
   * practice).
   */
  private static final double DECOUPLING_FARADS = 0.047e-6;

  /** Smallest of two capacitors in series that count as one filter. */
  private static final double STACKED_FARADS = 1e-6;

  private final Set<Node> steady = new HashSet<>();

  private Filters() {}

  /** Returns the filters of a circuit. */
  static Filters of(Circuit circuit, Grounds grounds, Electrodes electrodes) {
    Filters filters = new Filters();
    List<Capacitor> large =
        circuit.elements(Capacitor.class).stream()
            .filter(capacitor -> capacitor.farads() >= DECOUPLING_FARADS)
            .toList();
    for (Capacitor capacitor : large) {
      capacitor.nodes().stream()
          .filter(node -> grounds.bypasses(capacitor, node))
          .forEach(filters.steady::add);
    }
    filters.addStacks(large, grounds, electrodes, circuit.elementsByNode());
    for (Element element : circuit.elements()) {
      boolean stabiliser =
          element instanceof RegulatorSection
              || (element instanceof Diode diode && diode.law() instanceof ZenerLaw);
      if (stabiliser && element.nodes().stream().anyMatch(grounds::common)) {
        filters.steady.addAll(element.nodes());
      }
    }
    filters.steady.removeIf(grounds::common);
    return filters;
  }

  /** Adds the hot end of two large capacitors in series whose middle carries resistors at most. */
  private void addStacks(
      List<Capacitor> large,
      Grounds grounds,
      Electrodes electrodes,
      Map<Node, List<Element>> elementsByNode) {
    Map<Boolean, List<Capacitor>> byFoot =
        large.stream()
            .filter(capacitor -> capacitor.farads() >= STACKED_FARADS)
            .collect(
                Collectors.partitioningBy(c -> grounds.common(c.a()) || grounds.common(c.b())));
    Set<Node> middles =
        byFoot.getOrDefault(true, List.of()).stream()
            .flatMap(capacitor -> Stream.of(capacitor.a(), capacitor.b()))
            .filter(node -> !grounds.common(node) && electrodes.at(node).isEmpty())
            .filter(node -> elementsByNode.getOrDefault(node, List.of()).size() <= 4)
            .collect(Collectors.toSet());
    for (Capacitor capacitor : byFoot.getOrDefault(false, List.of())) {
      if (middles.contains(capacitor.b())) {
        steady.add(capacitor.a());
      } else if (middles.contains(capacitor.a())) {
        steady.add(capacitor.b());
      }
    }
  }

  /** Returns whether {@code node} is held steady. */
  boolean at(Node node) {
    return steady.contains(node);
  }
}
