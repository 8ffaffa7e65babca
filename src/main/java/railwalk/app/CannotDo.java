package railwalk.app;

/**
 * A job that could not be done. The message is what the person at the bench reads: whole lines,
 * each a plain sentence or a printed diagnostic, no stack trace behind it.
 */
public final class CannotDo extends Exception {
  private static final long serialVersionUID = 1;

  /** Keeps the lines to show. */
  public CannotDo(String message) {
    super(message, null, false, false);
  }

  /** Returns the lines to show. */
  public String lines() {
    String message = getMessage();
    return message == null ? "" : message;
  }
}
