package railwalk.solve;

import railwalk.circuit.Circuit;
import railwalk.solve.SolveOutcome.NotSolved;
import railwalk.solve.SolveOutcome.Solved;
import railwalk.walk.SupplyMap;

/** Circuit and walk in, operating point out. Stateless. */
public final class OperatingPointSolver {
  private OperatingPointSolver() {}

  /** Returns the operating point of {@code circuit}, or which node would not settle. */
  public static SolveOutcome solve(Circuit circuit, SupplyMap map) {
    CoupledSolver solver = new CoupledSolver(circuit, map, false);
    if (solver.startCold() && solver.settle()) {
      return new Solved(new SolvedPoint(solver));
    }
    CoupledSolver traced = new CoupledSolver(circuit, map, true);
    if (traced.startCold() && traced.settle()) {
      return new Solved(new SolvedPoint(traced));
    }
    return new NotSolved(traced.failedNode(), traced.failure(), traced.trace().lines());
  }
}
