package railwalk.circuit;

import java.util.List;

/** Two coupled coils: no part at DC, of use only between supply chokes. */
public record Coupling(String name, String first, String second, double factor) implements Element {
  @Override
  public List<Node> nodes() {
    return List.of();
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
