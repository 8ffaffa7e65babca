package railwalk.walk;

import java.util.List;
import java.util.stream.Stream;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Coupling;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.ElementVisitor;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.StandIn;
import railwalk.circuit.Switch;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;

/**
 * The node pairs that a part joins for alternating current, as {@link RippleGroups} floods through
 * them: both poles of passive parts, a rectifier's plates with its cathode, the closed contact of a
 * switch. Tubes that amplify, regulators and lone currents join nothing: they load a supply.
 */
final class Conduction implements ElementVisitor<List<Conduction.Pair>> {
  /** Two nodes joined. */
  record Pair(Node a, Node b) {}

  private static final Conduction INSTANCE = new Conduction();

  private Conduction() {}

  /** Returns the pairs that {@code element} joins. */
  static List<Pair> pairs(Element element) {
    return element.accept(INSTANCE);
  }

  private static List<Pair> pair(Node a, Node b) {
    return List.of(new Pair(a, b));
  }

  @Override
  public List<Pair> visit(Resistor resistor) {
    return pair(resistor.a(), resistor.b());
  }

  @Override
  public List<Pair> visit(Capacitor capacitor) {
    return pair(capacitor.a(), capacitor.b());
  }

  @Override
  public List<Pair> visit(Inductor inductor) {
    return pair(inductor.a(), inductor.b());
  }

  @Override
  public List<Pair> visit(VoltageSource source) {
    return pair(source.a(), source.b());
  }

  @Override
  public List<Pair> visit(CurrentSource source) {
    return List.of();
  }

  @Override
  public List<Pair> visit(Winding winding) {
    return winding.sections().stream().map(s -> new Pair(s.a(), s.b())).toList();
  }

  @Override
  public List<Pair> visit(Diode diode) {
    return pair(diode.anode(), diode.cathode());
  }

  @Override
  public List<Pair> visit(ControlledSource source) {
    return List.of();
  }

  @Override
  public List<Pair> visit(Coupling coupling) {
    return List.of();
  }

  @Override
  public List<Pair> visit(Potentiometer pot) {
    return List.of(new Pair(pot.a(), pot.wiper()), new Pair(pot.wiper(), pot.b()));
  }

  @Override
  public List<Pair> visit(Switch contact) {
    return contact.position() == 0
        ? List.of()
        : pair(contact.common(), contact.poles().get(contact.position() - 1));
  }

  @Override
  public List<Pair> visit(Fuse fuse) {
    return pair(fuse.a(), fuse.b());
  }

  @Override
  public List<Pair> visit(Lamp lamp) {
    return pair(lamp.a(), lamp.b());
  }

  @Override
  public List<Pair> visit(GlowLamp lamp) {
    return List.of();
  }

  @Override
  public List<Pair> visit(Wire wire) {
    return pair(wire.a(), wire.b());
  }

  @Override
  public List<Pair> visit(Filament filament) {
    return pair(filament.a(), filament.b());
  }

  @Override
  public List<Pair> visit(AmplifierSection section) {
    return List.of();
  }

  @Override
  public List<Pair> visit(RectifierSection section) {
    return section.plates().stream().map(p -> new Pair(p, section.cathode())).toList();
  }

  @Override
  public List<Pair> visit(RegulatorSection section) {
    return List.of();
  }

  @Override
  public List<Pair> visit(StandIn standIn) {
    return List.of();
  }

  /** Returns the nodes joined to {@code node} by {@code element}. */
  static Stream<Node> across(Element element, Node node) {
    return pairs(element).stream()
        .filter(p -> p.a().equals(node) || p.b().equals(node))
        .map(p -> p.a().equals(node) ? p.b() : p.a());
  }
}
