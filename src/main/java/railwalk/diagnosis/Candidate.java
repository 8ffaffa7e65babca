package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;

/**
 * One fault with the readings that it would give over its range of severities: solved at a few,
 * between them read off straight lines over the logarithm of the severity.
 */
final class Candidate {
  /** Severities looked at between two that were solved. */
  private static final int BETWEEN = 10;

  private final Fault fault;
  private final List<Double> logSeverities = new ArrayList<>();
  private final List<double[]> values = new ArrayList<>();

  Candidate(Fault fault) {
    this.fault = fault;
  }

  Fault fault() {
    return fault;
  }

  boolean solved() {
    return !values.isEmpty();
  }

  /** Takes the readings at one severity more. */
  void add(double severity, double[] readings) {
    double log = Math.log(severity);
    int place = 0;
    while (place < logSeverities.size() && logSeverities.get(place) < log) {
      place++;
    }
    if (place < logSeverities.size() && logSeverities.get(place) == log) {
      values.set(place, readings);
      return;
    }
    logSeverities.add(place, log);
    values.add(place, readings);
  }

  /** Returns the severities to look at. */
  double[] severities() {
    int solved = logSeverities.size();
    double[] all = new double[(solved - 1) * BETWEEN + 1];
    for (int i = 0; i < all.length; i++) {
      int from = Math.min(i / BETWEEN, solved - 1);
      double share = (i - from * BETWEEN) / (double) BETWEEN;
      double log =
          share == 0
              ? logSeverities.get(from)
              : logSeverities.get(from) * (1 - share) + logSeverities.get(from + 1) * share;
      all[i] = Math.exp(log);
    }
    return all;
  }

  /**
   * Returns each severity's share of what was expected before anything was read: the range is
   * log-uniform, the severities solved lie unevenly once the best was added.
   */
  double[] shares() {
    double[] severities = severities();
    double[] shares = new double[severities.length];
    if (severities.length == 1) {
      shares[0] = 1;
      return shares;
    }
    double span = Math.log(severities[severities.length - 1] / severities[0]);
    for (int i = 0; i < shares.length; i++) {
      double below = i == 0 ? severities[0] : severities[i - 1];
      double above = i == shares.length - 1 ? severities[i] : severities[i + 1];
      shares[i] = Math.log(above / below) / (2 * span);
    }
    return shares;
  }

  /** Returns the readings at {@code severity}, which lies within the range. */
  double[] at(double severity) {
    double log = Math.log(severity);
    int above = 0;
    while (above < logSeverities.size() - 1 && logSeverities.get(above) < log) {
      above++;
    }
    if (above == 0 || logSeverities.get(above) <= log) {
      return values.get(above).clone();
    }
    double low = logSeverities.get(above - 1);
    double share = (log - low) / (logSeverities.get(above) - low);
    double[] from = values.get(above - 1);
    double[] to = values.get(above);
    double[] between = new double[from.length];
    for (int i = 0; i < between.length; i++) {
      between[i] = (1 - share) * from[i] + share * to[i];
    }
    return between;
  }
}
