package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import railwalk.chart.Abreast;
import railwalk.chart.BaseDrawing;
import railwalk.chart.Block;
import railwalk.chart.BlockVisitor;
import railwalk.chart.Caution;
import railwalk.chart.FillIn;
import railwalk.chart.Heading;
import railwalk.chart.KeyFigures;
import railwalk.chart.Ladder;
import railwalk.chart.Paragraph;
import railwalk.chart.Plot;
import railwalk.chart.Remarks;
import railwalk.chart.SmallPrint;
import railwalk.chart.Table;

/** Sets the blocks of a page as slabs of a given width. */
final class BlockSlabs implements BlockVisitor {
  /** A text longer than this in one place would fill the sheet: it is cut, with an ellipsis. */
  private static final int MOST_LINES = 24;

  private static final double LABEL_SHARE = 0.24;
  private static final double LABEL_GAP = 12;
  private static final double BOX_INSET = 11;
  private static final double BULLET = 9;
  private static final double FILL_IN_HEIGHT = 22;
  private static final double COLUMN_GAP = 16;

  private final Faces faces;
  private final double width;
  private final double bodyHeight;
  private final Fit fit;
  private final List<Slab> slabs = new ArrayList<>();

  private BlockSlabs(Faces faces, double width, double bodyHeight, Fit fit) {
    this.faces = faces;
    this.width = width;
    this.bodyHeight = bodyHeight;
    this.fit = fit;
  }

  /** Returns the slabs of one block. */
  static List<Slab> of(Block block, Faces faces, double width, double bodyHeight) {
    return of(block, faces, width, bodyHeight, Fit.EASY);
  }

  /** Returns the slabs of one block, set as large as {@code fit} allows. */
  static List<Slab> of(Block block, Faces faces, double width, double bodyHeight, Fit fit) {
    BlockSlabs slabs = new BlockSlabs(faces, width, bodyHeight, fit);
    block.accept(slabs);
    return slabs.slabs;
  }

  @Override
  public void visit(Heading heading) {
    slabs.add(Slab.of(List.of(heading(heading.text()))));
  }

  /** Returns a heading as a slice, for a title above something else. */
  private Slice heading(String text) {
    return Slice.of(
        Style.HEADING + 7,
        (pen, left, top) ->
            pen.text(
                faces.breaker(Ink.Face.BOLD, Style.HEADING).clipped(text, width),
                Ink.Face.BOLD,
                Style.HEADING,
                left,
                top + Style.HEADING,
                Style.BLACK));
  }

  @Override
  public void visit(Paragraph paragraph) {
    slabs.add(Slab.of(lines(paragraph.text(), 0, Style.BODY, Style.BODY_LEADING, Style.BLACK)));
  }

  /** Returns a slice for each line of wrapped text, {@code indent} points in. */
  private List<Slice> lines(String text, double indent, double size, double leading, double grey) {
    return faces.breaker(Ink.Face.REGULAR, size).lines(text, width - indent).stream()
        .map(
            line ->
                Slice.of(
                    leading,
                    (pen, left, top) ->
                        pen.text(line, Ink.Face.REGULAR, size, left + indent, top + size, grey)))
        .toList();
  }

  @Override
  public void visit(Caution caution) {
    boolean large = caution.weight() == Caution.Weight.LARGE;
    double inset = large ? BOX_INSET + 4 : BOX_INSET;
    double size = large ? Style.BODY + 2 : Style.BODY - 0.5;
    double leading = large ? Style.BODY_LEADING + 3 : Style.BODY_LEADING - 1;
    double titleSize = large ? Style.LARGE_WARNING : Style.HEADING;
    String title = large ? caution.title().toUpperCase(Locale.ROOT) : caution.title();
    double textWidth = width - 2 * inset - (large ? 0 : BULLET);
    List<List<String>> points =
        caution.points().stream()
            .map(point -> faces.breaker(Ink.Face.REGULAR, size).lines(point, textWidth, MOST_LINES))
            .toList();
    double pointGap = 2.5;
    double height =
        inset
            + titleSize
            + 7
            + points.stream().mapToDouble(p -> p.size() * leading + pointGap).sum()
            + inset
            - 4;
    slabs.add(
        Slab.of(
            List.of(
                Slice.of(
                    height,
                    (pen, left, top) -> {
                      double stroke = large ? 3 : Style.RULE;
                      pen.frame(left, top, width, height, stroke);
                      double y = top + inset + titleSize * 0.8;
                      pen.text(
                          faces.breaker(Ink.Face.BOLD, titleSize).clipped(title, width - 2 * inset),
                          Ink.Face.BOLD,
                          titleSize,
                          left + inset,
                          y,
                          Style.BLACK);
                      y = top + inset + titleSize + 7;
                      for (List<String> point : points) {
                        if (!large) {
                          pen.disc(left + inset + 2, y + size - 0.32 * size, 1.3);
                        }
                        for (String line : point) {
                          pen.text(
                              line,
                              Ink.Face.REGULAR,
                              size,
                              left + width - inset - textWidth,
                              y + size,
                              Style.BLACK);
                          y += leading;
                        }
                        y += pointGap;
                      }
                    }))));
  }

