package railwalk.device;

/**
 * A glow-discharge regulator or neon lamp: dark until the strike volts are reached, then a nearly
 * constant voltage with a small slope.
 *
 * <p>The solver decides which of the two branches holds; each is a law of its own.
 *
 * @param strikeVolts at which the dark tube lights
 * @param operatingVolts at {@code referenceAmps}
 * @param referenceAmps middle of the rated current range
 * @param slopeOhms slope of the lit branch
 * @param minimumAmps below which the published regulation no longer holds
 * @param maximumAmps rating
 */
public record GasLaw(
    double strikeVolts,
    double operatingVolts,
    double referenceAmps,
    double slopeOhms,
    double minimumAmps,
    double maximumAmps)
    implements SectionLaw {

  /** Leakage of a dark tube: a thousand megohms, so that a node fed by nothing else is defined. */
  private static final double DARK_SIEMENS = 1e-9;

  /** Returns the branch before the strike: all but open. */
  public TwoPoleLaw dark() {
    return new Branch(DARK_SIEMENS, 0);
  }

  /**
   * Returns the lit branch: straight, from {@code operatingVolts − referenceAmps · slopeOhms} at no
   * current. Below no current it goes on straight; the solver then puts the tube out.
   */
  public TwoPoleLaw lit() {
    return new Branch(1 / slopeOhms, operatingVolts - referenceAmps * slopeOhms);
  }

  private record Branch(double siemens, double footVolts) implements TwoPoleLaw {
    @Override
    public void evaluate(double volts, TwoPoleCurrent out) {
      out.amps = siemens * (volts - footVolts);
      out.siemens = siemens;
    }

    @Override
    public TwoPoleLaw withEmission(double emission) {
      return this;
    }
  }
}
