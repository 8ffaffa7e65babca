package railwalk.readings;

import org.jspecify.annotations.Nullable;
import railwalk.source.SourceSpan;

/**
 * One figure read at the bench.
 *
 * @param point as typed
 * @param value volt, ohm or ampere, by its kind
 * @param state name of the state it was read in; empty for the amplifier as its netlist stands
 * @param rangeVolts the meter's range; NaN when not given
 * @param note as typed; empty when there is none
 * @param span where it stands; null when it was typed in a form
 */
public record Reading(
    String point,
    MeasuredAt at,
    ReadingKind kind,
    double value,
    String state,
    double rangeVolts,
    String note,
    @Nullable SourceSpan span) {
  /** The state that any amplifier has: all tubes pulled but the rectifiers. */
  public static final String TUBES_OUT = "tubes out";

  /** Returns the name of the state that any amplifier has with one of its tubes pulled. */
  public static String pulled(String bottle) {
    return bottle + " pulled";
  }
}
