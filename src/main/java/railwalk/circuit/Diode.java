package railwalk.circuit;

import java.util.List;
import railwalk.device.TwoPoleLaw;

/**
 * A silicon, zener or selenium diode.
 *
 * @param typeName as written
 */
public record Diode(String name, Node anode, Node cathode, String typeName, TwoPoleLaw law)
    implements Element {
  @Override
  public List<Node> nodes() {
    return List.of(anode, cathode);
  }

  @Override
  public <R> R accept(ElementVisitor<R> visitor) {
    return visitor.visit(this);
  }

  @Override
  public int hashCode() {
    return name.hashCode();
  }
}
