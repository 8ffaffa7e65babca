package railwalk.render.pdf;

import java.util.List;

/**
 * One mark on a sheet. Lengths are points from the sheet's upper left corner, down and to the
 * right; greys run from 0, black, to 1.
 */
sealed interface Ink {

  /** A piece of text on its baseline. */
  record Words(String text, Face face, double size, double left, double baseline, double grey)
      implements Ink {}

  /** A line through points, stroked. */
  record Stroke(List<Move> moves, double width, double grey) implements Ink {
    public Stroke {
      moves = List.copyOf(moves);
    }
  }

  /** An area within points, filled. */
  record Fill(List<Move> moves, double grey) implements Ink {
    public Fill {
      moves = List.copyOf(moves);
    }
  }

  /** One step of a path. */
  sealed interface Move {}

  /** Starts a new piece of the path. */
  record From(double x, double y) implements Move {}

  /** A straight line. */
  record To(double x, double y) implements Move {}

  /** A cubic curve with two control points. */
  record Curve(double x1, double y1, double x2, double y2, double x, double y) implements Move {}

  /** The two weights of the typeface. */
  enum Face {
    REGULAR,
    BOLD
  }
}
