package railwalk.circuit;

import java.util.List;

/**
 * A resistor.
 *
 * @param ohms NaN where the netlist says "?"
 * @param ratedWatts NaN when not given
 * @param tolerance as a share (0.05 for 5 %); NaN when not given
 */
public record Resistor(
    String name, Node a, Node b, double ohms, double ratedWatts, double tolerance)
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

  /** A resistance that nothing more is known of. */
  public Resistor(String name, Node a, Node b, double ohms) {
    this(name, a, b, ohms, Double.NaN, Double.NaN);
  }

  /** Returns this resistor with another value. */
  public Resistor withOhms(double changed) {
    return new Resistor(name, a, b, changed, ratedWatts, tolerance);
  }

  /** Returns whether the value is to be solved from readings. */
  public boolean unknown() {
    return Double.isNaN(ohms);
  }
}
