package railwalk.diagnosis;

/**
 * The covariance of some readings, inverted: F · Fᵀ + diag(v), F the rows of the spread factors, v
 * the variances that each reading has for itself.
 */
final class Covariance {
  private final double[][] inverse;
  private final double logDeterminant;

  private Covariance(double[][] inverse, double logDeterminant) {
    this.inverse = inverse;
    this.logDeterminant = logDeterminant;
  }

  /** Returns F · Fᵀ. */
  static double[][] shared(double[][] rows) {
    int n = rows.length;
    double[][] product = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = 0;
        for (int f = 0; f < rows[i].length; f++) {
          sum += rows[i][f] * rows[j][f];
        }
        product[i][j] = sum;
        product[j][i] = sum;
      }
    }
    return product;
  }

  /**
   * Returns the covariance with {@code own} variances on the diagonal, each above zero, inverted by
   * Cholesky's method.
   */
  static Covariance of(double[][] shared, double[] own) {
    int n = own.length;
    double[][] lower = new double[n][n];
    double logDeterminant = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = shared[i][j] + (i == j ? own[i] : 0);
        for (int k = 0; k < j; k++) {
          sum -= lower[i][k] * lower[j][k];
        }
        if (i == j) {
          lower[i][i] = Math.sqrt(Math.max(sum, 1e-12 * own[i]));
          logDeterminant += 2 * Math.log(lower[i][i]);
        } else {
          lower[i][j] = sum / lower[j][j];
        }
      }
    }
    double[][] invertedLower = new double[n][n];
    for (int c = 0; c < n; c++) {
      invertedLower[c][c] = 1 / lower[c][c];
      for (int r = c + 1; r < n; r++) {
        double sum = 0;
        for (int k = c; k < r; k++) {
          sum -= lower[r][k] * invertedLower[k][c];
        }
        invertedLower[r][c] = sum / lower[r][r];
      }
    }
    double[][] inverse = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = 0;
        for (int k = i; k < n; k++) {
          sum += invertedLower[k][i] * invertedLower[k][j];
        }
        inverse[i][j] = sum;
        inverse[j][i] = sum;
      }
    }
    return new Covariance(inverse, logDeterminant);
  }

  int size() {
    return inverse.length;
  }

  /** Returns the inverse's entry. */
  double precision(int i, int j) {
    return inverse[i][j];
  }

  /** Returns the inverse times {@code residual}. */
  double[] weighted(double[] residual) {
    double[] product = new double[residual.length];
    for (int i = 0; i < product.length; i++) {
      double sum = 0;
      for (int j = 0; j < product.length; j++) {
        sum += inverse[i][j] * residual[j];
      }
      product[i] = sum;
    }
    return product;
  }

  double logDeterminant() {
    return logDeterminant;
  }

  /** Returns a copy of the inverse that may be changed. */
  double[][] copyOfInverse() {
    double[][] copy = new double[inverse.length][];
    for (int i = 0; i < copy.length; i++) {
      copy[i] = inverse[i].clone();
    }
    return copy;
  }
}
