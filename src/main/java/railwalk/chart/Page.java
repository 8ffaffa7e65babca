package railwalk.chart;

import java.util.List;

/**
 * A part of the chart with a title of its own. On paper it starts a fresh sheet, unless it fits as
 * a whole below the one before.
 */
public record Page(String title, List<Block> blocks) {
  public Page {
    blocks = List.copyOf(blocks);
  }
}
