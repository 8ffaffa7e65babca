package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.solve.OperatingPoint;

/**
 * Tells which explanations no reading would tell apart: at every readable point what they show
 * differs by less than one deviation, meter and part spreads combined.
 */
final class Groups {
  private static final double APART = 1;

  private final Amplifier amplifier;
  private final Predictor predictor;
  private final double[] deviations;
  private final List<double[]> leaders = new ArrayList<>();

  /**
   * @param amplifier solved as its netlist stands
   * @param points every readable point
   */
  Groups(Amplifier amplifier, List<Probe> points) {
    this.amplifier = amplifier;
    predictor = new Predictor(amplifier, points);
    Prediction healthy = predictor.predict(amplifier.healthy());
    double[] limits = predictor.meterLimits(healthy.values());
    deviations = new double[limits.length];
    for (int i = 0; i < deviations.length; i++) {
      double variance = limits[i] * limits[i] / 3 + healthy.sharedVariance(i);
      deviations[i] = Math.sqrt(variance);
    }
  }

  /** Returns the number, from 1, of the group that {@code explanation} belongs to or begins. */
  int of(Explanation explanation) {
    double[] shown = {};
    if (explanation.kind() != Suspect.Kind.NOT_THIS_AMPLIFIER) {
      Optional<Map<String, OperatingPoint>> points =
          amplifier.with(explanation.faults(), explanation.severities());
      shown = points.isPresent() ? predictor.values(points.get()) : shown;
    }
    for (int g = 0; g < leaders.size(); g++) {
      if (shown.length > 0 && leaders.get(g).length > 0 && isLike(shown, leaders.get(g))) {
        return g + 1;
      }
    }
    leaders.add(shown);
    return leaders.size();
  }

  private boolean isLike(double[] one, double[] other) {
    for (int i = 0; i < one.length; i++) {
      if (!(Math.abs(one[i] - other[i]) < APART * deviations[i])) {
        return false;
      }
    }
    return true;
  }
}
