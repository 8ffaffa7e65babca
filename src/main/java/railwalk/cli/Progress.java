package railwalk.cli;

import java.io.PrintStream;

/**
 * One line on standard error while a job takes longer than a second and a person is watching; wiped
 * when the job ends.
 */
final class Progress implements AutoCloseable {
  private static final long PATIENCE_MILLIS = 1000;
  private static final String WIPE_LINE = "\r\u001b[K";

  private final PrintStream err;
  private final Thread watcher;
  private boolean shown;
  private boolean ended;

  private Progress(PrintStream err, String line) {
    this.err = err;
    this.watcher = new Thread(() -> showAfterAWhile(line), "progress");
    watcher.setDaemon(true);
  }

  /** Starts to watch over a job described by {@code line}; does nothing without a terminal. */
  static Progress over(Console console, String line) {
    Progress progress = new Progress(console.err(), line);
    if (console.terminal()) {
      progress.watcher.start();
    }
    return progress;
  }

  private void showAfterAWhile(String line) {
    try {
      Thread.sleep(PATIENCE_MILLIS);
    } catch (InterruptedException jobEnded) {
      return;
    }
    synchronized (this) {
      if (!ended) {
        shown = true;
        err.print(line);
        err.flush();
      }
    }
  }

  @Override
  public void close() {
    synchronized (this) {
      ended = true;
      if (shown) {
        err.print(WIPE_LINE);
        err.flush();
      }
    }
    watcher.interrupt();
  }
}
