package railwalk.readings;

import java.util.Optional;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Coupling;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Diode;
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
import railwalk.readings.Terminals.Ends;

/** The two ends of a part between which its drop is read; empty for parts without. */
final class Terminals implements ElementVisitor<Optional<Ends>> {
  /** The two ends. */
  record Ends(Node a, Node b) {}

  private static Optional<Ends> ends(Node a, Node b) {
    return Optional.of(new Ends(a, b));
  }

  @Override
  public Optional<Ends> visit(Resistor resistor) {
    return ends(resistor.a(), resistor.b());
  }

  @Override
  public Optional<Ends> visit(Capacitor capacitor) {
    return ends(capacitor.a(), capacitor.b());
  }

  @Override
  public Optional<Ends> visit(Inductor inductor) {
    return ends(inductor.a(), inductor.b());
  }

  @Override
  public Optional<Ends> visit(VoltageSource voltageSource) {
    return ends(voltageSource.a(), voltageSource.b());
  }

  @Override
  public Optional<Ends> visit(CurrentSource currentSource) {
    return ends(currentSource.a(), currentSource.b());
  }

  /** A winding is read in AC volts, from its first end to its last. */
  @Override
  public Optional<Ends> visit(Winding winding) {
    return Optional.empty();
  }

  @Override
  public Optional<Ends> visit(Diode diode) {
    return ends(diode.anode(), diode.cathode());
  }

  @Override
  public Optional<Ends> visit(ControlledSource controlledSource) {
    return ends(controlledSource.a(), controlledSource.b());
  }

  @Override
  public Optional<Ends> visit(Coupling coupling) {
    return Optional.empty();
  }

  /** The track, from end to end. */
  @Override
  public Optional<Ends> visit(Potentiometer potentiometer) {
    return ends(potentiometer.a(), potentiometer.b());
  }

  /** The contact in use; of a plain switch the only one. */
  @Override
  public Optional<Ends> visit(Switch contact) {
    int position = contact.position() == 0 && contact.poles().size() == 1 ? 1 : contact.position();
    return position == 0
        ? Optional.empty()
        : ends(contact.common(), contact.poles().get(position - 1));
  }

  @Override
  public Optional<Ends> visit(Fuse fuse) {
    return ends(fuse.a(), fuse.b());
  }

  @Override
  public Optional<Ends> visit(Lamp lamp) {
    return ends(lamp.a(), lamp.b());
  }

  @Override
  public Optional<Ends> visit(GlowLamp glowLamp) {
    return ends(glowLamp.a(), glowLamp.b());
  }

  @Override
  public Optional<Ends> visit(Wire wire) {
    return ends(wire.a(), wire.b());
  }

  @Override
  public Optional<Ends> visit(Filament filament) {
    return ends(filament.a(), filament.b());
  }

  @Override
  public Optional<Ends> visit(AmplifierSection amplifierSection) {
    return Optional.empty();
  }

  @Override
  public Optional<Ends> visit(RectifierSection rectifierSection) {
    return Optional.empty();
  }

  @Override
  public Optional<Ends> visit(RegulatorSection regulatorSection) {
    return Optional.empty();
  }

  @Override
  public Optional<Ends> visit(StandIn standIn) {
    return Optional.empty();
  }
}
