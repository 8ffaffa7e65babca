package railwalk.cli;

/** One line on standard error that says how far a job is, while a person is watching. */
final class ProgressLine {
  private static final String WIPE_LINE = "\r\u001b[K";

  private final Console console;
  private boolean shown;

  ProgressLine(Console console) {
    this.console = console;
  }

  /** Shows {@code text} in place of what stood there. */
  void show(String text) {
    if (console.terminal()) {
      console.err().print(WIPE_LINE + text);
      console.err().flush();
      shown = true;
    }
  }

  /** Wipes the line. */
  void end() {
    if (shown) {
      console.err().print(WIPE_LINE);
      console.err().flush();
      shown = false;
    }
  }
}
