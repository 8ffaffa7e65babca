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
    sheet.paragraph("Voltage chart of " + chart.fileName(), 0);
    sheet.paragraph(chart.conditionsLine(), 0);
    sheet.rule('=');
    BlockText blocks = new BlockText(sheet);
    for (Page page : chart.pages()) {
      if (!page.title().isEmpty()) {
        sheet.blank();
        sheet.ruleWith(page.title(), '=');
      }
      for (Block block : page.blocks()) {
        sheet.blank();
        block.accept(blocks);
      }
    }
    sheet.blank();
    sheet.rule('-');
    sheet.paragraph(chart.standingCaution(), 0);
    return sheet.text();
  }
}
