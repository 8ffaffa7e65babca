package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Plot;

/** Draws one plot: grid, curves with their labels at the ends, numbered marks. */
final class PlotDrawing {
  private static final double TITLE = 8;
  private static final double SMALL = 6.5;
  private static final double TITLE_ROW = 12;
  private static final double AXIS_TITLE_ROW = 9;
  private static final double LABEL_ROW = 9;
  private static final double TICK_GAP = 3;
  private static final double CURVE = 0.9;
  private static final double DASHED_CURVE = 0.7;
  private static final double DASH = 4;
  private static final double DASH_GAP = 2.5;
  private static final double GRID_GREY = 0.85;
  private static final double MARK_RADIUS = 2.3;
  private static final double WHITE = 1;

  private final Plot plot;
  private final Faces faces;
  private final Pen pen;
  private final Frame frame;
  private final List<Box> taken = new ArrayList<>();

  private PlotDrawing(Plot plot, Faces faces, Pen pen, Frame frame) {
    this.plot = plot;
    this.faces = faces;
    this.pen = pen;
    this.frame = frame;
  }

  /** Returns {@code plot} as a slice of that size. */
  static Slice of(Plot plot, Faces faces, double width, double height) {
    return Slice.of(
        height,
        (pen, left, top) -> {
          Frame frame = Frame.of(plot, faces, left, top, width, height);
          new PlotDrawing(plot, faces, pen, frame).draw(left, top, width);
        });
  }

  /** The rectangle between the axes and the scales along it. */
  private record Frame(
      Plot plot, double left, double top, double right, double bottom, double outerRight) {
    static Frame of(Plot plot, Faces faces, double left, double top, double width, double height) {
      double tickWidth = 0;
      for (double tick : plot.y().ticks()) {
        String word = plot.y().word(tick);
        tickWidth = Math.max(tickWidth, faces.width(word, Ink.Face.REGULAR, SMALL));
      }
      double labelWidth = 0;
      for (Plot.Curve curve : plot.curves()) {
        labelWidth = Math.max(labelWidth, faces.width(curve.label(), Ink.Face.REGULAR, SMALL));
      }
      return new Frame(
          plot,
          left + tickWidth + TICK_GAP,
          top + TITLE_ROW + AXIS_TITLE_ROW + LABEL_ROW,
          left + width - labelWidth - 2 * TICK_GAP,
          top + height - LABEL_ROW - AXIS_TITLE_ROW,
          left + width);
    }

    double x(double value) {
      Plot.Axis axis = plot.x();
      return left + (right - left) * (value - axis.from()) / (axis.to() - axis.from());
    }

    double y(double value) {
      Plot.Axis axis = plot.y();
      return bottom - (bottom - top) * (value - axis.from()) / (axis.to() - axis.from());
    }
  }

  private record Box(double left, double top, double right, double bottom) {
    boolean meets(Box other) {
      return left < other.right && other.left < right && top < other.bottom && other.top < bottom;
    }
  }

  private void draw(double left, double top, double width) {
    pen.text(
        faces.breaker(Ink.Face.BOLD, TITLE).clipped(plot.title(), width),
        Ink.Face.BOLD,
        TITLE,
        left,
        top + TITLE,
        Style.BLACK);
    pen.text(
        plot.y().title(), Ink.Face.REGULAR, SMALL, left, top + TITLE_ROW + SMALL, Style.DARK_GREY);
    grid();
    plot.curves().forEach(this::curve);
    pen.frame(
        frame.left, frame.top, frame.right - frame.left, frame.bottom - frame.top, Style.RULE);
    for (Plot.Mark mark : plot.marks()) {
      double x = frame.x(mark.at().x());
      double y = frame.y(mark.at().y());
      taken.add(new Box(x - MARK_RADIUS, y - MARK_RADIUS, x + MARK_RADIUS, y + MARK_RADIUS));
    }
    plot.curves().forEach(this::label);
    plot.marks().forEach(this::mark);
    plot.marks().forEach(this::number);
  }

  private void grid() {
    double foot = frame.bottom + TICK_GAP + SMALL;
    for (double tick : plot.x().ticks()) {
      double x = frame.x(tick);
      pen.line(x, frame.top, x, frame.bottom, Style.HAIRLINE, GRID_GREY);
      pen.textCentred(plot.x().word(tick), Ink.Face.REGULAR, SMALL, x, foot, Style.DARK_GREY);
    }
    for (double tick : plot.y().ticks()) {
      double y = frame.y(tick);
      pen.line(frame.left, y, frame.right, y, Style.HAIRLINE, GRID_GREY);
      pen.textRight(
          plot.y().word(tick),
          Ink.Face.REGULAR,
          SMALL,
          frame.left - TICK_GAP,
          y + SMALL * Style.CAP_HEIGHT / 2,
          Style.DARK_GREY);
    }
    pen.textCentred(
        plot.x().title(),
        Ink.Face.REGULAR,
        SMALL,
        (frame.left + frame.right) / 2,
        foot + AXIS_TITLE_ROW,
        Style.DARK_GREY);
  }

