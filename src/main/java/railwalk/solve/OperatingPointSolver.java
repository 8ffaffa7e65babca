package railwalk.solve;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.solve.SolveOutcome.NotSolved;
import railwalk.solve.SolveOutcome.Solved;
import railwalk.walk.RippleGroup;
import railwalk.walk.RippleGroups;
import railwalk.walk.SupplyMap;

/** Circuit and walk in, operating point out. Stateless. */
public final class OperatingPointSolver {
  /** Ripple up to this does no harm at any port, however small its mean volts. */
  private static final double LEAST_RIPPLE_VOLTS = 0.01;

  private OperatingPointSolver() {}

  /**
   * Returns the operating point of {@code circuit}, or which node would not settle. Where the
   * walk's ripple groups turn out to end too early they are grown and all is solved again.
   */
  public static SolveOutcome solve(Circuit circuit, SupplyMap walk) {
    SupplyMap map = walk;
    while (true) {
      CoupledSolver solver = new CoupledSolver(circuit, map, false);
      if (!(solver.startCold() && solver.settle())) {
        solver = new CoupledSolver(circuit, map, true);
        if (!(solver.startCold() && solver.settle())) {
          return new NotSolved(solver.failedNode(), solver.failure(), solver.trace().lines());
        }
      }
      SolvedPoint point = new SolvedPoint(solver, walk);
      Optional<List<RippleGroup>> grown =
          RippleGroups.grown(circuit, map.groups(), portRipples(point));
      if (grown.isEmpty()) {
        return new Solved(point);
      }
      map = map.withGroups(grown.get());
    }
  }

  /** Returns, for each port that ripples at all, its ripple (rms) over its mean volts. */
  static Map<Node, Double> portRipples(SolvedPoint point) {
    Map<Node, Double> ripples = new HashMap<>();
    for (CycleReport report : point.reports()) {
      for (Node port : report.net().group.ports()) {
        double rmsVolts = report.rippleRmsVolts()[report.net().at(port)];
        if (rmsVolts > LEAST_RIPPLE_VOLTS) {
          ripples.put(port, rmsVolts / Math.abs(report.meanVolts(port)));
        }
      }
    }
    return ripples;
  }
}
