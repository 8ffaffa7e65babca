package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.walk.RippleGroup;
import railwalk.walk.SupplyMap;
import railwalk.walk.Walk;

/**
 * Solves amplifiers that differ from a solved one in a part or two, starting from its solution: the
 * way to try hundreds of faults. Where no part was added, taken out or wired elsewhere, the walk is
 * that of the solved one.
 */
public final class NearbySolver {
  private final SolvedPoint point;
  private final CoupledSolver settled;

  /** Starts from {@code point}, as {@link OperatingPointSolver} returned it. */
  public NearbySolver(OperatingPoint point) {
    this.point = (SolvedPoint) point;
    settled = this.point.solver();
  }

  /** Returns the operating point of {@code changed}; empty when it does not settle. */
  public Optional<OperatingPoint> solve(Circuit changed) {
    Optional<SupplyMap> kept = sameWalk(changed);
    SupplyMap map = kept.orElseGet(() -> Walk.toSolve(changed));
    CoupledSolver solver = new CoupledSolver(changed, map, false);
    if (solver.startNear(settled) && solver.settle()) {
      return Optional.of(new SolvedPoint(solver, map));
    }
    SolveOutcome cold = OperatingPointSolver.solve(changed, map);
    return cold instanceof SolveOutcome.Solved solved
        ? Optional.of(solved.point())
        : Optional.empty();
  }

  /**
   * Returns the walk with the changed parts in place, and parts added at the end that lie outside
   * the supplies; empty when the wiring is another.
   */
  private Optional<SupplyMap> sameWalk(Circuit changed) {
    List<Element> before = point.circuit().elements();
    List<Element> after = changed.elements();
    if (before.size() > after.size() || !point.circuit().nodes().equals(changed.nodes())) {
      return Optional.empty();
    }
    Map<Element, Element> replaced = new HashMap<>();
    for (int i = 0; i < before.size(); i++) {
      Element was = before.get(i);
      Element is = after.get(i);
      if (was != is) {
        if (!isSamePlace(was, is) || (beginsToLeak(was, is) && !mayLoad(was))) {
          return Optional.empty();
        }
        replaced.put(was, is);
      }
    }
    for (int i = before.size(); i < after.size(); i++) {
      if (!mayLoad(after.get(i))) {
        return Optional.empty();
      }
    }
    SupplyMap map = settled.map();
    List<RippleGroup> groups = new ArrayList<>();
    for (RippleGroup group : map.groups()) {
      groups.add(replaced.isEmpty() ? group : replaced(group, replaced));
    }
    return Optional.of(map.withGroups(groups));
  }

  private static boolean isSamePlace(Element was, Element is) {
    return was.getClass() == is.getClass()
        && was.name().equals(is.name())
        && was.nodes().equals(is.nodes());
  }

  private static boolean beginsToLeak(Element was, Element is) {
    return was instanceof Capacitor a
        && is instanceof Capacitor b
        && Double.isInfinite(a.leakOhms()) != Double.isInfinite(b.leakOhms());
  }

  /**
   * Returns whether direct current may begin to flow through {@code element} without the walk
   * becoming another: it ties down no floating node, and it is inside a supply, or meets supplies
   * only at their ports.
   */
  private boolean mayLoad(Element element) {
    if (!point.map().undefined().isEmpty()) {
      return false;
    }
    for (RippleGroup group : settled.map().groups()) {
      if (group.elements().contains(element)) {
        return true;
      }
      for (Node node : element.nodes()) {
        if (group.nodes().contains(node)
            && !group.ports().contains(node)
            && !node.equals(point.circuit().reference())) {
          return false;
        }
      }
    }
    return true;
  }

  private static RippleGroup replaced(RippleGroup group, Map<Element, Element> by) {
    return new RippleGroup(
        group.arrangements(),
        group.elements().stream().map(e -> by.getOrDefault(e, e)).toList(),
        group.nodes(),
        group.ports(),
        group.outputs(),
        group.feeders().stream().map(e -> by.getOrDefault(e, e)).toList());
  }
}
