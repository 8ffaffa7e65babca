package railwalk.diagnosis;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.Circuit;
import railwalk.solve.OperatingPoint;

/**
 * One amplifier with figures put in for its open values, held against the readings: residuals,
 * their covariance from part spreads and meter, and slopes by solving again one per cent up.
 */
final class ValueFit {
  /** Step of a logarithm for slopes. */
  private static final double STEP = 0.01;

  /**
   * One deviation of what is expected of a value's logarithm before anything is read: a factor of
   * 20. It keeps a value that nothing tells from running away, and weighs nothing beside a reading.
   */
  private static final double PRIOR_DEVIATION = 3;

  private final List<OpenValue> open;
  private final double[] logs;
  private final Amplifier amplifier;
  private final Predictor predictor;
  private final double[] residual;
  private final Covariance covariance;
  private final double[] values;

  private ValueFit(
      List<OpenValue> open, double[] logs, Amplifier amplifier, List<Probe> probes, double[] read) {
    this.open = open;
    this.logs = logs.clone();
    this.amplifier = amplifier;
    predictor = new Predictor(amplifier, probes);
    Prediction prediction = predictor.predict(amplifier.healthy());
    values = prediction.values();
    residual = new double[read.length];
    for (int i = 0; i < read.length; i++) {
      residual[i] = read[i] - values[i];
    }
    covariance =
        Covariance.of(
            Covariance.shared(prediction.rows()),
            predictor.ownVariances(values, prediction.ownSpread()));
  }

  /** Returns {@code circuit} with exact values put in. */
  static Circuit circuit(Circuit circuit, List<OpenValue> open, double[] logs) {
    Circuit known = circuit;
    for (int u = 0; u < logs.length; u++) {
      known = open.get(u).putExact(known, Math.exp(logs[u]));
    }
    return known;
  }

  /** Solves the amplifier with the values put in; empty when it does not settle or cannot read. */
  static Optional<ValueFit> of(
      Circuit circuit, List<OpenValue> open, double[] logs, List<Probe> probes, double[] read) {
    try {
      Set<String> states = Predictor.states(probes);
      Amplifier amplifier = new Amplifier(circuit(circuit, open, logs), states);
      ValueFit fit = new ValueFit(open, logs, amplifier, probes, read);
      return Double.isNaN(fit.cost()) ? Optional.empty() : Optional.of(fit);
    } catch (NoOperatingPoint unsettled) {
      return Optional.empty();
    }
  }

  double[] logs() {
    return logs.clone();
  }

  /** Returns what the readings should be. */
  double[] values() {
    return values.clone();
  }

  /** Returns twice the negative logarithm of the density, but for a constant. */
  double cost() {
    double[] weighted = covariance.weighted(residual);
    double cost = covariance.logDeterminant();
    for (int i = 0; i < residual.length; i++) {
      cost += residual[i] * weighted[i];
    }
    for (int u = 0; u < logs.length; u++) {
      double off = (logs[u] - middle(u)) / PRIOR_DEVIATION;
      cost += off * off;
    }
    return cost;
  }

  private double middle(int u) {
    return Math.log(open.get(u).middleOhms());
  }

  /** Returns the slopes of the readings, one row for each open value; empty when unsettled. */
  Optional<double[][]> slopes() {
    return slopes(amplifier, predictor, open, logs);
  }

  /** Returns the slopes of what {@code predictor} reads, one row for each open value. */
  static Optional<double[][]> slopes(
      Amplifier amplifier, Predictor predictor, List<OpenValue> open, double[] logs) {
    double[] here = predictor.values(amplifier.healthy());
    double[][] slopes = new double[logs.length][];
    for (int u = 0; u < logs.length; u++) {
      OpenValue value = open.get(u);
      double ohms = Math.exp(logs[u] + STEP);
      Optional<Map<String, OperatingPoint>> moved =
          amplifier.changed(circuit -> value.putExact(circuit, ohms));
      if (moved.isEmpty()) {
        return Optional.empty();
      }
      double[] there = predictor.values(moved.get());
      for (int i = 0; i < there.length; i++) {
        double slope = (there[i] - here[i]) / STEP;
        there[i] = Double.isNaN(slope) ? 0 : slope;
      }
      slopes[u] = there;
    }
    return Optional.of(slopes);
  }

  /** Returns the normal equations' matrix inverted, its diagonal raised by a share. */
  Covariance posterior(double[][] slopes, double damping) {
    int n = logs.length;
    double[][] told = new double[n][n];
    double[] prior = new double[n];
    for (int u = 0; u < n; u++) {
      double[] weighted = covariance.weighted(slopes[u]);
      for (int v = 0; v < n; v++) {
        told[u][v] = dot(weighted, slopes[v]);
      }
    }
    Arrays.fill(prior, 1 / (PRIOR_DEVIATION * PRIOR_DEVIATION));
    for (int u = 0; u < n; u++) {
      prior[u] += damping * (told[u][u] + prior[u]);
    }
    return Covariance.of(told, prior);
  }

  /** Returns where a damped Gauss–Newton step leads. */
  double[] step(double[][] slopes, double damping) {
    double[] weighted = covariance.weighted(residual);
    double[] gradient = new double[logs.length];
    for (int u = 0; u < gradient.length; u++) {
      gradient[u] =
          dot(slopes[u], weighted) + (middle(u) - logs[u]) / (PRIOR_DEVIATION * PRIOR_DEVIATION);
    }
    return posterior(slopes, damping).weighted(gradient);
  }

  /** Returns what each reading tells of an open value: its share of the information. */
  double[] told(double[] slope) {
    double[] told = covariance.weighted(slope);
    double sum = 0;
    for (int i = 0; i < told.length; i++) {
      told[i] = Math.max(0, told[i] * slope[i]);
      sum += told[i];
    }
    for (int i = 0; i < told.length; i++) {
      told[i] = sum > 0 ? told[i] / sum : 0;
    }
    return told;
  }

  static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }
}
