package railwalk.cli;

import java.io.PrintStream;
import railwalk.app.CannotDo;

/**
 * One line on standard error while a job takes longer than a second and a person is watching; wiped
 * when the job ends.
 */
final class Progress {
  private static final long PATIENCE_MILLIS = 1000;
  private static final String WIPE_LINE = "\r\u001b[K";

  private final PrintStream err;
  private final String line;
  private boolean shown;
  private boolean ended;

  private Progress(PrintStream err, String line) {
    this.err = err;
    this.line = line;
  }

  /** What takes time. */
  interface Job<T> {
    /** Does it and returns what came of it. */
    T run() throws CannotDo;
  }

  /** Returns what {@code job} comes to, with {@code line} shown meanwhile. */
  static <T> T during(Console console, String line, Job<T> job) throws CannotDo {
    if (!console.terminal()) {
      return job.run();
    }
    Progress progress = new Progress(console.err(), line);
    Thread watcher = new Thread(progress::showAfterAWhile, "progress");
    watcher.setDaemon(true);
    watcher.start();
    try {
      return job.run();
    } finally {
      progress.wipe();
      watcher.interrupt();
    }
  }

  private void showAfterAWhile() {
    try {
      Thread.sleep(PATIENCE_MILLIS);
    } catch (InterruptedException jobEnded) {
      return;
    }
    show();
  }

  private synchronized void show() {
    if (!ended) {
      shown = true;
      err.print(line);
      err.flush();
    }
  }

  private synchronized void wipe() {
    ended = true;
    if (shown) {
      err.print(WIPE_LINE);
      err.flush();
    }
  }
}
