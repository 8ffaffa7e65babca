package railwalk.readings;

import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;

/** What a column of a sheet holds. */
enum Column {
  POINT,
  VOLTS,
  KIND,
  STATE,
  RANGE,
  NOTE;

  private static final Map<String, Column> NAMES =
      Map.ofEntries(
          Map.entry("point", POINT),
          Map.entry("points", POINT),
          Map.entry("test point", POINT),
          Map.entry("node", POINT),
          Map.entry("pin", POINT),
          Map.entry("place", POINT),
          Map.entry("where", POINT),
          Map.entry("volts", VOLTS),
          Map.entry("volt", VOLTS),
          Map.entry("v", VOLTS),
          Map.entry("voltage", VOLTS),
          Map.entry("value", VOLTS),
          Map.entry("reading", VOLTS),
          Map.entry("read", VOLTS),
          Map.entry("measured", VOLTS),
          Map.entry("kind", KIND),
          Map.entry("type", KIND),
          Map.entry("state", STATE),
          Map.entry("range", RANGE),
          Map.entry("meter range", RANGE),
          Map.entry("note", NOTE),
          Map.entry("notes", NOTE),
          Map.entry("remark", NOTE),
          Map.entry("remarks", NOTE),
          Map.entry("comment", NOTE),
          Map.entry("comments", NOTE));

  private static final Pattern IN_BRACKETS = Pattern.compile("\\([^()]*\\)|\\[[^\\[\\]]*]");
  private static final Pattern BLANKS = Pattern.compile("[\\s_-]+");

  /** Returns its name in a header. */
  String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** Returns the column that a header's cell names, in any case, a unit in brackets aside. */
  static Optional<Column> named(String cell) {
    String plain = IN_BRACKETS.matcher(cell).replaceAll("");
    String wanted = BLANKS.matcher(plain).replaceAll(" ").strip().toLowerCase(Locale.ROOT);
    return Optional.ofNullable(NAMES.get(wanted));
  }
}
