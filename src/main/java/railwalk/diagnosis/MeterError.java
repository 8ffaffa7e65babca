package railwalk.diagnosis;

import railwalk.circuit.Meter;

/**
 * How far a meter may be wrong. Digital: 1 % of the reading and one digit of a meter of 2,000
 * counts. With a needle: 3 % of the range's end. Limits of a meter in order, common practice.
 */
final class MeterError {
  private static final double SHARE = 0.01;
  private static final double COUNTS = 2000;
  private static final double LEAST_RANGE_VOLTS = 0.2;
  private static final double NEEDLE_SHARE = 0.03;

  private MeterError() {}

  /** Returns the limit of error (volt) at a reading of {@code volts}. */
  static double limitVolts(Meter meter, double volts, double rangeVolts) {
    if (!Double.isNaN(meter.ohmsPerVolt())) {
      return NEEDLE_SHARE * (Double.isNaN(rangeVolts) ? meter.rangeFor(volts) : rangeVolts);
    }
    double range = LEAST_RANGE_VOLTS;
    while (range < Math.abs(volts) && range < 2000) {
      range *= 10;
    }
    return SHARE * Math.abs(volts) + range / COUNTS;
  }
}
