package railwalk.device;

/**
 * Plate and screen current of a pentode or beam tube. The space current follows the pentode
 * companion of the triode law (N. Koren, "Improved vacuum tube models for SPICE simulations", Glass
 * Audio 8/5, 1996), with the plate's small share in the accelerating volts:
 *
 * <pre>ik = 2 · E^x / kg   with E(v, vg) of {@link Drive},   v = vs + vp / lambda</pre>
 *
 * How it parts between plate and screen depends on the plate volts in proportion to the drive (when
 * all volts of a tube rise together, the electron paths stay alike: K. R. Spangenberg, Vacuum
 * Tubes, 1948, chapter 11); the form is this project's:
 *
 * <pre>
 * z  = p / (mu · E + 2 V),   p = vp² / (vp + 3 V) for vp &gt; 0, else 0
 * h  = y / sqrt(1 + y²),     y = z / knee          the knee, from 0 to 1
 * f  = h · (1 − s0 − s1 / (1 + 4 z))               the plate's share
 * ip = ik · (1 − 0.35 · (1 − h)) · f,   is = ik · (1 − 0.35 · (1 − h)) · (1 − f)
 * </pre>
 *
 * As the plate falls below the knee the screen takes over, and about a third of the space current
 * turns back to the cathode. With screen and plate joined the same law is the triode connection.
 * Once continuously differentiable for any finite volts, currents never negative, the plate's
 * rising with plate and grid volts. Ampere, volt. {@code railwalk.fit} makes the constants.
 *
 * @param mu amplification factor of the grid against the screen
 * @param exponent x, near 1.4
 * @param kg divides the space current, volt^x per ampere
 * @param kp how sharply the remote end is cut off; about 4 times mu
 * @param kvb rounding at low screen volts, volt²
 * @param contactVolts vct, added to the grid volts
 * @param lambda how much more the screen's volts count than the plate's, 10 to 200
 * @param knee place of the knee, as a share of the drive; about 0.07
 * @param screenShare s0, the screen's share of the space current at high plate volts
 * @param screenRise s1, what the screen takes beyond that as the plate falls
 */
public record PentodeLaw(
    double mu,
    double exponent,
    double kg,
    double kp,
    double kvb,
    double contactVolts,
    double lambda,
    double knee,
    double screenShare,
    double screenRise,
    GridLaw grid)
    implements AmplifierLaw {

  private static final double RISE_RATE = 4;
  private static final double TURNED_BACK = 0.35;
  private static final double PLATE_ROUNDING_VOLTS = 3;
  private static final double DRIVE_FLOOR_VOLTS = 2;

  @Override
  public void evaluate(
      double plateVolts, double screenVolts, double gridVolts, SectionCurrents out) {
    grid.evaluate(gridVolts, out);
    double reach = 1 / lambda;
    Drive drive = Drive.of(mu, kp, kvb, contactVolts, screenVolts + plateVolts * reach, gridVolts);
    double e = drive.volts();
    if (!(e > 0)) {
      none(out);
      return;
    }
    double space = 2 / kg * Math.exp(exponent * Math.log(e));
    double perDriveVolt = exponent * space / e;

    double pull = 0;
    double pullSlope = 0;
    if (plateVolts > 0) {
      double w = 1 / (plateVolts + PLATE_ROUNDING_VOLTS);
      pull = plateVolts * plateVolts * w;
      pullSlope = (2 * plateVolts - pull) * w;
    }
    double inverseScale = 1 / (mu * e + DRIVE_FLOOR_VOLTS);
    double z = pull * inverseScale;
    double zByDrive = -z * mu * inverseScale;

    double y = z / knee;
    double inverseRoot = 1 / Math.sqrt(1 + y * y);
    double h = y * inverseRoot;
    double hByZ = inverseRoot * inverseRoot * inverseRoot / knee;
    double fall = 1 / (1 + RISE_RATE * z);
    double kept = 1 - screenShare - screenRise * fall;
    double share = h * kept;
    double shareByZ = hByZ * kept + h * screenRise * RISE_RATE * fall * fall;
    double through = 1 - TURNED_BACK * (1 - h);
    double throughByZ = TURNED_BACK * hByZ;

    double plateFactor = through * share;
    double plateFactorByZ = throughByZ * share + through * shareByZ;
    double screenFactor = through - plateFactor;
    double screenFactorByZ = throughByZ - plateFactorByZ;

    double plateByDrive = perDriveVolt * plateFactor + space * plateFactorByZ * zByDrive;
    double screenByDrive = perDriveVolt * screenFactor + space * screenFactorByZ * zByDrive;
    double byPull = space * pullSlope * inverseScale;

    out.plateAmps = space * plateFactor;
    out.screenAmps = space * screenFactor;
    out.plateByScreenSiemens = plateByDrive * drive.byAccelerating();
    out.screenByScreenSiemens = screenByDrive * drive.byAccelerating();
    out.plateByPlateSiemens = out.plateByScreenSiemens * reach + byPull * plateFactorByZ;
    out.screenByPlateSiemens = out.screenByScreenSiemens * reach + byPull * screenFactorByZ;
    out.plateByGridSiemens = plateByDrive * drive.byGrid();
    out.screenByGridSiemens = screenByDrive * drive.byGrid();
  }

  private static void none(SectionCurrents out) {
    out.plateAmps = 0;
    out.screenAmps = 0;
    out.plateByPlateSiemens = 0;
    out.plateByScreenSiemens = 0;
    out.plateByGridSiemens = 0;
    out.screenByPlateSiemens = 0;
    out.screenByScreenSiemens = 0;
    out.screenByGridSiemens = 0;
  }

  @Override
  public PentodeLaw withEmission(double emission) {
    return new PentodeLaw(
        mu,
        exponent,
        kg / emission,
        kp,
        kvb,
        contactVolts,
        lambda,
        knee,
        screenShare,
        screenRise,
        grid.withEmission(emission));
  }
}
