package railwalk.circuit;

import java.util.List;

/**
 * A choke, a coil or a transformer half: its winding resistance at DC.
 *
 * @param henries NaN when not given
 * @param dcOhms NaN when not given; then it counts as a short and its rows say so
 */
public record Inductor(String name, Node a, Node b, double henries, double dcOhms)
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
