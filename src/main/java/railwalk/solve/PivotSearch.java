package railwalk.solve;

/**
 * One numeric elimination on a dense copy of a sparse matrix, to learn a good pivot order and the
 * entries that fill in. Part of {@link SparseLu}; run once per topology.
 */
final class PivotSearch {
  private final int size;
  private final double[][] value;
  private final boolean[][] filled;
  private final boolean[] rowDone;
  private final boolean[] columnDone;
  private final int[] rowCount;
  private final int[] columnCount;
  private final int[] rowOf;
  private final int[] columnOf;
  private final double threshold;

  PivotSearch(int size, int[] entryRow, int[] entryColumn, double[] values, double threshold) {
    this.size = size;
    this.threshold = threshold;
    value = new double[size][size];
    filled = new boolean[size][size];
    rowDone = new boolean[size];
    columnDone = new boolean[size];
    rowCount = new int[size];
    columnCount = new int[size];
    rowOf = new int[size];
    columnOf = new int[size];
    for (int e = 0; e < entryRow.length; e++) {
      value[entryRow[e]][entryColumn[e]] = values[e + 1];
      filled[entryRow[e]][entryColumn[e]] = true;
      rowCount[entryRow[e]]++;
      columnCount[entryColumn[e]]++;
    }
  }

  /** Returns false when no usable pivot is left: the matrix is singular. */
  boolean run() {
    for (int k = 0; k < size; k++) {
      if (!choose(k)) {
        return false;
      }
      eliminate(rowOf[k], columnOf[k]);
    }
    return true;
  }

  int[] rowOf() {
    return rowOf;
  }

  int[] columnOf() {
    return columnOf;
  }

  /** Returns whether an entry is in the pattern, fill included. */
  boolean filled(int row, int column) {
    return filled[row][column];
  }

  private boolean choose(int k) {
    long bestCost = Long.MAX_VALUE;
    double bestSize = 0;
    for (int column = 0; column < size; column++) {
      if (columnDone[column]) {
        continue;
      }
      double greatest = 0;
      for (int row = 0; row < size; row++) {
        if (!rowDone[row]) {
          greatest = Math.max(greatest, Math.abs(value[row][column]));
        }
      }
      if (!(greatest > 0) || Double.isInfinite(greatest)) {
        return false;
      }
      for (int row = 0; row < size; row++) {
        if (rowDone[row] || !filled[row][column]) {
          continue;
        }
        double magnitude = Math.abs(value[row][column]);
        if (magnitude < threshold * greatest || magnitude == 0) {
          continue;
        }
        long cost = (long) (rowCount[row] - 1) * (columnCount[column] - 1);
        double relative = magnitude / greatest;
        if (cost < bestCost || (cost == bestCost && relative > bestSize)) {
          bestCost = cost;
          bestSize = relative;
          rowOf[k] = row;
          columnOf[k] = column;
        }
      }
    }
    return bestCost < Long.MAX_VALUE;
  }

  private void eliminate(int pivotRow, int pivotColumn) {
    rowDone[pivotRow] = true;
    columnDone[pivotColumn] = true;
    double pivot = value[pivotRow][pivotColumn];
    for (int column = 0; column < size; column++) {
      if (filled[pivotRow][column]) {
        columnCount[column]--;
      }
    }
    for (int row = 0; row < size; row++) {
      if (rowDone[row] || !filled[row][pivotColumn]) {
        continue;
      }
      rowCount[row]--;
      double factor = value[row][pivotColumn] / pivot;
      for (int column = 0; column < size; column++) {
        if (columnDone[column] || !filled[pivotRow][column]) {
          continue;
        }
        value[row][column] -= factor * value[pivotRow][column];
        if (!filled[row][column]) {
          filled[row][column] = true;
          rowCount[row]++;
          columnCount[column]++;
        }
      }
    }
  }
}
