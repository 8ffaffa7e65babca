package railwalk.walk;

import java.util.List;
import railwalk.circuit.Node;

/**
 * One thing that draws current from a supply node.
 *
 * @param parts the part the current leaves through, with the parts in parallel to it; empty for
 *     electrodes wired to the node itself
 * @param electrodes the tube electrodes it ends at
 * @param supplyNodes the further supply nodes it feeds
 */
public record SupplyLoad(
    List<DcStep> parts, List<TubeElectrode> electrodes, List<Node> supplyNodes) {
  public SupplyLoad {
    parts = List.copyOf(parts);
    electrodes = List.copyOf(electrodes);
    supplyNodes = List.copyOf(supplyNodes);
  }
}
