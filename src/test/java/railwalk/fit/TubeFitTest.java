package railwalk.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.device.AmplifierLaw;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.device.PublishedPoint;
import railwalk.device.SectionCurrents;
import railwalk.device.TubeType;

class TubeFitTest {
  private static final Catalogue CATALOGUE = Catalogue.standard();

  static List<String> types() {
    return CATALOGUE.types().stream().map(TubeType::name).toList();
  }

  /** Constants in the data files are the fit's and nothing else. */
  @ParameterizedTest
  @MethodSource("types")
  void refittingGivesTheConstantsOfTheDataFile(String type) {
    DataFile file = CATALOGUE.file(type).orElseThrow();
    Refit refit = new TubeFit(CATALOGUE).refit(type);
    List<String> committed = fitWords(String.join("\n", file.text().lines()));
    List<String> anew = fitWords(refit.dataFile());
    assertThat(anew).hasSameSizeAs(committed);
    double worst = 0;
    for (int i = 0; i < anew.size(); i++) {
      String[] was = committed.get(i).split("=", 2);
      String[] is = anew.get(i).split("=", 2);
      assertThat(is[0]).isEqualTo(was[0]);
      if (was[0].equals("section")) {
        assertThat(is[1]).isEqualTo(was[1]);
      } else if (was.length == 2 && Double.parseDouble(was[1]) != 0) {
        worst =
            Math.max(worst, Math.abs(Double.parseDouble(is[1]) / Double.parseDouble(was[1]) - 1));
      }
    }
    System.out.printf("%-7s %2d words, worst change %.1e%n", type, anew.size(), worst);
    assertThat(worst).isLessThan(1e-4);
  }

  private static List<String> fitWords(String text) {
    return text.lines()
        .filter(line -> line.startsWith("fit "))
        .flatMap(line -> List.of(line.split("\\s+")).stream())
        .toList();
  }

  @Test
  void nothingButFitAndResidualLinesChanges() {
    DataFile file = CATALOGUE.file("6V6GT").orElseThrow();
    assertThat(new TubeFit(CATALOGUE).refit("6V6GT").dataFile().lines().filter(TubeFitTest::isFact))
        .containsExactlyElementsOf(
            file.text().lines().stream().filter(TubeFitTest::isFact).toList());
  }

  private static boolean isFact(String line) {
    return !line.isBlank() && !line.startsWith("fit ") && !line.startsWith("residual ");
  }

  /** Enough exact points of a known law give that law back. */
  @Test
  void aKnownLawIsFoundAgain() {
    double[] truth = {95, 1.45, 1300, 5.5, 250, 0.4};
    AmplifierLaw law = Curve.named("triode").law(truth);
    SectionCurrents is = new SectionCurrents();
    List<PublishedPoint> points = new ArrayList<>();
    for (double plate : new double[] {80, 150, 250, 350}) {
      for (double grid : new double[] {-0.5, -1, -1.5, -2.5}) {
        law.evaluate(plate, 0, grid, is);
        points.add(point(plate, grid, is.plateAmps));
      }
    }
    double[] found = LeastSquaresFit.constants(Curve.named("triode"), points);
    assertThat(new Comparer(points).compare(Curve.named("triode").law(found)))
        .hasSize(16)
        .allMatch(c -> Math.abs(c.errorShare()) < 0.02);
    assertThat(found[0] / truth[0]).isBetween(0.95, 1.05);
    assertThat(found[1] / truth[1]).isBetween(0.95, 1.05);
  }

  /** Where a type has a single point, the law meets it and the family supplies the rest. */
  @Test
  void oneBarePointIsMet() {
    double[] found =
        LeastSquaresFit.constants(Curve.named("triode"), List.of(point(200, -4, 0.006)));
    SectionCurrents is = new SectionCurrents();
    Curve.named("triode").law(found).evaluate(200, 0, -4, is);
    assertThat(is.plateAmps).isBetween(0.0059, 0.0061);
    assertThat(found[1]).isBetween(1.3, 1.5);
  }

  @Test
  void anUnknownTypeIsRefused() {
    assertThatThrownBy(() -> new TubeFit(CATALOGUE).refit("12XX99"))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("12XX99");
  }

  private static PublishedPoint point(double plateVolts, double gridVolts, double plateAmps) {
    return new PublishedPoint(
        "",
        PublishedPoint.Setup.triode(plateVolts, gridVolts),
        PublishedPoint.Figures.current(plateAmps),
        new PublishedPoint.Credit("made up", "transcription", "high", "", 1));
  }
}
