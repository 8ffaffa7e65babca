package railwalk.diagnosis;

import java.util.List;

/**
 * The reading that tells most.
 *
 * @param probe where and what
 * @param gainBits by how much it lessens what is not known, expected, bit
 * @param outcomes what each reading there would mean, by rising reading
 */
public record NextProbe(Probe probe, double gainBits, List<Outcome> outcomes) {
  public NextProbe {
    outcomes = List.copyOf(outcomes);
  }

  /**
   * One outcome.
   *
   * @param value about this much
   * @param low from here
   * @param high to here
   * @param groups numbers of the groups of suspects that it speaks for, likeliest first
   */
  public record Outcome(double value, double low, double high, List<Integer> groups) {
    public Outcome {
      groups = List.copyOf(groups);
    }
  }
}
