package railwalk.walk;

import railwalk.circuit.Element;
import railwalk.circuit.Node;

/**
 * One part on a {@link DcPath}, and between which of its nodes the path goes through it.
 *
 * @param from where the path enters it
 * @param to where the path leaves it
 */
public record DcStep(Node from, Element element, Node to) {}
