package railwalk.walk;

import java.util.List;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/**
 * The part of the circuit that carries ripple, cut out of it to be solved over one period of the
 * line: windings, rectifiers, reservoirs, and the first filter stages.
 *
 * @param arrangement in words: "full-wave, centre tap"
 * @param elements all parts inside, in netlist order; they take no part in the DC network
 * @param nodes all nodes that the elements touch, the reference among them where they touch it, in
 *     netlist order
 * @param ports those nodes (never the reference) that parts outside the group hang on
 * @param outputs nodes that a rectifier feeds directly: the reservoirs' hot ends
 */
public record RippleGroup(
    String arrangement,
    List<Element> elements,
    List<Node> nodes,
    List<Node> ports,
    List<Node> outputs) {
  public RippleGroup {
    elements = List.copyOf(elements);
    nodes = List.copyOf(nodes);
    ports = List.copyOf(ports);
    outputs = List.copyOf(outputs);
  }
}
