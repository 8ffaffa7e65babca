package railwalk.device;

/**
 * The effective volts that set a tube's space current, and their slopes, after the triode law of N.
 * Koren, "Improved vacuum tube models for SPICE simulations", Glass Audio 8/5, 1996:
 *
 * <pre>E = (v / kp) · ln(1 + exp(kp · (1/mu + (vg + vct) / sqrt(kvb + v²))))   for v &gt; 0, else 0
 * </pre>
 *
 * where v is the accelerating volts (the plate's in a triode, the screen's and a share of the
 * plate's in a pentode). vct, the contact volts, is a common addition to the published form. E
 * rises with v and with vg everywhere. One piece of {@link TriodeLaw} and {@link PentodeLaw}.
 *
 * @param volts E
 * @param byAccelerating dE/dv
 * @param byGrid dE/dvg
 */
record Drive(double volts, double byAccelerating, double byGrid) {
  static final Drive NONE = new Drive(0, 0, 0);

  /** Below this the exponential is 1e-304 and less: cut off. */
  private static final double CUT_OFF = -700;

  static Drive of(
      double mu, double kp, double kvb, double contactVolts, double volts, double gridVolts) {
    if (!(volts > 0)) {
      return NONE;
    }
    double square = kvb + volts * volts;
    double inverseRoot = 1 / Math.sqrt(square);
    double grid = (gridVolts + contactVolts) * inverseRoot;
    double x = kp * (1 / mu + grid);
    if (x < CUT_OFF) {
      return NONE;
    }
    double tail = Math.exp(-Math.abs(x));
    double soft = Softplus.value(x, tail) / kp;
    double slope = Softplus.slope(x, tail);
    double ratio = volts * inverseRoot;
    return new Drive(volts * soft, soft - slope * grid * ratio * ratio, slope * ratio);
  }
}
