package railwalk.chart;

import railwalk.units.Quantity;

/** A figure against its limit. */
final class Share {
  private Share() {}

  /** Returns "11.4 W of 14 W (81 %)"; the watts alone where no limit is known. */
  static String of(double watts, double wattsMax) {
    return Double.isNaN(wattsMax)
        ? Quantity.watts(watts)
        : Quantity.watts(watts)
            + " of "
            + Quantity.watts(wattsMax)
            + " ("
            + Quantity.percent(watts / wattsMax)
            + ")";
  }
}
