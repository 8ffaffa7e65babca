package railwalk.render.pdf;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.util.List;
import java.util.stream.Stream;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.chart.Chart;
import railwalk.chart.ChartBuilder;
import railwalk.chart.Page;
import railwalk.chart.SampleAmp;
import railwalk.chart.SampleAmp.Order;
import railwalk.chart.Table;

/** The finished file, read back by PDFBox. */
class PdfRendererTest {
  private static final PdfRenderer RENDERER = new PdfRenderer();

  static Stream<Order> orders() {
    return SampleAmp.orders().stream();
  }

  @ParameterizedTest
  @MethodSource("orders")
  void everyFigureIsInTheText(Order order) throws IOException {
    Chart chart = new ChartBuilder().build(SampleAmp.input(order));
    byte[] bytes = RENDERER.render(chart, Paper.A4);
    try (PDDocument document = Loader.loadPDF(bytes)) {
      PDFTextStripper stripper = new PDFTextStripper();
      stripper.setSortByPosition(true);
      String text = stripper.getText(document);
      List<String> figures = figures(chart);
      System.out.printf(
          "%d tubes: %d sheets, %d bytes, %d figures%n",
          order.tubes(), document.getNumberOfPages(), bytes.length, figures.size());
      assertThat(figures).isNotEmpty().allSatisfy(figure -> assertThat(text).contains(figure));
      for (int page = 1; page <= document.getNumberOfPages(); page++) {
        assertThat(text).contains("page " + page + " of " + document.getNumberOfPages());
      }
    }
  }

  private static List<String> figures(Chart chart) {
    return chart.pages().stream()
        .map(Page::blocks)
        .flatMap(List::stream)
        .filter(Table.class::isInstance)
        .map(Table.class::cast)
        .flatMap(PdfRendererTest::figures)
        .filter(figure -> !figure.isEmpty())
        .distinct()
        .toList();
  }

  private static Stream<String> figures(Table table) {
    return table.groups().stream()
        .flatMap(group -> group.rows().stream())
        .flatMap(
            row ->
                Stream.iterate(0, i -> i < row.cells().size(), i -> i + 1)
                    .filter(
                        i ->
                            table.columns().get(i).use() == Table.Use.FIGURES
                                || table.columns().get(i).use() == Table.Use.KEY_FIGURES)
                    .map(i -> row.cells().get(i)));
  }

  @Test
  void theSameChartGivesTheSameBytes() {
    Chart once = new ChartBuilder().build(SampleAmp.input(Order.of(7, 6, 2)));
    Chart again = new ChartBuilder().build(SampleAmp.input(Order.of(7, 6, 2)));
    assertThat(RENDERER.render(once, Paper.LETTER)).isEqualTo(RENDERER.render(again, Paper.LETTER));
  }

  @ParameterizedTest
  @MethodSource("papers")
  void sheetsHaveTheirSizeAndTheirFontsWithThem(Paper paper, float widthPoints, float heightPoints)
      throws IOException {
    Chart chart = new ChartBuilder().build(SampleAmp.input(Order.of(4, 3, 0)));
    try (PDDocument document = Loader.loadPDF(RENDERER.render(chart, paper))) {
      for (PDPage page : document.getPages()) {
        assertThat(page.getMediaBox().getWidth()).isEqualTo(widthPoints);
        assertThat(page.getMediaBox().getHeight()).isEqualTo(heightPoints);
        for (var name : page.getResources().getFontNames()) {
          PDFont font = page.getResources().getFont(name);
          assertThat(font.isEmbedded()).as(font.getName()).isTrue();
          assertThat(font.getName()).contains("IBMPlexSans");
        }
      }
      var information = document.getDocumentInformation();
      assertThat(information.getTitle()).isEqualTo("Sample");
      assertThat(information.getCreationDate()).isNull();
      assertThat(information.getModificationDate()).isNull();
      assertThat(document.getDocumentCatalog().getDocumentOutline().children())
          .extracting(item -> item.getTitle())
          .anySatisfy(title -> assertThat(title).contains("Supply"))
          .anySatisfy(title -> assertThat(title).contains("Tubes by pin"));
    }
  }

  /** Sizes after ISO 216 and the North American trade size, in points of 1/72 inch. */
  static Stream<Arguments> papers() {
    return Stream.of(
        Arguments.of(Paper.A4, (float) (210 / 25.4 * 72), (float) (297 / 25.4 * 72)),
        Arguments.of(Paper.LETTER, 8.5f * 72, 11f * 72));
  }

  @Test
  void aSignThatTheTypefaceLacksBecomesABox() {
    Faces faces = Faces.load();
    Pen pen = new Pen(faces);
    pen.text("a増b\tc", Ink.Face.REGULAR, 10, 0, 20, 0);
    assertThat(pen.inks()).filteredOn(Ink.Stroke.class::isInstance).hasSize(1);
    assertThat(pen.inks())
        .filteredOn(Ink.Words.class::isInstance)
        .extracting(ink -> ((Ink.Words) ink).text())
        .containsExactly("a", "b c");
  }
}
