package railwalk.walk;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/**
 * One node of a supply: a rectifier's output, or a node fed from another supply node through
 * droppers and chokes.
 *
 * @param parent the supply node that feeds it; null for one fed by the rectifier (or a fixed
 *     source) itself
 * @param droppers the parts between parent and node, in feeding order; for a first node the parts
 *     between the rectifier's output and it, usually none
 * @param group which of {@link SupplyMap#groups()} feeds it; −1 when a fixed source does
 * @param depth 0 for a first node
 */
public record SupplyNode(
    Node node, @Nullable Node parent, List<Element> droppers, int group, int depth) {
  public SupplyNode {
    droppers = List.copyOf(droppers);
  }
}
