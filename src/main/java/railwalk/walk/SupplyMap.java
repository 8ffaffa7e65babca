package railwalk.walk;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.Node;

/**
 * What the walk finds in a circuit.
 *
 * @param groups rectifier groups, in netlist order of their first part
 * @param supplyNodes the supply trees, each parent before its children, in feeding order
 * @param undefined nodes with no DC path to the reference: their volts are not predictable
 * @param idleSections names of amplifier sections through which no DC can flow, since plate or
 *     cathode leads nowhere
 * @param feeds for a node, the supply node from which it hangs
 */
public record SupplyMap(
    List<RippleGroup> groups,
    List<SupplyNode> supplyNodes,
    Set<Node> undefined,
    Set<String> idleSections,
    Map<Node, Node> feeds) {
  public SupplyMap {
    groups = List.copyOf(groups);
    supplyNodes = List.copyOf(supplyNodes);
    undefined = Set.copyOf(undefined);
    idleSections = Set.copyOf(idleSections);
    feeds = Map.copyOf(feeds);
  }

  /** Returns this map with groups that hold more of the circuit, in the same order. */
  public SupplyMap withGroups(List<RippleGroup> grown) {
    return new SupplyMap(grown, supplyNodes, undefined, idleSections, feeds);
  }

  /** Returns the supply node that {@code node} hangs from, itself when it is one. */
  public Optional<Node> supplyOf(Node node) {
    return Optional.ofNullable(feeds.get(node));
  }

  /** Returns the entry of a supply node. */
  public Optional<SupplyNode> supplyNode(Node node) {
    return supplyNodes.stream().filter(s -> s.node().equals(node)).findFirst();
  }
}
