package railwalk.readings;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.source.Diagnostic;

/** Which cell of a row is which. */
final class Columns {
  private final Map<Column, Integer> places;
  private final int count;

  private Columns(Map<Column, Integer> places, int count) {
    this.places = places;
    this.count = count;
  }

  /** Returns the columns of a sheet without a header: point, volts, kind, state, range, note. */
  static Columns usual() {
    Map<Column, Integer> places = new EnumMap<>(Column.class);
    for (Column column : Column.values()) {
      places.put(column, places.size());
    }
    return new Columns(places, places.size());
  }

  /** Returns whether {@code row} names at least the columns of points and of volts. */
  static boolean isHeader(SheetRow row) {
    return names(row, Column.POINT) && names(row, Column.VOLTS);
  }

  /**
   * Returns the column that a row lacks which is otherwise a header: no figure in it, and point or
   * volts among its words.
   */
  static Optional<Column> lacking(SheetRow row) {
    boolean figures = row.cells().stream().anyMatch(cell -> FigureReader.isFigure(cell.text()));
    boolean point = says(row, Column.POINT);
    boolean volts = says(row, Column.VOLTS);
    if (figures || row.cells().size() < 2 || point == volts) {
      return Optional.empty();
    }
    return Optional.of(point ? Column.VOLTS : Column.POINT);
  }

  /** Returns the columns of a header; {@code said} takes what is to be said of it. */
  static Columns of(SheetRow header, List<Diagnostic> said) {
    Map<Column, Integer> places = new EnumMap<>(Column.class);
    List<Cell> passedOver = new ArrayList<>();
    for (int i = 0; i < header.cells().size(); i++) {
      Cell cell = header.cells().get(i);
      Optional<Column> column = Column.named(cell.text());
      if (column.isEmpty()) {
        if (!cell.isEmpty()) {
          passedOver.add(cell);
        }
      } else if (places.putIfAbsent(column.get(), i) != null) {
        said.add(SheetProblem.COLUMN_TWICE.at(cell.span(), column.get().word()));
      }
    }
    if (!passedOver.isEmpty()) {
      String names = String.join(", ", passedOver.stream().map(Cell::text).toList());
      said.add(SheetProblem.COLUMNS_PASSED_OVER.at(passedOver.get(0).span(), names));
    }
    return new Columns(places, header.cells().size());
  }

  /** Returns the cell of {@code row} in {@code column}; an empty one where there is none. */
  Cell cell(SheetRow row, Column column) {
    return row.cell(places.getOrDefault(column, -1));
  }

  /** Returns the cell right of the volts unless it is a point's or a range's. */
  Optional<Cell> besideVolts(SheetRow row) {
    int beside = places.getOrDefault(Column.VOLTS, -1) + 1;
    boolean mayBeFigure =
        places.getOrDefault(Column.POINT, -1) == beside
            || places.getOrDefault(Column.RANGE, -1) == beside;
    return mayBeFigure ? Optional.empty() : Optional.of(row.cell(beside));
  }

  /** Returns the written cells right of the volts. */
  List<Cell> rightOfVolts(SheetRow row) {
    int volts = places.getOrDefault(Column.VOLTS, -1);
    List<Cell> right = new ArrayList<>();
    for (int i = volts + 1; i < row.cells().size(); i++) {
      if (!row.cell(i).isEmpty()) {
        right.add(row.cell(i));
      }
    }
    return right;
  }

  /** Returns the written cells beyond the last column. */
  List<Cell> beyond(SheetRow row) {
    List<Cell> beyond = new ArrayList<>();
    for (int i = count; i < row.cells().size(); i++) {
      if (!row.cell(i).isEmpty()) {
        beyond.add(row.cell(i));
      }
    }
    return beyond;
  }

  /** Returns whether notes stand in the last column, so that a separator may be part of one. */
  boolean endWithNotes() {
    return places.getOrDefault(Column.NOTE, -1) == count - 1;
  }

  private static boolean names(SheetRow row, Column column) {
    return row.cells().stream().anyMatch(c -> Column.named(c.text()).equals(Optional.of(column)));
  }

  private static boolean says(SheetRow row, Column column) {
    return row.cells().stream().anyMatch(cell -> cell.text().equalsIgnoreCase(column.word()));
  }
}
