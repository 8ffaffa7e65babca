package railwalk.render.pdf;

import railwalk.chart.Chart;

/** What stands at the head and foot of every sheet. */
record Margins(Chart chart, Paper paper, Faces faces) {
  private static final double HEAD_BASELINE = 38;
  private static final double FOOT_ABOVE_EDGE = 30;
  private static final double LEAST_GAP = 14;

  void draw(Pen pen, int number, int count) {
    double left = Style.MARGIN_SIDE;
    double right = paper.widthPoints() - Style.MARGIN_SIDE;
    if (number > 1) {
      pair(pen, chart.title(), chart.conditionsLine(), left, right, HEAD_BASELINE);
      pen.line(left, HEAD_BASELINE + 6, right, HEAD_BASELINE + 6, Style.HAIRLINE, Style.MID_GREY);
    }
    double foot = paper.heightPoints() - FOOT_ABOVE_EDGE;
    pair(pen, chart.standingCaution(), "page " + number + " of " + count, left, right, foot);
  }

  /** Writes one text at the left, the other at the right, cut where they would meet. */
  private void pair(Pen pen, String start, String end, double left, double right, double baseline) {
    String shownEnd =
        faces.breaker(Ink.Face.REGULAR, Style.SMALL).clipped(end, 0.6 * (right - left));
    double endWidth = faces.width(shownEnd, Ink.Face.REGULAR, Style.SMALL);
    String shownStart =
        faces
            .breaker(Ink.Face.REGULAR, Style.SMALL)
            .clipped(start, right - left - endWidth - LEAST_GAP);
    pen.text(shownStart, Ink.Face.REGULAR, Style.SMALL, left, baseline, Style.DARK_GREY);
    pen.textRight(shownEnd, Ink.Face.REGULAR, Style.SMALL, right, baseline, Style.DARK_GREY);
  }
}
