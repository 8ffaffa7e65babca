package railwalk.chart;

import java.util.List;
import railwalk.solve.OperatingPoint;
import railwalk.source.Diagnostic;

/**
 * All that a chart is made from.
 *
 * @param fileName of the netlist
 * @param columns the netlist as it stands, then its states in their order
 * @param diagnostics what reading the netlist gave rise to, notes of assumptions included
 * @param otherLines the netlist as it stands at other line volts, rising; empty when not asked for
 */
public record ChartInput(
    String fileName,
    List<Column> columns,
    List<Diagnostic> diagnostics,
    List<OperatingPoint> otherLines) {
  public ChartInput {
    columns = List.copyOf(columns);
    diagnostics = List.copyOf(diagnostics);
    otherLines = List.copyOf(otherLines);
    if (columns.isEmpty()) {
      throw new IllegalArgumentException("a chart needs a first column");
    }
  }

  /** Makes the input of a chart at one line voltage. */
  public ChartInput(String fileName, List<Column> columns, List<Diagnostic> diagnostics) {
    this(fileName, columns, diagnostics, List.of());
  }

  /** Returns the column of the netlist as it stands. */
  public Column first() {
    return columns.get(0);
  }

  /** Returns the columns of the states. */
  public List<Column> states() {
    return columns.subList(1, columns.size());
  }
}
