package railwalk.circuit;

import java.util.List;
import railwalk.device.GasLaw;
import railwalk.device.SectionType;

/** A glow-discharge regulator tube. */
public record RegulatorSection(
    String name, String bottle, String section, SectionType type, Node anode, Node cathode)
    implements Element {
  @Override
  public List<Node> nodes() {
    return List.of(anode, cathode);
  }

  @Override
  public <R> R accept(ElementVisitor<R> visitor) {
    return visitor.visit(this);
  }

  @Override
  public int hashCode() {
    return name.hashCode();
  }

  /** Returns this section with another law. */
  public RegulatorSection withLaw(GasLaw changed) {
    return new RegulatorSection(name, bottle, section, type.withLaw(changed), anode, cathode);
  }

  /** Returns the section's law. */
  public GasLaw law() {
    return (GasLaw) type.law();
  }
}
