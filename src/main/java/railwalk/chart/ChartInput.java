package railwalk.chart;

import java.util.List;
import railwalk.source.Diagnostic;

/**
 * All that a chart is made from.
 *
 * @param fileName of the netlist
 * @param columns the netlist as it stands, then its states in their order
 * @param diagnostics what reading the netlist gave rise to, notes of assumptions included
 */
public record ChartInput(String fileName, List<Column> columns, List<Diagnostic> diagnostics) {
  public ChartInput {
    columns = List.copyOf(columns);
    diagnostics = List.copyOf(diagnostics);
    if (columns.isEmpty()) {
      throw new IllegalArgumentException("a chart needs a first column");
    }
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
