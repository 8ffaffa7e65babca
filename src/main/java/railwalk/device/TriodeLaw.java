package railwalk.device;

/**
 * A triode's plate current by the law of N. Koren, "Improved vacuum tube models for SPICE
 * simulations", Glass Audio 8/5, 1996,
 *
 * <pre>ip = 2 · E^x / kg   with E(vp, vg) of {@link Drive}, nothing for vp ≤ 0</pre>
 *
 * (ampere, volt), and the grid current of {@link GridLaw}. Once continuously differentiable, rising
 * with plate and grid volts, for any finite volts. {@code railwalk.fit} makes the constants from
 * published points.
 *
 * @param mu amplification factor far from cut-off
 * @param exponent x, near 1.4
 * @param kg divides the space current, volt^x per ampere
 * @param kp how sharply the remote end is cut off; about 3 to 6 times mu
 * @param kvb rounding at low plate volts, volt²
 * @param contactVolts vct, added to the grid volts
 */
public record TriodeLaw(
    double mu, double exponent, double kg, double kp, double kvb, double contactVolts, GridLaw grid)
    implements AmplifierLaw {

  @Override
  public void evaluate(
      double plateVolts, double screenVolts, double gridVolts, SectionCurrents out) {
    Drive drive = Drive.of(mu, kp, kvb, contactVolts, plateVolts, gridVolts);
    double e = drive.volts();
    double amps = 0;
    double perDriveVolt = 0;
    if (e > 0) {
      amps = 2 / kg * Math.exp(exponent * Math.log(e));
      perDriveVolt = exponent * amps / e;
    }
    out.plateAmps = amps;
    out.plateByPlateSiemens = perDriveVolt * drive.byAccelerating();
    out.plateByGridSiemens = perDriveVolt * drive.byGrid();
    out.plateByScreenSiemens = 0;
    out.screenAmps = 0;
    out.screenByPlateSiemens = 0;
    out.screenByScreenSiemens = 0;
    out.screenByGridSiemens = 0;
    grid.evaluate(gridVolts, out);
  }

  @Override
  public TriodeLaw withEmission(double emission) {
    return new TriodeLaw(
        mu, exponent, kg / emission, kp, kvb, contactVolts, grid.withEmission(emission));
  }
}
