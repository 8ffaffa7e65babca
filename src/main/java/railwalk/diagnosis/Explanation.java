package railwalk.diagnosis;

import java.util.List;

/**
 * An explanation of the readings on its way to becoming a {@link Suspect}.
 *
 * @param candidates none for the healthy amplifier and for another one; two for a pair of faults
 * @param severities the likeliest, one for each candidate
 * @param lows of nine in ten of each severity's probability
 * @param highs of it
 * @param logPosterior not yet made to add up to 1
 * @param fit at the likeliest severity
 * @param prediction at the likeliest severity; the healthy one's spread before it was refined
 */
record Explanation(
    Suspect.Kind kind,
    List<Candidate> candidates,
    List<Double> severities,
    List<Double> lows,
    List<Double> highs,
    double logPosterior,
    Fit fit,
    Prediction prediction) {
  Explanation {
    candidates = List.copyOf(candidates);
    severities = List.copyOf(severities);
    lows = List.copyOf(lows);
    highs = List.copyOf(highs);
  }

  /** Returns an explanation without a fault. */
  static Explanation without(
      Suspect.Kind kind, double logPosterior, Fit fit, Prediction prediction) {
    return new Explanation(
        kind, List.of(), List.of(), List.of(), List.of(), logPosterior, fit, prediction);
  }

  /** Returns the faults. */
  List<Fault> faults() {
    return candidates.stream().map(Candidate::fault).toList();
  }

  /** Returns the only fault's candidate. */
  Candidate single() {
    return candidates.get(0);
  }
}
