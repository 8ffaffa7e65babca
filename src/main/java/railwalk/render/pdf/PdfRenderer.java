package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Block;
import railwalk.chart.Chart;
import railwalk.chart.Heading;
import railwalk.chart.Page;

/** A chart as a PDF for paper. The same chart gives the same bytes. Stateless. */
public final class PdfRenderer {
  /** From this share of a sheet on, a page starts below the one before. */
  private static final double SHARE_OF_A_SHEET_WORTH_FILLING = 0.5;

  private static final String PRODUCT = "Railwalk";

  /** Returns the document. */
  public byte[] render(Chart chart, Paper paper) {
    Faces faces = Faces.load();
    PdfFile file = new PdfFile(chart.title(), chart.subject(), PRODUCT);
    return file.bytes(layOut(chart, paper, faces), faces, paper);
  }

  /** Returns the sheets with all that stands on them. */
  static List<PdfFile.Leaf> layOut(Chart chart, Paper paper, Faces faces) {
    double width = paper.widthPoints() - 2 * Style.MARGIN_SIDE;
    Sheets sheets = new Sheets(faces, paper);
    List<String> bookmarks = new ArrayList<>();
    sheets.place(Slab.of(List.of(titleBlock(chart, faces, width))));
    boolean first = true;
    for (Page page : chart.pages()) {
      List<List<Slab>> blocks = blocks(page, sheets, faces, width);
      if (!first) {
        startPage(blocks, sheets);
      }
      first = false;
      mark(bookmarks, sheets.pens().size(), page.title());
      place(blocks, sheets);
    }
    mark(bookmarks, sheets.pens().size(), "");
    List<PdfFile.Leaf> leaves = new ArrayList<>();
    int count = sheets.pens().size();
    for (int i = 0; i < count; i++) {
      Pen pen = sheets.pens().get(i);
      new Margins(chart, paper, faces).draw(pen, i + 1, count);
      leaves.add(new PdfFile.Leaf(pen.inks(), bookmarks.get(i)));
    }
    return leaves;
  }

  /** Returns the slabs of each block; a page's title and headings go with the block they lead. */
  private static List<List<Slab>> blocks(Page page, Sheets sheets, Faces faces, double width) {
    List<List<Slab>> blocks = new ArrayList<>();
    List<Slice> leading = new ArrayList<>();
    if (!page.title().isEmpty()) {
      leading.add(pageTitle(page.title(), faces, width));
    }
    for (Block block : page.blocks()) {
      List<Slab> slabs = new ArrayList<>(BlockSlabs.of(block, faces, width, sheets.bodyHeight()));
      if (block instanceof Heading) {
        slabs.forEach(slab -> leading.addAll(slab.slices()));
      } else if (!slabs.isEmpty()) {
        slabs.set(0, slabs.get(0).after(leading));
        leading.clear();
        blocks.add(slabs);
      }
    }
    return blocks;
  }

  /** Makes room for a page: below the one before where all of it fits, or much of it. */
  private static void startPage(List<List<Slab>> blocks, Sheets sheets) {
    double height = Style.PAGE_GAP;
    for (List<Slab> slabs : blocks) {
      Slab.Head head = slabs.get(0).head();
      height += Style.BLOCK_GAP + (head == null ? 0 : head.first().height());
      for (Slab slab : slabs) {
        height += Slab.height(slab.lead()) + Slab.height(slab.slices());
      }
    }
    boolean muchRoom = sheets.room() > SHARE_OF_A_SHEET_WORTH_FILLING * sheets.bodyHeight();
    if (height > sheets.room() && !muchRoom) {
      sheets.startFreshSheet();
    } else {
      sheets.space(Style.PAGE_GAP - Style.BLOCK_GAP);
    }
  }

  private static void place(List<List<Slab>> blocks, Sheets sheets) {
    for (List<Slab> slabs : blocks) {
      sheets.space(Style.BLOCK_GAP);
      slabs.forEach(sheets::place);
    }
  }

  /** Fills the list up to sheet {@code sheet}, whose bookmark is {@code title}. */
  private static void mark(List<String> bookmarks, int sheet, String title) {
    while (bookmarks.size() < sheet - 1) {
      bookmarks.add("");
    }
    if (bookmarks.size() < sheet) {
      bookmarks.add(title);
    } else if (!title.isEmpty()) {
      String there = bookmarks.get(sheet - 1);
      bookmarks.set(sheet - 1, there.isEmpty() ? title : there + ", " + title);
    }
  }

  private static Slice titleBlock(Chart chart, Faces faces, double width) {
    List<String> titles = faces.breaker(Ink.Face.BOLD, Style.TITLE).lines(chart.title(), width);
    List<String> shown = titles.subList(0, Math.min(4, titles.size()));
    double leading = Style.TITLE * 1.15;
    double height = shown.size() * leading + 34;
    return Slice.of(
        height,
        (pen, left, top) -> {
          double y = top + Style.TITLE * 0.85;
          for (String line : shown) {
            pen.text(line, Ink.Face.BOLD, Style.TITLE, left, y, Style.BLACK);
            y += leading;
          }
          y += -leading + Style.TITLE * 0.3 + Style.HEADING + 3;
          pen.text(
              faces.breaker(Ink.Face.REGULAR, Style.HEADING).clipped(chart.subject(), width),
              Ink.Face.REGULAR,
              Style.HEADING,
              left,
              y,
              Style.DARK_GREY);
          pen.line(
              left,
              top + height - 4,
              left + width,
              top + height - 4,
              Style.HEAVY_RULE,
              Style.BLACK);
        });
  }

  private static Slice pageTitle(String title, Faces faces, double width) {
    return Slice.of(
        Style.PAGE_TITLE + 20,
        (pen, left, top) -> {
          pen.text(
              faces.breaker(Ink.Face.BOLD, Style.PAGE_TITLE).clipped(title, width),
              Ink.Face.BOLD,
              Style.PAGE_TITLE,
              left,
              top + Style.PAGE_TITLE * 0.85,
              Style.BLACK);
          double y = top + Style.PAGE_TITLE + 5;
          pen.line(left, y, left + width, y, Style.RULE, Style.BLACK);
        });
  }
}
