package railwalk.walk;

import java.util.List;
import railwalk.circuit.Node;

/**
 * A way from a wire of the wall outlet to the chassis or the reference without a transformer
 * between.
 *
 * @param target the chassis or the reference
 * @param steps from the wall's wire to it; empty when it is the wire itself
 * @param ohms the resistance of the way, contacts and diodes taken for nothing
 * @param switchedOff whether one of the two wires reaches it even with every switch open
 */
public record LineContact(Node target, List<DcStep> steps, double ohms, boolean switchedOff) {
  public LineContact {
    steps = List.copyOf(steps);
  }
}
