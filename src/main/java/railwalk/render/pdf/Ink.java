package railwalk.render.pdf;

import java.util.List;

/**
 * One mark on a sheet. Lengths are points from the sheet's upper left corner, down and to the
 * right; greys run from 0, black, to 1.
 */
sealed interface Ink {

  /** Returns this mark {@code scale} times as large around the upper left corner, then moved. */
  Ink moved(double scale, double dx, double dy);

  /** A piece of text on its baseline. */
  record Words(String text, Face face, double size, double left, double baseline, double grey)
      implements Ink {
    @Override
    public Words moved(double scale, double dx, double dy) {
      return new Words(text, face, scale * size, scale * left + dx, scale * baseline + dy, grey);
    }
  }

  /** A line through points, stroked. */
  record Stroke(List<Move> moves, double width, double grey) implements Ink {
    public Stroke {
      moves = List.copyOf(moves);
    }

    @Override
    public Stroke moved(double scale, double dx, double dy) {
      return new Stroke(Move.moved(moves, scale, dx, dy), scale * width, grey);
    }
  }

  /** An area within points, filled. */
  record Fill(List<Move> moves, double grey) implements Ink {
    public Fill {
      moves = List.copyOf(moves);
    }

    @Override
    public Fill moved(double scale, double dx, double dy) {
      return new Fill(Move.moved(moves, scale, dx, dy), grey);
    }
  }

  /** One step of a path. */
  sealed interface Move {
    /** Returns this step scaled and moved. */
    Move moved(double scale, double dx, double dy);

    /** Returns all of {@code moves} scaled and moved. */
    static List<Move> moved(List<Move> moves, double scale, double dx, double dy) {
      return moves.stream().map(move -> move.moved(scale, dx, dy)).toList();
    }
  }

  /** Starts a new piece of the path. */
  record From(double x, double y) implements Move {
    @Override
    public From moved(double scale, double dx, double dy) {
      return new From(scale * x + dx, scale * y + dy);
    }
  }

  /** A straight line. */
  record To(double x, double y) implements Move {
    @Override
    public To moved(double scale, double dx, double dy) {
      return new To(scale * x + dx, scale * y + dy);
    }
  }

  /** A cubic curve with two control points. */
  record Curve(double x1, double y1, double x2, double y2, double x, double y) implements Move {
    @Override
    public Curve moved(double scale, double dx, double dy) {
      return new Curve(
          scale * x1 + dx,
          scale * y1 + dy,
          scale * x2 + dx,
          scale * y2 + dy,
          scale * x + dx,
          scale * y + dy);
    }
  }

  /** The two weights of the typeface. */
  enum Face {
    REGULAR,
    BOLD
  }
}
