package railwalk.spread;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;

/**
 * The sampled band of every node: the volts under and over which one build in twenty lies, among
 * builds whose parts are drawn within their limits ({@link RandomBuild}) and solved one by one.
 */
public final class SampledBands {
  /** How many builds a band takes. */
  public static final int BUILDS = 2048;

  /** Seed of the draws: the same netlist gives the same bands. */
  public static final long SEED = 1;

  /** Share of the builds left out on either side of a band. */
  private static final double TAIL = 0.05;

  private SampledBands() {}

  /** Returns the bands of a solved point, as its solver returned it. */
  public static Bands of(OperatingPoint point) {
    return of(point, BUILDS, SEED);
  }

  /** Returns the bands of a solved point by so many builds. */
  static Bands of(OperatingPoint point, int builds, long seed) {
    Circuit circuit = point.circuit();
    List<Node> nodes = new ArrayList<>();
    for (Node node : circuit.nodes()) {
      if (!node.equals(circuit.reference()) && !Double.isNaN(point.volts(node))) {
        nodes.add(node);
      }
    }
    Samples samples = Samples.of(point, builds, seed, build -> volts(build, nodes));
    Map<Node, Band> bands = new HashMap<>();
    for (int n = 0; n < nodes.size(); n++) {
      double low = samples.quantile(n, TAIL);
      double high = samples.quantile(n, 1 - TAIL);
      if (!Double.isNaN(low)) {
        bands.put(nodes.get(n), new Band(low, high));
      }
    }
    return new Bands(bands, samples.sampling());
  }

  private static double[] volts(OperatingPoint build, List<Node> nodes) {
    double[] volts = new double[nodes.size()];
    for (int n = 0; n < volts.length; n++) {
      volts[n] = build.volts(nodes.get(n));
    }
    return volts;
  }
}
