package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Winding;
import railwalk.device.SectionLaw;

/**
 * Writes the direct-current equations of parts: coils and windings are their resistance, capacitors
 * their leak; what follows a law is noted for {@link DcNetwork} to evaluate.
 */
class DcStamper extends LinearStamper {
  /** A tube section with the number of the first of its 16 entries. */
  record AmplifierDraft(
      AmplifierSection section, int plate, int screen, int grid, int cathode, int entry) {}

  /** A two-pole with the number of the first of its four entries. */
  record TwoPoleDraft(Element element, SectionLaw law, int anode, int cathode, int entry) {}

  final List<AmplifierDraft> amplifiers = new ArrayList<>();
  final List<TwoPoleDraft> twoPoles = new ArrayList<>();
  private final List<ControlledSource> controlled = new ArrayList<>();

  DcStamper(Stamps stamps, Map<Node, Integer> unknowns) {
    super(stamps, unknowns);
  }

  /** Writes the sources that follow another part's current, which must stand by then. */
  void finish() {
    controlled.forEach(this::writeControlled);
  }

  @Override
  public Void visit(Capacitor capacitor) {
    stamps.conductance(at(capacitor.a()), at(capacitor.b()), 1 / capacitor.leakOhms());
    return null;
  }

  @Override
  public Void visit(Inductor inductor) {
    double ohms = Double.isNaN(inductor.dcOhms()) ? 0 : inductor.dcOhms();
    series(inductor, inductor.a(), inductor.b(), ohms, 0);
    return null;
  }

  @Override
  public Void visit(Winding winding) {
    for (Winding.Section section : winding.sections()) {
      double ohms = Double.isNaN(section.ohms()) ? 0 : section.ohms();
      series(winding, section.a(), section.b(), ohms, 0);
    }
    return null;
  }

  @Override
  public Void visit(Diode diode) {
    twoPole(diode, diode.law(), diode.anode(), diode.cathode());
    return null;
  }

  @Override
  public Void visit(RectifierSection section) {
    section.plates().forEach(p -> twoPole(section, section.law(), p, section.cathode()));
    return null;
  }

  @Override
  public Void visit(RegulatorSection section) {
    twoPole(section, section.law(), section.anode(), section.cathode());
    return null;
  }

  @Override
  public Void visit(GlowLamp lamp) {
    twoPole(lamp, lamp.law(), lamp.a(), lamp.b());
    return null;
  }

  private void twoPole(Element element, SectionLaw law, Node anode, Node cathode) {
    int a = at(anode);
    int c = at(cathode);
    twoPoles.add(new TwoPoleDraft(element, law, a, c, stamps.conductance(a, c, 0)));
  }

  @Override
  public Void visit(AmplifierSection section) {
    int plate = at(section.plate());
    Node screenNode = section.screen();
    int screen = screenNode == null ? -1 : at(screenNode);
    int grid = at(section.grid());
    int cathode = at(section.cathode());
    int[] unknowns = {plate, screen, grid, cathode};
    int first = stamps.count();
    for (int row : unknowns) {
      for (int column : unknowns) {
        stamps.entry(row, column, 0);
      }
    }
    amplifiers.add(new AmplifierDraft(section, plate, screen, grid, cathode, first));
    return null;
  }

  @Override
  public Void visit(ControlledSource source) {
    controlled.add(source);
    return null;
  }

  private void writeControlled(ControlledSource source) {
    int a = at(source.a());
    int b = at(source.b());
    Node controlA = source.controlA();
    Node controlB = source.controlB();
    int ca = controlA == null ? -1 : at(controlA);
    int cb = controlB == null ? -1 : at(controlB);
    int control =
        branches().entrySet().stream()
            .filter(e -> e.getKey().name().equalsIgnoreCase(source.controlElement()))
            .mapToInt(Map.Entry::getValue)
            .findFirst()
            .orElse(-1);
    switch (source.kind()) {
      case VOLTS_BY_VOLTS -> {
        int branch = newBranch(source, a, b);
        stamps.entry(branch, ca, -source.gain());
        stamps.entry(branch, cb, source.gain());
      }
      case VOLTS_BY_AMPS -> {
        int branch = newBranch(source, a, b);
        stamps.entry(branch, control, -source.gain());
      }
      case AMPS_BY_VOLTS -> {
        stamps.entry(a, ca, source.gain());
        stamps.entry(a, cb, -source.gain());
        stamps.entry(b, ca, -source.gain());
        stamps.entry(b, cb, source.gain());
      }
      case AMPS_BY_AMPS -> {
        stamps.entry(a, control, source.gain());
        stamps.entry(b, control, -source.gain());
      }
    }
  }

  private int newBranch(ControlledSource source, int a, int b) {
    int branch = stamps.newBranch();
    branches().put(source, branch);
    stamps.branch(branch, a, b, 0, 0);
    return branch;
  }
}
