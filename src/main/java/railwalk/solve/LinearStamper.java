package railwalk.solve;

import java.util.HashMap;
import java.util.Map;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Coupling;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Element;
import railwalk.circuit.ElementVisitor;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.StandIn;
import railwalk.circuit.Switch;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Wire;

/**
 * Writes the equations of the parts that are the same for direct current and for every instant of a
 * line period. What amplifies, rectifies or stores is left to the two heirs.
 *
 * <p>Signs: the equation of a node is the sum of the currents that leave it through the parts.
 */
abstract class LinearStamper implements ElementVisitor<Void> {
  /** Below this a part gets a current of its own for an unknown, which zero ohms do not upset. */
  static final double BRANCH_OHMS = 0.5;

  /** What a closed contact or plain wire is taken to have, so that two in parallel share. */
  private static final double CONTACT_OHMS = 1e-6;

  final Stamps stamps;
  private final Map<Node, Integer> unknowns;
  private final Map<Element, Integer> branches = new HashMap<>();

  LinearStamper(Stamps stamps, Map<Node, Integer> unknowns) {
    this.stamps = stamps;
    this.unknowns = unknowns;
  }

  /** Returns the unknown of a node's volts; −1 for the reference. */
  final int at(Node node) {
    Integer unknown = unknowns.get(node);
    if (unknown == null) {
      throw new IllegalStateException("node " + node.name() + " is not in this network");
    }
    return unknown;
  }

  /** Returns the current unknown of each part that has one. */
  final Map<Element, Integer> branches() {
    return branches;
  }

  /** Writes a resistance between two nodes, with a source of {@code volts} in series. */
  final void series(Element element, Node a, Node b, double ohms, double volts) {
    if (ohms >= BRANCH_OHMS && volts == 0) {
      stamps.conductance(at(a), at(b), 1 / ohms);
      return;
    }
    int branch = stamps.newBranch();
    branches.put(element, branch);
    stamps.branch(branch, at(a), at(b), Math.max(ohms, CONTACT_OHMS), volts);
  }

  @Override
  public Void visit(Resistor resistor) {
    series(resistor, resistor.a(), resistor.b(), resistor.ohms(), 0);
    return null;
  }

  @Override
  public Void visit(VoltageSource source) {
    int branch = stamps.newBranch();
    branches.put(source, branch);
    stamps.branch(branch, at(source.a()), at(source.b()), source.seriesOhms(), source.volts());
    return null;
  }

  @Override
  public Void visit(CurrentSource source) {
    stamps.source(at(source.a()), -source.amps());
    stamps.source(at(source.b()), source.amps());
    return null;
  }

  @Override
  public Void visit(Potentiometer pot) {
    double upperOhms = Math.max((1 - pot.share()) * pot.ohms(), BRANCH_OHMS);
    double lowerOhms = Math.max(pot.share() * pot.ohms(), BRANCH_OHMS);
    stamps.conductance(at(pot.a()), at(pot.wiper()), 1 / upperOhms);
    stamps.conductance(at(pot.wiper()), at(pot.b()), 1 / lowerOhms);
    return null;
  }

  @Override
  public Void visit(Switch contact) {
    if (contact.position() > 0) {
      series(contact, contact.common(), contact.poles().get(contact.position() - 1), 0, 0);
    }
    return null;
  }

  @Override
  public Void visit(Fuse fuse) {
    series(fuse, fuse.a(), fuse.b(), 0, 0);
    return null;
  }

  @Override
  public Void visit(Lamp lamp) {
    series(lamp, lamp.a(), lamp.b(), lamp.ratedVolts() / lamp.ratedAmps(), 0);
    return null;
  }

  @Override
  public Void visit(Wire wire) {
    series(wire, wire.a(), wire.b(), 0, 0);
    return null;
  }

  @Override
  public Void visit(Filament filament) {
    series(filament, filament.a(), filament.b(), filament.hotOhms(), 0);
    return null;
  }

  @Override
  public Void visit(StandIn standIn) {
    Node cathode = standIn.electrodes().get(railwalk.device.Electrode.CATHODE);
    standIn
        .draws()
        .forEach(
            (electrode, amps) -> {
              Node node = standIn.electrodes().get(electrode);
              if (node != null) {
                stamps.source(at(node), -amps);
              }
              if (cathode != null) {
                stamps.source(at(cathode), amps);
              }
            });
    return null;
  }

  @Override
  public Void visit(Coupling coupling) {
    return null;
  }

  @Override
  public Void visit(ControlledSource source) {
    return refuse(source);
  }

  @Override
  public Void visit(AmplifierSection section) {
    return refuse(section);
  }

  @Override
  public Void visit(RegulatorSection section) {
    return refuse(section);
  }

  @Override
  public Void visit(GlowLamp lamp) {
    return refuse(lamp);
  }

  private static Void refuse(Element element) {
    throw new IllegalStateException(element.name() + " has no place in a ripple group");
  }
}
