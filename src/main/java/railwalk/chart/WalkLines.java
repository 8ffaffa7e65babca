package railwalk.chart;

import java.util.ArrayList;
import java.util.List;

/** Lines of a walk, wrapped at the width of a terminal; a figure stays with its unit. */
final class WalkLines {
  private static final int WIDTH = 80;
  private static final String INDENT = "  ";

  /** Units that a line never starts with. */
  private static final List<String> UNITS =
      List.of("V", "A", "mA", "µA", "nA", "Ω", "kΩ", "MΩ", "mΩ", "W", "mW");

  private final List<String> lines = new ArrayList<>();

  /** Adds a sentence or sum; what does not fit goes on indented. */
  void add(String text) {
    StringBuilder line = new StringBuilder();
    for (String word : glued(text)) {
      if (line.length() > 0 && line.length() + 1 + word.length() > WIDTH) {
        lines.add(line.toString());
        line.setLength(0);
        line.append(INDENT).append(word);
      } else {
        line.append(line.length() == 0 ? "" : " ").append(word);
      }
    }
    lines.add(line.toString());
  }

  /** Adds an empty line, unless there is none yet. */
  void gap() {
    if (!lines.isEmpty()) {
      lines.add("");
    }
  }

  List<String> lines() {
    return List.copyOf(lines);
  }

  /** Returns the words of a text, each unit together with its figure. */
  private static List<String> glued(String text) {
    List<String> words = new ArrayList<>();
    for (String word : text.split(" ", -1)) {
      String bare = word.replaceAll("[,.;:)]+$", "");
      if (UNITS.contains(bare) && !words.isEmpty()) {
        words.set(words.size() - 1, words.get(words.size() - 1) + " " + word);
      } else {
        words.add(word);
      }
    }
    return words;
  }
}
