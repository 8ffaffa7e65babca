package railwalk.circuit;

import railwalk.device.Electrode;

/**
 * A tube electrode that the netlist names, and the node it is on.
 *
 * @param section its section's id; empty for the heater and for the only section
 */
public record Lead(String section, Electrode electrode, Node node) {}
