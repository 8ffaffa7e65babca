package railwalk.solve;

/** What following an amplifier from switch-on came to. */
public sealed interface WarmUpOutcome {
  /** Followed to the end. */
  record Followed(WarmUpCourse course) implements WarmUpOutcome {}

  /**
   * Not followed to the end.
   *
   * @param seconds after switch-on, how far it went
   * @param node that would not settle
   */
  record Lost(double seconds, String node, String reason) implements WarmUpOutcome {}
}
