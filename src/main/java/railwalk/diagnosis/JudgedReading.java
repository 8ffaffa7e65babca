package railwalk.diagnosis;

import railwalk.readings.Reading;

/**
 * A reading beside what a healthy amplifier shows there; volt, ohm or ampere by the reading's kind.
 *
 * @param chart expected at the netlist's own line, before the meter is counted in
 * @param expected expected at the actual line, before the meter is counted in
 * @param meter expected at the actual line on this meter and range
 * @param low lower limit for 99 healthy amplifiers in 100 as the meter shows it, the meter's own
 *     error left out
 * @param high upper limit
 * @param meterLimit how far the meter itself may be wrong
 */
public record JudgedReading(
    Reading reading,
    double chart,
    double expected,
    double meter,
    double low,
    double high,
    double meterLimit,
    Verdict verdict) {}
