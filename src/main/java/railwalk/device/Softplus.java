package railwalk.device;

/**
 * {@code ln(1 + exp(x))} and its slope without overflow and without loss of digits for very
 * negative x. The caller hands in {@code tail = exp(−|x|)}, so that both share one exponential.
 */
final class Softplus {
  private Softplus() {}

  /** Returns {@code ln(1 + exp(x))}. */
  static double value(double x, double tail) {
    // ln(1 + t) by the correction t / ((1 + t) − 1) for what rounding took from 1 + t
    // (D. Goldberg, ACM Computing Surveys 23/1, 1991, theorem 4); faster than Math.log1p.
    double sum = 1 + tail;
    double rounded = sum - 1;
    double log = rounded == 0 ? tail : Math.log(sum) * (tail / rounded);
    return x > 0 ? x + log : log;
  }

  /** Returns {@code 1 / (1 + exp(−x))}. */
  static double slope(double x, double tail) {
    return x > 0 ? 1 / (1 + tail) : tail / (1 + tail);
  }
}
