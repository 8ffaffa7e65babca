package railwalk.chart;

import java.util.List;

/**
 * Curves over two axes, with single points marked on them. Figures are in the units that the axes'
 * titles name.
 *
 * @param title above it
 * @param curves from front to back: where labels would overlap the earlier curve keeps its own
 */
public record Plot(String title, Axis x, Axis y, List<Curve> curves, List<Mark> marks)
    implements Block {
  /**
   * One axis.
   *
   * @param title with the unit
   * @param step between ticks; {@code from} and {@code to} are multiples of it
   */
  public record Axis(String title, double from, double to, double step) {
    /** Returns where its ticks are, rising. */
    public List<Double> ticks() {
      return Ticks.between(from, to, step);
    }

    /** Returns the number at a tick as people read it. */
    public String word(double tick) {
      return Ticks.word(tick, step);
    }
  }

  /** How a curve is drawn. */
  public enum Line {
    PLAIN,
    DASHED
  }

  /** One place on the plot. */
  public record Spot(double x, double y) {}

  /**
   * One curve.
   *
   * @param label set at its last spot
   * @param spots joined by straight lines; all inside the axes
   */
  public record Curve(String label, Line line, List<Spot> spots) {
    public Curve {
      spots = List.copyOf(spots);
    }
  }

  /** A single point with the number by which a table lists it. */
  public record Mark(String number, Spot at) {}

  public Plot {
    curves = List.copyOf(curves);
    marks = List.copyOf(marks);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
