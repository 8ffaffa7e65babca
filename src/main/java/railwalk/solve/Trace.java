package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** What the solver tried, a line each: kept for people who ask why a network would not settle. */
final class Trace {
  private static final int MOST_LINES = 2000;

  private final List<String> lines = new ArrayList<>();
  private final boolean wanted;

  Trace(boolean wanted) {
    this.wanted = wanted;
  }

  /** Returns whether anybody will read it. */
  boolean wanted() {
    return wanted;
  }

  void add(String format, Object... arguments) {
    if (wanted && lines.size() < MOST_LINES) {
      lines.add(String.format(Locale.ROOT, format, arguments));
    }
  }

  List<String> lines() {
    return List.copyOf(lines);
  }
}
