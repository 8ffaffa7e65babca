package railwalk.render.text;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Table;
import railwalk.chart.Table.Use;
import railwalk.render.type.ColumnFit;
import railwalk.render.type.LineBreaker;

/** One table as aligned columns. The head comes again where it has scrolled out of sight. */
final class TableText {
  private static final int WRITING_COLUMNS = 8;
  private static final int LEAST_WRITING_COLUMNS = 5;

  /** A word longer than this may be cut where room is short; figures never are. */
  private static final int LONG_WORD = 8;

  private static final int LINES_IN_SIGHT = 22;
  private static final LineBreaker FIGURES = LineBreaker.ofFigures(TextWidth::of);
  private static final int REMARK_INDENT = 4;

  private final Sheet sheet;
  private final Table table;
  private final int count;
  private final int[] widths;
  private final String gap;

  TableText(Sheet sheet, Table table) {
    this.sheet = sheet;
    this.table = table;
    this.count = table.columns().size();
    double[] natural = new double[count];
    double[] least = new double[count];
    measure(natural, least);
    double sum = 0;
    for (double width : natural) {
      sum += width;
    }
    gap = sum + 2 * (count - 1) <= Sheet.COLUMNS ? "  " : " ";
    double room = Sheet.COLUMNS - gap.length() * (count - 1);
    double[] fitted = ColumnFit.widths(natural, least, room);
    widths = new int[count];
    for (int i = 0; i < count; i++) {
      widths[i] = Math.max(1, (int) Math.floor(fitted[i] + 1e-6));
    }
  }

  private void measure(double[] natural, double[] least) {
    for (int i = 0; i < count; i++) {
      Table.Column column = table.columns().get(i);
      double head = Sheet.BREAKER.widestPiece(column.head());
      natural[i] = head;
      least[i] = head;
      if (column.use() == Use.WRITING) {
        natural[i] = Math.max(head, WRITING_COLUMNS);
        least[i] = Math.max(head, LEAST_WRITING_COLUMNS);
      }
      for (Table.Group group : table.groups()) {
        for (Table.Row row : group.rows()) {
          String cell = Sheet.clean(row.cells().get(i));
          LineBreaker breaker = breaker(column.use());
          natural[i] = Math.max(natural[i], breaker.width(cell));
          double piece = breaker.widestPiece(cell);
          least[i] =
              Math.max(least[i], column.use() == Use.WORDS ? Math.min(piece, LONG_WORD) : piece);
        }
      }
    }
  }

  private static LineBreaker breaker(Use use) {
    return use == Use.WORDS ? Sheet.BREAKER : FIGURES;
  }

  void print() {
    if (!table.title().isEmpty()) {
      sheet.ruleWith(table.title(), '-');
    }
    int headAt = Integer.MIN_VALUE;
    boolean first = true;
    for (Table.Group group : table.groups()) {
      if (!first) {
        sheet.blank();
      }
      boolean headDue = first || sheet.lines() - headAt > LINES_IN_SIGHT;
      first = false;
      if (!group.title().isEmpty()) {
        String subtitle = group.subtitle().isEmpty() ? "" : "  " + group.subtitle();
        sheet.paragraph(group.title() + subtitle, 0);
      }
      if (headDue) {
        head();
        headAt = sheet.lines();
      }
      group.rows().forEach(this::row);
      group.notes().forEach(note -> sheet.hanging("  ", note));
    }
  }

  private void head() {
    if (table.columns().stream().anyMatch(c -> !c.group().isEmpty())) {
      sheet.line(groupHeads());
    }
    List<List<String>> cells = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      cells.add(Sheet.BREAKER.lines(table.columns().get(i).head(), widths[i]));
    }
    lines(cells);
    StringBuilder rule = new StringBuilder();
    for (int i = 0; i < count; i++) {
      rule.append(i == 0 ? "" : gap).append("-".repeat(widths[i]));
    }
    sheet.line(rule.toString());
  }

  private String groupHeads() {
    StringBuilder line = new StringBuilder();
    int i = 0;
    while (i < count) {
      String group = table.columns().get(i).group();
      int width = widths[i];
      int end = i + 1;
      while (end < count && !group.isEmpty() && table.columns().get(end).group().equals(group)) {
        width += gap.length() + widths[end];
        end++;
      }
      String name = Sheet.BREAKER.clipped(Sheet.clean(group), width);
      line.append(i == 0 ? "" : gap)
          .append(group.isEmpty() ? " ".repeat(width) : dashed(name, width));
      i = end;
    }
    return line.toString();
  }

  /** Returns the name with dashes up to {@code width} on both sides. */
  private static String dashed(String name, int width) {
    int rest = width - TextWidth.of(name) - 2;
    return rest < 2
        ? Sheet.left(name, width)
        : "-".repeat(rest / 2) + " " + name + " " + "-".repeat(rest - rest / 2);
  }

  private void row(Table.Row row) {
    List<List<String>> cells = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      cells.add(
          table.columns().get(i).use() == Use.WRITING
              ? List.of("_".repeat(widths[i]))
              : breaker(table.columns().get(i).use())
                  .lines(Sheet.clean(row.cells().get(i)), widths[i]));
    }
    lines(cells);
    if (!row.remark().isEmpty()) {
      sheet.hanging(" ".repeat(REMARK_INDENT) + "(", row.remark() + ")");
    }
  }

  private void lines(List<List<String>> cells) {
    int height = cells.stream().mapToInt(List::size).max().orElse(0);
    for (int at = 0; at < height; at++) {
      StringBuilder line = new StringBuilder();
      for (int i = 0; i < count; i++) {
        String cell = at < cells.get(i).size() ? cells.get(i).get(at) : "";
        boolean flushLeft = table.columns().get(i).use() == Use.WORDS;
        line.append(i == 0 ? "" : gap)
            .append(flushLeft ? Sheet.left(cell, widths[i]) : Sheet.right(cell, widths[i]));
      }
      sheet.line(line.toString());
    }
  }
}
