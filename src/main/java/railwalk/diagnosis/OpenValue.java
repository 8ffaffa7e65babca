package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Winding;

/**
 * A resistance that the netlist leaves open: of a resistor, a coil or a winding's section.
 *
 * @param section of a winding, from 0; 0 for all else
 * @param resistor whether it is a resistor's
 * @param a one end
 * @param b the other end
 */
record OpenValue(Element element, int section, boolean resistor, Node a, Node b) {
  /** A value sought has no tolerance of its own: it is the part's, not its marking's. */
  private static final double NO_TOLERANCE = 1e-6;

  /** Middle of what is expected before anything is read, and of the starts: ohm. */
  private static final double MIDDLE_RESISTOR_OHMS = 47e3;

  private static final double MIDDLE_WINDING_OHMS = 30;

  /** Returns the open values of the parts called {@code names}, one for each mention. */
  static List<OpenValue> of(Circuit circuit, List<String> names) {
    Map<String, Integer> mentions = new HashMap<>();
    List<OpenValue> values = new ArrayList<>();
    for (String name : names) {
      Element element =
          circuit
              .element(name)
              .orElseThrow(() -> new IllegalArgumentException("no part called " + name));
      int mention = mentions.merge(name, 1, Integer::sum) - 1;
      if (element instanceof Winding winding) {
        int section = open(winding, mention);
        Winding.Section s = winding.sections().get(section);
        values.add(new OpenValue(element, section, false, s.a(), s.b()));
      } else {
        List<Node> ends = element.nodes();
        boolean resistor = element instanceof Resistor;
        values.add(new OpenValue(element, 0, resistor, ends.get(0), ends.get(1)));
      }
    }
    return values;
  }

  private static int open(Winding winding, int mention) {
    int seen = 0;
    for (int s = 0; s < winding.sections().size(); s++) {
      if (Double.isNaN(winding.sections().get(s).ohms()) && seen++ == mention) {
        return s;
      }
    }
    throw new IllegalArgumentException(winding.name() + " has no open section " + mention);
  }

  double middleOhms() {
    return resistor ? MIDDLE_RESISTOR_OHMS : MIDDLE_WINDING_OHMS;
  }

  /** Returns {@code circuit} with the value put in. */
  Circuit put(Circuit circuit, double ohms) {
    return put(circuit, ohms, Double.NaN);
  }

  /** Returns {@code circuit} with the value put in, taken for exact. */
  Circuit putExact(Circuit circuit, double ohms) {
    return put(circuit, ohms, NO_TOLERANCE);
  }

  /** Puts the value in with another tolerance; NaN: the part's own. */
  private Circuit put(Circuit circuit, double ohms, double tolerance) {
    return Rewire.replace(
        circuit,
        e -> e.name().equals(element.name()) && e.getClass() == element.getClass(),
        e -> List.of(with(e, ohms, tolerance)));
  }

  private Element with(Element e, double ohms, double tolerance) {
    if (e instanceof Resistor r) {
      double share = Double.isNaN(tolerance) ? r.tolerance() : tolerance;
      return new Resistor(r.name(), r.a(), r.b(), ohms, r.ratedWatts(), share);
    }
    if (e instanceof Inductor l) {
      return new Inductor(l.name(), l.a(), l.b(), l.henries(), ohms);
    }
    return ((Winding) e).withOhms(section, ohms);
  }
}
