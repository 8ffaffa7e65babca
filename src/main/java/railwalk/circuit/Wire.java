package railwalk.circuit;

import java.util.List;

/**
 * A plain connection that keeps two node names apart: pins joined inside a tube, a regulator's
 * jumper.
 *
 * @param bottle the tube that makes it; empty when it is plain wire
 */
public record Wire(String name, Node a, Node b, String bottle) implements Element {
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
