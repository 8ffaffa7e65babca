package railwalk.circuit;

import java.util.List;

/**
 * A fuse, whole.
 *
 * @param ratedAmps NaN when not given
 */
public record Fuse(String name, Node a, Node b, double ratedAmps) implements Element {
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
