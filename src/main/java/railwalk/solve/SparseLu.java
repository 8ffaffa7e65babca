package railwalk.solve;

import java.util.Arrays;

/**
 * LU factors of a sparse matrix whose pattern never changes: the pivot order and every
 * multiply-and-subtract of the elimination are found once and then replayed on new values.
 *
 * <p>The order is Markowitz's (fewest possible fill-ins, (r−1)(c−1)) among entries of sufficient
 * size in their column (threshold pivoting): H. M. Markowitz, "The elimination form of the
 * inverse", Management Science 3 (1957); Duff, Erisman, Reid, "Direct Methods for Sparse Matrices"
 * (1986), ch. 5 and 7. A replay that meets a pivot too small for its column says so, and the caller
 * has the order found again from the values at hand.
 */
final class SparseLu {
  /** A pivot must be at least this part of the greatest entry left in its column. */
  private static final double THRESHOLD = 1e-3;

  /** On replay a pivot below this part of the column's original size is refused. */
  private static final double REPLAY_LIMIT = 1e-13;

  private final int size;
  private final int[] entryRow;
  private final int[] entryColumn;

  private int[] entrySlot = new int[0];
  private int[] rowOf = new int[0];
  private int[] columnOf = new int[0];
  private int[] pivotSlot = new int[0];
  private int[] lowerStart = new int[0];
  private int[] lowerSlot = new int[0];
  private int[] lowerRow = new int[0];
  private int[] upperStart = new int[0];
  private int[] upperSlot = new int[0];
  private int[] upperColumn = new int[0];
  private int[] updateSlot = new int[0];
  private double[] slots = new double[0];
  private double[] columnScale = new double[0];
  private double[] work = new double[0];
  private double[] manyWork = new double[0];

  /**
   * @param size order of the matrix
   * @param entryRow row of each entry; no pair of row and column twice
   * @param entryColumn column of each entry
   */
  SparseLu(int size, int[] entryRow, int[] entryColumn) {
    this.size = size;
    this.entryRow = entryRow.clone();
    this.entryColumn = entryColumn.clone();
  }

  /** Returns whether {@code values} (entry e at e + 1) could be factored, ordering if need be. */
  boolean factor(double[] values) {
    if (pivotSlot.length == size && size > 0 && replay(values)) {
      return true;
    }
    return size == 0 || (order(values) && replay(values));
  }

  /** Solves A·x = b; {@code b} and {@code x} may be the same array. */
  void solve(double[] b, double[] x) {
    double[] y = work;
    for (int k = 0; k < size; k++) {
      y[k] = b[rowOf[k]];
    }
    for (int k = 0; k < size; k++) {
      double yk = y[k];
      if (yk != 0) {
        for (int i = lowerStart[k]; i < lowerStart[k + 1]; i++) {
          y[lowerRow[i]] -= slots[lowerSlot[i]] * yk;
        }
      }
    }
    for (int k = size - 1; k >= 0; k--) {
      double sum = y[k];
      for (int i = upperStart[k]; i < upperStart[k + 1]; i++) {
        sum -= slots[upperSlot[i]] * y[upperColumn[i]];
      }
      y[k] = sum / slots[pivotSlot[k]];
    }
    for (int k = 0; k < size; k++) {
      x[columnOf[k]] = y[k];
    }
  }

  /**
   * Solves A·X = B in place for {@code count} right-hand sides at once; {@code b} holds them row by
   * row: element (row, k) at row · count + k.
   */
  void solveMany(double[] b, int count) {
    if (manyWork.length < size * count) {
      manyWork = new double[size * count];
    }
    double[] y = manyWork;
    for (int k = 0; k < size; k++) {
      System.arraycopy(b, rowOf[k] * count, y, k * count, count);
    }
    for (int k = 0; k < size; k++) {
      for (int i = lowerStart[k]; i < lowerStart[k + 1]; i++) {
        subtract(y, lowerRow[i] * count, slots[lowerSlot[i]], k * count, count);
      }
    }
    for (int k = size - 1; k >= 0; k--) {
      for (int i = upperStart[k]; i < upperStart[k + 1]; i++) {
        subtract(y, k * count, slots[upperSlot[i]], upperColumn[i] * count, count);
      }
      double inverse = 1 / slots[pivotSlot[k]];
      int at = k * count;
      for (int c = 0; c < count; c++) {
        y[at + c] *= inverse;
      }
    }
    for (int k = 0; k < size; k++) {
      System.arraycopy(y, k * count, b, columnOf[k] * count, count);
    }
  }

  private static void subtract(double[] y, int target, double factor, int source, int count) {
    for (int c = 0; c < count; c++) {
      y[target + c] -= factor * y[source + c];
    }
  }

