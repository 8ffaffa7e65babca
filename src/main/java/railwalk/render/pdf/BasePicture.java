package railwalk.render.pdf;

import java.util.List;
import railwalk.chart.BaseDrawing;

/** Draws a tube's base from below: the ring of pins, what tells pin 1, and what each leads to. */
final class BasePicture {
  private static final double TITLE = 8;
  private static final double TITLE_ROW = 13;
  private static final double LABEL = 7.5;
  private static final double NUMBER = 7;
  private static final double RIM = 46;
  private static final double PITCH = 33;
  private static final double LABEL_RADIUS = 51;
  private static final double PIN = 5.6;
  private static final double THICK_PIN = 7.4;
  private static final double LABEL_ROOM = 13;
  private static final double CAP_ROOM = 20;
  private static final double KEY_RADIUS = 13;
  private static final double WHITE = 1;

  private final BaseDrawing base;

  private BasePicture(BaseDrawing base) {
    this.base = base;
  }

  /** Returns {@code base} as a slice of that width. */
  static Slice of(BaseDrawing base, double width) {
    BasePicture picture = new BasePicture(base);
    double above = TITLE_ROW + (base.cap().isEmpty() ? 0 : CAP_ROOM) + LABEL_ROOM;
    return Slice.of(
        above + 2 * RIM + LABEL_ROOM,
        (pen, left, top) -> {
          pen.text(base.title(), Ink.Face.BOLD, TITLE, left, top + TITLE, Style.BLACK);
          picture.draw(pen, left + width / 2, top + above + RIM, top + TITLE_ROW);
        });
  }

  private void draw(Pen pen, double x, double y, double capTop) {
    pen.circle(x, y, RIM, Style.RULE);
    for (BaseDrawing.Contact contact : base.contacts()) {
      contact(pen, contact, x, y);
    }
    switch (base.mark()) {
      case KEY -> key(pen, x, y);
      case BEAD -> pen.circle(x, y + RIM + 3, 3, Style.RULE);
      case GAP, THICK_PINS -> {}
    }
    if (!base.cap().isEmpty()) {
      double capY = capTop + CAP_ROOM / 2;
      pen.circle(x, capY, PIN, Style.RULE);
      pen.disc(x, capY, 1.5, Style.BLACK);
      pen.text(
          "top cap: " + base.cap(),
          Ink.Face.REGULAR,
          LABEL,
          x + PIN + 4,
          capY + LABEL * Style.CAP_HEIGHT / 2,
          Style.BLACK);
    }
  }

  private void contact(Pen pen, BaseDrawing.Contact contact, double x, double y) {
    double turn = Math.toRadians(contact.degrees());
    double sin = -Math.sin(turn);
    double cos = Math.cos(turn);
    double pinX = x + PITCH * sin;
    double pinY = y + PITCH * cos;
    double radius = contact.thick() ? THICK_PIN : PIN;
    double numberBaseline = pinY + NUMBER * Style.CAP_HEIGHT / 2;
    String number = Integer.toString(contact.number());
    if (!contact.present()) {
      pen.textCentred(number, Ink.Face.REGULAR, NUMBER, pinX, numberBaseline, Style.PALE_GREY);
      return;
    }
    if (contact.live()) {
      pen.disc(pinX, pinY, radius, Style.BLACK);
      pen.textCentred(number, Ink.Face.BOLD, NUMBER, pinX, numberBaseline, WHITE);
    } else {
      pen.circle(pinX, pinY, radius, Style.HAIRLINE);
      pen.textCentred(number, Ink.Face.REGULAR, NUMBER, pinX, numberBaseline, Style.MID_GREY);
    }
    label(pen, contact, x + LABEL_RADIUS * sin, y + LABEL_RADIUS * cos, sin, cos);
  }

  /** Writes what a pin leads to outside the rim, flush with it. */
  private void label(
      Pen pen, BaseDrawing.Contact contact, double x, double y, double sin, double cos) {
    double grey = contact.live() ? Style.BLACK : Style.MID_GREY;
    double baseline = y + LABEL * Style.CAP_HEIGHT * (1 + cos) / 2;
    if (Math.abs(sin) < 0.2) {
      pen.textCentred(contact.leadsTo(), Ink.Face.REGULAR, LABEL, x, baseline, grey);
    } else if (sin > 0) {
      pen.text(contact.leadsTo(), Ink.Face.REGULAR, LABEL, x, baseline, grey);
    } else {
      pen.textRight(contact.leadsTo(), Ink.Face.REGULAR, LABEL, x, baseline, grey);
    }
  }

  /** Draws the spigot with its key. */
  private static void key(Pen pen, double x, double y) {
    double half = 3;
    double depth = 4;
    double shoulder = Math.sqrt(KEY_RADIUS * KEY_RADIUS - half * half);
    pen.circle(x, y, KEY_RADIUS, Style.RULE);
    List<Ink.Move> block =
        List.of(
            new Ink.From(x - half, y + shoulder),
            new Ink.To(x - half, y + KEY_RADIUS + depth),
            new Ink.To(x + half, y + KEY_RADIUS + depth),
            new Ink.To(x + half, y + shoulder));
    pen.fill(block, Style.BLACK);
  }
}