  private void curve(Plot.Curve curve) {
    List<Plot.Spot> spots = curve.spots();
    if (spots.size() < 2) {
      return;
    }
    if (curve.line() == Plot.Line.DASHED) {
      pen.stroke(dashes(spots), DASHED_CURVE);
      return;
    }
    List<Ink.Move> moves = new ArrayList<>();
    moves.add(new Ink.From(frame.x(spots.get(0).x()), frame.y(spots.get(0).y())));
    for (Plot.Spot spot : spots.subList(1, spots.size())) {
      moves.add(new Ink.To(frame.x(spot.x()), frame.y(spot.y())));
    }
    pen.stroke(moves, CURVE);
  }

  /** Returns the way through {@code spots} cut into dashes. */
  private List<Ink.Move> dashes(List<Plot.Spot> spots) {
    List<Ink.Move> moves = new ArrayList<>();
    double x = frame.x(spots.get(0).x());
    double y = frame.y(spots.get(0).y());
    moves.add(new Ink.From(x, y));
    boolean inked = true;
    double rest = DASH;
    for (Plot.Spot spot : spots.subList(1, spots.size())) {
      double toX = frame.x(spot.x());
      double toY = frame.y(spot.y());
      double length = Math.hypot(toX - x, toY - y);
      while (length > rest) {
        x += (toX - x) * rest / length;
        y += (toY - y) * rest / length;
        length -= rest;
        moves.add(inked ? new Ink.To(x, y) : new Ink.From(x, y));
        inked = !inked;
        rest = inked ? DASH : DASH_GAP;
      }
      rest -= length;
      x = toX;
      y = toY;
      if (inked) {
        moves.add(new Ink.To(x, y));
      }
    }
    return moves;
  }

  /** Sets a curve's label beside its end, unless something stands there. */
  private void label(Plot.Curve curve) {
    if (curve.label().isEmpty() || curve.spots().isEmpty()) {
      return;
    }
    Plot.Spot end = curve.spots().get(curve.spots().size() - 1);
    double x = frame.x(end.x());
    double y = frame.y(end.y());
    double width = faces.width(curve.label(), Ink.Face.REGULAR, SMALL);
    boolean leavesAtTheTop = y < frame.top + 1 && x < frame.right - 1;
    double left = leavesAtTheTop ? x - width / 2 : x + TICK_GAP;
    double baseline = leavesAtTheTop ? frame.top - TICK_GAP : y + SMALL * Style.CAP_HEIGHT / 2;
    left = Math.min(left, frame.outerRight - width);
    Box box = new Box(left - 1, baseline - SMALL, left + width + 1, baseline);
    if (isFree(box)) {
      taken.add(box);
      pen.text(curve.label(), Ink.Face.REGULAR, SMALL, left, baseline, Style.BLACK);
    }
  }

  private void mark(Plot.Mark mark) {
    double x = frame.x(mark.at().x());
    double y = frame.y(mark.at().y());
    pen.disc(x, y, MARK_RADIUS, WHITE);
    pen.circle(x, y, MARK_RADIUS, Style.RULE);
  }

  /** Writes a mark's number beside it, where there is room. */
  private void number(Plot.Mark mark) {
    double x = frame.x(mark.at().x());
    double y = frame.y(mark.at().y());
    double width = faces.width(mark.number(), Ink.Face.BOLD, SMALL);
    double height = SMALL * Style.CAP_HEIGHT;
    double away = MARK_RADIUS + 1.2;
    double[][] corners = {
      {x + away, y - away / 2},
      {x - away - width, y - away / 2},
      {x + away, y + away / 2 + height},
      {x - away - width, y + away / 2 + height},
      {x - width / 2, y - away - 0.5},
      {x - width / 2, y + away + 0.5 + height}
    };
    for (double[] corner : corners) {
      Box box = new Box(corner[0], corner[1] - height, corner[0] + width, corner[1]);
      if (isFree(box) && isInside(box)) {
        taken.add(box);
        number(mark.number(), box);
        return;
      }
    }
  }

  private void number(String number, Box box) {
    double rim = 0.6;
    pen.fill(
        List.of(
            new Ink.From(box.left - rim, box.top - rim),
            new Ink.To(box.right + rim, box.top - rim),
            new Ink.To(box.right + rim, box.bottom + rim),
            new Ink.To(box.left - rim, box.bottom + rim)),
        WHITE);
    pen.text(number, Ink.Face.BOLD, SMALL, box.left, box.bottom, Style.BLACK);
  }

  private boolean isFree(Box box) {
    return taken.stream().noneMatch(box::meets);
  }

  private boolean isInside(Box box) {
    return box.left > frame.left
        && box.right < frame.right
        && box.top > frame.top
        && box.bottom < frame.bottom;
  }
}
