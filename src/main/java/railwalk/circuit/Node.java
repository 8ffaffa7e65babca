package railwalk.circuit;

import org.jspecify.annotations.Nullable;

/**
 * A junction of the circuit. Equality is spelled out since nodes are the keys of almost every map.
 *
 * @param index its place in {@link Circuit#nodes()}, which is netlist order
 * @param name as first typed
 */
public record Node(int index, String name) {

  @Override
  public boolean equals(@Nullable Object other) {
    return other instanceof Node node && index == node.index && name.equals(node.name);
  }

  @Override
  public int hashCode() {
    return 31 * index + name.hashCode();
  }
}
