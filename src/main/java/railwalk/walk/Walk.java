package railwalk.walk;

import java.util.List;
import java.util.Map;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;

/**
 * The walk through a circuit as a graph: from the rectifiers through droppers and chokes to the
 * supply nodes, and on to what hangs on them. Hands the solver the nodes it can solve and the
 * ripple groups, the chart its order.
 */
public final class Walk {
  private Walk() {}

  /** Returns what the walk finds in {@code circuit}. */
  public static SupplyMap of(Circuit circuit) {
    return of(circuit, RippleGroups.of(circuit));
  }

  /**
   * Returns only what the solver needs of the walk: ripple groups, undefined nodes and idle
   * sections; the supply trees are left out.
   */
  public static SupplyMap toSolve(Circuit circuit) {
    List<RippleGroup> groups = RippleGroups.of(circuit);
    DcReach reach = DcReach.of(circuit, DcBranches.of(circuit), groups);
    return new SupplyMap(groups, List.of(), reach.undefined(), reach.idleSections(), Map.of());
  }

  /** Returns what the walk finds when the ripple groups are already cut out. */
  static SupplyMap of(Circuit circuit, List<RippleGroup> groups) {
    List<DcBranch> branches = DcBranches.of(circuit);
    DcReach reach = DcReach.of(circuit, branches, groups);
    Grounds grounds = Grounds.of(circuit, branches, groups);
    Electrodes electrodes = Electrodes.of(circuit);
    List<Root> roots = Root.of(circuit, groups, grounds);
    Ladder ladder = Ladder.of(circuit, branches, groups, grounds, roots);
    Filters filters = Filters.of(circuit, grounds, electrodes);
    Charge charge = new Charge(circuit, groups, branches, grounds);
    List<SupplyNode> supplyNodes =
        SupplyTree.of(circuit, ladder, electrodes, filters, grounds, groups, charge);
    Map<Node, Node> feeds = Feeds.of(circuit, ladder, electrodes, grounds, supplyNodes);
    return new SupplyMap(groups, supplyNodes, reach.undefined(), reach.idleSections(), feeds);
  }
}
