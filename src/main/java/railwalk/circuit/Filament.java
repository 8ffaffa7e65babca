package railwalk.circuit;

import java.util.List;

/**
 * A tube's heater or filament, or a part of it between two wired pins, at its hot resistance. It
 * stands in the circuit only where both its ends are wired.
 *
 * @param bottle the tube it heats
 * @param ratedVolts of this part
 * @param ratedAmps of this part
 */
public record Filament(
    String name, String bottle, Node a, Node b, double ratedVolts, double ratedAmps)
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

  /** Returns the hot resistance. */
  public double hotOhms() {
    return ratedVolts / ratedAmps;
  }
}
