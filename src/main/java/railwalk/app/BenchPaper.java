package railwalk.app;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import railwalk.chart.Chart;
import railwalk.render.pdf.Paper;
import railwalk.render.pdf.PdfRenderer;
import railwalk.render.text.TextRenderer;

/** Finished pages for the bench, to be printed or written. */
public final class BenchPaper {
  private final Chart chart;

  BenchPaper(Chart chart) {
    this.chart = chart;
  }

  /** Returns the pages as text. */
  public String print() {
    return new TextRenderer().render(chart);
  }

  /** Writes the pages to {@code target}, whole or not at all. */
  public void write(Path target, ChartFormat format, Paper paper) throws CannotDo {
    byte[] bytes =
        switch (format) {
          case PDF -> new PdfRenderer().render(chart, paper);
          case TEXT -> print().getBytes(StandardCharsets.UTF_8);
          case CSV, JSON -> throw new CannotDo("these pages are written as pdf or text");
        };
    WholeFile.write(target, bytes);
  }
}
