package railwalk.diagnosis;

/**
 * What an amplifier reads at some places, and how that goes from build to build.
 *
 * @param values one for each place: what the meter reads, volt, ohm or ampere; NaN where nothing
 *     can be said
 * @param shifts of these, what comes of the spread's middle lying off the nominal parts
 * @param rows for each place, its change for one deviation of each spread factor
 * @param ownSpread for each place, a deviation of its own that no factor explains
 */
record Prediction(double[] values, double[] shifts, double[][] rows, double[] ownSpread) {
  /** Returns the variance of a place that the spread factors explain. */
  double sharedVariance(int place) {
    double variance = 0;
    for (double deviation : rows[place]) {
      variance += deviation * deviation;
    }
    return variance;
  }
}
