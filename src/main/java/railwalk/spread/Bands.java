package railwalk.spread;

import java.util.Map;
import railwalk.circuit.Node;

/**
 * The band of every node with a DC path.
 *
 * @param byNode band by node; nodes without a DC path are absent
 */
public record Bands(Map<Node, Band> byNode) {
  public Bands {
    byNode = Map.copyOf(byNode);
  }
}
