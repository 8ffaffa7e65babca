package railwalk.solve;

import railwalk.circuit.Element;

/**
 * What a diode, or one plate of a rectifier tube, stands.
 *
 * @param plate its place among the tube's plates, from 0
 * @param inverseVolts greatest volts against its way
 */
public record RectifierLoad(
    Element rectifier, int plate, double meanAmps, double peakAmps, double inverseVolts) {}
