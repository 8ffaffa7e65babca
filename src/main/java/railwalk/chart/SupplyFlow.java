package railwalk.chart;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import railwalk.circuit.Node;
import railwalk.walk.SupplyNode;

/** The currents that run down a supply. */
record SupplyFlow(Column column) {

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
    List<Rung> rungs = Rung.to(supply);
    return rungs.isEmpty()
        ? Optional.empty()
        : Optional.of(rungs.get(rungs.size() - 1).amps(column.point()));
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
}
