package railwalk.render.pdf;

/** A size of sheet, upright, in points. */
public enum Paper {
  /** ISO 216: 210 mm by 297 mm. */
  A4(210 / 25.4 * 72, 297 / 25.4 * 72),
  /** 8.5 inch by 11 inch. */
  LETTER(8.5 * 72, 11 * 72);

  private final double widthPoints;
  private final double heightPoints;

  Paper(double widthPoints, double heightPoints) {
    this.widthPoints = widthPoints;
    this.heightPoints = heightPoints;
  }

  double widthPoints() {
    return widthPoints;
  }

  double heightPoints() {
    return heightPoints;
  }
}
