package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Ladder;

/** The drawing signs of a supply: parts lie along the rail, from left to right. */
final class LadderSigns {
  /** Half the length of every part's sign. */
  static final double HALF_LENGTH = 13;

  /** Half the length of a source's sign. */
  static final double SOURCE_RADIUS = 12;

  private static final double STROKE = 0.9;
  private static final double FINE = 0.6;
  private static final double NODE_RADIUS = 2.1;

  private LadderSigns() {}

  static void node(Pen pen, double x, double y) {
    pen.disc(x, y, NODE_RADIUS);
  }

  /** Draws a node that was drawn before. */
  static void openNode(Pen pen, double x, double y) {
    pen.circle(x, y, NODE_RADIUS, STROKE);
  }

  /** Draws the sign that the drawing goes on below. */
  static void arrowDown(Pen pen, double x, double y) {
    pen.line(x, y, x, y + 9, STROKE, Style.BLACK);
    pen.fill(
        List.of(new Ink.From(x - 2.6, y + 8), new Ink.To(x + 2.6, y + 8), new Ink.To(x, y + 13)),
        Style.BLACK);
  }

  static void part(Pen pen, Ladder.Symbol symbol, double x, double y) {
    switch (symbol) {
      case RESISTOR -> resistor(pen, x, y);
      case CHOKE -> choke(pen, x, y);
      case FUSE -> fuse(pen, x, y);
      case SWITCH -> contact(pen, x, y);
      case DIODE -> diode(pen, x, y, false);
      case LAMP -> lamp(pen, x, y);
      case BOX -> pen.frame(x - HALF_LENGTH, y - 5, 2 * HALF_LENGTH, 10, STROKE);
    }
  }

  static void source(Pen pen, Ladder.Source source, boolean negative, double x, double y) {
    switch (source) {
      case TUBE_RECTIFIER -> rectifierTube(pen, x, y, negative);
      case DIODE_RECTIFIER -> {
        lead(pen, x, y);
        diode(pen, x, y, negative);
      }
      case FIXED_SOURCE -> battery(pen, x, y);
    }
  }

  private static void lead(Pen pen, double x, double y) {
    pen.line(x - SOURCE_RADIUS, y, x - HALF_LENGTH, y, STROKE, Style.BLACK);
    pen.line(x + HALF_LENGTH, y, x + SOURCE_RADIUS, y, STROKE, Style.BLACK);
  }

  private static void resistor(Pen pen, double x, double y) {
    double step = 2 * HALF_LENGTH / 12;
    List<Ink.Move> path = new ArrayList<>();
    path.add(new Ink.From(x - HALF_LENGTH, y));
    for (int i = 0; i < 6; i++) {
      double peak = i % 2 == 0 ? -5 : 5;
      path.add(new Ink.To(x - HALF_LENGTH + (2 * i + 1) * step, y + peak));
    }
    path.add(new Ink.To(x + HALF_LENGTH, y));
    pen.stroke(path, STROKE);
  }

  private static void choke(Pen pen, double x, double y) {
    double radius = HALF_LENGTH / 4;
    List<Ink.Move> path = new ArrayList<>();
    path.add(new Ink.From(x - HALF_LENGTH, y));
    for (int i = 0; i < 4; i++) {
      double left = x - HALF_LENGTH + 2 * i * radius;
      path.add(
          new Ink.Curve(
              left, y - 1.9 * radius, left + 2 * radius, y - 1.9 * radius, left + 2 * radius, y));
    }
    pen.stroke(path, STROKE);
    pen.line(x - HALF_LENGTH, y - 7, x + HALF_LENGTH, y - 7, FINE, Style.BLACK);
    pen.line(x - HALF_LENGTH, y - 9, x + HALF_LENGTH, y - 9, FINE, Style.BLACK);
  }

  private static void fuse(Pen pen, double x, double y) {
    pen.frame(x - HALF_LENGTH, y - 4, 2 * HALF_LENGTH, 8, STROKE);
    pen.line(x - HALF_LENGTH, y, x + HALF_LENGTH, y, FINE, Style.BLACK);
  }

  private static void contact(Pen pen, double x, double y) {
    pen.circle(x - 8, y, 1.6, STROKE);
    pen.circle(x + 8, y, 1.6, STROKE);
    pen.line(x - HALF_LENGTH, y, x - 9.6, y, STROKE, Style.BLACK);
    pen.line(x + 9.6, y, x + HALF_LENGTH, y, STROKE, Style.BLACK);
    pen.line(x - 6.8, y - 1.1, x + 8, y - 3, STROKE, Style.BLACK);
  }

  private static void diode(Pen pen, double x, double y, boolean towardsLeft) {
    double nose = towardsLeft ? x - 6 : x + 6;
    double back = towardsLeft ? x + 6 : x - 6;
    pen.line(x - HALF_LENGTH, y, x + HALF_LENGTH, y, STROKE, Style.BLACK);
    pen.fill(
        List.of(new Ink.From(back, y - 6), new Ink.To(back, y + 6), new Ink.To(nose, y)),
        Style.BLACK);
    pen.line(nose, y - 6, nose, y + 6, STROKE * 1.4, Style.BLACK);
  }

  private static void lamp(Pen pen, double x, double y) {
    pen.circle(x, y, 7, STROKE);
    pen.line(x - 5, y - 5, x + 5, y + 5, FINE, Style.BLACK);
    pen.line(x - 5, y + 5, x + 5, y - 5, FINE, Style.BLACK);
    pen.line(x - HALF_LENGTH, y, x - 7, y, STROKE, Style.BLACK);
    pen.line(x + 7, y, x + HALF_LENGTH, y, STROKE, Style.BLACK);
  }

  /** Draws a bottle with a plate and a bent cathode; the cathode is on the rail's side. */
  private static void rectifierTube(Pen pen, double x, double y, boolean plateOnTheRail) {
    double side = plateOnTheRail ? -1 : 1;
    pen.circle(x, y, SOURCE_RADIUS, STROKE);
    double plate = x - 4 * side;
    double cathode = x + 4 * side;
    pen.line(x - SOURCE_RADIUS * side, y, plate, y, STROKE, Style.BLACK);
    pen.line(plate, y - 6.5, plate, y + 6.5, STROKE * 1.6, Style.BLACK);
    pen.line(x + SOURCE_RADIUS * side, y, cathode, y, STROKE, Style.BLACK);
    pen.line(cathode, y - 5.5, cathode, y + 5.5, STROKE, Style.BLACK);
    pen.line(cathode, y - 5.5, cathode - 2.5 * side, y - 5.5, STROKE, Style.BLACK);
    pen.line(cathode, y + 5.5, cathode - 2.5 * side, y + 5.5, STROKE, Style.BLACK);
  }

  private static void battery(Pen pen, double x, double y) {
    pen.line(x - SOURCE_RADIUS, y, x - 2, y, STROKE, Style.BLACK);
    pen.line(x + 2, y, x + SOURCE_RADIUS, y, STROKE, Style.BLACK);
    pen.line(x - 2, y - 4, x - 2, y + 4, STROKE * 2, Style.BLACK);
    pen.line(x + 2, y - 8, x + 2, y + 8, STROKE, Style.BLACK);
  }
}
