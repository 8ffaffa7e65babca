package railwalk.device;

/**
 * Current into a control grid: a retarding-field exponential that turns into the three-halves-power
 * law above the contact potential,
 *
 * <pre>ig = G · s^1.5,   s = n · ln(1 + exp((vg − vc) / n)),   n = 1.5 · U</pre>
 *
 * with vg grid to cathode (volt), vc the volts where the grid begins to draw space current, U the
 * volts per factor e below that (the temperature of an oxide cathode, about 1100 K), G in ampere
 * per volt^1.5. Smooth everywhere, never negative. It takes no notice of the plate. One piece of
 * {@link TriodeLaw} and {@link PentodeLaw}.
 *
 * <p>Child's law and the retarding-field law are textbook (K. R. Spangenberg, Vacuum Tubes, 1948,
 * chapters 8 and 4); the join is this project's.
 *
 * @param perveance G
 * @param startVolts vc
 * @param slopeVolts U
 */
public record GridLaw(double perveance, double startVolts, double slopeVolts) {
  /** Below this many n under the start the current is less than 1e-24 of G. */
  private static final double DARK = -37;

  /** Fills the grid current of {@code out} and its slope. */
  void evaluate(double gridVolts, SectionCurrents out) {
    double width = 1.5 * slopeVolts;
    double x = (gridVolts - startVolts) / width;
    if (x < DARK) {
      out.gridAmps = 0;
      out.gridByGridSiemens = 0;
    } else {
      double tail = Math.exp(-Math.abs(x));
      double soft = width * Softplus.value(x, tail);
      double root = perveance * Math.sqrt(soft);
      out.gridAmps = root * soft;
      out.gridByGridSiemens = 1.5 * root * Softplus.slope(x, tail);
    }
    out.gridByPlateSiemens = 0;
    out.gridByScreenSiemens = 0;
  }

  GridLaw withEmission(double emission) {
    return new GridLaw(perveance * emission, startVolts, slopeVolts);
  }
}
