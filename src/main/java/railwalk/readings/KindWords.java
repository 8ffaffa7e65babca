package railwalk.readings;

import java.util.Locale;
import java.util.Map;
import railwalk.source.NearNames;

/** How people write kinds of readings. */
final class KindWords {
  private static final Map<String, ReadingKind> WORDS =
      Map.ofEntries(
          Map.entry("dc", ReadingKind.DC),
          Map.entry("vdc", ReadingKind.DC),
          Map.entry("v dc", ReadingKind.DC),
          Map.entry("volts", ReadingKind.DC),
          Map.entry("ac", ReadingKind.AC),
          Map.entry("vac", ReadingKind.AC),
          Map.entry("v ac", ReadingKind.AC),
          Map.entry("rms", ReadingKind.AC),
          Map.entry("ripple", ReadingKind.RIPPLE),
          Map.entry("hum", ReadingKind.RIPPLE),
          Map.entry("ohms", ReadingKind.OHMS),
          Map.entry("ohm", ReadingKind.OHMS),
          Map.entry("\u03c9", ReadingKind.OHMS),
          Map.entry("resistance", ReadingKind.OHMS),
          Map.entry("ma", ReadingKind.MA),
          Map.entry("milliamps", ReadingKind.MA),
          Map.entry("current", ReadingKind.MA));

  private KindWords() {}

  /** Returns the kind that {@code cell} names, in any case. */
  static ReadingKind kind(Cell cell) throws RowRefused {
    String word = cell.text().replace('\u2126', '\u03c9').toLowerCase(Locale.ROOT);
    ReadingKind kind = WORDS.get(word);
    if (kind == null) {
      String near = NearNames.hint(word, WORDS.keySet());
      throw new RowRefused(
          SheetProblem.KIND_UNKNOWN,
          cell.span(),
          cell.text(),
          near.isEmpty() ? "dc, ac, ripple, ohms or ma" : near);
    }
    return kind;
  }
}
