package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Block;
import railwalk.chart.TubePage;

/**
 * A tube type's page as a PDF for paper: on one sheet, set smaller where there is much to say. The
 * same page gives the same bytes. Stateless.
 */
public final class TubePageRenderer {
  private static final String PRODUCT = "Railwalk";
  private static final double TITLE_BLOCK = 46;
  private static final double FOOT_ABOVE_EDGE = 30;

  /** Returns the document. */
  public byte[] render(TubePage page, Paper paper) {
    Faces faces = Faces.load();
    PdfFile file = new PdfFile(page.name(), page.summary(), PRODUCT);
    return file.bytes(layOut(page, paper, faces), faces, paper);
  }

  /** Returns the sheets with all that stands on them; more than one only if nothing else helps. */
  static List<PdfFile.Leaf> layOut(TubePage page, Paper paper, Faces faces) {
    Sheets sheets = new Sheets(faces, paper);
    for (Fit fit : Fit.all()) {
      sheets = sheets(page, paper, faces, fit);
      if (sheets.pens().size() == 1) {
        break;
      }
    }
    List<PdfFile.Leaf> leaves = new ArrayList<>();
    int count = sheets.pens().size();
    for (int i = 0; i < count; i++) {
      Pen pen = sheets.pens().get(i);
      foot(page, paper, pen, i + 1, count);
      leaves.add(new PdfFile.Leaf(pen.inks(), i == 0 ? page.name() : ""));
    }
    return leaves;
  }

  private static Sheets sheets(TubePage page, Paper paper, Faces faces, Fit fit) {
    double width = paper.widthPoints() - 2 * Style.MARGIN_SIDE;
    Sheets sheets = new Sheets(faces, paper);
    sheets.place(Slab.of(List.of(title(page, faces, width))));
    for (Block block : page.blocks()) {
      sheets.space(fit.blockGap());
      for (Slab slab : BlockSlabs.of(block, faces, width, sheets.bodyHeight(), fit)) {
        sheets.place(slab);
      }
    }
    return sheets;
  }

  private static Slice title(TubePage page, Faces faces, double width) {
    return Slice.of(
        TITLE_BLOCK,
        (pen, left, top) -> {
          double baseline = top + Style.TITLE * 0.85;
          pen.text(page.name(), Ink.Face.BOLD, Style.TITLE, left, baseline, Style.BLACK);
          double used = faces.width(page.name(), Ink.Face.BOLD, Style.TITLE) + 14;
          pen.text(
              faces.breaker(Ink.Face.REGULAR, Style.HEADING).clipped(page.also(), width - used),
              Ink.Face.REGULAR,
              Style.HEADING,
              left + used,
              baseline,
              Style.DARK_GREY);
          pen.text(
              faces.breaker(Ink.Face.REGULAR, Style.HEADING).clipped(page.summary(), width),
              Ink.Face.REGULAR,
              Style.HEADING,
              left,
              baseline + Style.HEADING + 5,
              Style.DARK_GREY);
          double rule = top + TITLE_BLOCK - 2;
          pen.line(left, rule, left + width, rule, Style.HEAVY_RULE, Style.BLACK);
        });
  }

  private static void foot(TubePage page, Paper paper, Pen pen, int number, int count) {
    double baseline = paper.heightPoints() - FOOT_ABOVE_EDGE;
    double right = paper.widthPoints() - Style.MARGIN_SIDE;
    pen.text(
        page.foot(), Ink.Face.REGULAR, Style.SMALL, Style.MARGIN_SIDE, baseline, Style.DARK_GREY);
    if (count > 1) {
      String place = "page " + number + " of " + count;
      pen.textRight(place, Ink.Face.REGULAR, Style.SMALL, right, baseline, Style.DARK_GREY);
    }
  }
}
