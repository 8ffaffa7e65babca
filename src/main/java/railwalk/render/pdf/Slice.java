package railwalk.render.pdf;

/** A piece of a page that is never cut: it has a height and can draw itself. */
interface Slice {
  /** Returns its height in points. */
  double height();

  /** Draws it with its upper left corner at the given place. */
  void draw(Pen pen, double left, double top);

  /** Returns whether it is mere room, which may be left out at a sheet's end. */
  default boolean isGap() {
    return false;
  }

  /** Returns the same, {@code scale} times as large. */
  default Slice scaled(double scale, Faces faces) {
    if (isGap()) {
      return gap(scale * height());
    }
    return of(
        scale * height(),
        (pen, left, top) -> {
          Pen apart = new Pen(faces);
          draw(apart, 0, 0);
          pen.add(apart, scale, left, top);
        });
  }

  /** Returns empty room. */
  static Slice gap(double height) {
    return new Gap(height);
  }

  /** Empty room. */
  record Gap(double height) implements Slice {
    @Override
    public boolean isGap() {
      return true;
    }

    @Override
    public void draw(Pen pen, double left, double top) {}
  }

  /** Returns a slice of that height drawn by {@code drawing}. */
  static Slice of(double height, Drawing drawing) {
    return new Slice() {
      @Override
      public double height() {
        return height;
      }

      @Override
      public void draw(Pen pen, double left, double top) {
        drawing.draw(pen, left, top);
      }
    };
  }

  /** Draws at a place. */
  @FunctionalInterface
  interface Drawing {
    void draw(Pen pen, double left, double top);
  }
}
