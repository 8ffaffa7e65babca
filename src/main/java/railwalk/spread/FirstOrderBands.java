package railwalk.spread;

import java.util.HashMap;
import java.util.Map;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;

/**
 * The first-order band of every node: its middle ∓ 1.645 times the root of its summed variances, by
 * the {@link SpreadFactors} of the solved point. 1.645 standard deviations leave 5 % of a normal
 * distribution on either side. The expected volts, of an amplifier with nominal parts, always stay
 * inside the band.
 */
public final class FirstOrderBands {
  /** Standard deviations on each side of the expected volts: 5 % and 95 % of a normal spread. */
  public static final double DEVIATIONS = 1.645;

  private FirstOrderBands() {}

  /** Returns the bands of a solved point. */
  public static Bands of(OperatingPoint point) {
    return of(point, SpreadFactors.of(point));
  }

  /** Returns the bands of a solved point whose factors are known. */
  public static Bands of(OperatingPoint point, SpreadFactors factors) {
    Circuit circuit = point.circuit();
    Map<Node, Band> bands = new HashMap<>();
    for (Node node : circuit.nodes()) {
      double volts = point.volts(node);
      if (node.equals(circuit.reference()) || Double.isNaN(volts)) {
        continue;
      }
      double middle = volts + factors.shiftVolts(node);
      double half = DEVIATIONS * factors.deviationVolts(node);
      bands.put(node, new Band(Math.min(volts, middle - half), Math.max(volts, middle + half)));
    }
    return new Bands(bands);
  }
}
