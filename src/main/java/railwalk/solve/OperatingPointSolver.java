package railwalk.solve;

import railwalk.circuit.Circuit;
import railwalk.walk.SupplyMap;

/** Circuit and walk in, operating point out. Stateless; safe for several threads. */
public interface OperatingPointSolver {
  /** Returns the operating point, or which node would not settle. */
  SolveOutcome solve(Circuit circuit, SupplyMap map);

  /** Returns the outcome when started from a neighbouring solution of the same topology. */
  SolveOutcome solve(Circuit circuit, SupplyMap map, OperatingPoint near);
}
