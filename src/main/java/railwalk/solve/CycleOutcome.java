package railwalk.solve;

/** What came of stepping the whole netlist through time: it settled, or why it does not. */
public sealed interface CycleOutcome {
  /** Every line period is like the one before. */
  record Settled(LineCycle cycle) implements CycleOutcome {}

  /**
   * It does not come to rest.
   *
   * @param node where that shows most
   */
  record NotSettled(String node, String reason) implements CycleOutcome {}
}
