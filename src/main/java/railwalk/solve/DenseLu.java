package railwalk.solve;

import org.jspecify.annotations.Nullable;

/** LU factors of a small full matrix, rows exchanged for the greatest pivot. */
final class DenseLu {
  private final double[][] factors;
  private final int[] rowOf;

  private DenseLu(double[][] factors, int[] rowOf) {
    this.factors = factors;
    this.rowOf = rowOf;
  }

  /** Returns the factors of {@code matrix}, which is left alone; null when it is singular. */
  static @Nullable DenseLu of(double[][] matrix) {
    int n = matrix.length;
    double[][] lu = new double[n][];
    int[] rowOf = new int[n];
    for (int i = 0; i < n; i++) {
      lu[i] = matrix[i].clone();
      rowOf[i] = i;
    }
    for (int k = 0; k < n; k++) {
      int best = k;
      for (int i = k + 1; i < n; i++) {
        if (Math.abs(lu[i][k]) > Math.abs(lu[best][k])) {
          best = i;
        }
      }
      double[] row = lu[best];
      lu[best] = lu[k];
      lu[k] = row;
      int number = rowOf[best];
      rowOf[best] = rowOf[k];
      rowOf[k] = number;
      if (!(Math.abs(row[k]) > 0) || Double.isInfinite(row[k])) {
        return null;
      }
      for (int i = k + 1; i < n; i++) {
        double factor = lu[i][k] / row[k];
        lu[i][k] = factor;
        if (factor != 0) {
          for (int j = k + 1; j < n; j++) {
            lu[i][j] -= factor * row[j];
          }
        }
      }
    }
    return new DenseLu(lu, rowOf);
  }

  /** Returns x with matrix · x = {@code b}. */
  double[] solve(double[] b) {
    int n = factors.length;
    double[] x = new double[n];
    for (int i = 0; i < n; i++) {
      double sum = b[rowOf[i]];
      for (int j = 0; j < i; j++) {
        sum -= factors[i][j] * x[j];
      }
      x[i] = sum;
    }
    for (int i = n - 1; i >= 0; i--) {
      double sum = x[i];
      for (int j = i + 1; j < n; j++) {
        sum -= factors[i][j] * x[j];
      }
      x[i] = sum / factors[i][i];
    }
    return x;
  }
}
