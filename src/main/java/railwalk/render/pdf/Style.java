package railwalk.render.pdf;

/** Sizes and greys of the printed chart, in points. */
final class Style {
  static final double MARGIN_SIDE = 50;
  static final double MARGIN_TOP = 62;
  static final double MARGIN_BOTTOM = 56;

  static final double TITLE = 24;
  static final double PAGE_TITLE = 16;
  static final double HEADING = 11;
  static final double GROUP_TITLE = 10;
  static final double BODY = 9;
  static final double BODY_LEADING = 12.5;
  static final double HEAD = 7.5;
  static final double SMALL = 7.5;
  static final double SMALL_LEADING = 10;
  static final double LARGE_WARNING = 30;

  static final double BLACK = 0;
  static final double DARK_GREY = 0.3;
  static final double MID_GREY = 0.55;
  static final double PALE_GREY = 0.8;

  static final double HAIRLINE = 0.4;
  static final double RULE = 0.8;
  static final double HEAVY_RULE = 2;

  static final double BLOCK_GAP = 16;
  static final double PAGE_GAP = 30;

  /** Height of capitals over the size, for centring text on a line. */
  static final double CAP_HEIGHT = 0.7;

  private Style() {}
}
