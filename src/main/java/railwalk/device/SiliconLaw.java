package railwalk.device;

/**
 * A junction rectifier: {@code i = Is · (exp(v / nVt) − 1)} up to {@code straightAmps}, from there
 * straight on with the slope reached (the bulk resistance of the chip), so that no trial volts
 * overflow. A stack of cells scales {@code slopeVolts}.
 *
 * @param saturationAmps Is
 * @param slopeVolts n · kT/q, times the number of cells in series
 * @param straightAmps where the exponential hands over to a straight line
 */
public record SiliconLaw(double saturationAmps, double slopeVolts, double straightAmps)
    implements TwoPoleLaw {

  /**
   * Generic 1 A silicon rectifier: 0.60 V at 1 mA and 0.87 V at 1 A. From memory of the typical
   * forward curve of the 1N4001 to 1N4007 class.
   */
  public static SiliconLaw generic() {
    double slopeVolts = 0.0391;
    return new SiliconLaw(1 / Math.expm1(0.87 / slopeVolts), slopeVolts, 1);
  }

  @Override
  public void evaluate(double volts, TwoPoleCurrent out) {
    double kneeVolts = kneeVolts();
    if (volts <= kneeVolts) {
      double e = Math.exp(volts / slopeVolts);
      out.amps = saturationAmps * (e - 1);
      out.siemens = saturationAmps * e / slopeVolts;
    } else {
      double slope = (straightAmps + saturationAmps) / slopeVolts;
      out.amps = straightAmps + slope * (volts - kneeVolts);
      out.siemens = slope;
    }
  }

  @Override
  public double kneeVolts() {
    return slopeVolts * Math.log1p(straightAmps / saturationAmps);
  }

  @Override
  public TwoPoleLaw withEmission(double emission) {
    return new SiliconLaw(saturationAmps * emission, slopeVolts, straightAmps * emission);
  }
}
