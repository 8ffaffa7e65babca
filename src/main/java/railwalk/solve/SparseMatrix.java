package railwalk.solve;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;

/**
 * A sparse matrix of fixed pattern, made from the shape of {@link Stamps}. Values live in plain
 * arrays beside it, so that several value sets can share one pattern: place 0 is written but never
 * read (entries of the reference node), place p + 1 belongs to the p-th entry of the pattern.
 */
final class SparseMatrix {
  private final int size;
  private final int[] placeOf;
  private final int[] stampedRows;
  private final int[] stampedColumns;
  private final int[] rows;
  private final int[] columns;
  private final SparseLu lu;

  SparseMatrix(Stamps stamps) {
    size = stamps.size();
    placeOf = new int[stamps.count()];
    stampedRows = new int[placeOf.length];
    stampedColumns = new int[placeOf.length];
    IntList patternRows = new IntList();
    IntList patternColumns = new IntList();
    Map<Long, Integer> places = new HashMap<>();
    for (int number = 0; number < stamps.count(); number++) {
      int row = stamps.row(number);
      int column = stamps.column(number);
      stampedRows[number] = row;
      stampedColumns[number] = column;
      if (row < 0 || column < 0) {
        continue;
      }
      long key = (long) row * size + column;
      Integer place = places.get(key);
      if (place == null) {
        patternRows.add(row);
        patternColumns.add(column);
        place = patternRows.size();
        places.put(key, place);
      }
      placeOf[number] = place;
    }
    rows = patternRows.toArray();
    columns = patternColumns.toArray();
    lu = new SparseLu(size, rows, columns);
  }

  int size() {
    return size;
  }

  SparseLu lu() {
    return lu;
  }

  /** Returns the place of the entry that {@link Stamps#entry} gave {@code number}. */
  int place(int number) {
    return placeOf[number];
  }

  /** Returns the places of {@code count} entries from number {@code first} on. */
  int[] places(int first, int count) {
    int[] places = new int[count];
    for (int i = 0; i < count; i++) {
      places[i] = place(first + i);
    }
    return places;
  }

  /** Returns a zeroed value array. */
  double[] newValues() {
    return new double[rows.length + 1];
  }

  /** Returns whether {@code stamps} have the shape that this pattern was made from. */
  boolean fits(Stamps stamps) {
    boolean fits = stamps.count() == placeOf.length && stamps.size() == size;
    for (int number = 0; fits && number < placeOf.length; number++) {
      fits =
          stamps.row(number) == stampedRows[number]
              && stamps.column(number) == stampedColumns[number];
    }
    return fits;
  }

  /** Fills {@code values} with the sums of {@code stamps}, which must have the pattern's shape. */
  void load(Stamps stamps, double[] values) {
    Arrays.fill(values, 0);
    for (int number = 0; number < placeOf.length; number++) {
      values[placeOf[number]] += stamps.value(number);
    }
  }

  /** Adds the matrix of {@code values} times {@code x} to {@code result}. */
  void addProduct(double[] values, double[] x, double[] result) {
    for (int e = 0; e < rows.length; e++) {
      result[rows[e]] += values[e + 1] * x[columns[e]];
    }
  }
}
