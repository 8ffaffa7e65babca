package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SupplyPoint;
import railwalk.walk.DcPath;
import railwalk.walk.DcPaths;
import railwalk.walk.DcStep;
import railwalk.walk.SupplyNode;

/** The supply ladder as sums, resistor by resistor. */
final class WalkLadder {
  private final OperatingPoint point;
  private final WalkTerms terms;
  private final WalkLoads loads;
  private final WalkRectifier rectifier;

  WalkLadder(OperatingPoint point, Wording wording) {
    this.point = point;
    this.terms = new WalkTerms(point);
    this.loads = new WalkLoads(point, wording);
    this.rectifier = new WalkRectifier(point);
  }

  /** Adds a line for every supply node, each tree after a gap. */
  void addAll(WalkLines lines) {
    for (SupplyNode supply : point.map().supplyNodes()) {
      if (supply.parent() == null) {
        lines.gap();
        lines.add(rectifier.line(supply) + drawn(supply));
      } else {
        lines.add(line(supply, supply.parent(), true));
      }
    }
  }

  /** Adds the lines from the rectifier to one supply node. */
  void addDownTo(SupplyNode last, WalkLines lines) {
    List<SupplyNode> chain = new ArrayList<>();
    Optional<SupplyNode> at = Optional.of(last);
    while (at.isPresent()) {
      chain.add(0, at.get());
      at = Optional.ofNullable(at.get().parent()).flatMap(point.map()::supplyNode);
    }
    lines.add(rectifier.line(chain.get(0)));
    for (SupplyNode supply : chain) {
      if (supply.parent() != null) {
        lines.add(line(supply, supply.parent(), false));
      }
    }
  }

  /** Returns what a first supply node gives, in brackets. */
  private String drawn(SupplyNode supply) {
    List<WalkLoads.Share> shares = loads.of(supply.node());
    return " (" + WalkLoads.text(WalkAmps.of(whole(shares)), shares) + ")";
  }

  private static double whole(List<WalkLoads.Share> shares) {
    return Math.abs(shares.stream().mapToDouble(WalkLoads.Share::amps).sum());
  }

  /** Returns the sum that leads to a supply node, with what its current is for. */
  private String line(SupplyNode supply, Node parent, boolean withLoads) {
    Node node = supply.node();
    List<DcStep> steps = steps(supply);
    List<WalkSum.Term> drops = terms.of(steps);
    WalkBranch branch = new WalkBranch(point);
    if (drops.isEmpty() || branch.drawsNothing(steps)) {
      return branch.sum(steps) + (withLoads && drops.isEmpty() ? drawn(supply) : "");
    }
    WalkSum.Printed sum =
        new WalkSum(parent.name(), point.volts(parent), drops, node.name(), point.volts(node))
            .printed();
    if (!withLoads) {
      return sum.text();
    }
    boolean ohmic = drops.get(drops.size() - 1).ohmic();
    return ohmic
        ? sum.text() + " (" + WalkLoads.text(sum.amps(), loads.of(node)) + ")"
        : sum.text() + drawn(supply);
  }

  /** Returns the steps from a supply node's parent to it. */
  private List<DcStep> steps(SupplyNode supply) {
    DcPath path = new DcPaths(point.map(), point.circuit()).to(supply.node());
    List<DcStep> there = path.there();
    int from = 0;
    for (int k = 0; k < there.size(); k++) {
      if (there.get(k).from().equals(supply.parent())) {
        from = k;
      }
    }
    return there.subList(from, there.size());
  }

  /** Returns the output's entry, where a node is one. */
  static Optional<SupplyPoint> output(OperatingPoint point, Node node) {
    return point.supplies().stream().filter(s -> s.node().equals(node)).findFirst();
  }
}
