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
    PublishedPoint point, FigureKind measure, double published, double law, double toleranceShare) {

  /** Returns how far the law is off, as a share of the published figure: 0.02 is 2 % too much. */
  public double errorShare() {
    return law / published - 1;
  }

  /** Returns the point in a few words: "250 V, screen 250 V, cathode 135 Ω". */
  public String pointWords() {
    return PointWords.of(point);
  }

  /** Returns the published figure with its unit. */
  public String publishedWords() {
    return PointWords.figure(published, measure);
  }

  /** Returns what the law gives, with its unit. */
  public String lawWords() {
    return PointWords.figure(law, measure);
  }

  /** Returns how far the law is off, in per cent with a sign. */
  public String errorWords() {
    return PointWords.percent(errorShare());
  }
}
