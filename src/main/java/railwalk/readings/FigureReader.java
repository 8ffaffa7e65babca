package railwalk.readings;

import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;
import railwalk.units.ValueReading.Refused;
import railwalk.units.ValueReading.Remark;
import railwalk.units.ValueReading.Value;

/** Reads what people note down from a meter: {@code 352}, {@code 0.35k}, {@code -42 V}, OL. */
final class FigureReader {
  /** Beyond these a figure is a slip of the pen whatever the amplifier. */
  private static final double MOST_VOLTS = 100e3;

  private static final double MOST_OHMS = 1e12;
  private static final double MOST_AMPS = 100;

  /** From here on k without a unit is more likely kilohm than kilovolt (common practice). */
  private static final double LEAST_UNLIKELY_KILOVOLTS = 3;

  private static final double AMPS_PER_MILLIAMP = 1e-3;

  private static final int LONGEST_FIGURE = 40;

  /** What a meter shows, or a person writes, where there is no path or the range is too low. */
  private static final Pattern NO_FIGURE =
      Pattern.compile(
          "[-+<>]?\\s*(?:[o0]\\.?l\\.?|over(?:load|range| range)?|open|inf(?:inite|inity)?|\u221e)"
              + "\\s*((?:k|m|meg)?\\s*(?:ohms?|\u03a9|\u2126)?)",
          Pattern.CASE_INSENSITIVE);

  private static final Pattern NOT_READ = Pattern.compile("[-?\u2014]*");
  private static final Pattern FIGURE = Pattern.compile("[-+]?\\s*[.,]?\\d.*", Pattern.DOTALL);
  private static final Pattern PARTS =
      Pattern.compile("([-+]?)\\s*([.,]?\\d[\\d., '\u2019]*)(.*)", Pattern.DOTALL);
  private static final Pattern PEAKS =
      Pattern.compile("[-+]?\\d.*?(p\\s*-?\\s*p|pk|peak)", Pattern.CASE_INSENSITIVE);
  private static final Pattern TAIL =
      Pattern.compile("(.*[\\d.vam ])(ac|dc|rms|~)", Pattern.CASE_INSENSITIVE);
  private static final Pattern EXPONENT = Pattern.compile("(?:[eE][-+]?\\d+)?");
  private static final Pattern OHMS_CODE = Pattern.compile("[rR]\\d*");
  private static final Pattern VOLTS_AFTER =
      Pattern.compile(
          "(?:e[-+]?\\d+)?(?:[km]|[kmu\u00b5\u03bc]?(?:v|volts?|vdc|dcv|vac|vrms))?|[vk]\\d+v?",
          Pattern.CASE_INSENSITIVE);

  /** What stands behind ohms at least as often as behind volts. */
  private static final Pattern LIKE_OHMS =
      Pattern.compile("k|m|meg|[km]\\d+", Pattern.CASE_INSENSITIVE);

  private static final Pattern POINT_GROUPS = Pattern.compile("\\d{1,3}(?:,\\d{3})+(?:\\.\\d*)?");
  private static final Pattern COMMA_GROUPS = Pattern.compile("\\d{1,3}(?:\\.\\d{3})+,\\d*");
  private static final Pattern PERIODS_ALONE = Pattern.compile("\\d{1,3}(?:\\.\\d{3}){2,}");
  private static final Pattern BLANK_GROUPS =
      Pattern.compile("\\d{1,3}(?:[ '\u2019]\\d{3})+(?:[.,]\\d*)?");
  private static final Pattern LIKE_ONE_GROUP = Pattern.compile("[1-9]\\d{0,2}[.,]\\d{3}");
  private static final Pattern PLAIN = Pattern.compile("\\d*\\.?\\d*");

  private final boolean decimalComma;
  private final List<Diagnostic> notes;

  /**
   * A reader for one sheet.
   *
   * @param decimalComma whether a lone comma in a figure is the decimal sign
   * @param notes takes what was assumed
   */
  FigureReader(boolean decimalComma, List<Diagnostic> notes) {
    this.decimalComma = decimalComma;
    this.notes = notes;
  }

  /** Returns whether {@code text} starts like a figure, or says that the meter showed none. */
  static boolean isFigure(String text) {
    String plain = plain(text);
    return FIGURE.matcher(plain).matches() || NO_FIGURE.matcher(plain).matches();
  }

  /** Returns whether {@code text} says that nothing was read: empty, dashes, question marks. */
  static boolean isNotRead(String text) {
    return NOT_READ.matcher(plain(text)).matches();
  }

