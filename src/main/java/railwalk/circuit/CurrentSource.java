package railwalk.circuit;

import java.util.List;

/** A DC current that flows out of node a, through the source, into node b. */
public record CurrentSource(String name, Node a, Node b, double amps) implements Element {
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
