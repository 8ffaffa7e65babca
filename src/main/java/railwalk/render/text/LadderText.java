package railwalk.render.text;

import java.util.List;
import railwalk.chart.Ladder;

/** The supply drawing as text: each rail runs down the page, its branches stand to the right. */
final class LadderText {
  /** A branch of a branch stands further right, but no further than this. */
  private static final int DEEPEST_INDENT = 24;

  private static final String BRANCH = "|   ";

  private final Sheet sheet;

  LadderText(Sheet sheet) {
    this.sheet = sheet;
  }

  void print(Ladder ladder) {
    boolean first = true;
    for (Ladder.Feed feed : ladder.feeds()) {
      if (!first) {
        sheet.blank();
      }
      first = false;
      sheet.hanging("(~) ", feed.name() + "  " + String.join("; ", feed.lines()));
      span(" ", " |", feed.rail());
    }
  }

  /** Prints a span and all that hangs on its end, each line behind {@code indent}. */
  private void span(String indent, String entry, Ladder.Span span) {
    String lead = entry;
    for (Ladder.Part part : span.parts()) {
      sheet.line(lead);
      lead = indent + "|";
      sheet.hanging(indent + "# ", words(part));
    }
    sheet.line(lead);
    stop(indent, span.to());
  }

  private static String words(Ladder.Part part) {
    String value = part.value().isEmpty() ? "" : " " + part.value();
    return part.name() + value + "   " + part.load();
  }

  private void stop(String indent, Ladder.Stop stop) {
    String more = stop.lines().isEmpty() ? "" : "  (" + String.join("; ", stop.lines()) + ")";
    sheet.hanging(indent + "o ", stop.node() + "  " + stop.volts() + more);
    List<Ladder.Span> spans = stop.spans();
    for (int i = spans.size() - 1; i > 0; i--) {
      String inner = indent.length() < DEEPEST_INDENT ? indent + BRANCH : indent;
      span(inner, indent + "+---+", spans.get(i));
    }
    if (!spans.isEmpty()) {
      span(indent, indent + "|", spans.get(0));
    }
  }
}
