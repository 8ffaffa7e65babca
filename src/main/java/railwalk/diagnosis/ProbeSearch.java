package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.readings.ReadingKind;
import railwalk.solve.OperatingPoint;

/**
 * Finds the unread place that would settle most: the expected drop of the entropy over the groups
 * of suspects, each reading taken as normal about what the suspect shows there, given the readings
 * already taken. Cost and risk count: what is measured with the power off comes first when equal.
 */
final class ProbeSearch {
  /** Places of three-point Gauss–Hermite quadrature, and their weights. */
  private static final double[] NODES = {-Math.sqrt(3), 0, Math.sqrt(3)};

  private static final double[] WEIGHTS = {1 / 6.0, 4 / 6.0, 1 / 6.0};

  /** First-order spreads and a severity's own uncertainty, as a share of what a fault changes. */
  private static final double CHANGE_ERROR = 0.08;

  private static final double LEAST_GAIN_BITS = 0.03;
  private static final double LEAST_WEIGHT = 1e-3;

  private final Amplifier amplifier;
  private final List<Probe> read;
  private final double[] figures;
  private final List<Probe> places;
  private final Predictor predictor;

  /**
   * @param amplifier solved in the states that {@code read} and {@code places} need
   * @param read what was read
   * @param figures what it read
   * @param places where might be read next
   */
  ProbeSearch(Amplifier amplifier, List<Probe> read, double[] figures, List<Probe> places) {
    this.amplifier = amplifier;
    this.read = read;
    this.figures = figures;
    this.places = List.copyOf(places);
    List<Probe> all = new ArrayList<>(read);
    all.addAll(places);
    predictor = new Predictor(amplifier, all);
  }

  /** What one explanation shows at every place, given the readings. */
  record Outlook(int group, double weight, double[] means, double[] deviations) {}

  /**
   * Returns the outlook of an explanation; empty when it does not settle in a state that a place
   * needs.
   */
  Optional<Outlook> outlook(Explanation explanation, int group, double weight) {
    Optional<Map<String, OperatingPoint>> points =
        amplifier.with(explanation.faults(), explanation.severities());
    if (points.isEmpty()) {
      return Optional.empty();
    }
    Prediction all = predictor.predict(points.get());
    double[] healthy = predictor.values(amplifier.healthy());
    double[] limits = predictor.meterLimits(all.values());
    int n = read.size();
    double[] own = new double[all.values().length];
    for (int i = 0; i < own.length; i++) {
      double meter = limits[i] / Math.sqrt(3);
      double change = CHANGE_ERROR * (all.values()[i] - healthy[i]);
      double shown = all.ownSpread()[i];
      own[i] = meter * meter + change * change + shown * shown + 1e-12;
    }
    double[][] shared = Covariance.shared(all.rows());
    double[][] readShared = new double[n][n];
    double[] residual = new double[n];
    double[] readOwn = new double[n];
    for (int i = 0; i < n; i++) {
      System.arraycopy(shared[i], 0, readShared[i], 0, n);
      residual[i] = figures[i] - all.values()[i];
      readOwn[i] = own[i];
    }
    Covariance covariance = Covariance.of(readShared, readOwn);
    double[] weighted = covariance.weighted(residual);
    double[] means = new double[places.size()];
    double[] deviations = new double[places.size()];
    for (int j = 0; j < means.length; j++) {
      double mean = all.values()[n + j];
      double variance = shared[n + j][n + j] + own[n + j];
      double[] across = new double[n];
      for (int i = 0; i < n; i++) {
        across[i] = shared[n + j][i];
        mean += across[i] * weighted[i];
      }
      double[] told = covariance.weighted(across);
      for (int i = 0; i < n; i++) {
        variance -= across[i] * told[i];
      }
      means[j] = mean;
      deviations[j] = Math.sqrt(Math.max(variance, own[n + j]));
    }
    return Optional.of(new Outlook(group, weight, means, deviations));
  }

