package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Ladder;
import railwalk.render.type.LineBreaker;

/** Draws one rail of the supply: a slice for each tier of its grid. */
final class LadderSlabs {
  private static final double LEAST_CELL = 84;
  private static final double WIDEST_CELL = 120;
  private static final double LAST_LABEL = 66;
  private static final double NODE_NAME = 9;
  private static final double NODE_VOLTS = 10.5;
  private static final double LINE = 7;
  private static final double LINE_LEADING = 8.6;
  private static final int MOST_LINES = 6;
  private static final double TALLEST_ROW = 180;
  private static final double RAIL = 0.9;
  private static final double ABOVE_RAIL = 13;
  private static final double BELOW_RAIL = 17;
  private static final double ROW_GAP = 9;
  private static final double SIGN_AT_FEED = 14;

  private final Faces faces;
  private final LadderGrid.Tier tier;
  private final double cell;
  private final double[] rails;
  private final double height;

  private LadderSlabs(Faces faces, LadderGrid.Tier tier, double cell) {
    this.faces = faces;
    this.tier = tier;
    this.cell = cell;
    this.rails = new double[tier.rows()];
    double y = 0;
    for (int row = 0; row < rails.length; row++) {
      y += above(row);
      rails[row] = y;
      y += below(row) + ROW_GAP;
    }
    this.height = y;
  }

  /** Returns the slabs of one rail. */
  static List<Slab> of(Ladder.Feed feed, Faces faces, double width, double bodyHeight) {
    int columns = 1 + (int) ((width - LAST_LABEL) / LEAST_CELL);
    int rows = Math.max(1, (int) (bodyHeight / TALLEST_ROW));
    List<LadderGrid.Tier> tiers = LadderGrid.tiers(feed, columns, rows);
    int used =
        tiers.stream()
            .flatMap(tier -> tier.stops().stream())
            .mapToInt(LadderGrid.PlacedStop::column)
            .max()
            .orElse(1);
    double cell = Math.min(WIDEST_CELL, (width - LAST_LABEL) / Math.max(1, used));
    List<Slab> slabs = new ArrayList<>();
    for (LadderGrid.Tier tier : tiers) {
      LadderSlabs drawing = new LadderSlabs(faces, tier, cell);
      slabs.add(Slab.of(List.of(Slice.of(drawing.height, drawing::draw))));
    }
    return slabs;
  }

  private double above(int row) {
    return ABOVE_RAIL
        + NODE_NAME
        + NODE_VOLTS
        + tier.stops().stream()
            .filter(s -> s.row() == row)
            .mapToDouble(s -> LINE_LEADING * lines(s.stop().lines(), labelWidth()).size())
            .max()
            .orElse(0)
        + 6;
  }

  private double below(int row) {
    double parts =
        tier.spans().stream()
            .filter(s -> s.toRow() == row && !s.parts().isEmpty())
            .flatMap(s -> s.parts().stream())
            .mapToDouble(p -> BELOW_RAIL + LINE_LEADING * partLines(p).size())
            .max()
            .orElse(6);
    Ladder.Feed feed = tier.feed();
    double lines =
        feed == null || row > 0
            ? 0
            : BELOW_RAIL + 6 + LINE_LEADING * lines(feed.lines(), cell - 6).size();
    double arrow =
        tier.stops().stream().anyMatch(s -> s.row() == row && s.goesOn()) ? BELOW_RAIL : 0;
    return Math.max(Math.max(parts, lines), arrow);
  }

  private double labelWidth() {
    return Math.max(LAST_LABEL, cell - 8);
  }

  private List<String> lines(List<String> texts, double room) {
    LineBreaker breaker = faces.breaker(Ink.Face.REGULAR, LINE);
    return texts.stream()
        .flatMap(text -> breaker.lines(text, room, 2).stream())
        .limit(MOST_LINES)
        .toList();
  }

  private List<String> partLines(Ladder.Part part) {
    List<String> texts = new ArrayList<>();
    texts.add(part.value().isEmpty() ? part.name() : part.name() + " " + part.value());
    texts.add(part.load());
    return lines(texts, cell - 10);
  }

