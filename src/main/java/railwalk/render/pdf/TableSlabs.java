package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Table;
import railwalk.chart.Table.Use;
import railwalk.render.type.LineBreaker;

/** Sets one table: a slab for each group, a slice for each row, and the head they share. */
final class TableSlabs {
  private static final int MOST_LINES = 10;
  private static final double ROW = 14;
  private static final double WRITING_ROW = 17.5;
  private static final double CELL_LEADING = 10.5;
  private static final double BASELINE_ABOVE_FOOT = 5;
  private static final double HEAD_LEADING = 9;
  private static final double TITLE_ROW = 19;
  private static final double GROUP_GAP = 9;
  private static final double NOTE_GAP = 3;
  private static final double NOTE = 8;
  private static final double NOTE_LEADING = 10.5;

  private final Table table;
  private final Faces faces;
  private final double width;
  private final TableColumns columns;
  private final double rowHeight;

  TableSlabs(Table table, Faces faces, double width) {
    this.table = table;
    this.faces = faces;
    this.width = width;
    this.columns = TableColumns.of(table, faces, width);
    this.rowHeight =
        table.columns().stream().anyMatch(c -> c.use() == Use.WRITING) ? WRITING_ROW : ROW;
  }

  List<Slab> slabs() {
    Slab.Head head = new Slab.Head(head(table.title()), head(continued(table.title())));
    return table.groups().stream().map(group -> slab(group, head)).toList();
  }

  private static String continued(String title) {
    return title.isEmpty() ? "" : title + " (continued)";
  }

  private Slab slab(Table.Group group, Slab.Head head) {
    List<Slice> slices = new ArrayList<>();
    Slice again = null;
    if (!group.title().isEmpty()) {
      slices.add(groupTitle(group.title(), group.subtitle()));
      again = groupTitle(continued(group.title()), group.subtitle());
    }
    group.rows().forEach(row -> slices.add(row(row)));
    if (!group.notes().isEmpty()) {
      slices.add(Slice.gap(NOTE_GAP));
    }
    for (String note : group.notes()) {
      slices.addAll(note(note));
    }
    slices.add(Slice.gap(GROUP_GAP));
    return new Slab(!group.title().isEmpty(), List.of(), head, again, slices);
  }

  private Slice head(String title) {
    List<List<String>> heads = new ArrayList<>();
    LineBreaker breaker = faces.breaker(Ink.Face.BOLD, Style.HEAD);
    for (int i = 0; i < table.columns().size(); i++) {
      heads.add(breaker.lines(table.columns().get(i).head(), columns.widths()[i]));
    }
    int lines = heads.stream().mapToInt(List::size).max().orElse(1);
    boolean grouped = table.columns().stream().anyMatch(c -> !c.group().isEmpty());
    double titleHeight = title.isEmpty() ? 0 : TITLE_ROW;
    double groupHeight = grouped ? HEAD_LEADING + 4 : 0;
    double height = titleHeight + groupHeight + lines * HEAD_LEADING + 7;
    return Slice.of(
        height,
        (pen, left, top) -> {
          if (!title.isEmpty()) {
            pen.text(
                faces.breaker(Ink.Face.BOLD, Style.HEADING).clipped(title, width),
                Ink.Face.BOLD,
                Style.HEADING,
                left,
                top + Style.HEADING,
                Style.BLACK);
          }
          if (grouped) {
            groupHeads(pen, left, top + titleHeight);
          }
          double foot = top + height - 2;
          for (int i = 0; i < heads.size(); i++) {
            double baseline = foot - 4 - (heads.get(i).size() - 1) * HEAD_LEADING;
            for (String line : heads.get(i)) {
              headCell(pen, i, line, left, baseline);
              baseline += HEAD_LEADING;
            }
          }
          pen.line(left, foot, left + width, foot, Style.RULE, Style.BLACK);
        });
  }

  private void headCell(Pen pen, int column, String line, double left, double baseline) {
    Use use = table.columns().get(column).use();
    if (use == Use.FIGURES || use == Use.KEY_FIGURES) {
      pen.textRight(
          line, Ink.Face.BOLD, Style.HEAD, left + columns.right(column), baseline, Style.DARK_GREY);
    } else {
      pen.text(
          line,
          Ink.Face.BOLD,
          Style.HEAD,
          left + columns.lefts()[column],
          baseline,
          Style.DARK_GREY);
    }
  }

