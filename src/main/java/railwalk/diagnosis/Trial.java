package railwalk.diagnosis;

/** Names of states that a test of the trade sets up. */
final class Trial {
  private static final String PULLED = " pulled";

  private Trial() {}

  /** Returns the name of the state with one tube pulled. */
  static String pulled(String bottle) {
    return bottle + PULLED;
  }
}
