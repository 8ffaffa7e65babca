package railwalk.spread;

/** The normal distribution's quantiles. */
final class Normal {
  private Normal() {}

  /**
   * Returns the figure, in standard deviations, under which a share of a normal distribution lies:
   * formula 26.2.23 of M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions (1964),
   * good to 4.5e-4 of a deviation.
   */
  static double quantile(double share) {
    double tail = Math.min(share, 1 - share);
    double t = Math.sqrt(-2 * Math.log(Math.max(tail, 1e-300)));
    double top = 2.515517 + t * (0.802853 + t * 0.010328);
    double bottom = 1 + t * (1.432788 + t * (0.189269 + t * 0.001308));
    double deviations = t - top / bottom;
    return share < 0.5 ? -deviations : deviations;
  }
}
