package railwalk.render.csv;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import railwalk.chart.Chart;
import railwalk.chart.Figures;

/**
 * A chart's DC points as CSV after RFC 4180, at full precision: {@code
 * node,pins,volts,low_volts,high_volts,meter_volts}, pins separated by blanks, unknown figures
 * empty. Where the amplifier has states a first column {@code state} says which, empty for the
 * netlist as it stands. Stateless.
 */
public final class CsvRenderer {
  private static final String LINE_END = "\r\n";

  /** Returns the table with its head, each line ending as RFC 4180 asks (CR LF). */
  public String render(Chart chart) {
    boolean states = chart.figures().size() > 1;
    StringBuilder out = new StringBuilder();
    out.append(states ? "state," : "")
        .append("node,pins,volts,low_volts,high_volts,meter_volts")
        .append(LINE_END);
    for (Figures figures : chart.figures()) {
      for (Figures.Point point : figures.points()) {
        List<String> fields = new ArrayList<>();
        if (states) {
          fields.add(figures.conditions().state());
        }
        fields.add(point.node());
        fields.add(String.join(" ", point.pins()));
        fields.add(number(point.volts()));
        fields.add(number(point.lowVolts()));
        fields.add(number(point.highVolts()));
        fields.add(number(point.meterVolts()));
        out.append(fields.stream().map(CsvRenderer::quoted).collect(Collectors.joining(",")))
            .append(LINE_END);
      }
    }
    return out.toString();
  }

  private static String number(double value) {
    return Double.isFinite(value) ? Double.toString(value + 0.0) : "";
  }

  private static String quoted(String field) {
    return field.chars().anyMatch(c -> c == ',' || c == '"' || c == '\r' || c == '\n')
        ? '"' + field.replace("\"", "\"\"") + '"'
        : field;
  }
}
