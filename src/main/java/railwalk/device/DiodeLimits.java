package railwalk.device;

import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Limits of usual silicon rectifiers, told from the type's number; NaN where they are not on file.
 * Source: the registered series 1N4001 to 1N4007 (1 A) and 1N5400 to 1N5408 (3 A), and UF4001 to
 * UF4007 alike, from memory of the makers' sheets. They are absolute limits.
 *
 * @param inverseVoltsMax repetitive peak inverse volts
 * @param dcAmpsMax mean forward current, half-wave into a resistance
 */
public record DiodeLimits(double inverseVoltsMax, double dcAmpsMax) {
  /** A type that is not on file. */
  private static final DiodeLimits NONE = new DiodeLimits(Double.NaN, Double.NaN);

  private static final Pattern NUMBER = Pattern.compile("(1N400|UF400|1N540)(\\d).*");
  private static final double[] ONE_AMPERE = {Double.NaN, 50, 100, 200, 400, 600, 800, 1000};
  private static final double[] THREE_AMPERES = {50, 100, 200, 300, 400, 500, 600, 800, 1000};

  /** Returns the limits of a type by its name as written. */
  public static DiodeLimits of(String typeName) {
    Matcher number = NUMBER.matcher(typeName.toUpperCase(Locale.ROOT));
    if (!number.matches()) {
      return NONE;
    }
    boolean three = number.group(1).equals("1N540");
    double[] volts = three ? THREE_AMPERES : ONE_AMPERE;
    int digit = Integer.parseInt(number.group(2));
    return digit < volts.length && !Double.isNaN(volts[digit])
        ? new DiodeLimits(volts[digit], three ? 3 : 1)
        : NONE;
  }
}
