package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import railwalk.render.type.Typeface;

/** Puts marks on one sheet. */
final class Pen {
  /** Handle length of a quarter circle drawn as a cubic curve, over its radius. */
  private static final double CIRCLE_HANDLE = 0.5523;

  private static final double BOX_HEIGHT_EMS = 0.68;
  private static final double BOX_STROKE = 0.5;

  private final Faces faces;
  private final List<Ink> inks = new ArrayList<>();

  Pen(Faces faces) {
    this.faces = faces;
  }

  /** Returns all that was drawn. */
  List<Ink> inks() {
    return List.copyOf(inks);
  }

  Faces faces() {
    return faces;
  }

  /** Writes text from {@code left}; a sign that the typeface lacks becomes a box. */
  void text(String text, Ink.Face face, double size, double left, double baseline, double grey) {
    Typeface typeface = faces.of(face);
    if (text.chars().allMatch(sign -> sign != 0xA0 && typeface.has(sign))) {
      words(new StringBuilder(text), face, size, left, baseline, grey);
      return;
    }
    StringBuilder run = new StringBuilder();
    double runLeft = left;
    double x = left;
    for (int codePoint : text.codePoints().map(Pen::printable).toArray()) {
      String sign = Character.toString(codePoint);
      double width = typeface.width(sign, size);
      if (typeface.has(codePoint)) {
        if (run.isEmpty()) {
          runLeft = x;
        }
        run.append(sign);
      } else {
        words(run, face, size, runLeft, baseline, grey);
        double inset = 0.08 * size;
        box(x + inset, baseline - BOX_HEIGHT_EMS * size, width - 2 * inset, BOX_HEIGHT_EMS * size);
      }
      x += width;
    }
    words(run, face, size, runLeft, baseline, grey);
  }

  void textRight(
      String text, Ink.Face face, double size, double right, double baseline, double grey) {
    text(text, face, size, right - faces.width(text, face, size), baseline, grey);
  }

  void textCentred(
      String text, Ink.Face face, double size, double centre, double baseline, double grey) {
    text(text, face, size, centre - faces.width(text, face, size) / 2, baseline, grey);
  }

  void line(double x1, double y1, double x2, double y2, double width, double grey) {
    inks.add(new Ink.Stroke(List.of(new Ink.From(x1, y1), new Ink.To(x2, y2)), width, grey));
  }

  void stroke(List<Ink.Move> moves, double width) {
    inks.add(new Ink.Stroke(moves, width, Style.BLACK));
  }

  void fill(List<Ink.Move> moves, double grey) {
    inks.add(new Ink.Fill(moves, grey));
  }

  void frame(double left, double top, double width, double height, double stroke) {
    inks.add(new Ink.Stroke(rectangle(left, top, width, height), stroke, Style.BLACK));
  }

  void circle(double x, double y, double radius, double stroke) {
    inks.add(new Ink.Stroke(round(x, y, radius), stroke, Style.BLACK));
  }

  void disc(double x, double y, double radius) {
    disc(x, y, radius, Style.BLACK);
  }

  void disc(double x, double y, double radius, double grey) {
    inks.add(new Ink.Fill(round(x, y, radius), grey));
  }

  /** Adds what another pen drew around its own origin, {@code scale} times as large. */
  void add(Pen drawn, double scale, double left, double top) {
    for (Ink ink : drawn.inks) {
      inks.add(ink.moved(scale, left, top));
    }
  }

  private void box(double left, double top, double width, double height) {
    frame(left, top, width, height, BOX_STROKE);
  }

  private void words(
      StringBuilder run, Ink.Face face, double size, double left, double baseline, double grey) {
    if (!run.toString().isBlank()) {
      inks.add(new Ink.Words(run.toString(), face, size, left, baseline, grey));
    }
    run.setLength(0);
  }

  /** Returns a blank for a no-break space and for a control character. */
  private static int printable(int codePoint) {
    return codePoint == 0xA0 || Character.isISOControl(codePoint) ? ' ' : codePoint;
  }

  private static List<Ink.Move> rectangle(double left, double top, double width, double height) {
    return List.of(
        new Ink.From(left, top),
        new Ink.To(left + width, top),
        new Ink.To(left + width, top + height),
        new Ink.To(left, top + height),
        new Ink.To(left, top),
        new Ink.To(left + width, top));
  }

  private static List<Ink.Move> round(double x, double y, double r) {
    double h = CIRCLE_HANDLE * r;
    return List.of(
        new Ink.From(x + r, y),
        new Ink.Curve(x + r, y + h, x + h, y + r, x, y + r),
        new Ink.Curve(x - h, y + r, x - r, y + h, x - r, y),
        new Ink.Curve(x - r, y - h, x - h, y - r, x, y - r),
        new Ink.Curve(x + h, y - r, x + r, y - h, x + r, y));
  }
}
