package railwalk.spread;

/**
 * The volts between which nine healthy amplifiers in ten fall: expected volts ∓ 1.645 standard
 * deviations, first order.
 */
public record Band(double lowVolts, double highVolts) {}
