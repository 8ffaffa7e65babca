package railwalk.chart;

import java.util.List;

/**
 * A part of the chart with a title of its own. On paper it starts a fresh sheet, unless the one
 * before leaves room for it.
 */
public record Page(String title, List<Block> blocks) {
  public Page {
    blocks = List.copyOf(blocks);
  }
}
