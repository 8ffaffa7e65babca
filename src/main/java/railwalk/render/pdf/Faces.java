package railwalk.render.pdf;

import railwalk.render.type.LineBreaker;
import railwalk.render.type.Typeface;

/** The two weights of the typeface, loaded once for a document. */
record Faces(Typeface regular, Typeface bold) {

  static Faces load() {
    return new Faces(Typeface.regular(), Typeface.semiBold());
  }

  Typeface of(Ink.Face face) {
    return face == Ink.Face.BOLD ? bold : regular;
  }

  /** Returns the width of {@code text} in points. */
  double width(String text, Ink.Face face, double size) {
    return of(face).width(text, size);
  }

  /** Returns a breaker of words that measures in points. */
  LineBreaker breaker(Ink.Face face, double size) {
    return LineBreaker.ofWords(text -> width(text, face, size));
  }

  /** Returns a breaker of figures that measures in points. */
  LineBreaker figureBreaker(Ink.Face face, double size) {
    return LineBreaker.ofFigures(text -> width(text, face, size));
  }
}
