package railwalk.solve;

import railwalk.device.TwoPoleCurrent;

/**
 * The rectifying paths of one stage, by Newton's method: each path linearised where the stage
 * before left it, the linear parts between them known by their {@link StageResponse}. With slopes s
 * beyond the conductance that stands in the linear parts, and currents c + s·v, path volts v follow
 * from (1 − Z·s)·v = v₀ + Z·c.
 */
final class PathEquations {
  /** A stage is settled when no path's current is further than this from its straight line. */
  private static final double SETTLED_AMPS = 2e-10;

  private static final int MOST_ITERATIONS = 80;

  /** Slopes that differ by less than this share one factorisation. */
  private static final double SAME_SIEMENS = 1e-11;

  private final CycleNetwork net;
  private final StageResponse response;
  private final int paths;
  private final double[] slopes;
  private final double[] factoredSlopes;
  private final double[] open;
  private final double[] right;
  private final double[] solved;
  private final double[] factors;
  private final int[] rowOf;
  private final TwoPoleCurrent current = new TwoPoleCurrent();
  private boolean factored;
  final double[] amps;
  final double[] volts;

  PathEquations(CycleNetwork net, StageResponse response) {
    this.net = net;
    this.response = response;
    paths = net.paths.size();
    slopes = new double[paths];
    factoredSlopes = new double[paths];
    open = new double[paths];
    right = new double[paths];
    solved = new double[paths];
    factors = new double[paths * paths];
    rowOf = new int[paths];
    amps = new double[paths];
    volts = new double[paths];
  }

  /** Forgets the factors, since the linear parts may have changed. */
  void begin() {
    factored = false;
  }

  /** Returns the slopes that the last stage was solved with, siemens. */
  double[] slopes() {
    return factoredSlopes;
  }

  /** Solves a stage and puts the paths' currents into {@code inputs}; false when none settles. */
  boolean settle(double[] inputs) {
    int first = response.firstPath;
    for (int p = 0; p < paths; p++) {
      double[] by = response.pathVoltsBy[p];
      double sum = 0;
      for (int i = 0; i < first; i++) {
        sum += by[i] * inputs[i];
      }
      open[p] = sum;
    }
    for (int iteration = 0; iteration < MOST_ITERATIONS; iteration++) {
      boolean sameSlopes = factored;
      for (int p = 0; p < paths; p++) {
        sameSlopes &= Math.abs(slopes[p] - factoredSlopes[p]) <= SAME_SIEMENS;
      }
      if (!sameSlopes && !factor()) {
        return false;
      }
      for (int p = 0; p < paths; p++) {
        double sum = open[p];
        for (int q = 0; q < paths; q++) {
          sum += response.pathVoltsBy[p][first + q] * (amps[q] - slopes[q] * volts[q]);
        }
        right[p] = sum;
      }
      solve();
      for (int p = 0; p < paths; p++) {
        inputs[first + p] =
            amps[p] + slopes[p] * (solved[p] - volts[p]) - StageResponse.PATH_SIEMENS * solved[p];
      }
      if (linearise() < SETTLED_AMPS) {
        return true;
      }
    }
    return false;
  }

  /**
   * Evaluates every path where it stands; returns the greatest difference between the current of
   * its law and that of the straight line that the stage was solved with.
   */
  private double linearise() {
    double difference = 0;
    for (int p = 0; p < paths; p++) {
      net.paths.get(p).law().evaluate(solved[p], current);
      double straight = amps[p] + slopes[p] * (solved[p] - volts[p]);
      difference = Math.max(difference, Math.abs(current.amps - straight));
      volts[p] = solved[p];
      amps[p] = current.amps;
      slopes[p] = current.siemens;
    }
    return difference;
  }

  /** Returns the slope of a path's current in the inputs, as the last stage was solved with it. */
  double slopeBeyond(int path) {
    return factoredSlopes[path] - StageResponse.PATH_SIEMENS;
  }

  private boolean factor() {
    for (int q = 0; q < paths; q++) {
      factoredSlopes[q] = slopes[q];
      rowOf[q] = q;
    }
    for (int p = 0; p < paths; p++) {
      for (int q = 0; q < paths; q++) {
        double z = response.pathVoltsBy[p][response.firstPath + q];
        factors[p * paths + q] = (p == q ? 1 : 0) - z * slopeBeyond(q);
      }
    }
    for (int k = 0; k < paths; k++) {
      int best = k;
      for (int i = k + 1; i < paths; i++) {
        if (Math.abs(factors[i * paths + k]) > Math.abs(factors[best * paths + k])) {
          best = i;
        }
      }
      exchange(k, best);
      double pivot = factors[k * paths + k];
      if (!(Math.abs(pivot) > 0) || Double.isInfinite(pivot)) {
        factored = false;
        return false;
      }
      for (int i = k + 1; i < paths; i++) {
        double factor = factors[i * paths + k] / pivot;
        factors[i * paths + k] = factor;
        for (int j = k + 1; j < paths; j++) {
          factors[i * paths + j] -= factor * factors[k * paths + j];
        }
      }
    }
    factored = true;
    return true;
  }

  private void exchange(int a, int b) {
    if (a == b) {
      return;
    }
    for (int j = 0; j < paths; j++) {
      double value = factors[a * paths + j];
      factors[a * paths + j] = factors[b * paths + j];
      factors[b * paths + j] = value;
    }
    int row = rowOf[a];
    rowOf[a] = rowOf[b];
    rowOf[b] = row;
  }

  private void solve() {
    for (int i = 0; i < paths; i++) {
      double sum = right[rowOf[i]];
      for (int j = 0; j < i; j++) {
        sum -= factors[i * paths + j] * solved[j];
      }
      solved[i] = sum;
    }
    for (int i = paths - 1; i >= 0; i--) {
      double sum = solved[i];
      for (int j = i + 1; j < paths; j++) {
        sum -= factors[i * paths + j] * solved[j];
      }
      solved[i] = sum / factors[i * paths + i];
    }
  }

  /** Solves the last stage's equations for rows of right-hand sides side by side. */
  void solveMany(double[][] rights, double[][] results) {
    for (int i = 0; i < paths; i++) {
      System.arraycopy(rights[rowOf[i]], 0, results[i], 0, results[i].length);
      for (int j = 0; j < i; j++) {
        addRow(results[i], -factors[i * paths + j], results[j]);
      }
    }
    for (int i = paths - 1; i >= 0; i--) {
      for (int j = i + 1; j < paths; j++) {
        addRow(results[i], -factors[i * paths + j], results[j]);
      }
      double inverse = 1 / factors[i * paths + i];
      double[] row = results[i];
      for (int c = 0; c < row.length; c++) {
        row[c] *= inverse;
      }
    }
  }

  /** Adds {@code factor} times a row to another. */
  static void addRow(double[] target, double factor, double[] source) {
    for (int c = 0; c < target.length; c++) {
      target[c] += factor * source[c];
    }
  }
}
