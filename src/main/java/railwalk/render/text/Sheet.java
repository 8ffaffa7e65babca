package railwalk.render.text;

import java.util.regex.Pattern;
import railwalk.render.type.LineBreaker;

/** The text so far, with the means to add lines that keep to the width. */
final class Sheet {
  static final int COLUMNS = 80;

  private static final Pattern CONTROL = Pattern.compile("\\p{Cntrl}");

  static final LineBreaker BREAKER = LineBreaker.ofWords(TextWidth::of);

  private final StringBuilder out = new StringBuilder();
  private int lines;

  /** Adds a line, without blanks at its end. */
  void line(String line) {
    out.append(line.replace('\u00A0', ' ').stripTrailing()).append('\n');
    lines++;
  }

  /** Adds an empty line, unless there is one already. */
  void blank() {
    if (!out.isEmpty() && out.lastIndexOf("\n\n") != out.length() - 2) {
      line("");
    }
  }

  /** Adds a line of {@code sign} from edge to edge. */
  void rule(char sign) {
    line(String.valueOf(sign).repeat(COLUMNS));
  }

  /** Adds a line of {@code sign} that begins with {@code title}. */
  void ruleWith(String title, char sign) {
    String start =
        String.valueOf(sign).repeat(2) + " " + BREAKER.clipped(clean(title), COLUMNS - 8) + " ";
    line(start + String.valueOf(sign).repeat(COLUMNS - TextWidth.of(start)));
  }

  /** Adds wrapped text, {@code indent} columns in. */
  void paragraph(String text, int indent) {
    hanging(" ".repeat(indent), text);
  }

  /** Adds wrapped text behind {@code lead}; its further lines start below its first word. */
  void hanging(String lead, String text) {
    String cleanLead = clean(lead);
    int width = TextWidth.of(cleanLead);
    String start = cleanLead;
    for (String line : BREAKER.lines(clean(text), COLUMNS - width)) {
      line(start + line);
      start = " ".repeat(width);
    }
  }

  /** Returns the number of lines so far. */
  int lines() {
    return lines;
  }

  String text() {
    return out.toString();
  }

  /** Returns {@code text} with a blank for every control character. */
  static String clean(String text) {
    return CONTROL.matcher(text).replaceAll(" ");
  }

  /** Returns {@code text} filled up with blanks to {@code width}. */
  static String left(String text, int width) {
    return text + " ".repeat(Math.max(0, width - TextWidth.of(text)));
  }

  /** Returns {@code text} with blanks before it up to {@code width}. */
  static String right(String text, int width) {
    return " ".repeat(Math.max(0, width - TextWidth.of(text))) + text;
  }
}
