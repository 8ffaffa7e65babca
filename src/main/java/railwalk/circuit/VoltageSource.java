package railwalk.circuit;

import java.util.List;

/** A fixed DC source: a stands {@code volts} above b at no load. */
public record VoltageSource(String name, Node a, Node b, double volts, double seriesOhms)
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
