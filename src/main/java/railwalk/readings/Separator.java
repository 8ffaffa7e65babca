package railwalk.readings;

import java.util.EnumMap;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.source.SourceText;

/** The sign between the cells of a sheet. */
enum Separator {
  COMMA(',', false, "comma"),
  SEMICOLON(';', true, "semicolon"),
  TAB('\t', true, "tab");

  private final char sign;
  private final boolean decimalComma;
  private final String word;

  Separator(char sign, boolean decimalComma, String word) {
    this.sign = sign;
    this.decimalComma = decimalComma;
    this.word = word;
  }

  char sign() {
    return sign;
  }

  /** Returns whether a comma in a figure is the decimal sign. */
  boolean decimalComma() {
    return decimalComma;
  }

  /** Returns its name, for messages. */
  String word() {
    return word;
  }

  /**
   * Returns the sign of a sheet: the one by which a line of it is a header, else the one that comes
   * first on most lines.
   */
  static Separator of(SourceText text) {
    Map<Separator, Integer> firstOn = new EnumMap<>(Separator.class);
    for (int line = 1; line <= text.lines().size(); line++) {
      if (RowCutter.isRemark(text.line(line))) {
        continue;
      }
      for (Separator separator : values()) {
        SheetRow row = new RowCutter(text, separator).row(line);
        if (row.flaw() == null && Columns.isHeader(row)) {
          return separator;
        }
      }
      Separator first = first(text.line(line));
      if (first != null) {
        firstOn.merge(first, 1, Integer::sum);
      }
    }
    Separator most = COMMA;
    for (Separator separator : values()) {
      if (firstOn.getOrDefault(separator, 0) > firstOn.getOrDefault(most, 0)) {
        most = separator;
      }
    }
    return most;
  }

  private static @Nullable Separator first(String line) {
    boolean quoted = false;
    for (int i = 0; i < line.length(); i++) {
      char sign = line.charAt(i);
      quoted ^= sign == '"';
      for (Separator separator : values()) {
        if (!quoted && sign == separator.sign) {
          return separator;
        }
      }
    }
    return null;
  }
}
