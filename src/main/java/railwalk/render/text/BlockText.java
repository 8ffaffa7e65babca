package railwalk.render.text;

import java.util.List;
import java.util.Locale;
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

/** Each kind of block as text. */
final class BlockText implements BlockVisitor {
  private static final int MAX_LABEL = 16;

  private final Sheet sheet;

  BlockText(Sheet sheet) {
    this.sheet = sheet;
  }

  @Override
  public void visit(Heading heading) {
    sheet.ruleWith(heading.text(), '-');
  }

  @Override
  public void visit(Paragraph paragraph) {
    sheet.paragraph(paragraph.text(), 0);
  }

  @Override
  public void visit(Caution caution) {
    boolean large = caution.weight() == Caution.Weight.LARGE;
    char edge = large ? '#' : '|';
    sheet.line(large ? "#".repeat(Sheet.COLUMNS) : "+" + "-".repeat(Sheet.COLUMNS - 2) + "+");
    String title = large ? spaced(caution.title().toUpperCase(Locale.ROOT)) : caution.title();
    boxed(edge, "", title);
    for (String point : caution.points()) {
      boxed(edge, large ? "" : "- ", point);
    }
    sheet.line(large ? "#".repeat(Sheet.COLUMNS) : "+" + "-".repeat(Sheet.COLUMNS - 2) + "+");
  }

  private void boxed(char edge, String lead, String text) {
    int width = Sheet.COLUMNS - 4;
    String start = lead;
    for (String line : Sheet.BREAKER.lines(Sheet.clean(text), width - lead.length())) {
      sheet.line(edge + " " + Sheet.left(start + line, width) + " " + edge);
      start = " ".repeat(lead.length());
    }
  }

  private static String spaced(String title) {
    return String.join(" ", title.split(""));
  }

  @Override
  public void visit(KeyFigures keyFigures) {
    int label =
        keyFigures.entries().stream()
            .mapToInt(e -> TextWidth.of(Sheet.clean(e.label())))
            .max()
            .orElse(0);
    int width = Math.min(label, MAX_LABEL);
    for (KeyFigures.Entry entry : keyFigures.entries()) {
      String name = Sheet.clean(entry.label());
      String text = entry.strong() ? "** " + entry.text() + " **" : entry.text();
      if (TextWidth.of(name) > width) {
        sheet.paragraph(name, 0);
        name = "";
      }
      sheet.hanging(Sheet.left(name, width) + "  ", text);
    }
  }

  @Override
  public void visit(Table table) {
    new TableText(sheet, table).print();
  }

  @Override
  public void visit(Ladder ladder) {
    new LadderText(sheet).print(ladder);
  }

  @Override
  public void visit(Remarks remarks) {
    for (Remarks.Remark remark : remarks.remarks()) {
      String place = remark.place().isEmpty() ? "" : " (" + remark.place() + ")";
      String mark = remark.mark().isEmpty() ? "" : remark.mark() + ": ";
      sheet.hanging("- ", mark + remark.text() + place);
      if (!remark.hint().isEmpty()) {
        sheet.paragraph(remark.hint(), 4);
      }
    }
  }

  @Override
  public void visit(FillIn fillIn) {
    int label = fillIn.labels().stream().mapToInt(TextWidth::of).max().orElse(0);
    for (String name : fillIn.labels()) {
      sheet.line(Sheet.left(name, label) + "  " + "_".repeat(36));
    }
  }

  @Override
  public void visit(Plot plot) {
    PlotText.print(plot, this::visit);
  }

  @Override
  public void visit(BaseDrawing base) {
    sheet.ruleWith(base.title(), '-');
    for (BaseDrawing.Contact contact : base.contacts()) {
      if (contact.present()) {
        sheet.hanging(Sheet.right(Integer.toString(contact.number()), 3) + "  ", contact.leadsTo());
      }
    }
    if (!base.cap().isEmpty()) {
      sheet.hanging("cap  ", base.cap());
    }
  }

  @Override
  public void visit(Abreast abreast) {
    stacked(abreast.left());
    sheet.blank();
    stacked(abreast.right());
  }

  @Override
  public void visit(SmallPrint smallPrint) {
    stacked(smallPrint.blocks());
  }

  private void stacked(List<Block> blocks) {
    for (Block block : blocks) {
      sheet.blank();
      block.accept(this);
    }
  }
}
