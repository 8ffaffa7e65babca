package railwalk.walk;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/** Tells what draws current from a supply node. */
public final class SupplyLoads {
  private final Ladder ladder;
  private final Electrodes electrodes;
  private final Set<Node> supplies;
  private final Set<Element> feeders = new HashSet<>();

  private SupplyLoads(SupplyMap map, Circuit circuit) {
    this.ladder = Ladder.of(circuit, map.groups());
    this.electrodes = Electrodes.of(circuit);
    this.supplies = map.supplyNodes().stream().map(SupplyNode::node).collect(Collectors.toSet());
    map.groups().forEach(group -> feeders.addAll(group.feeders()));
  }

  /**
   * Returns the loads of a supply node: the electrodes wired to it first, then each part that leads
   * away from it, in netlist order. What feeds the node, and the parts of a rectifier, are none.
   */
  public static List<SupplyLoad> of(SupplyMap map, Circuit circuit, Node supplyNode) {
    return new SupplyLoads(map, circuit).at(supplyNode);
  }

  private List<SupplyLoad> at(Node node) {
    List<SupplyLoad> loads = new ArrayList<>();
    List<DcBranch> feeds = ladder.feedsSideBySide(node);
    List<Element> feeding = feeds.stream().map(DcBranch::element).toList();
    for (TubeElectrode electrode : electrodes.at(node)) {
      if (!feeding.contains(electrode.tube())) {
        loads.add(new SupplyLoad(List.of(), List.of(electrode), List.of()));
      }
    }
    Map<Node, List<DcStep>> byFarEnd = new LinkedHashMap<>();
    for (DcBranch branch : ladder.conductorsAt(node)) {
      if (!feeds.contains(branch) && !feeders.contains(branch.element())) {
        Node far = branch.other(node);
        byFarEnd
            .computeIfAbsent(far, key -> new ArrayList<>())
            .add(new DcStep(node, branch.element(), far));
      }
    }
    byFarEnd.forEach((far, parts) -> loads.add(load(node, far, parts)));
    return loads;
  }

  private SupplyLoad load(Node node, Node far, List<DcStep> parts) {
    Set<TubeElectrode> ends = new LinkedHashSet<>();
    Set<Node> fed = new LinkedHashSet<>();
    if (supplies.contains(far)) {
      fed.add(far);
    } else if (ladder.children(node).contains(far)) {
      collect(far, ends, fed);
    }
    return new SupplyLoad(parts, List.copyOf(ends), List.copyOf(fed));
  }

  private void collect(Node node, Set<TubeElectrode> ends, Set<Node> fed) {
    List<TubeElectrode> here = electrodes.at(node);
    ends.addAll(here);
    for (Node child : ladder.children(node)) {
      if (supplies.contains(child)) {
        fed.add(child);
      } else if (here.isEmpty()) {
        collect(child, ends, fed);
      }
    }
  }
}
