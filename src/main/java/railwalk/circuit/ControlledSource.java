package railwalk.circuit;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * A linear controlled source between a (positive, or where current leaves) and b.
 *
 * @param gain V/V, A/V, V/A or A/A by kind
 * @param controlA positive controlling node of the voltage-controlled kinds; null otherwise
 * @param controlB negative controlling node; null otherwise
 * @param controlElement name of the source whose current controls; empty for the others
 */
public record ControlledSource(
    String name,
    Kind kind,
    Node a,
    Node b,
    double gain,
    @Nullable Node controlA,
    @Nullable Node controlB,
    String controlElement)
    implements Element {
  @Override
  public List<Node> nodes() {
    return controlA == null || controlB == null ? List.of(a, b) : List.of(a, b, controlA, controlB);
  }

  @Override
  public <R> R accept(ElementVisitor<R> visitor) {
    return visitor.visit(this);
  }

  @Override
  public int hashCode() {
    return name.hashCode();
  }

  /** What controls what. */
  public enum Kind {
    /** E: volts by volts. */
    VOLTS_BY_VOLTS,
    /** G: current by volts. */
    AMPS_BY_VOLTS,
    /** H: volts by current. */
    VOLTS_BY_AMPS,
    /** F: current by current. */
    AMPS_BY_AMPS
  }
}
