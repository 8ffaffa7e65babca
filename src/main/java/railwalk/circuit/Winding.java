package railwalk.circuit;

import java.util.ArrayList;
import java.util.List;

/**
 * A transformer winding, tapped or not, or the wall.
 *
 * <p>Each section's first node is in phase with the other windings' first ends; along a tapped
 * winding all sections have one sense, so that its two ends are in opposite phase against a tap
 * between them.
 *
 * @param sections from the first end to the last; at least one
 * @param atLineVolts line volts at which {@code openRmsVolts} hold; NaN: the design volts of the
 *     line
 * @param transformer name of the transformer whose primary it shares; empty when none
 * @param wall whether this is the wall outlet itself (no isolation from the line)
 * @param ratedAmps greatest current rms of a section; NaN when not given
 */
public record Winding(
    String name,
    List<Section> sections,
    double atLineVolts,
    String transformer,
    boolean wall,
    double ratedAmps)
    implements Element {
  @Override
  public List<Node> nodes() {
    return nodeList();
  }

  @Override
  public <R> R accept(ElementVisitor<R> visitor) {
    return visitor.visit(this);
  }

  @Override
  public int hashCode() {
    return name.hashCode();
  }

  /**
   * The turns between two neighbouring ends or taps.
   *
   * @param openRmsVolts volts rms of a against b at no load, never negative
   * @param ohms winding resistance at DC; NaN when not given
   */
  public record Section(Node a, Node b, double openRmsVolts, double ohms) {}

  /** Keeps a copy of the sections. */
  public Winding {
    sections = List.copyOf(sections);
  }

  /** A winding without a current rating. */
  public Winding(
      String name, List<Section> sections, double atLineVolts, String transformer, boolean wall) {
    this(name, sections, atLineVolts, transformer, wall, Double.NaN);
  }

  /** Returns this winding with other sections. */
  public Winding withSections(List<Section> changed) {
    return new Winding(name, changed, atLineVolts, transformer, wall, ratedAmps);
  }

  /** Returns this winding with its open-circuit volts multiplied by {@code factor}. */
  public Winding scaled(double factor) {
    return withSections(
        sections.stream()
            .map(s -> new Section(s.a(), s.b(), s.openRmsVolts() * factor, s.ohms()))
            .toList());
  }

  /** Returns this winding with another resistance in the section of that number, from 0. */
  public Winding withOhms(int number, double ohms) {
    List<Section> changed = new ArrayList<>(sections);
    Section s = changed.get(number);
    changed.set(number, new Section(s.a(), s.b(), s.openRmsVolts(), ohms));
    return withSections(changed);
  }

  /** Returns the ends and taps in order. */
  private List<Node> nodeList() {
    List<Node> nodes = new ArrayList<>();
    nodes.add(sections.get(0).a());
    sections.forEach(section -> nodes.add(section.b()));
    return nodes;
  }
}
