package railwalk.solve;

import railwalk.circuit.Winding;

/**
 * What a section of a winding gives and carries.
 *
 * @param section its place among the winding's sections, from 0
 * @param rmsVolts between the section's ends, under load
 */
public record WindingLoad(
    Winding winding, int section, double rmsVolts, double rmsAmps, double peakAmps) {}
