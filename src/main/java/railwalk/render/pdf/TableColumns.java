package railwalk.render.pdf;

import railwalk.chart.Table;
import railwalk.chart.Table.Use;
import railwalk.render.type.ColumnFit;
import railwalk.render.type.LineBreaker;

/**
 * Where a table's columns stand: left edges and widths, from the table's own left edge. Room to
 * spare goes to the gaps first, then to the columns that are written in by hand.
 */
record TableColumns(double[] lefts, double[] widths) {
  static final double CELL = 8.8;

  private static final double LEAST_GAP = 8;
  private static final double WIDEST_GAP = 20;
  private static final double WIDEST_HEAD = 60;

  /** A word wider than this may be cut where room is short; figures never are. */
  private static final double LONG_WORD = 44;

  private static final double WRITING = 56;
  private static final double LEAST_WRITING = 34;
  private static final double WIDEST_WRITING = 96;

  static TableColumns of(Table table, Faces faces, double width) {
    int count = table.columns().size();
    double[] natural = new double[count];
    double[] least = new double[count];
    for (int i = 0; i < count; i++) {
      measure(table, i, faces, natural, least);
    }
    double gaps = LEAST_GAP * (count - 1);
    double[] widths = ColumnFit.widths(natural, least, width - gaps);
    double spare = width - gaps;
    for (double each : widths) {
      spare -= each;
    }
    double gap = LEAST_GAP;
    if (count > 1 && spare > 0) {
      double more = Math.min(spare / (count - 1), WIDEST_GAP - LEAST_GAP);
      gap += more;
      spare -= more * (count - 1);
    }
    widenWriting(table, widths, spare);
    double[] lefts = new double[count];
    for (int i = 1; i < count; i++) {
      lefts[i] = lefts[i - 1] + widths[i - 1] + gap;
    }
    return new TableColumns(lefts, widths);
  }

  double right(int column) {
    return lefts[column] + widths[column];
  }

  static Ink.Face face(Use use) {
    return use == Use.KEY_FIGURES ? Ink.Face.BOLD : Ink.Face.REGULAR;
  }

  /** Returns what breaks the cells of a column. */
  static LineBreaker breaker(Use use, Faces faces) {
    return use == Use.WORDS ? faces.breaker(face(use), CELL) : faces.figureBreaker(face(use), CELL);
  }

  private static void measure(Table table, int i, Faces faces, double[] natural, double[] least) {
    Table.Column column = table.columns().get(i);
    LineBreaker head = faces.breaker(Ink.Face.BOLD, Style.HEAD);
    natural[i] =
        Math.max(
            head.widestPiece(column.head()),
            Math.min(faces.width(column.head(), Ink.Face.BOLD, Style.HEAD), WIDEST_HEAD));
    least[i] = head.widestPiece(column.head());
    if (column.use() == Use.WRITING) {
      natural[i] = Math.max(natural[i], WRITING);
      least[i] = Math.max(least[i], LEAST_WRITING);
      return;
    }
    LineBreaker cells = breaker(column.use(), faces);
    for (Table.Group group : table.groups()) {
      for (Table.Row row : group.rows()) {
        String cell = row.cells().get(i);
        natural[i] = Math.max(natural[i], cells.width(cell));
        double piece = cells.widestPiece(cell);
        least[i] =
            Math.max(least[i], column.use() == Use.WORDS ? Math.min(piece, LONG_WORD) : piece);
      }
    }
  }

  private static void widenWriting(Table table, double[] widths, double spare) {
    long columns = table.columns().stream().filter(c -> c.use() == Use.WRITING).count();
    for (int i = 0; i < widths.length; i++) {
      if (table.columns().get(i).use() == Use.WRITING) {
        widths[i] += Math.max(0, Math.min(spare / columns, WIDEST_WRITING - widths[i]));
      }
    }
  }
}
