package railwalk.device;

/**
 * Static law of a triode, pentode or beam section: a pure function from electrode volts to
 * currents, once continuously differentiable for all volts that a solver may try.
 */
public non-sealed interface AmplifierLaw extends SectionLaw {
  /**
   * Fills {@code out} with currents and partial derivatives.
   *
   * @param plateVolts plate to cathode
   * @param screenVolts screen to cathode; a triode takes no notice of it
   * @param gridVolts control grid to cathode
   */
  void evaluate(double plateVolts, double screenVolts, double gridVolts, SectionCurrents out);

  /**
   * Returns the same law with the space current multiplied by {@code emission} at fixed volts (1 is
   * a tube as published, 0.7 a tired one).
   */
  AmplifierLaw withEmission(double emission);
}
