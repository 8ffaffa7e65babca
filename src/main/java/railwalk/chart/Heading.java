package railwalk.chart;

/** A heading within a page; it stays with the block that follows it. */
public record Heading(String text) implements Block {
  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
