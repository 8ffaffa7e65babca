package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Resistor;
import railwalk.circuit.StandIn;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;

/**
 * The amplifier as an ohmmeter finds it: unplugged, discharged, all tubes pulled, diodes taken as
 * open (a meter's small test volts do not make them conduct in every position).
 */
final class ColdAmplifier {
  private ColdAmplifier() {}

  static Circuit of(Circuit circuit) {
    List<Element> elements = new ArrayList<>();
    for (Element element : circuit.elements()) {
      if (element instanceof Diode d) {
        elements.add(new Resistor(d.name(), d.anode(), d.cathode(), Rewire.OPEN_OHMS));
      } else if (element instanceof Winding w) {
        if (!w.wall()) {
          elements.add(w.scaled(0));
        }
      } else if (element instanceof VoltageSource v) {
        elements.add(new VoltageSource(v.name(), v.a(), v.b(), 0, v.seriesOhms()));
      } else if (element.bottle().isEmpty()
          && !(element instanceof StandIn)
          && !(element instanceof CurrentSource)) {
        elements.add(element);
      }
    }
    return circuit.withElements(elements);
  }
}
