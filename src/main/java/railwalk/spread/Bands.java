package railwalk.spread;

import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Node;

/**
 * The band of every node with a DC path.
 *
 * @param byNode band by node; nodes without a DC path are absent
 * @param sampling of the builds they were found by; null for bands of first order
 */
public record Bands(Map<Node, Band> byNode, @Nullable Sampling sampling) {
  public Bands {
    byNode = Map.copyOf(byNode);
  }

  /** Makes bands of first order. */
  public Bands(Map<Node, Band> byNode) {
    this(byNode, null);
  }
}
