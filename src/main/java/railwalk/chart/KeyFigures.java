package railwalk.chart;

import java.util.List;

/** Labels with what they say, one below the other. */
public record KeyFigures(List<Entry> entries) implements Block {
  /**
   * One label and its text.
   *
   * @param strong whether the text is set bold
   */
  public record Entry(String label, String text, boolean strong) {}

  public KeyFigures {
    entries = List.copyOf(entries);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
