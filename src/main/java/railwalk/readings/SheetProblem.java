package railwalk.readings;

import static railwalk.source.Severity.ERROR;
import static railwalk.source.Severity.NOTE;
import static railwalk.source.Severity.WARNING;

import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;
import railwalk.source.Severity;
import railwalk.source.SourceSpan;

/**
 * Everything that can be said about a sheet of readings. An error costs one row, or the sheet where
 * it has no place; a note tells what was assumed. The constant's name in lower case with hyphens is
 * its code; {@code %1$s} and so on are filled from where it is found.
 */
enum SheetProblem {
  // the sheet
  NOT_A_SHEET(
      ERROR,
      "%1$s is no sheet of readings but %2$s",
      "wanted: plain text, a header point,volts,kind,state,range,note, and one reading on each line"),
  SHEET_EMPTY(
      ERROR, "%1$s is empty", "a header point,volts and one reading on each line: V1.6,171"),
  NO_ROW_READABLE(
      ERROR,
      "not one line of %1$s reads like a reading",
      "a header point,volts,kind,state,range,note, then one reading on each line: V1.6,171"),
  NOTHING_FILLED_IN(
      ERROR, "%1$s has no reading in it", "what the meter showed goes into the column volts"),
  HEADER_MISSING(
      NOTE, "no header, so the cells are taken as point,volts,kind,state,range,note", ""),
  COLUMN_MISSING(
      ERROR,
      "this header has no column called %1$s",
      "point,volts[,kind][,state][,range][,note] in any order"),
  COLUMN_TWICE(WARNING, "there are two columns for %1$s", "the first one counts"),
  COLUMNS_PASSED_OVER(NOTE, "columns that mean nothing here are passed over: %1$s", ""),

  // the shape of a row
  QUOTE_OPEN(
      ERROR,
      "this quote is never closed",
      "a cell in quotes ends with a quote and then the next %1$s or the line's end"),
  QUOTE_STRAY(
      ERROR, "a quote stands inside a cell in quotes", "inside quotes write it twice: \"\""),
  SEPARATOR_MISSING(
      ERROR, "no %1$s parts point and volts here", "a line that is only a remark starts with #"),
  CELLS_TOO_MANY(
      ERROR, "%1$s stands in no column of the header", "text with a %2$s goes in quotes"),
  DECIMAL_COMMA(
      ERROR,
      "%1$s,%2$s reads as two cells, since commas part the cells here",
      "%1$s.%2$s if it is one figure%3$s"),
  WORD_SHAPE(ERROR, "%1$s is no reading", "point=value, such as V1.6=171 or R38=35mV"),
  VALUE_MISSING(ERROR, "%1$s: nothing stands after the =", "%1$s=171"),

  // where it was read
  POINT_MISSING(ERROR, "a reading without a point", "a pin, electrode, part or node: V1.6,171"),
  POINT_UNKNOWN(ERROR, "there is no point %1$s", "%2$s"),
  NODE_UNKNOWN(ERROR, "there is no node %1$s", "%2$s"),
  TUBE_UNKNOWN(ERROR, "there is no tube %1$s", "%2$s"),
  TUBE_ALONE(ERROR, "%1$s is a tube: at which of its pins or electrodes?", "%2$s"),
  TRANSFORMER_ALONE(ERROR, "%1$s is a transformer: on which winding?", "%2$s"),
  PIN_NOT_WIRED(ERROR, "nothing is wired to %2$s's %1$s", "its wired pins: %3$s"),
  PINS_NOT_KNOWN(ERROR, "which pin of %1$s is which is not known", "name the electrode: %1$s.%2$s"),
  PIN_OF_OTHER_SECTION(ERROR, "%1$s of %2$s belongs to section %3$s", "write %2$s.%4$s"),
  ELECTRODE_UNKNOWN(ERROR, "%1$s is neither a pin nor an electrode", "%2$s"),
  ELECTRODE_NOT_IN_TUBE(ERROR, "%1$s has no %2$s that is wired", "%3$s"),
  SECTION_NEEDED(ERROR, "%1$s has more than one %2$s", "one of %3$s"),
  REFERENCE_POINT(
      ERROR,
      "%1$s is the reference: it reads 0 by definition",
      "all readings are against it, the black lead's place"),
  REFERENCE_NOT_ZERO(
      ERROR,
      "%1$s is wired to the reference in the netlist, which reads 0 by definition, but %2$s was read",
      "is the wire or joint to the reference open? measure it in ohms, unplugged and discharged"),
  REFERENCE_READ(NOTE, "%1$s is on the reference, so its 0 is passed over", ""),
  NO_TWO_ENDS(ERROR, "%1$s has no two ends to read between", "name a node or a pin"),
  WINDING_NEEDS_AC(ERROR, "%1$s is a winding, on which only AC volts are read", "kind ac"),
  WINDING_TAKEN_AS_AC(NOTE, "%1$s is a winding, so this is taken as AC volts", ""),
  HEATER_ON_WINDING(
      NOTE, "%1$s is a heater pin, so this is taken as the volts from end to end of %2$s", ""),
  HEATER_AGAINST_REFERENCE(
      NOTE,
      "the other end of this heater is on no winding: %1$s is taken against the reference",
      ""),
  NOT_AGAINST_REFERENCE(
      ERROR, "%2$s against the reference, but no end of %1$s is on it", "name a node or a pin%3$s"),
  CURRENT_PLACE(
      ERROR,
      "the current of which part? %1$s does not tell",
      "a part (R38) or an electrode (V4.k)"),

