package railwalk.walk;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
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
import railwalk.device.ZenerLaw;

/**
 * Lists the ways that direct current can take through each part of a circuit. A grid is none, nor
 * is a neon lamp, which is dark until proved lit, nor a source of current.
 */
final class DcBranches implements ElementVisitor<Void> {
  /** What a part without a resistance of its own counts when ways are compared. */
  private static final double NOMINAL_OHMS = 1;

  /** An amplifying section, when ways are compared: the order of a small triode's plate. */
  private static final double TUBE_OHMS = 20_000;

  private final List<DcBranch> branches = new ArrayList<>();

  private DcBranches() {}

  /** Returns the branches of all parts, in netlist order, those from a node to itself left out. */
  static List<DcBranch> of(Circuit circuit) {
    DcBranches lister = new DcBranches();
    circuit.elements().forEach(element -> element.accept(lister));
    return List.copyOf(lister.branches);
  }

  private Void add(Element element, Node a, Node b, DcBranch.Way way, double ohms) {
    if (!a.equals(b)) {
      double known = Double.isNaN(ohms) ? NOMINAL_OHMS : ohms;
      branches.add(new DcBranch(branches.size(), element, a, b, way, known));
    }
    return null;
  }

  @Override
  public Void visit(Resistor resistor) {
    return add(resistor, resistor.a(), resistor.b(), DcBranch.Way.CONDUCTOR, resistor.ohms());
  }

  @Override
  public Void visit(Capacitor capacitor) {
    return Double.isInfinite(capacitor.leakOhms())
        ? null
        : add(capacitor, capacitor.a(), capacitor.b(), DcBranch.Way.LEAK, capacitor.leakOhms());
  }

  @Override
  public Void visit(Inductor inductor) {
    return add(inductor, inductor.a(), inductor.b(), DcBranch.Way.CONDUCTOR, inductor.dcOhms());
  }

  @Override
  public Void visit(VoltageSource source) {
    return add(source, source.a(), source.b(), DcBranch.Way.SOURCE, source.seriesOhms());
  }

  @Override
  public Void visit(CurrentSource source) {
    return null;
  }

  @Override
  public Void visit(Winding winding) {
    for (Winding.Section section : winding.sections()) {
      add(winding, section.a(), section.b(), DcBranch.Way.WINDING, section.ohms());
    }
    return null;
  }

  @Override
  public Void visit(Diode diode) {
    DcBranch.Way way = diode.law() instanceof ZenerLaw ? DcBranch.Way.ZENER : DcBranch.Way.DIODE;
    return add(diode, diode.anode(), diode.cathode(), way, NOMINAL_OHMS);
  }

  @Override
  public Void visit(ControlledSource source) {
    return switch (source.kind()) {
      case VOLTS_BY_VOLTS, VOLTS_BY_AMPS ->
          add(source, source.a(), source.b(), DcBranch.Way.SOURCE, 0);
      case AMPS_BY_VOLTS, AMPS_BY_AMPS -> null;
    };
  }

  @Override
  public Void visit(Coupling coupling) {
    return null;
  }

  @Override
  public Void visit(Potentiometer pot) {
    double ohms = Double.isNaN(pot.ohms()) ? NOMINAL_OHMS : pot.ohms();
    add(pot, pot.a(), pot.wiper(), DcBranch.Way.CONDUCTOR, ohms * (1 - pot.share()));
    return add(pot, pot.wiper(), pot.b(), DcBranch.Way.CONDUCTOR, ohms * pot.share());
  }

  @Override
  public Void visit(Switch contact) {
    if (contact.position() == 0) {
      return null;
    }
    Node pole = contact.poles().get(contact.position() - 1);
    return add(contact, contact.common(), pole, DcBranch.Way.CONDUCTOR, 0);
  }

  @Override
  public Void visit(Fuse fuse) {
    return add(fuse, fuse.a(), fuse.b(), DcBranch.Way.CONDUCTOR, 0);
  }

  @Override
  public Void visit(Lamp lamp) {
    double ohms = lamp.ratedVolts() / lamp.ratedAmps();
    return add(lamp, lamp.a(), lamp.b(), DcBranch.Way.CONDUCTOR, ohms);
  }

  @Override
  public Void visit(GlowLamp glowLamp) {
    return null;
  }

  @Override
  public Void visit(Wire wire) {
    return add(wire, wire.a(), wire.b(), DcBranch.Way.CONDUCTOR, 0);
  }

  @Override
  public Void visit(Filament filament) {
    double ohms = filament.hotOhms();
    return add(filament, filament.a(), filament.b(), DcBranch.Way.CONDUCTOR, ohms);
  }

  @Override
  public Void visit(AmplifierSection section) {
    Node cathode = section.cathode();
    add(section, section.plate(), cathode, DcBranch.Way.PLATE, TUBE_OHMS);
    Node screen = section.screen();
    return screen == null ? null : add(section, screen, cathode, DcBranch.Way.SCREEN, TUBE_OHMS);
  }

  @Override
  public Void visit(RectifierSection section) {
    for (Node plate : section.plates()) {
      add(section, plate, section.cathode(), DcBranch.Way.RECTIFIER, NOMINAL_OHMS);
    }
    return null;
  }

  @Override
  public Void visit(RegulatorSection section) {
    Node cathode = section.cathode();
    return add(section, section.anode(), cathode, DcBranch.Way.REGULATOR, NOMINAL_OHMS);
  }

  @Override
  public Void visit(StandIn standIn) {
    return null;
  }
}