  private void groupHeads(Pen pen, double left, double top) {
    int i = 0;
    while (i < table.columns().size()) {
      String group = table.columns().get(i).group();
      int last = i;
      while (last + 1 < table.columns().size()
          && !group.isEmpty()
          && table.columns().get(last + 1).group().equals(group)) {
        last++;
      }
      if (!group.isEmpty()) {
        double start = left + columns.lefts()[i];
        double end = left + columns.right(last);
        pen.textCentred(
            faces.breaker(Ink.Face.BOLD, Style.HEAD).clipped(group, end - start),
            Ink.Face.BOLD,
            Style.HEAD,
            (start + end) / 2,
            top + Style.HEAD,
            Style.BLACK);
        double y = top + HEAD_LEADING + 2;
        pen.line(start, y, end, y, Style.HAIRLINE, Style.MID_GREY);
      }
      i = last + 1;
    }
  }

  private Slice groupTitle(String title, String subtitle) {
    return Slice.of(
        TITLE_ROW,
        (pen, left, top) -> {
          double baseline = top + TITLE_ROW - BASELINE_ABOVE_FOOT;
          String shown =
              faces.breaker(Ink.Face.BOLD, Style.GROUP_TITLE).clipped(title, width * 0.6);
          pen.text(shown, Ink.Face.BOLD, Style.GROUP_TITLE, left, baseline, Style.BLACK);
          double used = faces.width(shown, Ink.Face.BOLD, Style.GROUP_TITLE) + 10;
          pen.text(
              faces.breaker(Ink.Face.REGULAR, Style.BODY).clipped(subtitle, width - used),
              Ink.Face.REGULAR,
              Style.BODY,
              left + used,
              baseline,
              Style.DARK_GREY);
          double foot = top + TITLE_ROW;
          pen.line(left, foot, left + width, foot, Style.HAIRLINE, Style.MID_GREY);
        });
  }

  private Slice row(Table.Row row) {
    List<List<String>> cells = new ArrayList<>();
    for (int i = 0; i < table.columns().size(); i++) {
      cells.add(
          TableColumns.breaker(table.columns().get(i).use(), faces)
              .lines(row.cells().get(i), columns.widths()[i], MOST_LINES));
    }
    int lines = cells.stream().mapToInt(List::size).max().orElse(1);
    double remarkLeft = columns.lefts()[Math.min(1, columns.lefts().length - 1)];
    List<String> remark = remark(row.remark(), width - remarkLeft);
    double cellsHeight = rowHeight + (lines - 1) * CELL_LEADING;
    double height = cellsHeight + (remark.isEmpty() ? 0 : remark.size() * Style.SMALL_LEADING - 1);
    return Slice.of(
        height,
        (pen, left, top) -> {
          double firstBaseline = top + rowHeight - BASELINE_ABOVE_FOOT;
          for (int i = 0; i < cells.size(); i++) {
            cell(pen, i, cells.get(i), left, firstBaseline);
          }
          double baseline = top + cellsHeight + Style.SMALL - 3;
          for (String line : remark) {
            pen.text(
                line, Ink.Face.REGULAR, Style.SMALL, left + remarkLeft, baseline, Style.DARK_GREY);
            baseline += Style.SMALL_LEADING;
          }
          pen.line(left, top + height, left + width, top + height, Style.HAIRLINE, Style.PALE_GREY);
        });
  }

  private List<String> remark(String remark, double room) {
    return remark.isEmpty()
        ? List.of()
        : faces.breaker(Ink.Face.REGULAR, Style.SMALL).lines(remark, room, MOST_LINES);
  }

  private void cell(Pen pen, int column, List<String> lines, double left, double firstBaseline) {
    Use use = table.columns().get(column).use();
    double start = left + columns.lefts()[column];
    double end = left + columns.right(column);
    if (use == Use.WRITING) {
      double y = firstBaseline + 2;
      pen.line(start, y, end, y, Style.HAIRLINE, Style.DARK_GREY);
      return;
    }
    double baseline = firstBaseline;
    Ink.Face face = TableColumns.face(use);
    for (String line : lines) {
      if (use == Use.WORDS) {
        pen.text(line, face, TableColumns.CELL, start, baseline, Style.BLACK);
      } else {
        pen.textRight(line, face, TableColumns.CELL, end, baseline, Style.BLACK);
      }
      baseline += CELL_LEADING;
    }
  }

  private List<Slice> note(String note) {
    List<Slice> slices = new ArrayList<>();
    for (String line : faces.breaker(Ink.Face.REGULAR, NOTE).lines(note, width)) {
      slices.add(
          Slice.of(
              NOTE_LEADING,
              (pen, left, top) ->
                  pen.text(
                      line, Ink.Face.REGULAR, NOTE, left, top + NOTE_LEADING - 1, Style.BLACK)));
    }
    return slices;
  }
}
