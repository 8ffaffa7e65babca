package railwalk.walk;

import java.util.List;
import java.util.Map;
import railwalk.circuit.Circuit;

/**
 * The walk through a circuit as a graph: from the rectifiers through droppers and chokes to the
 * supply nodes, and on to what hangs on them. Hands the solver the nodes it can solve and the
 * ripple groups, the chart its order.
 */
public final class Walk {
  private Walk() {}

  /** Returns what the walk finds when the ripple groups are already cut out. */
  static SupplyMap of(Circuit circuit, List<RippleGroup> groups) {
    List<DcBranch> branches = DcBranches.of(circuit);
    DcReach reach = DcReach.of(circuit, branches, groups);
    return new SupplyMap(groups, List.of(), reach.undefined(), reach.idleSections(), Map.of());
  }
}
