package railwalk.render.type;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;
import java.util.regex.Pattern;

/**
 * Breaks text into lines: words at blanks, except between a figure and its unit; figures only where
 * a zero-width space (U+200B) allows it; inside a piece only where the piece alone is wider than a
 * line. Lines come back with no-break spaces (U+00A0) where no break was allowed.
 */
public final class LineBreaker {
  /** The blank between a figure and its unit: they stay together. */
  private static final Pattern BEFORE_A_UNIT =
      Pattern.compile("(?<=[0-9]) (?=(?:[pnµmkMG]?(?:V|A|W|Ω|F|H|Hz)|%)(?!\\p{L}))");

  private static final String NO_BREAK_SPACE = "\u00A0";
  private static final String ZERO_WIDTH_SPACE = "\u200B";

  private final ToDoubleFunction<String> widthOf;
  private final String breakAt;
  private final String joinWith;

  private LineBreaker(ToDoubleFunction<String> widthOf, String breakAt, String joinWith) {
    this.widthOf = widthOf;
    this.breakAt = breakAt;
    this.joinWith = joinWith;
  }

  /**
   * Returns a breaker of words.
   *
   * @param widthOf width of a piece of text, in the unit that lines are measured in
   */
  public static LineBreaker ofWords(ToDoubleFunction<String> widthOf) {
    return new LineBreaker(widthOf, " ", " ");
  }

  /** Returns a breaker of figures, which stay in one piece but at a zero-width space. */
  public static LineBreaker ofFigures(ToDoubleFunction<String> widthOf) {
    return new LineBreaker(widthOf, ZERO_WIDTH_SPACE, "");
  }

  /** Returns the lines, at least one; none is wider than {@code width} unless a single sign is. */
  public List<String> lines(String text, double width) {
    List<String> lines = new ArrayList<>();
    StringBuilder line = new StringBuilder();
    for (String word : pieces(text)) {
      if (!line.isEmpty() && widthOf.applyAsDouble(line + joinWith + word) <= width) {
        line.append(joinWith).append(word);
        continue;
      }
      if (!line.isEmpty()) {
        lines.add(line.toString());
        line.setLength(0);
      }
      line.append(cutLongWord(word, width, lines));
    }
    if (!line.isEmpty() || lines.isEmpty()) {
      lines.add(line.toString());
    }
    return lines;
  }

  /** Returns the width of the text in one line. */
  public double width(String text) {
    return widthOf.applyAsDouble(String.join(joinWith, pieces(text)));
  }

  /** Returns the first {@code most} lines; an ellipsis at the end says that there were more. */
  public List<String> lines(String text, double width, int most) {
    List<String> lines = lines(text, width);
    if (lines.size() <= most) {
      return lines;
    }
    List<String> shown = new ArrayList<>(lines.subList(0, most));
    shown.set(most - 1, clipped(shown.get(most - 1) + " …", width));
    return shown;
  }

  /** Returns the width of the widest piece between two places to break. */
  public double widestPiece(String text) {
    double widest = 0;
    for (String word : pieces(text)) {
      widest = Math.max(widest, widthOf.applyAsDouble(word));
    }
    return widest;
  }

  /** Returns {@code text} cut to {@code width} with an ellipsis where it is wider. */
  public String clipped(String text, double width) {
    if (widthOf.applyAsDouble(text) <= width) {
      return text;
    }
    int end = text.length();
    while (end > 0 && widthOf.applyAsDouble(text.substring(0, end) + "…") > width) {
      end = text.offsetByCodePoints(end, -1);
    }
    return text.substring(0, end) + "…";
  }

  private String[] pieces(String text) {
    if (text.indexOf(' ') < 0 && text.indexOf(breakAt) < 0) {
      return new String[] {text};
    }
    return BEFORE_A_UNIT.matcher(text).replaceAll(NO_BREAK_SPACE).split(breakAt, -1);
  }

  /** Adds full lines of a word too wide for one, and returns what is left of it. */
  private String cutLongWord(String word, double width, List<String> lines) {
    String rest = word;
    while (widthOf.applyAsDouble(rest) > width && rest.codePointCount(0, rest.length()) > 1) {
      int end = rest.offsetByCodePoints(0, 1);
      while (end < rest.length()
          && widthOf.applyAsDouble(rest.substring(0, rest.offsetByCodePoints(end, 1))) <= width) {
        end = rest.offsetByCodePoints(end, 1);
      }
      lines.add(rest.substring(0, end));
      rest = rest.substring(end);
    }
    return rest;
  }
}
