package railwalk.circuit;

import java.util.List;

/** An incandescent lamp at its hot resistance. */
public record Lamp(String name, Node a, Node b, double ratedVolts, double ratedAmps)
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
