package railwalk.walk;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Node;

/**
 * The way of the direct current to one point of the amplifier and back again.
 *
 * @param target the point
 * @param supply the supply node it hangs from; null when it hangs from ground alone
 * @param there the steps from the winding (or fixed source) through rectifier, droppers and loads
 *     to the point, each beginning where the one before ended; for a point that hangs from ground
 *     the steps from the reference to it
 * @param back the steps from the point through tube and cathode circuit to the reference and the
 *     winding; empty for a supply node, a grid, and a point above the tubes
 */
public record DcPath(Node target, @Nullable Node supply, List<DcStep> there, List<DcStep> back) {
  public DcPath {
    there = List.copyOf(there);
    back = List.copyOf(back);
  }
}
