package railwalk.app;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import railwalk.diagnosis.JudgedReading;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;

/**
 * A sheet of readings with what was expected and the verdict beside each: CSV that {@code
 * SheetReader} takes again. Volts and ohms as they are, currents in milliampere.
 */
final class SavedSheet {
  private static final MathContext DIGITS = new MathContext(6);

  private SavedSheet() {}

  /**
   * Returns the sheet's text.
   *
   * @param lineVolts at the wall; NaN when not stated
   * @param meter as a sheet's row says it; empty when it is the netlist's
   */
  static String text(List<JudgedReading> readings, double lineVolts, String meter) {
    StringBuilder text = new StringBuilder();
    row(
        text,
        List.of(
            "point",
            "volts",
            "kind",
            "state",
            "range",
            "note",
            "expected",
            "lower",
            "upper",
            "verdict"));
    if (!Double.isNaN(lineVolts)) {
      row(text, List.of("line", figure(ReadingKind.DC, lineVolts)));
    }
    if (!meter.isEmpty()) {
      row(text, List.of("meter", meter));
    }
    for (JudgedReading judged : readings) {
      Reading r = judged.reading();
      ReadingKind kind = r.kind();
      row(
          text,
          List.of(
              r.point(),
              figure(kind, r.value()),
              kind.word(),
              r.state(),
              figure(ReadingKind.DC, r.rangeVolts()),
              r.note(),
              figure(kind, judged.meter()),
              figure(kind, judged.low()),
              figure(kind, judged.high()),
              judged.verdict().word()));
    }
    return text.toString();
  }

  private static String figure(ReadingKind kind, double value) {
    if (Double.isNaN(value)) {
      return "";
    }
    if (Double.isInfinite(value)) {
      return "OL";
    }
    double shown = kind == ReadingKind.MA ? 1000 * value : value;
    BigDecimal rounded = new BigDecimal(Math.abs(shown) < 1e-9 ? 0 : shown).round(DIGITS);
    return rounded.signum() == 0 ? "0" : rounded.stripTrailingZeros().toPlainString();
  }

  private static void row(StringBuilder text, List<String> cells) {
    for (int i = 0; i < cells.size(); i++) {
      String cell = cells.get(i);
      boolean quoted = cell.contains(",") || cell.contains("\"");
      text.append(i == 0 ? "" : ",")
          .append(quoted ? "\"" + cell.replace("\"", "\"\"") + "\"" : cell);
    }
    text.append('\n');
  }
}
