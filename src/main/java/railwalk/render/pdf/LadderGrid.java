package railwalk.render.pdf;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.chart.Ladder;

/**
 * One rail's tree laid on a grid: nodes at columns that grow along the rail, a row for the main
 * rail and one for each branch. What is too wide or too high for one tier goes on in the next, from
 * its node drawn again.
 */
final class LadderGrid {
  private final int columns;
  private final int rows;
  private final Deque<Ladder.Stop> waiting = new ArrayDeque<>();
  private List<PlacedStop> stops = new ArrayList<>();
  private List<PlacedSpan> spans = new ArrayList<>();
  private int nextRow;

  /**
   * @param columns cells abreast
   * @param rows rows of one tier
   */
  private LadderGrid(int columns, int rows) {
    this.columns = columns;
    this.rows = rows;
  }

  /**
   * A node.
   *
   * @param again whether it was drawn before, on the tier above
   * @param goesOn whether it is drawn again on a tier below
   */
  record PlacedStop(int column, int row, Ladder.Stop stop, boolean again, boolean goesOn) {}

  /** The way to the node at {@code toColumn}; it begins at a node of another row on a branch. */
  record PlacedSpan(
      int fromColumn, int fromRow, int toColumn, int toRow, List<Ladder.Part> parts) {}

  /**
   * One tier.
   *
   * @param feed what the tier starts from; null where it goes on from a node
   */
  record Tier(
      Ladder.@Nullable Feed feed, List<PlacedStop> stops, List<PlacedSpan> spans, int rows) {}

  /** Returns the tiers of {@code feed}, the one that starts at the rectifier first. */
  static List<Tier> tiers(Ladder.Feed feed, int columns, int rows) {
    LadderGrid grid = new LadderGrid(columns, rows);
    List<Tier> tiers = new ArrayList<>();
    tiers.add(grid.firstTier(feed));
    while (!grid.waiting.isEmpty()) {
      tiers.add(grid.nextTier(grid.waiting.removeFirst()));
    }
    return tiers;
  }

  private Tier firstTier(Ladder.Feed feed) {
    startTier();
    Ladder.Span rail = inShortSpans(feed.rail());
    int column = 1 + rail.parts().size();
    spans.add(new PlacedSpan(0, 0, column, 0, rail.parts()));
    place(rail.to(), column, 0, false);
    return new Tier(feed, List.copyOf(stops), List.copyOf(spans), nextRow);
  }

  private Tier nextTier(Ladder.Stop stop) {
    startTier();
    place(stop, 0, 0, true);
    return new Tier(null, List.copyOf(stops), List.copyOf(spans), nextRow);
  }

  private void startTier() {
    stops = new ArrayList<>();
    spans = new ArrayList<>();
    nextRow = 1;
  }

  /** Places a node and all that fits after it; the rest waits for a tier of its own. */
  private void place(Ladder.Stop stop, int column, int row, boolean again) {
    List<Ladder.Span> late = new ArrayList<>();
    int at = stops.size();
    stops.add(new PlacedStop(column, row, stop, again, false));
    boolean first = true;
    for (Ladder.Span span : stop.spans()) {
      Ladder.Span way = inShortSpans(span);
      int to = column + length(way);
      int toRow = first ? row : nextRow;
      if (to >= columns || toRow >= rows) {
        late.add(span);
        continue;
      }
      if (!first) {
        nextRow++;
      }
      first = false;
      spans.add(new PlacedSpan(column, row, to, toRow, way.parts()));
      place(way.to(), to, toRow, false);
    }
    if (!late.isEmpty()) {
      stops.set(at, new PlacedStop(column, row, stop, again, true));
      waiting.add(new Ladder.Stop(stop.node(), stop.volts(), List.of(), late));
    }
  }

  private static int length(Ladder.Span span) {
    return Math.max(1, span.parts().size());
  }

  /**
   * Returns {@code span} with a nameless node in it where it has more parts than one tier holds.
   */
  private Ladder.Span inShortSpans(Ladder.Span span) {
    int most = columns - 2;
    if (span.parts().size() <= most) {
      return span;
    }
    Ladder.Span rest = new Ladder.Span(span.parts().subList(most, span.parts().size()), span.to());
    Ladder.Stop between = new Ladder.Stop("", "", List.of(), List.of(rest));
    return new Ladder.Span(span.parts().subList(0, most), between);
  }
}
