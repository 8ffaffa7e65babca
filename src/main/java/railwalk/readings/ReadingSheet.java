package railwalk.readings;

import java.util.List;

/**
 * A bench sheet.
 *
 * @param readings in the sheet's order, no two of the same place, kind and state
 * @param lineVolts rms at the wall; NaN when the sheet does not say
 * @param meter the meter's words, as {@code .meter} takes them; empty when the sheet does not say
 */
public record ReadingSheet(List<Reading> readings, double lineVolts, String meter) {
  public ReadingSheet {
    readings = List.copyOf(readings);
  }
}
