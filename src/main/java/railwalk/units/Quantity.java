package railwalk.units;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Numbers as people read them: three significant digits (four from 1000 up within a prefix step
 * when exactness asks for it), an SI prefix, a unit and a real minus sign (U+2212).
 *
 * <p>"Ω" stands for ohm and "µ" (U+00B5) for micro. NaN, the value of a node with no DC path, shows
 * as an en dash.
 */
public final class Quantity {
  private static final String[] PREFIXES = {"p", "n", "µ", "m", "", "k", "M", "G"};
  private static final int UNIT_STEP = 4;
  private static final char MINUS = '\u2212';
  private static final String UNKNOWN = "–";

  private Quantity() {}

  /** Returns volts without prefix: {@code 312 V}, {@code 1.43 V}, {@code −0.52 V}. */
  public static String volts(double volts) {
    return Double.isNaN(volts) ? UNKNOWN : plainVolts(volts) + " V";
  }

  /**
   * Returns volts as a bare number for a table column headed "V": three significant digits, and no
   * digit finer than a millivolt.
   */
  public static String plainVolts(double volts) {
    if (Double.isNaN(volts)) {
      return UNKNOWN;
    }
    return signed(digits(volts, 3, 3));
  }

  /** Returns a bare number with exactly {@code decimals} places after the point: {@code −0.50}. */
  public static String fixed(double value, int decimals) {
    if (Double.isNaN(value)) {
      return UNKNOWN;
    }
    BigDecimal rounded = new BigDecimal(value).setScale(decimals, RoundingMode.HALF_EVEN);
    return signed((rounded.signum() == 0 ? rounded.abs() : rounded).toPlainString());
  }

  /**
   * Returns how many places after the point three significant digits of a value need, 3 at most.
   */
  public static int decimals(double value) {
    if (value == 0 || Double.isNaN(value)) {
      return 0;
    }
    BigDecimal rounded = new BigDecimal(value).round(new MathContext(3, RoundingMode.HALF_EVEN));
    return Math.max(0, Math.min(3, 2 - (rounded.precision() - rounded.scale() - 1)));
  }

  /** Returns a current: {@code 1.18 mA}, {@code 38 µA}. */
  public static String amps(double amps) {
    return of(amps, "A");
  }

  /** Returns a resistance: {@code 4.7 kΩ}, {@code 1 MΩ}. */
  public static String ohms(double ohms) {
    return of(ohms, "Ω");
  }

  /** Returns a power: {@code 11.4 W}, {@code 43 mW}. */
  public static String watts(double watts) {
    return of(watts, "W");
  }

  /** Returns a power in watts without prefix, to be held against a rating: {@code 0.123 W}. */
  public static String wattsUnscaled(double watts) {
    return Double.isNaN(watts) ? UNKNOWN : signed(trim(new BigDecimal(digits(watts, 3, 3)))) + " W";
  }

  /** Returns a share in whole per cent: {@code 62 %}. */
  public static String percent(double share) {
    if (Double.isNaN(share)) {
      return UNKNOWN;
    }
    return signed(new BigDecimal(100 * share).setScale(0, RoundingMode.HALF_EVEN).toString())
        + " %";
  }

  /**
   * Returns {@code value} with three significant digits, the SI prefix that leaves one to three
   * digits before the point, and {@code unit}. Trailing zeros after the point are dropped.
   */
  public static String of(double value, String unit) {
    if (Double.isNaN(value)) {
      return UNKNOWN;
    }
    if (value == 0) {
      return "0 " + unit;
    }
    BigDecimal rounded = new BigDecimal(value).round(new MathContext(3, RoundingMode.HALF_EVEN));
    int exponent = rounded.precision() - rounded.scale() - 1;
    int step = Math.floorDiv(exponent, 3) + UNIT_STEP;
    if (step < 0) {
      return "0 " + unit;
    }
    step = Math.min(step, PREFIXES.length - 1);
    BigDecimal scaled = rounded.movePointLeft(3 * (step - UNIT_STEP));
    return signed(trim(scaled)) + " " + PREFIXES[step] + unit;
  }

  /**
   * Returns {@code value} with {@code significant} digits but none finer than {@code decimals}
   * places after the point; a value that rounds to nothing is "0".
   */
  static String digits(double value, int significant, int decimals) {
    if (value == 0) {
      return "0";
    }
    BigDecimal rounded =
        new BigDecimal(value).round(new MathContext(significant, RoundingMode.HALF_EVEN));
    if (rounded.scale() > decimals) {
      rounded = rounded.setScale(decimals, RoundingMode.HALF_EVEN);
    }
    if (rounded.signum() == 0) {
      return "0";
    }
    return rounded.scale() < 0 ? rounded.setScale(0).toPlainString() : rounded.toPlainString();
  }

  private static String trim(BigDecimal value) {
    BigDecimal stripped = value.stripTrailingZeros();
    return stripped.scale() < 0 ? stripped.setScale(0).toPlainString() : stripped.toPlainString();
  }

  private static String signed(String plain) {
    return plain.startsWith("-") ? MINUS + plain.substring(1) : plain;
  }
}