  @Override
  public void visit(KeyFigures keyFigures) {
    double labelWidth = LABEL_SHARE * width;
    List<Slice> slices = new ArrayList<>();
    for (KeyFigures.Entry entry : keyFigures.entries()) {
      Ink.Face face = entry.strong() ? Ink.Face.BOLD : Ink.Face.REGULAR;
      double size = entry.strong() ? Style.BODY + 2 : Style.BODY;
      List<String> labels =
          faces
              .breaker(Ink.Face.REGULAR, Style.BODY)
              .lines(entry.label(), labelWidth - LABEL_GAP, MOST_LINES);
      List<String> texts =
          faces.breaker(face, size).lines(entry.text(), width - labelWidth, MOST_LINES);
      double height = Math.max(labels.size(), texts.size()) * Style.BODY_LEADING + 3;
      slices.add(
          Slice.of(
              height,
              (pen, left, top) -> {
                double y = top + Style.BODY + 0.5;
                for (String label : labels) {
                  pen.text(label, Ink.Face.REGULAR, Style.BODY, left, y, Style.DARK_GREY);
                  y += Style.BODY_LEADING;
                }
                y = top + Style.BODY + 0.5;
                for (String text : texts) {
                  pen.text(text, face, size, left + labelWidth, y, Style.BLACK);
                  y += Style.BODY_LEADING;
                }
              }));
    }
    slabs.add(Slab.of(slices));
  }

  @Override
  public void visit(Table table) {
    slabs.addAll(new TableSlabs(table, faces, width).slabs());
  }

  @Override
  public void visit(Ladder ladder) {
    for (Ladder.Feed feed : ladder.feeds()) {
      slabs.addAll(LadderSlabs.of(feed, faces, width, bodyHeight));
    }
  }

  @Override
  public void visit(Remarks remarks) {
    for (Remarks.Remark remark : remarks.remarks()) {
      List<Slice> slices = new ArrayList<>();
      String mark = remark.mark().isEmpty() ? "" : capital(remark.mark());
      String label =
          mark + (mark.isEmpty() || remark.place().isEmpty() ? "" : " · ") + remark.place();
      if (!label.isEmpty()) {
        slices.add(
            Slice.of(
                Style.SMALL_LEADING,
                (pen, left, top) ->
                    pen.text(
                        faces.breaker(Ink.Face.BOLD, Style.SMALL).clipped(label, width),
                        Ink.Face.BOLD,
                        Style.SMALL,
                        left,
                        top + Style.SMALL,
                        Style.DARK_GREY)));
      }
      slices.addAll(lines(remark.text(), 0, Style.BODY, Style.BODY_LEADING, Style.BLACK));
      if (!remark.hint().isEmpty()) {
        slices.addAll(lines(remark.hint(), 10, Style.SMALL, Style.SMALL_LEADING, Style.DARK_GREY));
      }
      slices.add(Slice.gap(5));
      slabs.add(Slab.of(slices));
    }
  }

  private static String capital(String word) {
    return word.substring(0, 1).toUpperCase(Locale.ROOT) + word.substring(1);
  }

  @Override
  public void visit(FillIn fillIn) {
    int abreast = 2;
    double each = (width - LABEL_GAP) / abreast;
    List<Slice> slices = new ArrayList<>();
    for (int from = 0; from < fillIn.labels().size(); from += abreast) {
      List<String> row =
          fillIn.labels().subList(from, Math.min(from + abreast, fillIn.labels().size()));
      slices.add(
          Slice.of(
              FILL_IN_HEIGHT,
              (pen, left, top) -> {
                double x = left;
                double baseline = top + FILL_IN_HEIGHT - 6;
                for (String label : row) {
                  pen.text(label, Ink.Face.REGULAR, Style.BODY, x, baseline, Style.DARK_GREY);
                  double start = x + faces.width(label, Ink.Face.REGULAR, Style.BODY) + 6;
                  pen.line(
                      start, baseline + 2, x + each, baseline + 2, Style.HAIRLINE, Style.DARK_GREY);
                  x += each + LABEL_GAP;
                }
              }));
    }
    slabs.add(Slab.of(slices));
  }

  @Override
  public void visit(Plot plot) {
    slabs.add(Slab.of(List.of(PlotDrawing.of(plot, faces, width, fit.plotHeight()))));
  }

  @Override
  public void visit(BaseDrawing base) {
    slabs.add(Slab.of(List.of(BasePicture.of(base, width))));
  }

  @Override
  public void visit(Abreast abreast) {
    double leftWidth = (width - COLUMN_GAP) * abreast.leftShare();
    double rightWidth = width - COLUMN_GAP - leftWidth;
    List<Slice> leftColumn = column(abreast.left(), leftWidth);
    List<Slice> rightColumn = column(abreast.right(), rightWidth);
    slabs.add(
        Slab.of(
            List.of(
                Slice.of(
                    Math.max(Slab.height(leftColumn), Slab.height(rightColumn)),
                    (pen, left, top) -> {
                      stack(leftColumn, pen, left, top);
                      stack(rightColumn, pen, left + leftWidth + COLUMN_GAP, top);
                    }))));
  }

  private List<Slice> column(List<Block> blocks, double columnWidth) {
    List<Slice> slices = new ArrayList<>();
    for (Block block : blocks) {
      if (!slices.isEmpty()) {
        slices.add(Slice.gap(fit.blockGap()));
      }
      for (Slab slab : of(block, faces, columnWidth, bodyHeight, fit)) {
        slices.addAll(slab.all());
      }
    }
    return slices;
  }

  private static void stack(List<Slice> slices, Pen pen, double left, double top) {
    double y = top;
    for (Slice slice : slices) {
      slice.draw(pen, left, y);
      y += slice.height();
    }
  }

  @Override
  public void visit(SmallPrint smallPrint) {
    double scale = fit.smallScale();
    for (Block block : smallPrint.blocks()) {
      Map<Slab.Head, Slab.Head> heads = new HashMap<>();
      for (Slab slab : of(block, faces, width / scale, bodyHeight / scale, fit)) {
        Slab.Head head = slab.head();
        Slab.Head small =
            head == null ? null : heads.computeIfAbsent(head, h -> h.scaled(scale, faces));
        slabs.add(slab.scaled(scale, small, faces));
      }
    }
  }
}
