package railwalk.chart;

import java.util.List;

/**
 * A framed box of warnings.
 *
 * @param weight how large it is set
 * @param points a sentence or a few each
 */
public record Caution(Weight weight, String title, List<String> points) implements Block {
  /** How large a caution is set. */
  public enum Weight {
    /** As the rest of the page. */
    PLAIN,
    /** Large enough to be read from across the bench. */
    LARGE
  }

  public Caution {
    points = List.copyOf(points);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
