package railwalk.solve;

import java.util.Optional;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Wire;
import railwalk.walk.RippleGroup;
import railwalk.walk.RippleGroups;
import railwalk.walk.SupplyNode;

/**
 * Ripple at the supply nodes behind a ripple group, where it is small: each dropper or choke and
 * the capacitors behind it divide what is left, at the frequency the reservoir is charged with. A
 * node without a capacitor follows the one before it as its mean volts do. Behind a tube nothing is
 * told.
 */
final class RippleBehind {
  private RippleBehind() {}

  /** Returns volts rms at {@code node}; empty when it is no supply node behind a group. */
  static Optional<Double> rippleVoltsRms(OperatingPoint point, Node node) {
    Optional<SupplyNode> supply = point.map().supplyNode(node);
    if (supply.isEmpty() || supply.get().group() < 0) {
      return Optional.empty();
    }
    Node parent = supply.get().parent();
    Optional<Double> before = parent == null ? Optional.empty() : point.rippleVoltsRms(parent);
    if (parent == null || before.isEmpty()) {
      return Optional.empty();
    }
    double ohms = 0;
    double henries = 0;
    for (Element part : supply.get().droppers()) {
      if (!isPassive(part)) {
        return Optional.empty();
      }
      double partOhms = TwoTerminal.ohms(part);
      ohms += Double.isFinite(partOhms) ? partOhms : 0;
      if (part instanceof Inductor choke) {
        double stated = choke.henries();
        henries += Double.isNaN(stated) ? RippleGroups.USUAL_CHOKE_HENRIES : stated;
      }
    }
    double farads = farads(point.circuit(), node);
    if (farads == 0) {
      double divided = Math.abs(point.volts(node) / point.volts(parent));
      return Optional.of(Math.min(1, Double.isFinite(divided) ? divided : 1) * before.get());
    }
    double omega =
        2 * Math.PI * point.circuit().line().hertz() * chargesAPeriod(point, supply.get());
    double share = 1 / (omega * farads) / Math.hypot(ohms, omega * henries - 1 / (omega * farads));
    return Optional.of(Math.min(1, share) * before.get());
  }

  private static boolean isPassive(Element part) {
    return part instanceof Resistor
        || part instanceof Inductor
        || part instanceof Potentiometer
        || part instanceof Fuse
        || part instanceof Lamp
        || part instanceof Wire
        || part instanceof Filament
        || part instanceof Switch;
  }

  /** Returns how often the reservoir that {@code supply} hangs on is charged in a line period. */
  private static int chargesAPeriod(OperatingPoint point, SupplyNode supply) {
    SupplyNode root = supply;
    Node parent = root.parent();
    while (parent != null) {
      root = point.map().supplyNode(parent).orElseThrow();
      parent = root.parent();
    }
    RippleGroup group = point.map().groups().get(supply.group());
    int output = group.outputs().indexOf(root.node());
    return output >= 0 && group.arrangements().get(output).startsWith("half-wave") ? 1 : 2;
  }

  private static double farads(Circuit circuit, Node node) {
    double farads = 0;
    for (Element element : circuit.elements()) {
      if (element instanceof Capacitor capacitor
          && capacitor.nodes().contains(node)
          && capacitor.nodes().contains(circuit.reference())) {
        farads += capacitor.farads();
      }
    }
    return farads;
  }
}
