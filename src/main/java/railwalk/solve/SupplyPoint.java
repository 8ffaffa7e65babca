package railwalk.solve;

import railwalk.circuit.Node;

/**
 * What one output of a rectifier group does over a line period.
 *
 * @param node the reservoir's hot end
 * @param dcAmps mean current that leaves the rectifier group there towards the load, all that hangs
 *     beyond the reservoir included; negative for a negative supply
 * @param peakAmps greatest current of one rectifier path that charges it
 * @param rippleVoltsRms rms of what is left when the mean is taken off
 */
public record SupplyPoint(Node node, double dcAmps, double peakAmps, double rippleVoltsRms) {}
