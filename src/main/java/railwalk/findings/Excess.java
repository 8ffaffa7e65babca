package railwalk.findings;

import railwalk.units.Quantity;

/**
 * A figure over its limit, in words.
 *
 * @param figure what is found
 * @param limit the rating; NaN when there is none
 * @param unit such as "W"
 * @param system the rating system in the sheet's word; may be empty
 */
record Excess(double figure, double limit, String unit, String system) {
  /** An excess too small to be told from the rating as printed. */
  private static final double NOTHING = 1.005;

  /** Up to this much over its sheet many a factory amplifier runs its tubes (common practice). */
  private static final double COMMON = 1.15;

  /** Returns whether the figure is over the limit. */
  boolean is() {
    return figure > limit * NOTHING;
  }

  /** Returns the words: "13.1 W, 9 % over its 12 W (design-centre)". */
  String words() {
    long percent = Math.round((figure / limit - 1) * 100);
    return Quantity.of(figure, unit)
        + ", "
        + percent
        + " % over its "
        + Quantity.of(limit, unit)
        + (system.isEmpty() ? "" : " (" + system + ")");
  }

  /** Returns the words, with a remark where factory amplifiers often run as far over. */
  String wordsWithCustom() {
    return words() + (figure <= limit * COMMON ? ", a common excess in factory amplifiers" : "");
  }
}
