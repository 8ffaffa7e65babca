package railwalk.fit;

import railwalk.device.PublishedPoint;

/**
 * One published figure beside what the law gives there.
 *
 * @param published in the SI unit of {@code measure}
 * @param law likewise; NaN when the law never gets there
 * @param toleranceShare standard deviation the fit allows it, as a share of the published figure;
 *     infinite for a figure that is shown but not fitted
 */
public record Comparison(
    PublishedPoint point, Measure measure, double published, double law, double toleranceShare) {

  /** Returns how far the law is off, as a share of the published figure: 0.02 is 2 % too much. */
  public double errorShare() {
    return law / published - 1;
  }
}
