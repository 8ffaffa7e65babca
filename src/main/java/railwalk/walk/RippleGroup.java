package railwalk.walk;

import java.util.List;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/**
 * The part of the circuit that carries ripple, cut out of it by {@link RippleGroups} to be solved
 * over one period of the line: windings, rectifiers, reservoirs, and the first filter stages.
 *
 * @param arrangements of the rectifiers in words, one for each output: "full-wave, centre tap"
 * @param elements all parts inside, in netlist order; they take no part in the DC network
 * @param nodes all nodes that the elements touch, the reference among them where they touch it, in
 *     netlist order
 * @param ports those nodes (never the reference) that parts outside the group hang on
 * @param outputs nodes that a rectifier feeds: the hot ends of its reservoirs
 * @param feeders the parts through which current comes from the rectifiers' side to an output:
 *     rectifiers themselves, or what stands between them and the reservoir
 */
public record RippleGroup(
    List<String> arrangements,
    List<Element> elements,
    List<Node> nodes,
    List<Node> ports,
    List<Node> outputs,
    List<Element> feeders) {
  public RippleGroup {
    arrangements = List.copyOf(arrangements);
    elements = List.copyOf(elements);
    nodes = List.copyOf(nodes);
    ports = List.copyOf(ports);
    outputs = List.copyOf(outputs);
    feeders = List.copyOf(feeders);
  }
}
