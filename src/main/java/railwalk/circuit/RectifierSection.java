package railwalk.circuit;

import java.util.List;
import java.util.stream.Stream;
import railwalk.device.SectionType;
import railwalk.device.TwoPoleLaw;

/**
 * A rectifier tube's plates with their common cathode, or a detector diode.
 *
 * @param plates one or two (three halves-power law each)
 * @param cathode for a filament its middle
 */
public record RectifierSection(
    String name, String bottle, String section, SectionType type, List<Node> plates, Node cathode)
    implements Element {
  @Override
  public List<Node> nodes() {
    return Stream.concat(plates.stream(), Stream.of(cathode)).toList();
  }

  @Override
  public <R> R accept(ElementVisitor<R> visitor) {
    return visitor.visit(this);
  }

  @Override
  public int hashCode() {
    return name.hashCode();
  }

  /** Keeps a copy of the plates. */
  public RectifierSection {
    plates = List.copyOf(plates);
  }

  /** Returns this section with another law for each plate. */
  public RectifierSection withLaw(TwoPoleLaw changed) {
    return new RectifierSection(name, bottle, section, type.withLaw(changed), plates, cathode);
  }

  /** Returns the law of one plate. */
  public TwoPoleLaw law() {
    return (TwoPoleLaw) type.law();
  }
}
