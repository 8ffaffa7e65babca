package railwalk.circuit;

import java.util.List;

/**
 * A capacitor: open at DC but for its leak.
 *
 * @param ratedVolts NaN when not given
 * @param leakOhms infinite when none is given
 * @param safetyRated whether the line marks it as fit for line-to-chassis use
 */
public record Capacitor(
    String name,
    Node a,
    Node b,
    double farads,
    double ratedVolts,
    double leakOhms,
    boolean safetyRated)
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
