package railwalk.solve;

/**
 * The highest volts of a node or across a capacitor between switch-on and the end, by size.
 *
 * @param volts with its sign
 * @param seconds after switch-on, when it first comes within half a per cent of the highest
 * @param endVolts at the end
 */
public record WarmUpPeak(double volts, double seconds, double endVolts) {
  private static final double NEAR = 0.995;

  /** Returns the peak of {@code volts} at rising {@code seconds}; NaN where there are no volts. */
  public static WarmUpPeak of(double[] seconds, double[] volts) {
    double end = volts[volts.length - 1];
    int highest = 0;
    for (int i = 1; i < volts.length; i++) {
      if (Math.abs(volts[i]) > Math.abs(volts[highest])) {
        highest = i;
      }
    }
    double peak = Double.isNaN(end) ? Double.NaN : volts[highest];
    int near = 0;
    while (near < highest && !(Math.abs(volts[near]) >= NEAR * Math.abs(peak))) {
      near++;
    }
    return new WarmUpPeak(peak, seconds[near], end);
  }

  /**
   * Returns for how long {@code volts} are larger than {@code limitVolts} in size, crossings taken
   * as straight.
   */
  public static double secondsAbove(double[] seconds, double[] volts, double limitVolts) {
    double sum = 0;
    for (int i = 1; i < volts.length; i++) {
      double from = Math.abs(volts[i - 1]) - limitVolts;
      double to = Math.abs(volts[i]) - limitVolts;
      double span = seconds[i] - seconds[i - 1];
      if (from > 0 && to > 0) {
        sum += span;
      } else if (from > 0 || to > 0) {
        sum += span * Math.max(from, to) / Math.abs(to - from);
      }
    }
    return sum;
  }
}