  /** Returns what {@code cell} says; {@code kind} is null where the sheet gives none. */
  Figure read(Cell cell, @Nullable ReadingKind kind) throws RowRefused {
    String text = plain(cell.text());
    if (text.length() > LONGEST_FIGURE) {
      throw notAValue(cell, kind);
    }
    Matcher none = NO_FIGURE.matcher(text);
    if (none.matches()) {
      boolean ohms = kind == ReadingKind.OHMS || (kind == null && !none.group(1).isBlank());
      if (!ohms) {
        throw new RowRefused(SheetProblem.OVER_RANGE, cell.span(), cell.text());
      }
      return new Figure(ReadingKind.OHMS, true, Double.POSITIVE_INFINITY);
    }
    if (PEAKS.matcher(text).matches() && kind != ReadingKind.OHMS) {
      throw new RowRefused(SheetProblem.PEAK_TO_PEAK, cell.span(), cell.text());
    }
    Matcher tail = TAIL.matcher(text);
    ReadingKind told = null;
    if (tail.matches()) {
      text = tail.group(1);
      told = tail.group(2).equalsIgnoreCase("dc") ? ReadingKind.DC : ReadingKind.AC;
    }
    return figure(cell, text, kind, told);
  }

  /** Reads the figure itself; {@code told} is what AC or DC behind it says. */
  private Figure figure(
      Cell cell, String text, @Nullable ReadingKind given, @Nullable ReadingKind told)
      throws RowRefused {
    Matcher parts = PARTS.matcher(text);
    if (!parts.matches()) {
      Measure measure = measure(given == null ? ReadingKind.DC : given);
      throw refused(cell, ValueReader.read(text.replace(" ", ""), measure), given);
    }
    String after = parts.group(3).replace(" ", "");
    String digits = parts.group(1) + decimal(cell, parts.group(2).strip(), given);
    if (given == null && lacksUnit(digits, after)) {
      throw new RowRefused(SheetProblem.UNIT_NEEDED, cell.span(), cell.text());
    }
    String written = digits + after;
    ReadingKind kind = given == null ? kind(cell, written, after, told) : given;
    if (told != null && !fits(told, kind)) {
      throw new RowRefused(
          SheetProblem.AC_OR_DC,
          cell.span(),
          cell.text(),
          told == ReadingKind.DC ? "DC" : "AC",
          kind.word());
    }
    boolean volts = measure(kind) == Measure.VOLTAGE;
    boolean strange = volts && (after.equals("M") || !VOLTS_AFTER.matcher(after).matches());
    ValueReading reading = ValueReader.read(written, measure(kind));
    if (strange
        || !(reading instanceof Value value)
        || value.remarks().contains(Remark.LETTERS_IGNORED)) {
      throw refused(cell, reading, given);
    }
    boolean bareMilliamps = kind == ReadingKind.MA && EXPONENT.matcher(after).matches();
    double amount = value.amount() * (bareMilliamps ? AMPS_PER_MILLIAMP : 1) + 0.0;
    if (Math.abs(amount) > most(kind)) {
      throw new RowRefused(
          SheetProblem.VALUE_OUT_OF_RANGE, cell.span(), cell.text(), measure(kind).words());
    }
    boolean kindTold = given != null || told != null || !volts;
    return new Figure(kind, kindTold, amount);
  }

  /** Returns whether a figure marked AC or DC can be of {@code kind}. */
  private static boolean fits(ReadingKind told, ReadingKind kind) {
    return switch (kind) {
      case DC, MA -> told == ReadingKind.DC;
      case AC, RIPPLE -> told == ReadingKind.AC;
      case OHMS -> false;
    };
  }

  /** Returns the kind that the unit behind a figure tells. */
  private ReadingKind kind(Cell cell, String written, String after, @Nullable ReadingKind told)
      throws RowRefused {
    Optional<Measure> stated =
        OHMS_CODE.matcher(after).matches()
            ? Optional.of(Measure.RESISTANCE)
            : ValueReader.statedMeasure(written);
    if (stated.isEmpty() || stated.get() == Measure.VOLTAGE) {
      return told == null ? ReadingKind.DC : told;
    }
    return switch (stated.get()) {
      case RESISTANCE -> ReadingKind.OHMS;
      case CURRENT -> ReadingKind.MA;
      default ->
          throw new RowRefused(
              SheetProblem.NOT_A_VALUE,
              cell.span(),
              cell.text(),
              "volts, ohms or a current",
              "171, 1.2kohm or 35mA");
    };
  }

  /** Returns whether a figure without a unit could as well be ohms or a current as volts. */
  private static boolean lacksUnit(String digits, String after) {
    boolean someKilovolts =
        after.equalsIgnoreCase("k")
            && ValueReader.read(digits, Measure.NUMBER) instanceof Value thousands
            && Math.abs(thousands.amount()) < LEAST_UNLIKELY_KILOVOLTS;
    return LIKE_OHMS.matcher(after).matches() && !someKilovolts;
  }

