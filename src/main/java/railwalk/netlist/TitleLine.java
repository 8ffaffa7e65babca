package railwalk.netlist;

import java.util.List;
import java.util.regex.Pattern;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/** Tells a title from a line that belongs further down. */
final class TitleLine {
  private static final Pattern DOT_LINE = Pattern.compile("\\.[a-zA-Z]{2,}(\\s.*)?");
  private static final Pattern PART_NAME = Pattern.compile("[A-Za-z]{1,3}\\d+[A-Za-z]?");
  private static final Pattern PIN = Pattern.compile("(\\d{1,2}|cap|plate|anode|grid|g1)=\\S+");

  private TitleLine() {}

  /** Returns whether line 1, which is always the title, looks like a part or a dot line. */
  static boolean readsLikeElement(String line) {
    if (DOT_LINE.matcher(line).matches()) {
      return true;
    }
    List<String> words = List.of(line.split("\\s+"));
    if (!PART_NAME.matcher(words.get(0)).matches()) {
      return false;
    }
    boolean pins = words.stream().anyMatch(word -> PIN.matcher(word).matches());
    return pins || (words.size() >= 4 && isValue(words.get(3)));
  }

  private static boolean isValue(String word) {
    return word.equalsIgnoreCase("RMS")
        || word.equalsIgnoreCase("DC")
        || ValueReader.read(word, Measure.NUMBER) instanceof ValueReading.Value;
  }
}