  /** Solves Aᵀ·x = b, the adjoint system; {@code b} and {@code x} may be the same array. */
  void solveTransposed(double[] b, double[] x) {
    double[] y = work;
    for (int k = 0; k < size; k++) {
      y[k] = b[columnOf[k]];
    }
    for (int k = 0; k < size; k++) {
      double yk = y[k] / slots[pivotSlot[k]];
      y[k] = yk;
      if (yk != 0) {
        for (int i = upperStart[k]; i < upperStart[k + 1]; i++) {
          y[upperColumn[i]] -= slots[upperSlot[i]] * yk;
        }
      }
    }
    for (int k = size - 1; k >= 0; k--) {
      double sum = y[k];
      for (int i = lowerStart[k]; i < lowerStart[k + 1]; i++) {
        sum -= slots[lowerSlot[i]] * y[lowerRow[i]];
      }
      y[k] = sum;
    }
    for (int k = 0; k < size; k++) {
      x[rowOf[k]] = y[k];
    }
  }

  private boolean replay(double[] values) {
    Arrays.fill(slots, 0);
    Arrays.fill(columnScale, 0);
    for (int e = 0; e < entrySlot.length; e++) {
      double value = values[e + 1];
      slots[entrySlot[e]] = value;
      int column = entryColumn[e];
      double magnitude = Math.abs(value);
      if (magnitude > columnScale[column]) {
        columnScale[column] = magnitude;
      }
    }
    int update = 0;
    for (int k = 0; k < size; k++) {
      double pivot = slots[pivotSlot[k]];
      if (!(Math.abs(pivot) > REPLAY_LIMIT * columnScale[columnOf[k]])) {
        return false;
      }
      double inverse = 1 / pivot;
      int upperFrom = upperStart[k];
      int upperTo = upperStart[k + 1];
      for (int i = lowerStart[k]; i < lowerStart[k + 1]; i++) {
        double factor = slots[lowerSlot[i]] * inverse;
        slots[lowerSlot[i]] = factor;
        for (int j = upperFrom; j < upperTo; j++) {
          slots[updateSlot[update++]] -= factor * slots[upperSlot[j]];
        }
      }
    }
    return true;
  }

  /** Finds pivot order and fill from {@code values}, eliminating them on a dense copy. */
  private boolean order(double[] values) {
    PivotSearch search = new PivotSearch(size, entryRow, entryColumn, values, THRESHOLD);
    if (!search.run()) {
      pivotSlot = new int[0];
      return false;
    }
    rowOf = search.rowOf();
    columnOf = search.columnOf();
    int[] rowPosition = inverse(rowOf);
    int[] columnPosition = inverse(columnOf);
    int[][] slotAt = new int[size][size];
    int slotCount = 0;
    for (int[] row : slotAt) {
      Arrays.fill(row, -1);
    }
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        if (search.filled(rowOf[i], columnOf[j])) {
          slotAt[i][j] = slotCount++;
        }
      }
    }
    slots = new double[slotCount];
    columnScale = new double[size];
    work = new double[size];
    entrySlot = new int[entryRow.length];
    for (int e = 0; e < entryRow.length; e++) {
      entrySlot[e] = slotAt[rowPosition[entryRow[e]]][columnPosition[entryColumn[e]]];
    }
    compile(slotAt);
    return true;
  }

  private void compile(int[][] slotAt) {
    pivotSlot = new int[size];
    lowerStart = new int[size + 1];
    upperStart = new int[size + 1];
    IntList lowerSlots = new IntList();
    IntList lowerRows = new IntList();
    IntList upperSlots = new IntList();
    IntList upperColumns = new IntList();
    IntList updates = new IntList();
    for (int k = 0; k < size; k++) {
      pivotSlot[k] = slotAt[k][k];
      lowerStart[k] = lowerSlots.size();
      upperStart[k] = upperSlots.size();
      for (int j = k + 1; j < size; j++) {
        if (slotAt[k][j] >= 0) {
          upperSlots.add(slotAt[k][j]);
          upperColumns.add(j);
        }
      }
      for (int i = k + 1; i < size; i++) {
        if (slotAt[i][k] >= 0) {
          lowerSlots.add(slotAt[i][k]);
          lowerRows.add(i);
          for (int u = upperStart[k]; u < upperSlots.size(); u++) {
            updates.add(slotAt[i][upperColumns.get(u)]);
          }
        }
      }
    }
    lowerStart[size] = lowerSlots.size();
    upperStart[size] = upperSlots.size();
    lowerSlot = lowerSlots.toArray();
    lowerRow = lowerRows.toArray();
    upperSlot = upperSlots.toArray();
    upperColumn = upperColumns.toArray();
    updateSlot = updates.toArray();
  }

  private static int[] inverse(int[] permutation) {
    int[] inverse = new int[permutation.length];
    for (int i = 0; i < permutation.length; i++) {
      inverse[permutation[i]] = i;
    }
    return inverse;
  }
}
