package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.solve.OperatingPoint;

/**
 * Ranks explanations of a set of readings by their probability given the readings (Bayes): how
 * often the fault occurs, times how likely the readings are with it, all severities of its range
 * counted. Part spreads are in the covariance of the readings, so that a whole supply that stands 3
 * % high is no surprise, and one node that does is.
 *
 * <p>All faults are first compared with the healthy amplifier's spread; the best are solved again
 * at their likeliest severity and compared with the spread that the faulted amplifier itself has.
 */
final class Ranking {
  /** Of two amplifiers on the bench one is healthy, before anything was read. */
  private static final double HEALTHY_SHARE = 0.5;

  private static final double OTHER_AMPLIFIER_SHARE = 0.01;

  /** How many of the best are solved again. */
  private static final int REFINED = 30;

  private static final int REFINEMENTS = 2;

  /** First-order spreads are off by this share of what a fault changes, one deviation. */
  private static final double CHANGE_ERROR = 0.04;

  /** Another amplifier than the netlist's: readings may be anywhere near. */
  private static final double OTHER_SPREAD = 0.4;

  private static final double OTHER_FLOOR_VOLTS = 10;

  private final Amplifier amplifier;
  private final Predictor predictor;
  private final double[] read;
  private final Prediction healthy;
  private final double[][] sharedHealthy;
  private final double[] slipWidths;

  /**
   * @param read one figure for each place of {@code predictor}, none NaN
   */
  Ranking(Amplifier amplifier, Predictor predictor, double[] read) {
    this.amplifier = amplifier;
    this.predictor = predictor;
    this.read = read;
    healthy = predictor.predict(amplifier.healthy());
    sharedHealthy = Covariance.shared(healthy.rows());
    slipWidths = slipWidths();
  }

  /** A slip may be anywhere between nothing and the greatest figure of its kind, either sign. */
  private double[] slipWidths() {
    double[] widths = new double[read.length];
    for (int i = 0; i < widths.length; i++) {
      double greatest = 0;
      for (int j = 0; j < widths.length; j++) {
        if (predictor.probes().get(j).kind() == predictor.probes().get(i).kind()) {
          greatest = Math.max(greatest, Math.max(Math.abs(read[j]), Math.abs(healthy.values()[j])));
        }
      }
      widths[i] = 2 * Math.max(greatest, 1e-6);
    }
    return widths;
  }

  /** Returns what the healthy amplifier shows. */
  Prediction healthy() {
    return healthy;
  }

  /** Returns the explanations, likeliest first. */
  List<Explanation> rank(List<Fault> faults, Frequency frequency) {
    double sum = 0;
    for (Fault fault : faults) {
      sum += frequency.weight(fault.kind());
    }
    double share = 1 - HEALTHY_SHARE - OTHER_AMPLIFIER_SHARE;
    List<Explanation> found = new ArrayList<>();
    for (Fault fault : faults) {
      Candidate candidate = new Candidate(fault);
      for (double severity : fault.range().grid()) {
        amplifier
            .with(fault, severity)
            .ifPresent(points -> candidate.add(severity, predictor.values(points)));
      }
      if (candidate.solved()) {
        double prior = Math.log(share * frequency.weight(fault.kind()) / sum);
        found.add(weigh(candidate, prior, null));
      }
    }
    found.sort(Comparator.comparingDouble(Explanation::logPosterior).reversed());
    for (int i = 0; i < Math.min(REFINED, found.size()); i++) {
      found.set(i, refined(found.get(i), frequency, share / sum));
    }
    found.addAll(new Pairs(amplifier, predictor, this).of(found, Math.log(share / sum), frequency));
    found.add(healthyOne());
    found.add(anotherAmplifier());
    found.sort(Comparator.comparingDouble(Explanation::logPosterior).reversed());
    return found;
  }

  private Explanation refined(Explanation rough, Frequency frequency, double unit) {
    Candidate candidate = rough.single();
    Explanation best = rough;
    double prior = Math.log(unit * frequency.weight(candidate.fault().kind()));
    for (int round = 0; round < REFINEMENTS; round++) {
      double severity = best.severities().get(0);
      Optional<Map<String, OperatingPoint>> points = amplifier.with(candidate.fault(), severity);
      if (points.isEmpty()) {
        return best;
      }
      Prediction own = predictor.predict(points.get());
      candidate.add(severity, predictor.values(points.get()));
      best = weigh(candidate, prior, own);
      if (!candidate.fault().range().open()) {
        break;
      }
    }
    return best;
  }

