package railwalk.render.text;

import railwalk.chart.Block;
import railwalk.chart.Chart;
import railwalk.chart.Page;

/** A chart as plain text for a terminal: no line is wider than 80 columns. Stateless. */
public final class TextRenderer {
  /** Returns the chart, each line ending in a newline. */
  public String render(Chart chart) {
    Sheet sheet = new Sheet();
    sheet.rule('=');
    sheet.paragraph(chart.title(), 0);
    sheet.paragraph(chart.subject(), 0);
    sheet.paragraph(chart.conditionsLine(), 0);
    sheet.rule('=');
    for (Page page : chart.pages()) {
      append(sheet, page);
    }
    sheet.blank();
    sheet.rule('-');
    sheet.paragraph(chart.standingCaution(), 0);
    return sheet.text();
  }

  /** Returns one page that stands alone, each line ending in a newline. */
  public String render(Page page) {
    Sheet sheet = new Sheet();
    append(sheet, page);
    return sheet.text();
  }

  private static void append(Sheet sheet, Page page) {
    if (!page.title().isEmpty()) {
      sheet.blank();
      sheet.ruleWith(page.title(), '=');
    }
    BlockText blocks = new BlockText(sheet);
    for (Block block : page.blocks()) {
      sheet.blank();
      block.accept(blocks);
    }
  }
}
