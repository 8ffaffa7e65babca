package railwalk.solve;

import java.util.Map;
import railwalk.circuit.Capacitor;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.Winding;

/** The current through a part that has two ends, read from solved unknowns. */
final class TwoTerminal {
  private TwoTerminal() {}

  /**
   * Returns ampere from the part's first node to its second; 0 for an open part. A potentiometer
   * answers for the track next to its first end, a winding for its first section.
   */
  static double amps(
      Element part, Map<Element, Integer> branches, Map<Node, Integer> unknowns, double[] x) {
    Integer branch = branches.get(part);
    if (branch != null) {
      return x[branch];
    }
    if (part instanceof CurrentSource source) {
      return source.amps();
    }
    double ohms = ohms(part);
    if (Double.isInfinite(ohms)) {
      return 0;
    }
    return (volts(part.nodes().get(0), unknowns, x) - volts(part.nodes().get(1), unknowns, x))
        / ohms;
  }

  /** Returns the resistance between a part's first two nodes; infinite where there is none. */
  static double ohms(Element part) {
    if (part instanceof Resistor r) {
      return r.ohms();
    }
    if (part instanceof Potentiometer p) {
      return Math.max((1 - p.share()) * p.ohms(), LinearStamper.BRANCH_OHMS);
    }
    if (part instanceof Inductor l) {
      return l.dcOhms();
    }
    if (part instanceof Winding w) {
      return w.sections().get(0).ohms();
    }
    if (part instanceof Filament f) {
      return f.hotOhms();
    }
    if (part instanceof Lamp lamp) {
      return lamp.ratedVolts() / lamp.ratedAmps();
    }
    return part instanceof Capacitor c ? c.leakOhms() : Double.POSITIVE_INFINITY;
  }

  private static double volts(Node node, Map<Node, Integer> unknowns, double[] x) {
    Integer unknown = unknowns.get(node);
    return unknown == null || unknown < 0 ? 0 : x[unknown];
  }
}
