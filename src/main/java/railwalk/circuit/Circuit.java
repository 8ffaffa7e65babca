package railwalk.circuit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * One amplifier as traced: immutable, free of positions in the text (those are kept beside it), the
 * input of walk, solver and chart.
 *
 * @param nodes in netlist order; a node's index is its place here
 * @param reference where the meter's black lead sits; one of {@code nodes}
 * @param elements in netlist order, names unique
 * @param bottles the tubes in netlist order
 * @param states further columns of the chart
 */
public record Circuit(
    String title,
    List<Node> nodes,
    Node reference,
    List<Element> elements,
    List<Bottle> bottles,
    List<Transformer> transformers,
    Line line,
    Meter meter,
    Spread spread,
    List<State> states,
    Words words) {

  public Circuit {
    nodes = List.copyOf(nodes);
    elements = List.copyOf(elements);
    bottles = List.copyOf(bottles);
    transformers = List.copyOf(transformers);
    states = List.copyOf(states);
  }

  /** Returns the elements of one kind, in netlist order. */
  public <E extends Element> List<E> elements(Class<E> kind) {
    return elements.stream().filter(kind::isInstance).map(kind::cast).toList();
  }

  /** Returns the element called {@code name}, in any case. */
  public Optional<Element> element(String name) {
    return elements.stream().filter(e -> e.name().equalsIgnoreCase(name)).findFirst();
  }

  /** Returns the node called {@code name}, in any case. */
  public Optional<Node> node(String name) {
    return nodes.stream().filter(n -> n.name().equalsIgnoreCase(name)).findFirst();
  }

  /** Returns the tube called {@code name}, in any case. */
  public Optional<Bottle> bottle(String name) {
    return bottles.stream().filter(b -> b.name().equalsIgnoreCase(name)).findFirst();
  }

  /** Returns the transformer called {@code name}, in any case. */
  public Optional<Transformer> transformer(String name) {
    return transformers.stream().filter(t -> t.name().equalsIgnoreCase(name)).findFirst();
  }

  /** Returns the elements at each node that has any, in netlist order. */
  public Map<Node, List<Element>> elementsByNode() {
    Map<Node, List<Element>> byNode = new LinkedHashMap<>();
    for (Element element : elements) {
      element.nodes().stream()
          .distinct()
          .forEach(n -> byNode.computeIfAbsent(n, key -> new ArrayList<>()).add(element));
    }
    return byNode;
  }

  /** Returns this circuit with other elements. */
  public Circuit withElements(List<Element> changed) {
    return new Circuit(
        title,
        nodes,
        reference,
        changed,
        bottles,
        transformers,
        line,
        meter,
        spread,
        states,
        words);
  }

  /** Returns this circuit with other tubes: its parts, and nodes that they need more. */
  Circuit withTubes(List<Node> moreNodes, List<Element> changed, List<Bottle> fitted) {
    return new Circuit(
        title,
        moreNodes,
        reference,
        changed,
        fitted,
        transformers,
        line,
        meter,
        spread,
        states,
        words);
  }

  /** Returns this circuit on another line. */
  public Circuit withLine(Line changed) {
    return new Circuit(
        title,
        nodes,
        reference,
        elements,
        bottles,
        transformers,
        changed,
        meter,
        spread,
        states,
        words);
  }

  /**
   * Returns this circuit as {@code state} sets it: switches, tubes out or of another type,
   * controls, line volts. Nodes keep their places.
   */
  public Circuit inState(State state) {
    return CircuitStates.apply(this, state);
  }

  /** Returns this circuit read with another meter. */
  public Circuit withMeter(Meter changed) {
    return new Circuit(
        title,
        nodes,
        reference,
        elements,
        bottles,
        transformers,
        line,
        changed,
        spread,
        states,
        words);
  }
}
