package railwalk.chart;

import java.util.List;

/** Blocks set in smaller type, such as figures to look up. */
public record SmallPrint(List<Block> blocks) implements Block {
  public SmallPrint {
    blocks = List.copyOf(blocks);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
