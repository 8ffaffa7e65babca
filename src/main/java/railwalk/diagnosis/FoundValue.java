package railwalk.diagnosis;

import java.util.List;
import java.util.Optional;

/**
 * A value that the netlist leaves open, as the readings tell it.
 *
 * @param element the part's name
 * @param section of a winding, from 0; 0 for all else
 * @param resistor whether it is a resistor, made in preferred values; else a winding or a coil
 * @param ohms the likeliest value; a guess when not determined
 * @param logDeviation one standard deviation of its natural logarithm
 * @param toldBy points of the readings that tell most, the strongest first
 * @param missing the reading that would narrow it most; empty when determined
 */
public record FoundValue(
    String element,
    int section,
    boolean resistor,
    double ohms,
    double logDeviation,
    List<String> toldBy,
    Optional<Probe> missing) {
  /** From here on, a factor of 1.65 either way, a value is not determined. */
  private static final double MOST_LOG_DEVIATION = 0.5;

  public FoundValue {
    toldBy = List.copyOf(toldBy);
  }

  /** Returns whether the readings determine the value. */
  public boolean determined() {
    return determined(logDeviation);
  }

  static boolean determined(double logDeviation) {
    return logDeviation <= MOST_LOG_DEVIATION;
  }
}
