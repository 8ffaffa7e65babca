package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.readings.MeasuredAt;
import railwalk.readings.ReadingKind;
import railwalk.solve.OperatingPoint;
import railwalk.walk.SupplyNode;

/** The points that a technician reads: every pin of every tube, every supply node. */
public final class BenchPoints {
  private BenchPoints() {}

  /**
   * Returns the points of a solved amplifier where direct volts can be predicted, each node once:
   * supply nodes by their own name in feeding order, others by the first pin on them.
   */
  public static List<Probe> of(OperatingPoint point) {
    Circuit circuit = point.circuit();
    Map<Node, String> names = new LinkedHashMap<>();
    for (SupplyNode supply : point.map().supplyNodes()) {
      names.putIfAbsent(supply.node(), supply.node().name());
    }
    for (Bottle bottle : circuit.bottles()) {
      bottle
          .pins()
          .forEach(
              (pin, node) ->
                  names.putIfAbsent(node, bottle.name() + "." + (pin == 0 ? "cap" : pin)));
      if (bottle.pins().isEmpty()) {
        circuit.elements().stream()
            .filter(e -> e.bottle().equals(bottle.name()))
            .forEach(e -> e.nodes().forEach(n -> names.putIfAbsent(n, n.name())));
      }
    }
    List<Probe> probes = new ArrayList<>();
    names.forEach(
        (node, name) -> {
          if (!node.equals(circuit.reference()) && !Double.isNaN(point.volts(node))) {
            probes.add(
                new Probe(name, new MeasuredAt.AtNode(node), ReadingKind.DC, "", Double.NaN));
          }
        });
    return probes;
  }
}
