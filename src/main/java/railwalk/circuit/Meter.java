package railwalk.circuit;

import java.util.List;

/**
 * The voltmeter that readings are taken with.
 *
 * @param ohms input resistance of a meter with one resistance on all ranges; NaN for ohms per volt
 * @param ohmsPerVolt NaN for a fixed resistance
 * @param rangesVolts rising; empty for a fixed resistance
 */
public record Meter(double ohms, double ohmsPerVolt, List<Double> rangesVolts) {
  /** The ranges of a classic ohms-per-volt meter where none are listed. */
  public static final List<Double> USUAL_RANGES_VOLTS = List.of(10.0, 50.0, 250.0, 500.0, 1000.0);

  /** A modern digital multimeter: 10 megohm (common practice). */
  public static final Meter TEN_MEGOHM = new Meter(10e6, Double.NaN, List.of());

  public Meter {
    rangesVolts = List.copyOf(rangesVolts);
  }

  /** Returns the range (volts) that a point at {@code volts} is read on; NaN without ranges. */
  public double rangeFor(double volts) {
    if (rangesVolts.isEmpty()) {
      return Double.NaN;
    }
    double magnitude = Math.abs(volts);
    return rangesVolts.stream()
        .filter(range -> range >= magnitude)
        .findFirst()
        .orElse(rangesVolts.get(rangesVolts.size() - 1));
  }

  /** Returns the input resistance on the range that holds {@code volts}. */
  public double inputOhms(double volts) {
    return Double.isNaN(ohms) ? ohmsPerVolt * rangeFor(volts) : ohms;
  }
}
