package railwalk.circuit;

import java.util.ArrayList;
import java.util.List;

/** Makes the circuit of a state out of the circuit of the first column. */
final class CircuitStates {
  private CircuitStates() {}

  static Circuit apply(Circuit circuit, State state) {
    Circuit changed = circuit;
    for (StateChange change : state.changes()) {
      changed = apply(changed, change);
    }
    return changed;
  }

  private static Circuit apply(Circuit circuit, StateChange change) {
    if (change instanceof StateChange.SwitchPosition set) {
      return circuit.withElements(replace(circuit, set));
    }
    if (change instanceof StateChange.ControlSet set) {
      return circuit.withElements(replace(circuit, set));
    }
    if (change instanceof StateChange.LineVolts set) {
      Line line = circuit.line();
      double design = line.stated() ? line.designVolts() : set.volts();
      return circuit.withLine(new Line(set.volts(), line.hertz(), design));
    }
    return circuit;
  }

  private static List<Element> replace(Circuit circuit, StateChange.SwitchPosition set) {
    List<Element> elements = new ArrayList<>();
    for (Element element : circuit.elements()) {
      boolean meant = element instanceof Switch && element.name().equalsIgnoreCase(set.name());
      elements.add(meant ? ((Switch) element).onPosition(set.position()) : element);
    }
    return elements;
  }

  private static List<Element> replace(Circuit circuit, StateChange.ControlSet set) {
    List<Element> elements = new ArrayList<>();
    for (Element element : circuit.elements()) {
      boolean meant =
          element instanceof Potentiometer && element.name().equalsIgnoreCase(set.name());
      elements.add(meant ? ((Potentiometer) element).setTo(set.share()) : element);
    }
    return elements;
  }
}
