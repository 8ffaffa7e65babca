package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.solve.OperatingPoint;

/**
 * Finds pairs of faults where no single one explains all readings: among the singles that explain
 * part of them, by what each changes alone added up; the best are then solved together.
 */
final class Pairs {
  /** Singles that are paired with one another. */
  private static final int SINGLES = 14;

  /** Pairs that are solved. */
  private static final int SOLVED = 6;

  /** Rounds of bringing the two severities of a pair to their best in turn. */
  private static final int ROUNDS = 2;

  /** A single fault that leaves no reading further off than this explains them all. */
  private static final double EXPLAINED_DEVIATIONS = 3.2;

  private final Amplifier amplifier;
  private final Predictor predictor;
  private final Ranking ranking;
  private final double[] nominal;

  Pairs(Amplifier amplifier, Predictor predictor, Ranking ranking) {
    this.amplifier = amplifier;
    this.predictor = predictor;
    this.ranking = ranking;
    nominal = predictor.values(amplifier.healthy());
  }

  private record Pair(Candidate one, Candidate other, double a, double b, double logDensity) {}

  /**
   * Returns pairs with their weight; none when a single fault or a healthy amplifier explains all.
   *
   * @param ranked singles, likeliest first
   * @param logUnit logarithm of the prior of a fault of weight 1
   */
  List<Explanation> of(List<Explanation> ranked, double logUnit, Frequency frequency) {
    if (ranked.isEmpty() || explainsAll(ranked.get(0)) || nominal.length < 2) {
      return List.of();
    }
    List<Pair> pairs = new ArrayList<>();
    List<Explanation> singles = singles(ranked);
    for (int i = 0; i < singles.size(); i++) {
      for (int j = i + 1; j < singles.size(); j++) {
        Candidate one = singles.get(i).single();
        Candidate other = singles.get(j).single();
        if (!one.fault().element().equals(other.fault().element())) {
          pairs.add(rough(one, other));
        }
      }
    }
    pairs.sort(Comparator.comparingDouble(Pair::logDensity).reversed());
    List<Explanation> found = new ArrayList<>();
    for (Pair pair : pairs.subList(0, Math.min(SOLVED, pairs.size()))) {
      solved(pair, logUnit, frequency).ifPresent(found::add);
    }
    return found;
  }

  private static boolean explainsAll(Explanation single) {
    if (single.fit().slipCount() > 0) {
      return false;
    }
    for (double deviations : single.fit().conditional()) {
      if (Math.abs(deviations) > EXPLAINED_DEVIATIONS) {
        return false;
      }
    }
    return true;
  }

  /** Returns the likeliest singles, and of the others those that explain some readings best. */
  private List<Explanation> singles(List<Explanation> ranked) {
    List<Explanation> singles = new ArrayList<>();
    for (Explanation single : ranked) {
      boolean sameLater =
          singles.stream()
              .anyMatch(
                  s -> s.single().fault().element().equals(single.single().fault().element()));
      if (!sameLater && singles.size() < SINGLES) {
        singles.add(single);
      }
    }
    return singles;
  }

  /** Returns the pair at its best severities, what each changes alone added up. */
  private Pair rough(Candidate one, Candidate other) {
    Pair best = new Pair(one, other, 1, 1, Double.NEGATIVE_INFINITY);
    for (double a : some(one)) {
      double[] first = one.at(a);
      for (double b : some(other)) {
        double log = fit(added(first, other.at(b)));
        if (log > best.logDensity()) {
          best = new Pair(one, other, a, b, log);
        }
      }
    }
    return best;
  }

  private static double[] some(Candidate candidate) {
    double[] all = candidate.severities();
    int step = Math.max(1, all.length / 8);
    double[] some = new double[(all.length + step - 1) / step];
    for (int i = 0; i < some.length; i++) {
      some[i] = all[i * step];
    }
    return some;
  }

  private double[] added(double[] one, double[] other) {
    double[] sum = new double[nominal.length];
    for (int i = 0; i < sum.length; i++) {
      sum[i] = one[i] + other[i] - nominal[i];
    }
    return sum;
  }

  private double fit(double[] values) {
    return ranking.fit(values, ranking.healthy(), ranking.sharedHealthy()).logDensity();
  }

  /**
   * Returns the pair solved together. What the sum of the two leaves out, found where they were
   * solved last, is added while each severity in turn is brought to its best.
   */
  private Optional<Explanation> solved(Pair rough, double logUnit, Frequency frequency) {
    double a = rough.a();
    double b = rough.b();
    List<Fault> faults = List.of(rough.one().fault(), rough.other().fault());
    Explanation best = null;
    for (int round = 0; round < ROUNDS; round++) {
      Optional<Map<String, OperatingPoint>> points = amplifier.with(faults, List.of(a, b));
      if (points.isEmpty()) {
        break;
      }
      Prediction own = predictor.predict(points.get());
      double[] together = predictor.values(points.get());
      Fit fit = ranking.fit(own.values(), own, Covariance.shared(own.rows()));
      double log = fit.logDensity() + logPrior(faults, logUnit, frequency);
      if (best == null || log > best.logPosterior()) {
        best =
            new Explanation(
                Suspect.Kind.FAULT,
                List.of(rough.one(), rough.other()),
                List.of(a, b),
                List.of(Double.NaN, Double.NaN),
                List.of(Double.NaN, Double.NaN),
                log,
                fit,
                own);
      }
      double[] sum = added(rough.one().at(a), rough.other().at(b));
      double[] left = new double[sum.length];
      for (int i = 0; i < left.length; i++) {
        left[i] = together[i] - sum[i];
      }
      a = bestFor(rough.one(), rough.other().at(b), left, a);
      b = bestFor(rough.other(), rough.one().at(a), left, b);
    }
    return Optional.ofNullable(best);
  }

  private double bestFor(Candidate moved, double[] still, double[] left, double now) {
    double best = now;
    double greatest = Double.NEGATIVE_INFINITY;
    for (double severity : moved.severities()) {
      double[] values = added(moved.at(severity), still);
      for (int i = 0; i < values.length; i++) {
        values[i] += left[i];
      }
      double log = fit(values);
      if (log > greatest) {
        greatest = log;
        best = severity;
      }
    }
    return best;
  }

  /**
   * Two faults at once are rarer than one by the second's own frequency; a severity that fits was
   * one of some that were possible.
   */
  private static double logPrior(List<Fault> faults, double logUnit, Frequency frequency) {
    double log = 0;
    for (Fault fault : faults) {
      log += logUnit + Math.log(frequency.weight(fault.kind()));
      log -= fault.range().open() ? LOG_SEVERITIES : 0;
    }
    return log;
  }

  /** A reading tells about one in ten of a range of severities from the others. */
  private static final double LOG_SEVERITIES = Math.log(10);
}
