package railwalk.circuit;

import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import railwalk.device.AmplifierLaw;
import railwalk.device.SectionType;

/**
 * A triode, pentode or beam section.
 *
 * @param bottle name of the tube it is in
 * @param section its letter; empty for the only one
 * @param screen null on a triode
 * @param suppressor node of a separate suppressor when it is not tied to the cathode; null
 *     otherwise
 */
public record AmplifierSection(
    String name,
    String bottle,
    String section,
    SectionType type,
    Node plate,
    @Nullable Node screen,
    Node grid,
    Node cathode,
    @Nullable Node suppressor)
    implements Element {
  @Override
  public List<Node> nodes() {
    return Stream.of(plate, screen, suppressor, grid, cathode).filter(Objects::nonNull).toList();
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
  public AmplifierSection withLaw(AmplifierLaw changed) {
    return new AmplifierSection(
        name, bottle, section, type.withLaw(changed), plate, screen, grid, cathode, suppressor);
  }

  /** Returns this section wired otherwise. */
  public AmplifierSection wired(
      Node toPlate, @Nullable Node toScreen, Node toGrid, Node toCathode) {
    return new AmplifierSection(
        name, bottle, section, type, toPlate, toScreen, toGrid, toCathode, suppressor);
  }

  /** Returns the section's law. */
  public AmplifierLaw law() {
    return (AmplifierLaw) type.law();
  }
}
