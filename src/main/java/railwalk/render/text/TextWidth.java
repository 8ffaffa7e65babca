package railwalk.render.text;

/**
 * Columns that text takes in a terminal: two for the wide signs of East Asian scripts and for
 * pictographs (after Unicode Standard Annex 11), none for marks that combine, one for all others.
 */
final class TextWidth {
  private TextWidth() {}

  static int of(String text) {
    int columns = 0;
    for (int at = 0; at < text.length(); at = text.offsetByCodePoints(at, 1)) {
      columns += of(text.codePointAt(at));
    }
    return columns;
  }

  private static int of(int codePoint) {
    if (codePoint < 0x300) {
      return 1;
    }
    int type = Character.getType(codePoint);
    if (type == Character.NON_SPACING_MARK
        || type == Character.ENCLOSING_MARK
        || type == Character.FORMAT) {
      return 0;
    }
    boolean wide =
        inside(codePoint, 0x1100, 0x115F)
            || inside(codePoint, 0x2E80, 0xA4CF)
            || inside(codePoint, 0xAC00, 0xD7A3)
            || inside(codePoint, 0xF900, 0xFAFF)
            || inside(codePoint, 0xFE30, 0xFE6F)
            || inside(codePoint, 0xFF00, 0xFF60)
            || inside(codePoint, 0xFFE0, 0xFFE6)
            || inside(codePoint, 0x1F300, 0x1FAFF)
            || inside(codePoint, 0x20000, 0x3FFFD);
    return wide ? 2 : 1;
  }

  private static boolean inside(int codePoint, int first, int last) {
    return codePoint >= first && codePoint <= last;
  }
}
