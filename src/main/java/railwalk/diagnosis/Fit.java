package railwalk.diagnosis;

/**
 * How well an amplifier explains the readings: the logarithm of the density of the residuals,
 * normal with a given covariance, where a reading may instead be a slip of the hand that can be
 * anywhere. A reading is taken as a slip when that is the likelier story given all others: its
 * share is then that of a slip, and it drops out of the rest. Dropping reading i changes the
 * density by its conditional one, whose mean and variance are read off the inverse covariance P:
 * residual less z/Pᵢᵢ, variance 1/Pᵢᵢ, z = (P·r)ᵢ.
 *
 * @param logDensity natural logarithm
 * @param slips which readings are taken as slips
 * @param conditional for each reading, its residual given all the others, in deviations
 */
record Fit(double logDensity, boolean[] slips, double[] conditional) {
  /** How often a reading is a slip (common practice: one in a few hundred). */
  private static final double SLIP_SHARE = 0.003;

  /** A third slip on one sheet is a sign of something else. */
  private static final int MOST_SLIPS = 2;

  private static final double LOG_TWO_PI = Math.log(2 * Math.PI);

  /**
   * Returns the fit of {@code residual}.
   *
   * @param slipWidths over which figures a slip at each reading may spread
   */
  static Fit of(double[] residual, Covariance covariance, double[] slipWidths) {
    int n = residual.length;
    double[] z = covariance.weighted(residual);
    double chiSquare = 0;
    for (int i = 0; i < n; i++) {
      chiSquare += residual[i] * z[i];
    }
    double log =
        -0.5 * (chiSquare + covariance.logDeterminant() + n * LOG_TWO_PI)
            + n * Math.log1p(-SLIP_SHARE);
    boolean[] slips = new boolean[n];
    double[] conditional = new double[n];
    double[][] p = null;
    for (int dropped = 0; dropped < Math.min(MOST_SLIPS, n - 1); dropped++) {
      int worst = -1;
      double greatestGain = 0;
      for (int i = 0; i < n; i++) {
        double own = p == null ? covariance.precision(i, i) : p[i][i];
        if (!slips[i] && own > 0) {
          double asRead = -0.5 * (z[i] * z[i] / own + LOG_TWO_PI - Math.log(own));
          double asSlip = Math.log(SLIP_SHARE / (1 - SLIP_SHARE) / slipWidths[i]);
          if (asSlip - asRead > greatestGain) {
            greatestGain = asSlip - asRead;
            worst = i;
          }
        }
      }
      if (worst < 0) {
        break;
      }
      log += greatestGain;
      slips[worst] = true;
      p = p == null ? covariance.copyOfInverse() : p;
      drop(worst, p, z);
    }
    for (int i = 0; i < n; i++) {
      double own = p == null ? covariance.precision(i, i) : p[i][i];
      conditional[i] = slips[i] || !(own > 0) ? Double.NaN : z[i] / Math.sqrt(own);
    }
    return new Fit(log, slips, conditional);
  }

  private static void drop(int reading, double[][] p, double[] z) {
    int n = z.length;
    double own = p[reading][reading];
    double[] column = p[reading].clone();
    double gone = z[reading];
    for (int i = 0; i < n; i++) {
      double factor = column[i] / own;
      z[i] -= factor * gone;
      for (int j = 0; j < n; j++) {
        p[i][j] -= factor * column[j];
      }
    }
  }

  int slipCount() {
    int count = 0;
    for (boolean slip : slips) {
      count += slip ? 1 : 0;
    }
    return count;
  }
}