  /** Returns the place that tells most; empty when none tells anything. */
  Optional<NextProbe> best(List<Outlook> outlooks) {
    @Nullable NextProbe best = null;
    double greatest = 0;
    for (int j = 0; j < places.size(); j++) {
      double gain = gain(outlooks, j);
      double worth = gain / cost(places.get(j));
      if (gain > LEAST_GAIN_BITS && worth > greatest) {
        greatest = worth;
        best = new NextProbe(places.get(j), gain, outcomes(outlooks, j));
      }
    }
    return Optional.ofNullable(best);
  }

  /** Returns what a reading costs beside one of direct volts: time and risk (common practice). */
  private static double cost(Probe probe) {
    if (probe.kind() == ReadingKind.OHMS) {
      return 0.9;
    }
    return probe.state().isEmpty() ? 1 : 1.5;
  }

  private static double gain(List<Outlook> outlooks, int place) {
    Map<Integer, Double> before = new LinkedHashMap<>();
    for (Outlook outlook : outlooks) {
      before.merge(outlook.group(), outlook.weight(), Double::sum);
    }
    double gain = entropy(before);
    for (Outlook truth : outlooks) {
      for (int q = 0; q < NODES.length; q++) {
        double value = truth.means()[place] + NODES[q] * truth.deviations()[place];
        Map<Integer, Double> after = new LinkedHashMap<>();
        for (Outlook other : outlooks) {
          after.merge(other.group(), other.weight() * density(other, place, value), Double::sum);
        }
        gain -= truth.weight() * WEIGHTS[q] * entropy(after);
      }
    }
    return gain / Math.log(2);
  }

  private static double density(Outlook outlook, int place, double value) {
    double deviation = outlook.deviations()[place];
    double z = (value - outlook.means()[place]) / deviation;
    return Math.exp(-0.5 * z * z) / deviation + 1e-9;
  }

  private static double entropy(Map<Integer, Double> weights) {
    double sum = weights.values().stream().mapToDouble(Double::doubleValue).sum();
    double entropy = 0;
    for (double weight : weights.values()) {
      double share = weight / sum;
      entropy -= share > 0 ? share * Math.log(share) : 0;
    }
    return entropy;
  }

  /** Returns what readings at a place mean: neighbouring suspects that overlap share an outcome. */
  private static List<NextProbe.Outcome> outcomes(List<Outlook> outlooks, int place) {
    List<Outlook> rising = new ArrayList<>(outlooks);
    rising.removeIf(o -> o.weight() < LEAST_WEIGHT);
    rising.sort(Comparator.comparingDouble(o -> o.means()[place]));
    List<NextProbe.Outcome> outcomes = new ArrayList<>();
    List<Outlook> together = new ArrayList<>();
    double reach = Double.NEGATIVE_INFINITY;
    for (Outlook outlook : rising) {
      double low = outlook.means()[place] - 2 * outlook.deviations()[place];
      if (!together.isEmpty() && low > reach) {
        outcomes.add(outcome(together, place));
        together.clear();
      }
      together.add(outlook);
      reach = Math.max(reach, outlook.means()[place] + 2 * outlook.deviations()[place]);
    }
    if (!together.isEmpty()) {
      outcomes.add(outcome(together, place));
    }
    return outcomes;
  }

  private static NextProbe.Outcome outcome(List<Outlook> together, int place) {
    double weight = 0;
    double mean = 0;
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (Outlook o : together) {
      weight += o.weight();
      mean += o.weight() * o.means()[place];
      low = Math.min(low, o.means()[place] - 2 * o.deviations()[place]);
      high = Math.max(high, o.means()[place] + 2 * o.deviations()[place]);
    }
    List<Integer> groups =
        together.stream()
            .sorted(Comparator.comparingDouble(Outlook::weight).reversed())
            .map(Outlook::group)
            .distinct()
            .toList();
    return new NextProbe.Outcome(mean / weight, low, high, groups);
  }
}
