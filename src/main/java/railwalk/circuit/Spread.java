package railwalk.circuit;

/**
 * Limits of parts that nothing more is known of, as shares.
 *
 * @param resistor uniform between the limits
 * @param tube plate current at fixed volts, limits at two standard deviations; NaN: the type's own
 * @param winding volts, uniform between the limits
 * @param line volts, uniform between the limits
 */
public record Spread(double resistor, double tube, double winding, double line) {
  /** Ten-per-cent resistors, each type's own tube limits, 3 % windings, the line as stated. */
  public static final Spread USUAL = new Spread(0.10, Double.NaN, 0.03, 0);
}
