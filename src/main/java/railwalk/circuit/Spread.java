package railwalk.circuit;

/**
 * Limits of parts that nothing more is known of, as shares.
 *
 * @param resistor uniform between the limits
 * @param tube plate current at fixed volts, limits at two standard deviations; NaN: the type's own
 * @param winding volts, uniform between the limits
 * @param line volts, uniform between the limits
 * @param usedTubes whether tubes and tube rectifiers have seen use: {@link #USED_LOW} to {@link
 *     #USED_HIGH} in place of the limits of new ones
 * @param carbonResistors whether resistors without a tolerance of their own are carbon
 *     compositions, which drift upwards: both limits lie {@link #CARBON_DRIFT} higher
 */
public record Spread(
    double resistor,
    double tube,
    double winding,
    double line,
    boolean usedTubes,
    boolean carbonResistors) {
  /** Current of used tubes at fixed volts, limits at two standard deviations: common practice. */
  public static final double USED_LOW = -0.35;

  /** Upper limit of used tubes: common practice. */
  public static final double USED_HIGH = 0.20;

  /** How far old carbon compositions stand above their marking on average: common practice. */
  public static final double CARBON_DRIFT = 0.05;

  /** Ten-per-cent resistors, each type's own tube limits, 3 % windings, the line as stated. */
  public static final Spread USUAL = new Spread(0.10, Double.NaN, 0.03, 0);

  /** New tubes, and resistors that stay about their marking. */
  public Spread(double resistor, double tube, double winding, double line) {
    this(resistor, tube, winding, line, false, false);
  }
}
