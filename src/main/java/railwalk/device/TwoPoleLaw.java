package railwalk.device;

/**
 * Static law of a rectifier plate, a silicon diode, a zener or a selenium stack: a pure,
 * non-decreasing, once continuously differentiable function of the volts from anode to cathode.
 */
public non-sealed interface TwoPoleLaw extends SectionLaw {
  /** Fills {@code out} for {@code volts} from anode (plate) to cathode. */
  void evaluate(double volts, TwoPoleCurrent out);

  /**
   * Returns the volts above which the law is nearly straight: a solver coming down from above them
   * starts its next step there.
   */
  default double kneeVolts() {
    return 0;
  }

  /** Returns the law with its current multiplied by {@code emission} at fixed volts. */
  TwoPoleLaw withEmission(double emission);
}
