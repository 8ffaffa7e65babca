package railwalk.chart;

/** A few sentences. */
public record Paragraph(String text) implements Block {
  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
