package railwalk.walk;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;

/**
 * Works out for each node the supply node it hangs from: plates and screens through their loads,
 * cathodes through the tube from its plate's supply, grids through their leaks from a bias node or
 * from whatever else is not ground. What hangs from ground alone is absent.
 */
final class Feeds {
  /** A node held to ground this much harder than to its feed belongs to ground. */
  private static final double GROUNDED_RATIO = 1000;

  private final Ladder ladder;
  private final Electrodes electrodes;
  private final Grounds grounds;
  private final Set<Node> supplies;
  private final Map<Node, Node> feeds = new HashMap<>();

  private Feeds(
      Ladder ladder, Electrodes electrodes, Grounds grounds, List<SupplyNode> supplyNodes) {
    this.ladder = ladder;
    this.electrodes = electrodes;
    this.grounds = grounds;
    this.supplies = supplyNodes.stream().map(SupplyNode::node).collect(Collectors.toSet());
  }

  /** Returns the supply node of each node that has one. */
  static Map<Node, Node> of(
      Circuit circuit,
      Ladder ladder,
      Electrodes electrodes,
      Grounds grounds,
      List<SupplyNode> supplyNodes) {
    Feeds feeds = new Feeds(ladder, electrodes, grounds, supplyNodes);
    supplyNodes.forEach(supply -> feeds.descend(supply.node(), supply.node()));
    boolean grown = true;
    while (grown) {
      grown = false;
      for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
        Node supply = feeds.supplyOf(section);
        Node cathode = section.cathode();
        if (supply != null && !feeds.feeds.containsKey(cathode) && !grounds.common(cathode)) {
          feeds.spread(cathode, supply);
          grown = true;
        }
      }
    }
    return feeds.feeds;
  }

  private @Nullable Node supplyOf(AmplifierSection section) {
    Node plateSupply = feeds.get(section.plate());
    Node screen = section.screen();
    return plateSupply != null || screen == null ? plateSupply : feeds.get(screen);
  }

  /** Gives {@code supply} to a node and to what the ladder feeds from it. */
  private void descend(Node node, Node supply) {
    feeds.putIfAbsent(node, supply);
    for (Node child : ladder.children(node)) {
      boolean cathodeOnly = electrodes.cathodeAt(child) && !electrodes.fedAt(child);
      if (!supplies.contains(child) && !cathodeOnly) {
        descend(child, supply);
      }
    }
  }

  /** Gives {@code supply} to a cathode and to all that hangs on it short of ground. */
  private void spread(Node node, Node supply) {
    feeds.put(node, supply);
    for (DcBranch branch : ladder.conductorsAt(node)) {
      Node next = branch.other(node);
      if (!feeds.containsKey(next) && !grounds.common(next) && !grounded(next, branch.ohms())) {
        spread(next, supply);
      }
    }
  }

  private boolean grounded(Node node, double feedOhms) {
    return ladder.conductorsAt(node).stream()
        .anyMatch(
            branch ->
                grounds.common(branch.other(node)) && branch.ohms() * GROUNDED_RATIO < feedOhms);
  }
}
