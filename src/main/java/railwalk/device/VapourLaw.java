package railwalk.device;

/**
 * One plate of a mercury-vapour rectifier: nothing until the vapour is ionized, then an arc whose
 * drop hardly depends on the current. It begins with a parabola and goes on straight, so that it
 * has no corner; slope and rounding are this project's, the published figure is the drop alone.
 *
 * @param dropVolts at {@link #REFERENCE_AMPS}
 */
public record VapourLaw(double dropVolts) implements TwoPoleLaw {
  /** Where sheets print the drop. */
  private static final double REFERENCE_AMPS = 0.225;

  private static final double SLOPE_OHMS = 2;
  private static final double ROUND_VOLTS = 2;

  /** Volts from the foot of the parabola to the drop. */
  private static final double RISE_VOLTS = Math.sqrt(2 * ROUND_VOLTS * SLOPE_OHMS * REFERENCE_AMPS);

  @Override
  public void evaluate(double volts, TwoPoleCurrent out) {
    double over = volts - dropVolts + RISE_VOLTS;
    if (over <= 0) {
      out.amps = 0;
      out.siemens = 0;
    } else if (over < ROUND_VOLTS) {
      out.amps = over * over / (2 * ROUND_VOLTS * SLOPE_OHMS);
      out.siemens = over / (ROUND_VOLTS * SLOPE_OHMS);
    } else {
      out.amps = (over - ROUND_VOLTS / 2) / SLOPE_OHMS;
      out.siemens = 1 / SLOPE_OHMS;
    }
  }

  /** Returns the volts at {@code amps}. */
  public double volts(double amps) {
    double bend = ROUND_VOLTS / (2 * SLOPE_OHMS);
    double over =
        amps < bend
            ? Math.sqrt(2 * ROUND_VOLTS * SLOPE_OHMS * amps)
            : amps * SLOPE_OHMS + ROUND_VOLTS / 2;
    return dropVolts - RISE_VOLTS + over;
  }

  @Override
  public double kneeVolts() {
    return dropVolts - RISE_VOLTS + ROUND_VOLTS;
  }

  /** An arc drops the same however well the cathode emits. */
  @Override
  public TwoPoleLaw withEmission(double emission) {
    return this;
  }
}
