package railwalk.diagnosis;

/** The amplifier that readings are to be compared with has no operating point. */
public final class NoOperatingPoint extends Exception {
  private static final long serialVersionUID = 1L;

  NoOperatingPoint(String state, String node, String reason) {
    super(
        "no operating point"
            + (state.isEmpty() ? "" : " in state " + state)
            + ": node "
            + node
            + ": "
            + reason);
  }
}
