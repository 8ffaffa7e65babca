package railwalk.circuit;

import java.util.List;
import railwalk.device.GasLaw;

/** A neon lamp: lights either way round. */
public record GlowLamp(String name, Node a, Node b, String typeName, GasLaw law)
    implements Element {
  @Override
  public List<Node> nodes() {
    return List.of(a, b);
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
