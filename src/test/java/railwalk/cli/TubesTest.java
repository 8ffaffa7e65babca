package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;

/** {@code railwalk tubes} and {@code railwalk fit}. */
class TubesTest {
  @Test
  void listsEveryTypeOfTheCatalogue() {
    Run run = Run.of("tubes");
    assertThat(run.code()).isZero();
    for (TubeType type : Catalogue.standard().types()) {
      assertThat(run.out().lines()).anyMatch(line -> line.startsWith(type.name() + " "));
    }
    assertThat(run.out().lines()).allMatch(line -> line.codePointCount(0, line.length()) <= 80);
  }

  @Test
  void showsEveryTypeWithPinsAndSources() {
    for (TubeType type : Catalogue.standard().types()) {
      Run run = Run.of("tubes", type.name());
      assertThat(run.code()).as(type.name()).isZero();
      assertThat(run.out())
          .startsWith("== " + type.name() + " =")
          .contains(type.summary(), "Pins, seen from below", "Sources");
      assertThat(run.out().lines()).allMatch(line -> line.codePointCount(0, line.length()) <= 80);
    }
  }

  /** Pins and limits of the 6V6GT as GE's sheet ET-T914 (3-55) prints them. */
  @Test
  void showsTheSheetsPinsAndLimits() {
    Run run = Run.of("tubes", "6v6gt");
    assertThat(run.out())
        .contains("Heater  6.3 V 450 mA")
        .containsPattern("plate 315 V; plate 12 W; screen 285 V; screen 2 W")
        .containsPattern("\n +3  plate\n +4  screen\n +5  grid\n")
        .containsPattern("\n +8  cathode\n");
  }

  @Test
  void findsATypeByItsOtherName() {
    assertThat(Run.of("tubes", "ECC83")).isEqualTo(Run.of("tubes", "12AX7"));
  }

  @Test
  void offersNearNamesForAnUnknownType() {
    Run run = Run.of("tubes", "12AX8");
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.out()).isEmpty();
    assertThat(run.err()).startsWith("railwalk: unknown tube type 12AX8: did you mean 12AX7");
  }

  /** Nothing in the catalogue is typed in: fitting again gives the very file. */
  @Test
  void fitReproducesTheDataFile() throws IOException {
    Run run = Run.of("fit", "ECC83");
    assertThat(run.code()).isZero();
    try (var file = Catalogue.class.getResourceAsStream("12AX7.tube")) {
      assertThat(file).isNotNull();
      assertThat(run.out()).isEqualTo(new String(file.readAllBytes(), StandardCharsets.UTF_8));
    }
  }
}
