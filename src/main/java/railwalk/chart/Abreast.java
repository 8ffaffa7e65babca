package railwalk.chart;

import java.util.List;

/**
 * Blocks in two columns side by side. Never cut by a sheet's end.
 *
 * @param leftShare the left column's share of the width, between 0 and 1
 */
public record Abreast(double leftShare, List<Block> left, List<Block> right) implements Block {
  public Abreast {
    left = List.copyOf(left);
    right = List.copyOf(right);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
