package railwalk.readings;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;

/**
 * One line of a sheet as cells; more than one line where a cell in quotes goes over its end.
 *
 * @param cells at least one
 * @param flaw why it cannot be cut into cells; null when it can
 */
record SheetRow(List<Cell> cells, @Nullable Diagnostic flaw) {
  SheetRow {
    cells = List.copyOf(cells);
  }

  /** Returns the cell at {@code index}; an empty one at the row's end past the last. */
  Cell cell(int index) {
    return index >= 0 && index < cells.size() ? cells.get(index) : new Cell("", false, end());
  }

  /** Returns whether nothing is written in any cell. */
  boolean isEmpty() {
    return cells.stream().allMatch(Cell::isEmpty);
  }

  private SourceSpan end() {
    SourceSpan last = cells.get(cells.size() - 1).span();
    return new SourceSpan(last.text(), last.line(), last.column() + last.length(), 1);
  }
}
