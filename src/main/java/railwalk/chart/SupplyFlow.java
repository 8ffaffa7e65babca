package railwalk.chart;

import java.util.Objects;
import java.util.Optional;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.walk.SupplyNode;

/** The currents that run down a supply. */
final class SupplyFlow {
  private final Column column;

  SupplyFlow(Column column) {
    this.column = column;
  }

  /**
   * Returns the current fed into a supply node: what leaves the rectifier at a first node (negative
   * for a negative supply), what comes through the droppers at the others; empty where neither is
   * known.
   */
  Optional<Double> fed(SupplyNode supply) {
    Node node = supply.node();
    Optional<Double> rectified =
        column.point().supplies().stream()
            .filter(s -> s.node().equals(node))
            .map(s -> s.dcAmps())
            .findFirst();
    if (rectified.isPresent()) {
      return rectified;
    }
    return supply.droppers().stream()
        .filter(dropper -> dropper.nodes().contains(node))
        .map(dropper -> inwards(dropper, node))
        .reduce(Double::sum);
  }

  /** Returns what of it is not passed on to further supply nodes. */
  Optional<Double> usedHere(SupplyNode supply) {
    double passedOn =
        column.map().supplyNodes().stream()
            .filter(child -> Objects.equals(child.parent(), supply.node()))
            .flatMap(child -> fed(child).stream())
            .mapToDouble(Double::doubleValue)
            .sum();
    return fed(supply).map(amps -> amps - passedOn);
  }

  private double inwards(Element dropper, Node node) {
    double amps = column.point().amps(dropper);
    return dropper.nodes().get(0).equals(node) ? -amps : amps;
  }
}