  // what was read
  NOT_A_VALUE(ERROR, "%1$s is not %2$s", "write it like %3$s"),
  LETTER_FOR_DIGIT(ERROR, "%1$s has a letter where a digit should be", "%2$s?"),
  SMALL_M_ON_RESISTANCE(ERROR, "%1$s would be milliohms", "%2$s"),
  WRONG_UNIT(ERROR, "%1$s is %2$s, but kind %3$s wants %4$s", "%5$s"),
  AC_OR_DC(ERROR, "%1$s says %2$s, but the row says kind %3$s", "one of the two is a slip"),
  UNIT_NEEDED(
      ERROR,
      "%1$s of what?",
      "with its unit: 171V, 0.35kV, 35mV, 1.5kohm, 35mA; or fill in the kind"),
  PEAK_TO_PEAK(
      ERROR,
      "%1$s is from peak to peak; rms is wanted",
      "read it with the meter on AC; a scope's figure over 2.83 for a sine, over 3.5 for a sawtooth"),
  OVER_RANGE(
      ERROR,
      "%1$s: the meter showed no figure",
      "take the next higher range; if no path was meant, the kind is ohms"),
  VALUE_OUT_OF_RANGE(ERROR, "%1$s cannot be %2$s of an amplifier", "the unit, or the point?"),
  NEGATIVE(ERROR, "%1$s: a reading of kind %2$s has no sign", ""),
  THOUSANDS(NOTE, "%1$s is read as %2$s, its groups of three as thousands", ""),
  COMMA_AS_DECIMAL(NOTE, "%1$s is read as %2$s, its comma as the decimal sign", ""),
  PERIOD_AS_DECIMAL(NOTE, "%1$s is read as it stands, its period as the decimal sign", ""),

  // under which conditions
  KIND_UNKNOWN(ERROR, "%1$s is no kind of reading", "%2$s"),
  STATE_UNKNOWN(ERROR, "there is no state %1$s", "%2$s"),
  STANDBY_UNKNOWN(ERROR, "the netlist has no state standby", "a line in it makes one: %1$s"),
  OHMS_STATE(
      ERROR,
      "ohms are read off, discharged and with the tubes out, not in state %1$s",
      "leave the state's cell empty"),
  RANGE_NOT_USED(NOTE, "a range in volts has no use for kind %1$s and is passed over", ""),
  RANGE_BAD(ERROR, "%1$s is no range", "the volts at full scale: 250"),
  RANGE_TOO_LOW(ERROR, "%1$s cannot be read on a range of %2$s", "one of the two is a slip"),
  LINE_OUT_OF_RANGE(
      ERROR, "%1$s cannot be the line's volts", "rms at the wall, 20 to 600: line,118"),
  LINE_STATE(
      ERROR,
      "the line's volts hold for the whole sheet, not for state %1$s",
      "another line is a state of the netlist: .state low_line line=108"),
  SETTING_TWICE(ERROR, "%1$s stands on %3$s %2$d already", "that one counts"),
  READ_TWICE(ERROR, "%1$s is read on %4$s %2$d already%3$s", "that one counts");

  private final Severity severity;
  private final String message;
  private final String hint;

  SheetProblem(Severity severity, String message, String hint) {
    this.severity = severity;
    this.message = message;
    this.hint = hint;
  }

  /** Returns the code that diagnostics carry. */
  String code() {
    return Diagnostic.code(this);
  }

  /** Returns the diagnostic about {@code span}; null is the sheet as a whole. */
  Diagnostic at(@Nullable SourceSpan span, Object... words) {
    return Diagnostic.of(this, severity, message, hint, span, words);
  }
}
