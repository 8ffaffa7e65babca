package railwalk.netlist;

import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import railwalk.device.SectionKind;
import railwalk.device.TubeType;

/** Names as charts print them: upper case, the X of an X line dropped. */
final class ChartName {
  private static final Pattern SECTION_NAME = Pattern.compile("(.*\\d)([A-Z])");

  private ChartName() {}

  /**
   * A tube's name taken apart.
   *
   * @param bottle such as "V1"
   * @param section its letter; empty when the name has none
   */
  record Tube(String bottle, String section) {}

  /**
   * Returns the name of the line that starts with {@code head}. The X stays where what is left
   * would not start with a letter, or is the name of another kind of part.
   */
  static String of(Word head, Frame frame, Report report) {
    String upper = head.text().toUpperCase(Locale.ROOT);
    boolean dropped =
        upper.startsWith("X") && upper.length() > 1 && Character.isLetter(upper.charAt(1));
    if (!dropped) {
      return upper;
    }
    String bare = upper.substring(1);
    Matcher section = SECTION_NAME.matcher(bare);
    boolean taken =
        frame.plainNames().contains(bare)
            || (section.matches() && frame.plainNames().contains(section.group(1)));
    if (taken) {
      report.add(Problem.X_KEPT, head.span(), upper, bare);
      return upper;
    }
    return bare;
  }

  /** Returns the bottle and section that {@code name} means for a tube of {@code type}. */
  static Tube tube(String name, TubeType type) {
    Matcher lettered = SECTION_NAME.matcher(name);
    boolean severalSections =
        type.sections().stream().filter(s -> s.kind() != SectionKind.DIODE).count() > 1
            || type.sections().size() > 1;
    if (severalSections && lettered.matches() && type.section(lettered.group(2)).isPresent()) {
      return new Tube(lettered.group(1), lettered.group(2));
    }
    return new Tube(name, "");
  }
}
