package railwalk.circuit;

/**
 * A junction of the circuit.
 *
 * @param index its place in {@link Circuit#nodes()}, which is netlist order
 * @param name as first typed
 */
public record Node(int index, String name) {}
