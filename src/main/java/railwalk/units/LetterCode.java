package railwalk.units;

import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import railwalk.units.ValueReading.Refusal;
import railwalk.units.ValueReading.Refused;
import railwalk.units.ValueReading.Value;

/**
 * The letter code of IEC 60062: a letter stands where the decimal point would ({@code 4k7}, {@code
 * R47}, {@code 470R}, {@code 4n7}), and a further letter may give the tolerance ({@code 4k7J}).
 */
final class LetterCode {
  private static final Pattern CODE =
      Pattern.compile("([+-]?)(\\d{0,9})([A-Za-z])(\\d{0,9})([A-Za-z]?)");

  /** The letters by what they code, lower case, as powers of ten. */
  private static final Map<Measure, Map<Character, Integer>> POWERS =
      Map.of(
          Measure.RESISTANCE,
          Map.of('r', 0, 'k', 3, 'm', 6, 'g', 9, 't', 12),
          Measure.CAPACITANCE,
          Map.of('p', -12, 'n', -9, 'u', -6, 'm', -3, 'f', 0),
          Measure.INDUCTANCE,
          Map.of('n', -9, 'u', -6, 'm', -3, 'h', 0),
          Measure.VOLTAGE,
          Map.of('v', 0, 'k', 3),
          Measure.CURRENT,
          Map.of('a', 0, 'm', -3, 'u', -6),
          Measure.NUMBER,
          Map.of('r', 0, 'k', 3, 'n', -9, 'p', -12, 'u', -6, 'm', 0));

  /** Tolerance letters as shares. */
  private static final Map<Character, Double> TOLERANCES =
      Map.ofEntries(
          Map.entry('B', 0.001),
          Map.entry('C', 0.0025),
          Map.entry('D', 0.005),
          Map.entry('F', 0.01),
          Map.entry('G', 0.02),
          Map.entry('H', 0.03),
          Map.entry('J', 0.05),
          Map.entry('K', 0.10),
          Map.entry('M', 0.20),
          Map.entry('N', 0.30));

  private LetterCode() {}

  /** Returns the reading of {@code text} when it is such a code for {@code measure}. */
  static Optional<ValueReading> read(String text, Measure measure) {
    Matcher code = CODE.matcher(text);
    if (!code.matches()) {
      return Optional.empty();
    }
    String whole = code.group(2);
    String part = code.group(4);
    char letter = code.group(3).charAt(0);
    char lower = Character.toLowerCase(letter);
    Integer power = POWERS.getOrDefault(measure, Map.of()).get(lower);
    boolean digitsAfter = !part.isEmpty();
    boolean ohmsWithoutPart = lower == 'r' && !whole.isEmpty();
    if (power == null || (!digitsAfter && !ohmsWithoutPart)) {
      return Optional.empty();
    }
    if (lower == 'm' && measure == Measure.NUMBER) {
      return Optional.of(new Refused(Refusal.M_CODE_IN_EXPRESSION, measure, meg(whole, part)));
    }
    if (letter == 'm' && measure == Measure.RESISTANCE) {
      String asMega = whole + "M" + part;
      return Optional.of(new Refused(Refusal.SMALL_M_ON_RESISTANCE, measure, asMega));
    }
    double tolerance = Double.NaN;
    if (!code.group(5).isEmpty()) {
      Double listed = TOLERANCES.get(Character.toUpperCase(code.group(5).charAt(0)));
      boolean unit = Suffix.statedBy(code.group(5)).filter(m -> m == measure).isPresent();
      boolean farad = measure == Measure.CAPACITANCE && code.group(5).equalsIgnoreCase("f");
      if (listed == null && !unit) {
        return Optional.empty();
      }
      tolerance = unit || farad || listed == null ? Double.NaN : listed;
    }
    double amount = ValueReader.scaled(code.group(1) + "0" + whole + "." + part + "0", power);
    return Optional.of(new Value(amount, tolerance, Set.of()));
  }

  private static String meg(String whole, String part) {
    return (whole.isEmpty() ? "0" : whole) + "." + part + "meg";
  }
}
