package railwalk.fit;

import java.util.List;
import railwalk.device.PublishedPoint;
import railwalk.device.RectifierLaw;
import railwalk.device.VapourLaw;

/**
 * The one constant of a three-halves-power diode from its published drops: the weighted mean of ln
 * K over the points and a prior, which alone decides where no figure is printed.
 */
final class PerveanceFit {
  private static final double DROP = 0.05;

  /** Rectifiers run from 17 to 60 V at 0.1 to 0.3 A; the width leaves the points alone. */
  private static final double RECTIFIER_PRIOR = 1e-3;

  /** A detector diode beside a triode passes about 1 mA at 10 V: common practice, no sheet. */
  private static final double DETECTOR_PRIOR = 3e-5;

  private static final double PRIOR_WIDTH = 3;

  /** Drop of a mercury arc: common practice. */
  private static final double USUAL_ARC_VOLTS = 15;

  private PerveanceFit() {}

  /** Returns the published drop beside the law's at the same current. */
  static Comparison compare(RectifierLaw law, PublishedPoint point) {
    double drop = Math.pow(point.published().plateAmps() / law.perveance(), 2.0 / 3);
    double tolerance = DROP / Comparer.weight(point);
    return new Comparison(point, FigureKind.DROP, point.setup().plateVolts(), drop, tolerance);
  }

  /** Returns the published drop of a mercury-vapour plate beside the law's. */
  static Comparison compare(VapourLaw law, PublishedPoint point) {
    double drop = law.volts(point.published().plateAmps());
    double tolerance = DROP / Comparer.weight(point);
    return new Comparison(point, FigureKind.DROP, point.setup().plateVolts(), drop, tolerance);
  }

  /** Returns the weighted mean of the published drops of a mercury-vapour plate, volt. */
  static double arcDrop(List<PublishedPoint> points) {
    double weights = 0;
    double sum = 0;
    for (PublishedPoint point : points) {
      double weight = Comparer.weight(point) * Comparer.weight(point);
      weights += weight;
      sum += weight * point.setup().plateVolts();
    }
    return weights == 0 ? USUAL_ARC_VOLTS : sum / weights;
  }

  /** Returns K, ampere per volt^1.5. */
  static double perveance(String word, List<PublishedPoint> points) {
    double prior = word.equals("diode") ? DETECTOR_PRIOR : RECTIFIER_PRIOR;
    double weights = 1 / (PRIOR_WIDTH * PRIOR_WIDTH);
    double sum = weights * Math.log(prior);
    for (PublishedPoint point : points) {
      double tolerance = DROP / Comparer.weight(point);
      double weight = 1 / (tolerance * tolerance);
      weights += weight;
      sum +=
          weight
              * Math.log(point.published().plateAmps() / Math.pow(point.setup().plateVolts(), 1.5));
    }
    return Math.exp(sum / weights);
  }
}
