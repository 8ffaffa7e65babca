package railwalk.circuit;

import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;

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
      return replaced(circuit, Switch.class, set.name(), s -> s.onPosition(set.position()));
    }
    if (change instanceof StateChange.ControlSet set) {
      return replaced(circuit, Potentiometer.class, set.name(), p -> p.setTo(set.share()));
    }
    if (change instanceof StateChange.LineVolts set) {
      Line line = circuit.line();
      double designVolts = line.stated() ? line.designVolts() : set.volts();
      return circuit.withLine(new Line(set.volts(), line.hertz(), designVolts));
    }
    if (change instanceof StateChange.TubeOut out) {
      return circuit.withElements(
          circuit.elements().stream().filter(e -> !isOf(e, out.bottle())).toList());
    }
    return refitted(circuit, (StateChange.TubeFitted) change);
  }

  /** Returns whether {@code element} is a piece of that tube, or the stand-in for it. */
  private static boolean isOf(Element element, String tube) {
    String owner = element instanceof StandIn ? element.name() : element.bottle();
    return owner.equalsIgnoreCase(tube);
  }

  private static <E extends Element> Circuit replaced(
      Circuit circuit, Class<E> kind, String name, UnaryOperator<E> change) {
    List<Element> elements = new ArrayList<>();
    for (Element element : circuit.elements()) {
      boolean meant = kind.isInstance(element) && element.name().equalsIgnoreCase(name);
      elements.add(meant ? change.apply(kind.cast(element)) : element);
    }
    return circuit.withElements(elements);
  }

  private static Circuit refitted(Circuit circuit, StateChange.TubeFitted fitted) {
    Bottle old =
        circuit
            .bottle(fitted.bottle())
            .orElseThrow(() -> new IllegalArgumentException("no tube " + fitted.bottle()));
    List<Node> nodes = new ArrayList<>(circuit.nodes());
    Fitting fitting = fit(circuit, old, fitted, name -> inside(nodes, name));
    List<Element> elements = new ArrayList<>();
    boolean placed = false;
    for (Element element : circuit.elements()) {
      if (!element.bottle().equals(old.name())) {
        elements.add(element);
      } else if (!placed) {
        elements.addAll(fitting.elements());
        placed = true;
      }
    }
    List<Bottle> bottles =
        circuit.bottles().stream().map(b -> b.equals(old) ? fitting.bottle() : b).toList();
    return circuit.withTubes(nodes, elements, bottles);
  }

  private static Fitting fit(
      Circuit circuit, Bottle old, StateChange.TubeFitted fitted, Socket.NodeMaker maker) {
    if (old.wiring() == Bottle.Wiring.BY_PIN) {
      return Socket.byPins(old.name(), fitted.type(), old.pins(), maker);
    }
    List<Lead> leads = new Leads(old, fitted.type()).of(circuit.elements());
    return Socket.byLeads(old.name(), fitted.type(), old.wiring(), leads, maker);
  }

  /** Returns the node called {@code name}, at the end of the list when there is none yet. */
  private static Node inside(List<Node> nodes, String name) {
    for (Node node : nodes) {
      if (node.name().equals(name)) {
        return node;
      }
    }
    Node made = new Node(nodes.size(), name);
    nodes.add(made);
    return made;
  }
}
