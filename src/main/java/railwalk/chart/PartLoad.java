package railwalk.chart;

import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;

/**
 * What a two-ended part stands: mean volts across it, mean current through it, and the heat in it.
 *
 * @param from its end at the higher volts
 * @param watts NaN when not known
 */
record PartLoad(Node from, Node to, double dropVolts, double amps, double watts) {

  /**
   * Returns the load of {@code element} at {@code point}.
   *
   * <p>A resistor in a supply filter carries ripple besides: with a capacitor after it the ripple
   * across it is the root of (ripple before)² − (ripple after)², exact for one frequency (the
   * capacitor's and the resistor's shares stand at right angles), and heats it by its square over
   * the resistance.
   */
  static PartLoad of(Element element, OperatingPoint point) {
    Node a = element.nodes().get(0);
    Node b =
        element instanceof Switch contact
            ? contact.poles().get(Math.max(0, contact.position() - 1))
            : element.nodes().get(1);
    double across = point.volts(a) - point.volts(b);
    double amps = Math.abs(point.amps(element));
    double watts = Math.abs(across) * amps;
    if (element instanceof Resistor resistor) {
      double rippleA = point.rippleVoltsRms(a).orElse(0.0);
      double rippleB = point.rippleVoltsRms(b).orElse(0.0);
      watts += Math.abs(rippleA * rippleA - rippleB * rippleB) / resistor.ohms();
    }
    return across >= 0
        ? new PartLoad(a, b, across, amps, watts)
        : new PartLoad(b, a, -across, amps, watts);
  }

  /** Returns current and heat in a few signs: "5.1 mA · 26 mW"; the current alone without drop. */
  String inShort() {
    return dropVolts * amps == 0
        ? Quantity.amps(amps)
        : Quantity.amps(amps) + " · " + Quantity.watts(watts);
  }
}
