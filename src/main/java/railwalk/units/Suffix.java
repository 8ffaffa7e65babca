package railwalk.units;

import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import railwalk.units.ValueReading.Refusal;
import railwalk.units.ValueReading.Remark;

/**
 * The letters after a number: a power of ten and a unit.
 *
 * @param power of ten
 * @param stated what the unit measures; null without a known unit
 * @param refusal why the letters cannot stand there; null when they can
 */
record Suffix(int power, @Nullable Measure stated, Set<Remark> remarks, @Nullable Refusal refusal) {

  private static final Map<Character, Integer> POWERS =
      Map.of('f', -15, 'p', -12, 'n', -9, 'u', -6, 'm', -3, 'k', 3, 'g', 9, 't', 12);

  private static final Map<String, Measure> UNITS =
      Map.ofEntries(
          Map.entry("ohm", Measure.RESISTANCE),
          Map.entry("ohms", Measure.RESISTANCE),
          Map.entry("f", Measure.CAPACITANCE),
          Map.entry("fd", Measure.CAPACITANCE),
          Map.entry("farad", Measure.CAPACITANCE),
          Map.entry("farads", Measure.CAPACITANCE),
          Map.entry("h", Measure.INDUCTANCE),
          Map.entry("hy", Measure.INDUCTANCE),
          Map.entry("henry", Measure.INDUCTANCE),
          Map.entry("henries", Measure.INDUCTANCE),
          Map.entry("henrys", Measure.INDUCTANCE),
          Map.entry("v", Measure.VOLTAGE),
          Map.entry("vdc", Measure.VOLTAGE),
          Map.entry("vdcw", Measure.VOLTAGE),
          Map.entry("wvdc", Measure.VOLTAGE),
          Map.entry("wv", Measure.VOLTAGE),
          Map.entry("dcv", Measure.VOLTAGE),
          Map.entry("vac", Measure.VOLTAGE),
          Map.entry("vrms", Measure.VOLTAGE),
          Map.entry("volt", Measure.VOLTAGE),
          Map.entry("volts", Measure.VOLTAGE),
          Map.entry("a", Measure.CURRENT),
          Map.entry("adc", Measure.CURRENT),
          Map.entry("amp", Measure.CURRENT),
          Map.entry("amps", Measure.CURRENT),
          Map.entry("s", Measure.CONDUCTANCE),
          Map.entry("siemens", Measure.CONDUCTANCE),
          Map.entry("mho", Measure.CONDUCTANCE),
          Map.entry("mhos", Measure.CONDUCTANCE),
          Map.entry("a/v", Measure.CONDUCTANCE),
          Map.entry("w", Measure.POWER),
          Map.entry("watt", Measure.POWER),
          Map.entry("watts", Measure.POWER),
          Map.entry("hz", Measure.FREQUENCY),
          Map.entry("cps", Measure.FREQUENCY),
          Map.entry("%", Measure.SHARE));

  /** What old capacitors print for micro- and picofarad. */
  private static final Set<String> MICRO_MARKS = Set.of("mf", "mfd");

  private static final Set<String> PICO_MARKS = Set.of("mmf", "mmfd", "uuf", "uufd");
  private static final String MEG = "meg";
  private static final Pattern LETTERS = Pattern.compile("\\p{L}+");

  /** Returns how {@code letters} are read after a number that measures {@code measure}. */
  static Suffix of(String letters, Measure measure) {
    String lower = letters.toLowerCase(Locale.ROOT);
    if (measure == Measure.CAPACITANCE && PICO_MARKS.contains(lower)) {
      return read(-12, measure, Remark.OLD_MARK_IS_PICO);
    }
    if (measure == Measure.CAPACITANCE && MICRO_MARKS.contains(lower)) {
      return read(-6, measure, Remark.OLD_MARK_IS_MICRO);
    }
    if (isWholeUnit(lower, measure)) {
      return unit(0, lower, measure, Set.of());
    }
    if (lower.startsWith(MEG)) {
      String rest = lower.substring(MEG.length());
      return unit(6, rest.startsWith("aohm") ? rest.substring(1) : rest, measure, Set.of());
    }
    Integer power = POWERS.get(lower.charAt(0));
    if (power == null) {
      return unit(0, lower, measure, Set.of());
    }
    String rest = lower.substring(1);
    if (measure != Measure.RESISTANCE || power != -3) {
      return unit(power, rest, measure, Set.of());
    }
    if (letters.charAt(0) == 'M') {
      return unit(6, rest, measure, Set.of(Remark.CAPITAL_M_IS_MEGA));
    }
    Suffix milli = unit(power, rest, measure, Set.of());
    return milli.refusal() == null ? refused(Refusal.SMALL_M_ON_RESISTANCE, measure) : milli;
  }

  /** Returns what the unit in {@code letters} measures, whatever is expected. */
  static Optional<Measure> statedBy(String letters) {
    return Optional.ofNullable(of(letters, Measure.NUMBER).stated());
  }

  /** An f alone is femto but on a capacitor, where it is the farad. */
  private static boolean isWholeUnit(String lower, Measure measure) {
    return lower.isEmpty()
        || (UNITS.containsKey(lower) && (!lower.equals("f") || measure == Measure.CAPACITANCE));
  }

  private static Suffix unit(int power, String rest, Measure measure, Set<Remark> remarks) {
    if (rest.isEmpty()) {
      return new Suffix(power, null, remarks, null);
    }
    Measure stated = UNITS.get(rest);
    if (stated == null) {
      return LETTERS.matcher(rest).matches()
          ? read(power, null, Remark.LETTERS_IGNORED)
          : refused(Refusal.NOT_A_NUMBER, null);
    }
    if (measure != Measure.NUMBER && stated != measure) {
      return refused(Refusal.WRONG_UNIT, stated);
    }
    return new Suffix(stated == Measure.SHARE ? power - 2 : power, stated, remarks, null);
  }

  private static Suffix read(int power, @Nullable Measure stated, Remark remark) {
    return new Suffix(power, stated, Set.of(remark), null);
  }

  private static Suffix refused(Refusal refusal, @Nullable Measure stated) {
    return new Suffix(0, stated, Set.of(), refusal);
  }
}
