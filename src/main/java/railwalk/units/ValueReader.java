package railwalk.units;

import java.math.BigDecimal;
import java.util.EnumSet;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import railwalk.units.ValueReading.Refusal;
import railwalk.units.ValueReading.Refused;
import railwalk.units.ValueReading.Remark;
import railwalk.units.ValueReading.Value;

/**
 * Reads a value the way the trade writes it: with SPICE suffixes {@code f p n u m k meg g t} in any
 * case and unit letters after them ({@code 20uF}, {@code 1kohm}), with an exponent, in the letter
 * code of IEC 60062 ({@code 4k7}), or as old capacitors are marked ({@code mfd}, {@code mmf}). On a
 * resistance a capital M is mega and a small m is refused.
 */
public final class ValueReader {
  private static final Pattern NUMBER =
      Pattern.compile("([+-]?)(\\d+\\.?\\d*|\\.\\d+)(?:[eE]([+-]?\\d{1,3}))?([^\\d.]*)");
  private static final Pattern FRACTION =
      Pattern.compile(
          "(?:(\\d{1,3})-)?(\\d{1,3})/(\\d{1,3})(w|watts?|a|amps?)", Pattern.CASE_INSENSITIVE);
  private static final Pattern TOLERANCE_SIGN = Pattern.compile("^(?:±|\\+/-|\\+-)");
  private static final double LARGEST_BARE_FARADS = 1e-3;
  private static final double LEAST_REMARKED_FARADS = 1e-9;

  private ValueReader() {}

  /** Returns what {@code text} says where a value of {@code measure} is expected. */
  public static ValueReading read(String text, Measure measure) {
    ValueReading reading = readPlain(plain(text), measure);
    if (reading instanceof Value value && !value.remarks().contains(Remark.LETTERS_IGNORED)) {
      return reading;
    }
    String digits = text.replace('O', '0').replace('o', '0').replace('l', '1').replace('I', '1');
    boolean readsWithDigits =
        !digits.equals(text)
            && text.chars().anyMatch(Character::isDigit)
            && readPlain(plain(digits), measure) instanceof Value value
            && !value.remarks().contains(Remark.LETTERS_IGNORED);
    return readsWithDigits ? new Refused(Refusal.LETTER_FOR_DIGIT, measure, digits) : reading;
  }

  /** Returns what the unit written after a number measures; empty without a known unit. */
  public static Optional<Measure> statedMeasure(String text) {
    String plain = plain(text);
    Matcher fraction = FRACTION.matcher(plain);
    if (fraction.matches()) {
      return Suffix.statedBy(fraction.group(4));
    }
    Matcher number = NUMBER.matcher(plain);
    return number.matches() ? Suffix.statedBy(number.group(4)) : Optional.empty();
  }

  private static String plain(String text) {
    String plain =
        text.replace('\u00b5', 'u')
            .replace('\u03bc', 'u')
            .replace('\u2212', '-')
            .replace("\u03a9", "ohm")
            .replace("\u2126", "ohm");
    return TOLERANCE_SIGN.matcher(plain).replaceFirst("");
  }

  private static ValueReading readPlain(String text, Measure measure) {
    Matcher fraction = FRACTION.matcher(text);
    if (fraction.matches()) {
      return fraction(fraction, measure);
    }
    return LetterCode.read(text, measure).orElseGet(() -> number(text, measure));
  }

  /** Reads 1/2W, or 1-1/2A as fuses are marked. */
  private static ValueReading fraction(Matcher fraction, Measure measure) {
    Measure stated = Suffix.statedBy(fraction.group(4)).orElse(measure);
    if (measure != stated && measure != Measure.NUMBER) {
      return new Refused(Refusal.WRONG_UNIT, stated, "");
    }
    double whole = fraction.group(1) == null ? 0 : Double.parseDouble(fraction.group(1));
    double parts = Double.parseDouble(fraction.group(3));
    if (parts == 0) {
      return new Refused(Refusal.NOT_A_NUMBER, measure, "");
    }
    double amount = whole + Double.parseDouble(fraction.group(2)) / parts;
    return new Value(amount, Double.NaN, Set.of());
  }

  private static ValueReading number(String text, Measure measure) {
    Matcher number = NUMBER.matcher(text);
    if (!number.matches()) {
      return new Refused(Refusal.NOT_A_NUMBER, measure, "");
    }
    String digits = number.group(2);
    boolean exponent = number.group(3) != null;
    Suffix suffix = Suffix.of(number.group(4), measure);
    Refusal refusal = suffix.refusal();
    if (refusal != null) {
      Measure stated = suffix.stated();
      return new Refused(refusal, stated == null ? measure : stated, hint(refusal, digits));
    }
    int power = (exponent ? Integer.parseInt(number.group(3)) : 0) + suffix.power();
    double amount = scaled(number.group(1) + digits, power);
    if (!Double.isFinite(amount)) {
      return new Refused(Refusal.OUT_OF_RANGE, measure, "");
    }
    if (measure != Measure.CAPACITANCE) {
      return new Value(amount, Double.NaN, suffix.remarks());
    }
    return capacitance(amount, suffix, exponent, digits);
  }

  private static ValueReading capacitance(
      double farads, Suffix suffix, boolean exponent, String digits) {
    boolean bare = suffix.power() == 0;
    if (bare && Math.abs(farads) > LARGEST_BARE_FARADS) {
      String hint = digits + "u for microfarad, " + digits + "p for picofarad";
      return new Refused(Refusal.BARE_CAPACITANCE, Measure.CAPACITANCE, exponent ? "" : hint);
    }
    EnumSet<Remark> remarks = EnumSet.noneOf(Remark.class);
    remarks.addAll(suffix.remarks());
    if (bare && !exponent && Math.abs(farads) >= LEAST_REMARKED_FARADS) {
      remarks.add(Remark.BARE_FARADS);
    }
    if (suffix.power() == -3 && Math.abs(farads) >= LARGEST_BARE_FARADS) {
      remarks.add(Remark.MILLIFARAD);
    }
    return new Value(farads, Double.NaN, remarks);
  }

  private static String hint(Refusal refusal, String digits) {
    if (refusal != Refusal.SMALL_M_ON_RESISTANCE) {
      return "";
    }
    String milli = BigDecimal.valueOf(scaled(digits, -3)).stripTrailingZeros().toPlainString();
    return digits + "M for megohm, " + milli + " if you mean a milliohm";
  }

  /** Returns {@code digits} times ten to {@code power}, rounded once. */
  static double scaled(String digits, int power) {
    return Double.parseDouble(digits + "e" + power);
  }
}
