package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.device.Catalogue;

/**
 * The printed pages of tube types, against those in {@code charts/tubes}. Run with {@code
 * -Dcharts.write=true} it writes them before comparing.
 */
class TubePagesTest {
  private static final Path PAGES = Path.of("charts", "tubes");
  private static final boolean WRITE = Boolean.getBoolean("charts.write");

  @TempDir private Path folder;

  static List<String> types() {
    return Stream.of("12AX7", "6V6GT", "EL84", "EF86", "300B", "GZ34")
        .filter(type -> Catalogue.standard().find(type).isPresent())
        .toList();
  }

  @BeforeAll
  static void writePages() throws IOException {
    if (WRITE) {
      Files.createDirectories(PAGES);
      for (String type : types()) {
        assertThat(Run.of("tubes", type, "-o", page(type).toString()).code()).isZero();
      }
    }
  }

  @ParameterizedTest
  @MethodSource("types")
  void thePageIsUpToDate(String type) throws IOException {
    Path pdf = folder.resolve("page.pdf");
    Run run = Run.of("tubes", type, "-o", pdf.toString());
    assertThat(run.err()).isEqualTo("wrote " + pdf + System.lineSeparator());
    assertThat(run.out()).isEmpty();
    assertThat(run.code()).isZero();
    assertThat(pdf).hasSameBinaryContentAs(page(type));
    assertThat(words(pdf)).contains(type, "seen from below", "Published points");
  }

  /** Letter is 612 by 792 points. */
  @Test
  void printsOnLetterToo() throws IOException {
    Path pdf = folder.resolve("page.pdf");
    assertThat(Run.of("tubes", "EL84", "-o", pdf.toString(), "--paper", "letter").code()).isZero();
    try (PDDocument document = Loader.loadPDF(Files.readAllBytes(pdf))) {
      assertThat(document.getNumberOfPages()).isEqualTo(1);
      assertThat(document.getPage(0).getMediaBox().getWidth()).isEqualTo(612f);
      assertThat(document.getPage(0).getMediaBox().getHeight()).isEqualTo(792f);
    }
  }

  @Test
  void printsAllThatAreListedIntoAFolder() throws IOException {
    Path pages = folder.resolve("new").resolve("pages");
    Run run = Run.of("tubes", "--kind", "regulator", "--all", pages.toString());
    assertThat(run.code()).isZero();
    try (Stream<Path> files = Files.list(pages)) {
      List<Path> written = files.toList();
      assertThat(run.err()).contains("wrote " + written.size() + " pages to " + pages);
      assertThat(written)
          .contains(pages.resolve("0A2.pdf"))
          .doesNotContain(pages.resolve("EL84.pdf"));
    }
  }

  @Test
  void refusesWhatMakesNoPage() {
    Run several = Run.of("tubes", "12AX7", "EL84", "-o", "x.pdf");
    assertThat(several.code()).isEqualTo(2);
    assertThat(several.err()).contains("-o takes the page of one type");
    Run none = Run.of("tubes", "-o", "x.pdf");
    assertThat(none.code()).isEqualTo(2);
    assertThat(none.err()).contains("-o needs a type");
    Run unknown = Run.of("tubes", "12AX8", "-o", "x.pdf");
    assertThat(unknown.code()).isEqualTo(2);
    assertThat(unknown.err()).contains("unknown tube type 12AX8: did you mean 12AX7");
    Run both = Run.of("tubes", "12AX7", "--all", folder.toString());
    assertThat(both.code()).isEqualTo(2);
    Run paper = Run.of("tubes", "12AX7", "-o", "x.pdf", "--paper", "a3");
    assertThat(paper.code()).isEqualTo(2);
    assertThat(paper.err()).contains("expected one of a4, letter");
    assertThat(Path.of("x.pdf")).doesNotExist();
  }

  private static Path page(String type) {
    return PAGES.resolve(type + ".pdf");
  }

  private static String words(Path pdf) throws IOException {
    try (PDDocument document = Loader.loadPDF(Files.readAllBytes(pdf))) {
      return new PDFTextStripper().getText(document);
    }
  }
}
