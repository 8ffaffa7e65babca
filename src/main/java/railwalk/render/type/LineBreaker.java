package railwalk.render.type;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * Breaks text into lines at blanks, and inside a word only where the word alone is wider than a
 * line. A no-break space (U+00A0) is no place to break.
 */
public final class LineBreaker {
  private final ToDoubleFunction<String> widthOf;

  /**
   * @param widthOf width of a piece of text, in the unit that lines are measured in
   */
  public LineBreaker(ToDoubleFunction<String> widthOf) {
    this.widthOf = widthOf;
  }

  /** Returns the lines, at least one; none is wider than {@code width} unless a single sign is. */
  public List<String> lines(String text, double width) {
    List<String> lines = new ArrayList<>();
    StringBuilder line = new StringBuilder();
    for (String word : text.split(" ", -1)) {
      if (!line.isEmpty() && widthOf.applyAsDouble(line + " " + word) <= width) {
        line.append(' ').append(word);
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

  /** Returns the width of the widest word. */
  public double widestWord(String text) {
    double widest = 0;
    for (String word : text.split(" ", -1)) {
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
