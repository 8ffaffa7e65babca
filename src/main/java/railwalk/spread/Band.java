package railwalk.spread;

/**
 * The volts between which nine healthy amplifiers in ten fall: to first order, expected volts ∓
 * 1.645 standard deviations; sampled, the 5 % and 95 % points of the builds.
 */
public record Band(double lowVolts, double highVolts) {}