  /** Returns {@code digits} with a period as the only sign in them. */
  private String decimal(Cell cell, String digits, @Nullable ReadingKind kind) throws RowRefused {
    boolean comma = digits.indexOf(',') >= 0;
    boolean onePeriod = digits.indexOf('.') == digits.lastIndexOf('.');
    if (PLAIN.matcher(digits).matches()) {
      if (decimalComma && LIKE_ONE_GROUP.matcher(digits).matches()) {
        note(SheetProblem.PERIOD_AS_DECIMAL, cell, digits);
      }
      return digits;
    }
    if (BLANK_GROUPS.matcher(digits).matches()) {
      return grouped(cell, digits.replaceAll("[ '\u2019]", "").replace(',', '.'));
    }
    boolean both = comma && digits.indexOf('.') >= 0;
    if (POINT_GROUPS.matcher(digits).matches() && (both || !decimalComma)) {
      return grouped(cell, digits.replace(",", ""));
    }
    if (COMMA_GROUPS.matcher(digits).matches()) {
      return grouped(cell, digits.replace(".", "").replace(',', '.'));
    }
    if (decimalComma && PERIODS_ALONE.matcher(digits).matches()) {
      return grouped(cell, digits.replace(".", ""));
    }
    boolean oneComma = comma && digits.indexOf(',') == digits.lastIndexOf(',');
    String decimal = digits.replace(',', '.');
    if (!oneComma || !onePeriod || !PLAIN.matcher(decimal).matches()) {
      throw notAValue(cell, kind);
    }
    if (!decimalComma || LIKE_ONE_GROUP.matcher(digits).matches()) {
      note(SheetProblem.COMMA_AS_DECIMAL, cell, decimal);
    }
    return decimal;
  }

  private String grouped(Cell cell, String digits) {
    note(SheetProblem.THOUSANDS, cell, digits);
    return digits;
  }

  private void note(SheetProblem problem, Cell cell, String digits) {
    notes.add(problem.at(cell.span(), cell.text(), digits));
  }

  private static RowRefused refused(Cell cell, ValueReading reading, @Nullable ReadingKind given) {
    if (!(reading instanceof Refused refused)) {
      return notAValue(cell, given);
    }
    return switch (refused.reason()) {
      case LETTER_FOR_DIGIT ->
          new RowRefused(SheetProblem.LETTER_FOR_DIGIT, cell.span(), cell.text(), refused.hint());
      case SMALL_M_ON_RESISTANCE ->
          new RowRefused(
              SheetProblem.SMALL_M_ON_RESISTANCE, cell.span(), cell.text(), refused.hint());
      case WRONG_UNIT -> wrongUnit(cell, refused.stated(), given == null ? ReadingKind.DC : given);
      case OUT_OF_RANGE ->
          new RowRefused(
              SheetProblem.VALUE_OUT_OF_RANGE,
              cell.span(),
              cell.text(),
              measure(given == null ? ReadingKind.DC : given).words());
      default -> notAValue(cell, given);
    };
  }

  private static RowRefused wrongUnit(Cell cell, Measure stated, ReadingKind kind) {
    String hint =
        switch (stated) {
          case VOLTAGE -> "kind dc, ac or ripple";
          case CURRENT -> "kind ma";
          case RESISTANCE -> "kind ohms";
          default -> "";
        };
    return new RowRefused(
        SheetProblem.WRONG_UNIT,
        cell.span(),
        cell.text(),
        stated.words(),
        kind.word(),
        measure(kind).words(),
        hint);
  }

  private static RowRefused notAValue(Cell cell, @Nullable ReadingKind given) {
    Measure measure = measure(given == null ? ReadingKind.DC : given);
    String example =
        switch (measure) {
          case RESISTANCE -> "1.5k, 470 or OL";
          case CURRENT -> "35 (milliampere), 35mA or 0.2A";
          default -> "352, 352V, 0.35kV or 350mV";
        };
    return new RowRefused(
        SheetProblem.NOT_A_VALUE, cell.span(), cell.text(), measure.words(), example);
  }

  private static Measure measure(ReadingKind kind) {
    return switch (kind) {
      case DC, AC, RIPPLE -> Measure.VOLTAGE;
      case OHMS -> Measure.RESISTANCE;
      case MA -> Measure.CURRENT;
    };
  }

  private static double most(ReadingKind kind) {
    return switch (kind) {
      case DC, AC, RIPPLE -> MOST_VOLTS;
      case OHMS -> MOST_OHMS;
      case MA -> MOST_AMPS;
    };
  }

  /** Returns {@code text} with plain blanks, and a hyphen for every dash and minus sign. */
  private static String plain(String text) {
    StringBuilder plain = new StringBuilder(text.length());
    for (int i = 0; i < text.length(); i++) {
      char sign = text.charAt(i);
      boolean dash = sign == '\u2212' || sign == '\u2013' || sign == '\u2010' || sign == '\u2011';
      if (sign != '\u200b' && sign != '\ufeff') {
        plain.append(dash ? '-' : Cell.isBlank(sign) ? ' ' : sign);
      }
    }
    return plain.toString().strip();
  }
}
