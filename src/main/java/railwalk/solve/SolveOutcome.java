package railwalk.solve;

import java.util.List;

/** What the solver comes back with. */
public sealed interface SolveOutcome {
  /** The circuit settled. */
  record Solved(OperatingPoint point) implements SolveOutcome {}

  /**
   * It did not.
   *
   * @param worstNode name of the node that would not settle
   * @param reason one sentence for people
   * @param trace what was tried, a line each
   */
  record NotSolved(String worstNode, String reason, List<String> trace) implements SolveOutcome {
    public NotSolved {
      trace = List.copyOf(trace);
    }
  }
}
