package railwalk.circuit;

import java.util.List;

/**
 * A potentiometer.
 *
 * @param ohms end to end; NaN where the netlist says "?"
 * @param share of the track between b and the wiper, 0 to 1
 */
public record Potentiometer(String name, Node a, Node wiper, Node b, double ohms, double share)
    implements Element {
  @Override
  public List<Node> nodes() {
    return List.of(a, wiper, b);
  }

  @Override
  public <R> R accept(ElementVisitor<R> visitor) {
    return visitor.visit(this);
  }

  @Override
  public int hashCode() {
    return name.hashCode();
  }

  /** Returns the control set elsewhere. */
  public Potentiometer setTo(double changedShare) {
    return new Potentiometer(name, a, wiper, b, ohms, changedShare);
  }
}