  /**
   * Weighs a fault over its severities.
   *
   * @param own the faulted amplifier's spread at about the likeliest severity; null: as healthy
   */
  private Explanation weigh(Candidate candidate, double logPrior, @Nullable Prediction own) {
    Prediction spread = own == null ? healthy : own;
    double[][] shared = own == null ? sharedHealthy : Covariance.shared(own.rows());
    double[] shifts = spread.shifts();
    double[] severities = candidate.severities();
    double[] shares = candidate.shares();
    double[] logs = new double[severities.length];
    @Nullable Fit best = null;
    int bestPlace = 0;
    @Nullable Covariance covariance = null;
    for (int s = 0; s < severities.length; s++) {
      double[] values = candidate.at(severities[s]);
      if (covariance == null || s % COVARIANCE_EVERY == COVARIANCE_EVERY / 2) {
        covariance = Covariance.of(shared, variances(values, spread.ownSpread()));
      }
      Fit fit = Fit.of(residual(sum(values, shifts)), covariance, slipWidths);
      logs[s] = fit.logDensity() + Math.log(shares[s]);
      if (best == null || fit.logDensity() > best.logDensity()) {
        best = fit;
        bestPlace = s;
      }
    }
    if (best == null) {
      throw new IllegalStateException(candidate.fault().element());
    }
    double log = logSum(logs);
    return new Explanation(
        Suspect.Kind.FAULT,
        List.of(candidate),
        List.of(severities[bestPlace]),
        List.of(quantile(severities, logs, log, 0.05)),
        List.of(quantile(severities, logs, log, 0.95)),
        log + logPrior,
        best,
        new Prediction(
            sum(candidate.at(severities[bestPlace]), shifts),
            shifts,
            spread.rows(),
            spread.ownSpread()));
  }

  /** The covariance is made anew after so many severities. */
  private static final int COVARIANCE_EVERY = 10;

  private static double[] sum(double[] a, double[] b) {
    double[] sum = new double[a.length];
    for (int i = 0; i < sum.length; i++) {
      sum[i] = a[i] + b[i];
    }
    return sum;
  }

  /** Returns how well an amplifier that shows {@code values} explains the readings. */
  Fit fit(double[] values, Prediction spread, double[][] shared) {
    return Fit.of(
        residual(values), Covariance.of(shared, variances(values, spread.ownSpread())), slipWidths);
  }

  /** Returns the healthy amplifier's shared covariance. */
  double[][] sharedHealthy() {
    return sharedHealthy;
  }

  private double[] residual(double[] values) {
    double[] residual = new double[read.length];
    for (int i = 0; i < residual.length; i++) {
      residual[i] = read[i] - values[i];
    }
    return residual;
  }

  private double[] variances(double[] values, double[] ownSpread) {
    double[] variances = predictor.ownVariances(values, ownSpread);
    for (int i = 0; i < variances.length; i++) {
      double change = CHANGE_ERROR * (values[i] - healthy.values()[i]);
      variances[i] += change * change;
    }
    return variances;
  }

  private Explanation healthyOne() {
    Fit fit = fit(healthy.values(), healthy, sharedHealthy);
    return Explanation.without(
        Suspect.Kind.HEALTHY, fit.logDensity() + Math.log(HEALTHY_SHARE), fit, healthy);
  }

  private Explanation anotherAmplifier() {
    double[] own = new double[read.length];
    for (int i = 0; i < own.length; i++) {
      double deviation = OTHER_SPREAD * Math.abs(healthy.values()[i]) + OTHER_FLOOR_VOLTS;
      own[i] = deviation * deviation;
    }
    double[][] none = new double[own.length][own.length];
    Fit fit = Fit.of(residual(healthy.values()), Covariance.of(none, own), slipWidths);
    return Explanation.without(
        Suspect.Kind.NOT_THIS_AMPLIFIER,
        fit.logDensity() + Math.log(OTHER_AMPLIFIER_SHARE),
        fit,
        healthy);
  }

  /** Returns the standard deviation of each reading of an explanation, everything counted. */
  double[] deviations(Explanation explanation) {
    Prediction prediction = explanation.prediction();
    double[] deviations = variances(prediction.values(), prediction.ownSpread());
    for (int i = 0; i < deviations.length; i++) {
      deviations[i] = Math.sqrt(deviations[i] + prediction.sharedVariance(i));
    }
    return deviations;
  }

  static double logSum(double[] logs) {
    double greatest = Double.NEGATIVE_INFINITY;
    for (double log : logs) {
      greatest = Math.max(greatest, log);
    }
    double sum = 0;
    for (double log : logs) {
      sum += Math.exp(log - greatest);
    }
    return greatest + Math.log(sum);
  }

  private static double quantile(double[] severities, double[] logs, double logSum, double share) {
    double sum = 0;
    for (int s = 0; s < severities.length; s++) {
      sum += Math.exp(logs[s] - logSum);
      if (sum >= share) {
        return severities[s];
      }
    }
    return severities[severities.length - 1];
  }
}
