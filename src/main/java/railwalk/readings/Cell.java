package railwalk.readings;

import railwalk.source.SourceSpan;

/**
 * One cell of a sheet.
 *
 * @param text without its quotes and the blanks around it
 * @param quoted whether it stood in quotes
 */
record Cell(String text, boolean quoted, SourceSpan span) {
  /** Returns whether nothing is written in it. */
  boolean isEmpty() {
    return text.isEmpty();
  }

  /** Returns whether {@code sign} is a blank: no-break and zero-width ones are. */
  static boolean isBlank(char sign) {
    return Character.isWhitespace(sign)
        || Character.isSpaceChar(sign)
        || sign == '\u200b'
        || sign == '\ufeff';
  }

  /** Returns {@code text} without blanks of any kind at its ends. */
  static String strip(String text) {
    int from = 0;
    int to = text.length();
    while (from < to && isBlank(text.charAt(from))) {
      from++;
    }
    while (to > from && isBlank(text.charAt(to - 1))) {
      to--;
    }
    return text.substring(from, to);
  }
}
