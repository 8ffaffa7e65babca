package railwalk.solve;

import java.util.Arrays;
import java.util.List;

/**
 * The derivatives of a run through a period, carried along stage by stage through the factors of
 * the stage itself. The first columns are by the states at the start, in order; the others are what
 * the caller adds. All columns go side by side: element (row, column) of a block is at row ·
 * columns + column.
 */
final class Derivatives {
  /** Adds what the columns beyond the start states do to the equations of a stage. */
  interface Sources {
    /** Adds to {@code rightSides}, a block of unknowns by columns. */
    void addTo(double[] rightSides);
  }

  private final List<Stores.Store> stores;
  private final SparseMatrix matrix;
  private final int count;
  private final double[] state;
  private final double[] history;
  private final double[] rate;
  private final double[] unknowns;
  private final double[] means;

  Derivatives(List<Stores.Store> stores, SparseMatrix matrix, int count) {
    this.stores = stores;
    this.matrix = matrix;
    this.count = count;
    state = new double[stores.size() * count];
    history = new double[stores.size() * count];
    rate = new double[stores.size() * count];
    unknowns = new double[matrix.size() * count];
    means = new double[matrix.size() * count];
    for (int s = 0; s < Math.min(count, stores.size()); s++) {
      state[s * count + s] = 1;
    }
  }

  /**
   * Carries the derivatives through one stage that has just been solved.
   *
   * @param carried seconds of the first stage's rate that the second starts from, 0 in the first
   * @param share of the period that the stage stands for
   * @param stage its length, seconds
   * @param perStage factor on each store's size in its equation, 1 over seconds
   */
  void stage(
      int half, double carried, double share, double stage, double perStage, Sources sources) {
    for (int i = 0; i < history.length; i++) {
      history[i] = state[i] + carried * rate[i];
    }
    Arrays.fill(unknowns, 0);
    for (int s = 0; s < stores.size(); s++) {
      Stores.Store store = stores.get(s);
      double companion = store.size() * perStage;
      if (store.isChoke()) {
        addRow(store.branch(), -companion, s);
      } else {
        addRow(store.a(), companion, s);
        addRow(store.b(), -companion, s);
      }
    }
    sources.addTo(unknowns);
    matrix.lu().solveMany(unknowns, count);
    for (int i = 0; i < means.length; i++) {
      means[i] += share * unknowns[i];
    }
    for (int s = 0; s < stores.size(); s++) {
      advance(s, half, stage);
    }
  }

  private void addRow(int row, double factor, int store) {
    if (row < 0) {
      return;
    }
    int to = row * count;
    int from = store * count;
    for (int c = 0; c < count; c++) {
      unknowns[to + c] += factor * history[from + c];
    }
  }

  private void advance(int s, int half, double stage) {
    Stores.Store store = stores.get(s);
    int a = store.isChoke() ? store.branch() : store.a();
    int b = store.isChoke() ? -1 : store.b();
    int at = s * count;
    for (int c = 0; c < count; c++) {
      double present =
          (a < 0 ? 0 : unknowns[a * count + c]) - (b < 0 ? 0 : unknowns[b * count + c]);
      if (half == 0) {
        rate[at + c] = (present - history[at + c]) / stage;
      } else {
        state[at + c] = present;
      }
    }
  }

  /** Returns, by column, what it does to the states at the period's end. */
  double[][] endByColumn() {
    return split(state, stores.size());
  }

  /** Returns, by column, what it does to the mean of every unknown. */
  double[][] meansByColumn() {
    return split(means, matrix.size());
  }

  private double[][] split(double[] block, int rows) {
    double[][] byColumn = new double[count][rows];
    for (int c = 0; c < count; c++) {
      for (int r = 0; r < rows; r++) {
        byColumn[c][r] = block[r * count + c];
      }
    }
    return byColumn;
  }
}
