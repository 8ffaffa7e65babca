package railwalk.chart;

import java.util.List;

/** A part of the chart that starts on a fresh sheet; it runs over several where it is long. */
public record Page(String title, List<Block> blocks) {
  public Page {
    blocks = List.copyOf(blocks);
  }
}
