package railwalk.diagnosis;

import java.util.List;
import java.util.Optional;

/**
 * One explanation of the readings.
 *
 * @param kind a fault, a healthy amplifier, or another amplifier than the netlist's
 * @param faults for {@link Kind#FAULT} the one fault, or the two of a pair; else none
 * @param estimates of each fault's severity; NaN where there is nothing to estimate
 * @param lows of nine in ten of the severity's probability
 * @param highs of it
 * @param probability of this explanation, all adding up to 1
 * @param group number of the group of explanations that no reading tells apart, from 1
 */
public record Suspect(
    Kind kind,
    List<Fault> faults,
    List<Double> estimates,
    List<Double> lows,
    List<Double> highs,
    double probability,
    int group,
    List<Evidence> supporting,
    List<Evidence> against) {
  /** What an explanation says. */
  public enum Kind {
    FAULT,
    HEALTHY,
    NOT_THIS_AMPLIFIER
  }

  public Suspect {
    faults = List.copyOf(faults);
    estimates = List.copyOf(estimates);
    lows = List.copyOf(lows);
    highs = List.copyOf(highs);
    supporting = List.copyOf(supporting);
    against = List.copyOf(against);
  }

  /** Returns the first fault; empty for a healthy or another amplifier. */
  public Optional<Fault> fault() {
    return faults.stream().findFirst();
  }
}
