package railwalk.circuit;

/**
 * The line (mains) that the chart is for.
 *
 * @param volts rms; NaN when the netlist has no {@code .line}: windings then hold as written
 * @param hertz of the line
 * @param designVolts line volts at which windings without a figure of their own are given; NaN with
 *     {@code volts}
 */
public record Line(double volts, double hertz, double designVolts) {
  /** No {@code .line}: 60 Hz, windings as written. */
  public static final Line NOT_STATED = new Line(Double.NaN, 60, Double.NaN);

  /** Returns whether the netlist (or the command line) gives line volts. */
  public boolean stated() {
    return !Double.isNaN(volts);
  }

  /** Returns the factor from a winding's written volts to its volts on this line. */
  public double scale(double atLineVolts) {
    if (!stated()) {
      return 1;
    }
    return volts / (Double.isNaN(atLineVolts) ? designVolts : atLineVolts);
  }
}
