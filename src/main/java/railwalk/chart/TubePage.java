package railwalk.chart;

import java.util.List;

/**
 * One tube type on a printed page, as plain data: base, ratings, curves and the published points.
 * Made by {@link TubePageBuilder}.
 *
 * @param name the type
 * @param also its other names, for the line beside the title; may be empty
 * @param summary a few words on what it is
 * @param foot one sentence for the foot of the page
 * @param blocks in reading order
 */
public record TubePage(String name, String also, String summary, String foot, List<Block> blocks) {
  public TubePage {
    blocks = List.copyOf(blocks);
  }
}
