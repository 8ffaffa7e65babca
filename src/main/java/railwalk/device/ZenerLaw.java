package railwalk.device;

/**
 * A zener diode: a silicon junction forwards, and backwards nothing until {@code zenerVolts}, then
 * a straight slope that begins with a parabola {@code roundVolts} wide so that it has no corner.
 *
 * @param zenerVolts at which the reverse current would start, sharply
 * @param slopeOhms reverse slope resistance
 */
public record ZenerLaw(double zenerVolts, double slopeOhms) implements TwoPoleLaw {
  private static final double ROUND_VOLTS = 0.2;
  private static final SiliconLaw FORWARD = SiliconLaw.generic();

  @Override
  public void evaluate(double volts, TwoPoleCurrent out) {
    FORWARD.evaluate(Math.max(volts, -1), out);
    if (volts < -1) {
      out.siemens = 0;
    }
    double over = -volts - zenerVolts + ROUND_VOLTS / 2;
    if (over <= 0) {
      return;
    }
    if (over < ROUND_VOLTS) {
      out.amps -= over * over / (2 * ROUND_VOLTS * slopeOhms);
      out.siemens += over / (ROUND_VOLTS * slopeOhms);
    } else {
      out.amps -= (over - ROUND_VOLTS / 2) / slopeOhms;
      out.siemens += 1 / slopeOhms;
    }
  }

  @Override
  public double kneeVolts() {
    return FORWARD.kneeVolts();
  }

  @Override
  public TwoPoleLaw withEmission(double emission) {
    return this;
  }
}
