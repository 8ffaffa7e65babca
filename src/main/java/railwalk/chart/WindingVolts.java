package railwalk.chart;

import java.util.List;
import java.util.Optional;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;
import railwalk.units.Quantity;

/** The AC volts of windings, at no load on the chart's line. */
final class WindingVolts {
  /** Below this a winding's end is no danger of its own. */
  private static final double WORTH_A_WARNING_RMS = 30;

  private WindingVolts() {}

  /** Returns a warning where a winding's end carries high AC besides its DC volts. */
  static Optional<String> at(Node node, Circuit circuit) {
    if (node.equals(circuit.reference())) {
      return Optional.empty();
    }
    return circuit.elements(Winding.class).stream()
        .filter(winding -> winding.nodes().contains(node))
        .flatMap(winding -> warning(winding, node, circuit).stream())
        .findFirst();
  }

  private static Optional<String> warning(Winding winding, Node node, Circuit circuit) {
    List<Node> ends = winding.nodes();
    int at = ends.indexOf(node);
    int black = ends.indexOf(circuit.reference());
    int other = black >= 0 ? black : at == 0 ? ends.size() - 1 : 0;
    double rms = between(winding, at, other, circuit);
    return rms < WORTH_A_WARNING_RMS
        ? Optional.empty()
        : Optional.of("carries AC: " + Quantity.volts(rms) + " rms to " + ends.get(other).name());
  }

  /** Returns the volts rms between two ends or taps. */
  static double between(Winding winding, int a, int b, Circuit circuit) {
    double written =
        winding.sections().subList(Math.min(a, b), Math.max(a, b)).stream()
            .mapToDouble(Winding.Section::openRmsVolts)
            .sum();
    return written * circuit.line().scale(winding.atLineVolts());
  }
}