  private void draw(Pen pen, double left, double top) {
    for (LadderGrid.PlacedSpan span : tier.spans()) {
      drawSpan(pen, left, top, span);
    }
    Ladder.Feed feed = tier.feed();
    if (feed != null) {
      drawFeed(pen, left, top + rails[0], feed);
    }
    for (LadderGrid.PlacedStop stop : tier.stops()) {
      drawStop(pen, left + stop.column() * cell, top + rails[stop.row()], stop);
    }
  }

  private void drawFeed(Pen pen, double left, double rail, Ladder.Feed feed) {
    double x = left + SIGN_AT_FEED;
    LadderSigns.source(pen, feed.source(), feed.negative(), x, rail);
    pen.text(
        faces.breaker(Ink.Face.BOLD, NODE_NAME).clipped(feed.name(), labelWidth() - 6),
        Ink.Face.BOLD,
        NODE_NAME,
        left,
        rail - LadderSigns.SOURCE_RADIUS - 5,
        Style.BLACK);
    double y = rail + BELOW_RAIL + 6;
    for (String line : lines(feed.lines(), cell - 6)) {
      pen.text(line, Ink.Face.REGULAR, LINE, left, y + 2, Style.DARK_GREY);
      y += LINE_LEADING;
    }
  }

  private void drawStop(Pen pen, double x, double rail, LadderGrid.PlacedStop placed) {
    Ladder.Stop stop = placed.stop();
    if (placed.again()) {
      LadderSigns.openNode(pen, x, rail);
    } else {
      LadderSigns.node(pen, x, rail);
    }
    if (placed.goesOn()) {
      LadderSigns.arrowDown(pen, x, rail);
    }
    double room = labelWidth();
    double y = rail - ABOVE_RAIL;
    List<String> lines = lines(stop.lines(), room);
    for (int i = lines.size() - 1; i >= 0; i--) {
      pen.text(lines.get(i), Ink.Face.REGULAR, LINE, x, y, Style.DARK_GREY);
      y -= LINE_LEADING;
    }
    pen.text(
        faces.breaker(Ink.Face.BOLD, NODE_VOLTS).clipped(stop.volts(), room),
        Ink.Face.BOLD,
        NODE_VOLTS,
        x,
        y - 0.5,
        Style.BLACK);
    String name =
        placed.again() && !stop.node().isEmpty() ? stop.node() + ", from above" : stop.node();
    pen.text(
        faces.breaker(Ink.Face.REGULAR, NODE_NAME).clipped(name, room),
        Ink.Face.REGULAR,
        NODE_NAME,
        x,
        y - 0.5 - NODE_VOLTS,
        Style.BLACK);
  }

  private void drawSpan(Pen pen, double left, double top, LadderGrid.PlacedSpan span) {
    boolean fromFeed = tier.feed() != null && span.fromColumn() == 0 && span.fromRow() == 0;
    double start = left + span.fromColumn() * cell;
    double end = left + span.toColumn() * cell;
    double rail = top + rails[span.toRow()];
    if (span.toRow() != span.fromRow()) {
      pen.line(start, top + rails[span.fromRow()], start, rail, RAIL, Style.BLACK);
    }
    double x = fromFeed ? start + SIGN_AT_FEED + LadderSigns.SOURCE_RADIUS : start;
    double centre = fromFeed ? start + 1.5 * cell : start + cell / 2;
    for (Ladder.Part part : span.parts()) {
      pen.line(x, rail, centre - LadderSigns.HALF_LENGTH, rail, RAIL, Style.BLACK);
      LadderSigns.part(pen, part.symbol(), centre, rail);
      x = centre + LadderSigns.HALF_LENGTH;
      double y = rail + BELOW_RAIL;
      for (String line : partLines(part)) {
        pen.textCentred(line, Ink.Face.REGULAR, LINE, centre, y, Style.BLACK);
        y += LINE_LEADING;
      }
      centre += cell;
    }
    pen.line(x, rail, end, rail, RAIL, Style.BLACK);
  }
}
