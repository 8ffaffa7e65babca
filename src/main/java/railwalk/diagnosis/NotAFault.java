package railwalk.diagnosis;

/** Words that name no fault of this amplifier. The message says what was not understood. */
public final class NotAFault extends Exception {
  private static final long serialVersionUID = 1L;

  NotAFault(String message) {
    super(message);
  }
}
