package railwalk.chart;

import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.solve.OperatingPoint;

/**
 * What a part stands between two of its ends: mean volts across them, mean current through them,
 * and the heat, ripple included.
 *
 * @param from the end at the higher volts
 */
record PartLoad(Node from, Node to, double dropVolts, double amps, double watts) {

  /** Returns the load of a part with two ends. */
  static PartLoad of(Element element, OperatingPoint point) {
    return of(element, element.nodes().get(0), element.nodes().get(1), point);
  }

  /** Returns the load of {@code element} between two of its ends. */
  static PartLoad of(Element element, Node a, Node b, OperatingPoint point) {
    double across = point.volts(a) - point.volts(b);
    double amps = Math.abs(point.amps(element));
    double watts = point.watts(element);
    if (element instanceof Potentiometer pot) {
      amps = Math.abs(across) / ohmsBetween(pot, a, b);
      watts = Math.abs(across) * amps;
    }
    return across >= 0
        ? new PartLoad(a, b, across, amps, watts)
        : new PartLoad(b, a, -across, amps, watts);
  }

  /** Returns the resistance of the track between two of a control's ends. */
  private static double ohmsBetween(Potentiometer pot, Node a, Node b) {
    if (!a.equals(pot.wiper()) && !b.equals(pot.wiper())) {
      return pot.ohms();
    }
    Node end = a.equals(pot.wiper()) ? b : a;
    return pot.ohms() * (end.equals(pot.a()) ? 1 - pot.share() : pot.share());
  }
}
