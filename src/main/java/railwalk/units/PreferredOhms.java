package railwalk.units;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/** Preferred resistances, and resistances as a netlist writes them. */
public final class PreferredOhms {
  /** The E24 series of one decade (IEC 60063). */
  private static final int[] E24 = {
    10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91
  };

  private PreferredOhms() {}

  /**
   * Returns the E24 value whose ratio to {@code ohms} is nearest to one.
   *
   * @throws IllegalArgumentException unless {@code ohms} is above zero and finite
   */
  public static double nearest(double ohms) {
    if (!(ohms > 0) || Double.isInfinite(ohms)) {
      throw new IllegalArgumentException("ohms " + ohms);
    }
    int decade = (int) Math.floor(Math.log10(ohms));
    double best = Double.NaN;
    double leastRatio = Double.POSITIVE_INFINITY;
    for (int d = decade - 1; d <= decade + 1; d++) {
      for (int figure : E24) {
        double value = BigDecimal.valueOf(figure).scaleByPowerOfTen(d - 1).doubleValue();
        double ratio = Math.abs(Math.log(value / ohms));
        if (ratio < leastRatio) {
          leastRatio = ratio;
          best = value;
        }
      }
    }
    return best;
  }

  /**
   * Returns {@code ohms}, above zero, with three significant digits as a netlist takes it: {@code
   * 220}, {@code 98.7k}, {@code 1.5Meg}.
   */
  public static String written(double ohms) {
    BigDecimal rounded = new BigDecimal(ohms).round(new MathContext(3, RoundingMode.HALF_EVEN));
    double size = rounded.doubleValue();
    int steps = size >= 1e6 ? 2 : size >= 1e3 ? 1 : 0;
    BigDecimal scaled = rounded.movePointLeft(3 * steps).stripTrailingZeros();
    String suffix = steps == 2 ? "Meg" : steps == 1 ? "k" : "";
    return scaled.toPlainString() + suffix;
  }
}
