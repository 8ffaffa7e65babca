package railwalk.device;

/**
 * A rectifier or diode whose cathode is on its way up: its current at fixed volts is a share of
 * that of the hot one.
 *
 * @param hot the law of the hot section
 * @param emission the share, 0 to 1
 */
public record WarmingLaw(TwoPoleLaw hot, double emission) implements TwoPoleLaw {
  @Override
  public void evaluate(double volts, TwoPoleCurrent out) {
    hot.evaluate(volts, out);
    out.amps *= emission;
    out.siemens *= emission;
  }

  @Override
  public double kneeVolts() {
    return hot.kneeVolts();
  }

  @Override
  public TwoPoleLaw withEmission(double further) {
    return new WarmingLaw(hot, emission * further);
  }
}
