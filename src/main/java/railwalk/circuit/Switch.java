package railwalk.circuit;

import java.util.List;
import java.util.stream.Stream;

/**
 * A switch, changeover or rotary.
 *
 * @param poles contacts in order; a plain switch has one
 * @param position 0 for open, else the number of the contact that the common is on
 */
public record Switch(String name, Node common, List<Node> poles, int position) implements Element {
  @Override
  public List<Node> nodes() {
    return Stream.concat(Stream.of(common), poles.stream()).toList();
  }

  @Override
  public <R> R accept(ElementVisitor<R> visitor) {
    return visitor.visit(this);
  }

  @Override
  public int hashCode() {
    return name.hashCode();
  }

  /** Keeps a copy of the poles. */
  public Switch {
    poles = List.copyOf(poles);
  }

  /** Returns the switch on another position. */
  public Switch onPosition(int changed) {
    return new Switch(name, common, poles, changed);
  }
}
