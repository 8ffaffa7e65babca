package railwalk.chart;

import java.util.List;

/** Labels with an empty line behind each, to be written on by hand. */
public record FillIn(List<String> labels) implements Block {
  public FillIn {
    labels = List.copyOf(labels);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
