package railwalk.device;

/**
 * What a cathode gives in the seconds after its heater is switched on, as a share of its current
 * when hot at the same volts.
 *
 * <p>The temperature, as a share θ of the hot one, follows from a constant power that is radiated
 * away (Stefan and Boltzmann): dθ/dt = (1 − θ⁴) / τ, so t / τ = ½ (artanh θ + arctan θ) + constant.
 * The saturation current follows Richardson's equation, A·T²·exp(−W / kT). A hot oxide cathode can
 * give ten times what the tube takes (handbooks ask for a reserve of that order; from memory); with
 * s the saturation current over the current the tube would take, it passes s / (1 + s) of that,
 * which goes from temperature-limited to space-charge-limited current without a corner (this
 * project's own rounding).
 *
 * @param seconds until nine tenths of the current are there; 0 for what conducts at once
 */
public record WarmUpLaw(double seconds) {
  /** The share of the hot current at which a tube counts as warm. */
  public static final double WARM = 0.9;

  /** Kelvin; an oxide cathode works at about 1,050 K (handbooks). */
  private static final double HOT_KELVIN = 1050;

  private static final double ROOM_KELVIN = 293;

  /** Work function of barium and strontium oxides, electron volts (handbooks: 1.0 to 1.1). */
  private static final double WORK_VOLTS = 1.0;

  /** Boltzmann's constant over the electron's charge, volts per kelvin. */
  private static final double THERMAL_VOLTS_PER_KELVIN = 8.617e-5;

  private static final double RESERVE = 10;

  private static final double EXPONENT = WORK_VOLTS / (THERMAL_VOLTS_PER_KELVIN * HOT_KELVIN);
  private static final double COLD = ROOM_KELVIN / HOT_KELVIN;
  private static final double WARM_TIME = time(temperatureAt(WARM));

  /** From here on the cathode is as hot as it gets, as nearly as can be told. */
  private static final double HOT_TIMES = 8;

  private static final int HALVINGS = 50;

  /** Returns the share of the hot current, from 0 to 1, {@code time} seconds after switch-on. */
  public double emission(double time) {
    if (time >= HOT_TIMES * seconds) {
      return 1;
    }
    return time <= 0 ? 0 : emissionAt(temperature(time / seconds * WARM_TIME));
  }

  /** Returns the seconds until the share of the hot current is {@code emission}, below 1. */
  public double secondsTo(double emission) {
    return seconds * time(temperatureAt(emission)) / WARM_TIME;
  }

  private static double emissionAt(double temperature) {
    double saturation =
        RESERVE * temperature * temperature * Math.exp(-EXPONENT * (1 / temperature - 1));
    return saturation / (1 + saturation) * (1 + RESERVE) / RESERVE;
  }

  private static double temperatureAt(double emission) {
    double low = COLD;
    double high = 1;
    for (int i = 0; i < HALVINGS; i++) {
      double middle = (low + high) / 2;
      if (emissionAt(middle) < emission) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return (low + high) / 2;
  }

  /** Returns the time, in units of τ, from room temperature to {@code temperature}. */
  private static double time(double temperature) {
    return integral(temperature) - integral(COLD);
  }

  private static double integral(double temperature) {
    double artanh = Math.log((1 + temperature) / (1 - temperature)) / 2;
    return (artanh + Math.atan(temperature)) / 2;
  }

  /** Returns the temperature after {@code time} in units of τ. */
  private static double temperature(double time) {
    double sought = 2 * (time + integral(COLD));
    double low = COLD;
    double high = 1;
    for (int i = 0; i < HALVINGS; i++) {
      double middle = (low + high) / 2;
      if (middle < Math.tanh(sought - Math.atan(middle))) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return (low + high) / 2;
  }
}
