package railwalk.findings;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;
import railwalk.solve.AcLoads;
import railwalk.solve.OperatingPoint;

/**
 * What a winding carries.
 *
 * @param rmsAmps of the section that carries most
 * @param heaters that hang on it
 * @param heaterAmps what the winding would carry with those heaters at their rated volts: the sum
 *     of what they ask for; NaN when none hangs on it
 */
public record WindingDuty(
    Winding winding, double rmsAmps, List<Filament> heaters, double heaterAmps) {
  /** Up to this a resistor in a heater circuit is a dropper (common practice). */
  private static final double HEATER_DROPPER_OHMS = 1000;

  public WindingDuty {
    heaters = List.copyOf(heaters);
  }

  /** Returns the duty of every winding, in netlist order. */
  public static List<WindingDuty> of(OperatingPoint point) {
    Circuit circuit = point.circuit();
    AcLoads loads = point.acLoads();
    Map<Node, List<Element>> at = circuit.elementsByNode();
    List<WindingDuty> duties = new ArrayList<>();
    for (Winding winding : circuit.elements(Winding.class)) {
      List<Filament> heaters = heaters(circuit, at, winding);
      double rmsAmps = loads.rmsAmps(winding);
      duties.add(new WindingDuty(winding, rmsAmps, heaters, rmsAmps * ratedShare(loads, heaters)));
    }
    return duties;
  }

  /** Returns the current that counts against the rating: for heaters what they ask for. */
  public double countedAmps() {
    return Double.isNaN(heaterAmps) ? rmsAmps : Math.max(rmsAmps, heaterAmps);
  }

  /** Returns the names of the tubes whose heaters hang on the winding. */
  public List<String> tubes() {
    List<String> names = new ArrayList<>();
    for (Filament filament : heaters) {
      if (!names.contains(filament.bottle())) {
        names.add(filament.bottle());
      }
    }
    return names;
  }

  /** Returns the heaters' rated volts over what they get, weighted by their watts. */
  private static double ratedShare(AcLoads loads, List<Filament> heaters) {
    double rated = 0;
    double actual = 0;
    for (Filament filament : heaters) {
      double volts = loads.heaterRmsVolts().getOrDefault(filament, Double.NaN);
      rated += filament.ratedVolts() * filament.ratedAmps();
      actual += volts * filament.ratedAmps();
    }
    return actual > 0 ? rated / actual : Double.NaN;
  }

  /**
   * Returns the heaters that leads and droppers join to a winding, not through the reference; none
   * of the wall's, which feeds more than heaters.
   */
  private static List<Filament> heaters(
      Circuit circuit, Map<Node, List<Element>> at, Winding winding) {
    List<Filament> found = new ArrayList<>();
    Set<Node> seen = new HashSet<>();
    Deque<Node> open = new ArrayDeque<>(winding.wall() ? List.of() : winding.nodes());
    while (!open.isEmpty()) {
      Node node = open.remove();
      if (node.equals(circuit.reference()) || !seen.add(node)) {
        continue;
      }
      for (Element element : at.getOrDefault(node, List.of())) {
        if (element instanceof Filament filament && !found.contains(filament)) {
          found.add(filament);
        }
        if (leads(element)) {
          open.addAll(element.nodes());
        }
      }
    }
    return found;
  }

  private static boolean leads(Element element) {
    return element instanceof Filament
        || element instanceof Lamp
        || element instanceof Wire
        || element instanceof Fuse
        || (element instanceof Resistor r && r.ohms() <= HEATER_DROPPER_OHMS)
        || (element instanceof Switch contact && contact.position() > 0);
  }
}
