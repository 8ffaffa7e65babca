package railwalk.diagnosis;

/**
 * How bad a fault may be: a figure that is log-uniform between two limits before anything was read.
 *
 * @param low least figure; equal to {@code high} where there is nothing to estimate
 * @param unit "Ω", "A", "V", or empty for a share
 */
public record Range(double low, double high, String unit) {
  /** A fault that is there or is not. */
  public static final Range NONE = new Range(1, 1, "");

  /** Figures tried for each factor e of the range. */
  private static final double PER_FACTOR_E = 1.2;

  /** Returns whether there is a figure to estimate. */
  public boolean open() {
    return high > low;
  }

  /** Returns the figures at which the fault is solved; one where there is nothing to estimate. */
  double[] grid() {
    if (!open()) {
      return new double[] {low};
    }
    double span = Math.log(high / low);
    int steps = (int) Math.ceil(Math.max(2, span * PER_FACTOR_E));
    double[] figures = new double[steps + 1];
    for (int i = 0; i <= steps; i++) {
      figures[i] = low * Math.exp(span * i / steps);
    }
    return figures;
  }
}
