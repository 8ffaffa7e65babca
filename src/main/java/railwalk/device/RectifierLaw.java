package railwalk.device;

/**
 * One plate of a high-vacuum rectifier: {@code i = K · v^1.5} for v &gt; 0, else nothing (the
 * three-halves-power law of Child and Langmuir, in ampere and volt). Once continuously
 * differentiable.
 *
 * @param perveance K, ampere per volt^1.5
 */
public record RectifierLaw(double perveance) implements TwoPoleLaw {
  @Override
  public void evaluate(double volts, TwoPoleCurrent out) {
    if (volts <= 0) {
      out.amps = 0;
      out.siemens = 0;
      return;
    }
    double root = perveance * Math.sqrt(volts);
    out.amps = root * volts;
    out.siemens = 1.5 * root;
  }

  @Override
  public TwoPoleLaw withEmission(double emission) {
    return new RectifierLaw(perveance * emission);
  }
}
