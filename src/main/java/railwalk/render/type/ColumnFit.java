package railwalk.render.type;

/** Fits the columns of a table into the room there is. */
public final class ColumnFit {
  private ColumnFit() {}

  /**
   * Returns a width for each column, {@code available} in total at most: the natural widths where
   * they fit; else all columns wider than a common limit come down to it, none below its least
   * width; else, where even the least widths are too much, all of those in proportion.
   *
   * @param natural width of each column's widest content
   * @param least width that each column needs without breaking a word; at most {@code natural}
   */
  public static double[] widths(double[] natural, double[] least, double available) {
    if (sum(natural) <= available) {
      return natural.clone();
    }
    double leastSum = sum(least);
    if (leastSum >= available) {
      double[] scaled = least.clone();
      for (int i = 0; i < scaled.length; i++) {
        scaled[i] *= available / leastSum;
      }
      return scaled;
    }
    double low = 0;
    double high = available;
    for (int step = 0; step < 60; step++) {
      double middle = (low + high) / 2;
      if (sum(limited(natural, least, middle)) <= available) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return limited(natural, least, low);
  }

  private static double[] limited(double[] natural, double[] least, double limit) {
    double[] widths = new double[natural.length];
    for (int i = 0; i < widths.length; i++) {
      widths[i] = Math.min(natural[i], Math.max(least[i], limit));
    }
    return widths;
  }

  private static double sum(double[] values) {
    double sum = 0;
    for (double value : values) {
      sum += value;
    }
    return sum;
  }
}
