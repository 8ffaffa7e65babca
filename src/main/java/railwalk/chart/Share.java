package railwalk.chart;

import railwalk.units.Quantity;

/** Heat against its limit. */
final class Share {
  private static final double HALF_A_PER_CENT = 0.005;

  private Share() {}

  /** Returns "11.4 W of 14 W (81 %)"; the watts alone where no limit is known. */
  static String of(double watts, double wattsMax) {
    if (Double.isNaN(wattsMax) || Double.isNaN(watts)) {
      return Quantity.watts(watts);
    }
    double share = watts / wattsMax;
    String percent = share < HALF_A_PER_CENT ? "under 1 %" : Quantity.percent(share);
    return Quantity.wattsUnscaled(watts)
        + " of "
        + Quantity.wattsUnscaled(wattsMax)
        + " ("
        + percent
        + ")";
  }
}
