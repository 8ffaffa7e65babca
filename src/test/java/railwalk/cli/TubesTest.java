package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
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
        .containsPattern("Heater +6\\.3 V 450 mA")
        .containsPattern("plate 315 V;\\s+plate 12 W;\\s+screen 285 V;\\s+screen 2 W")
        .containsPattern("\n +3  plate\n +4  screen\n +5  grid\n")
        .containsPattern("\n +8  cathode\n");
  }

  @Test
  void listsInTheOrderPeopleCount() {
    List<String> lines = Run.of("tubes").out().lines().toList();
    assertThat(place(lines, "6V6GT")).isLessThan(place(lines, "12AX7"));
    assertThat(place(lines, "0A2")).isLessThan(place(lines, "5Y3GT"));
  }

  private static int place(List<String> lines, String type) {
    for (int i = 0; i < lines.size(); i++) {
      if (lines.get(i).startsWith(type + " ")) {
        return i;
      }
    }
    throw new AssertionError("not listed: " + type);
  }

  @Test
  void listsByBaseHeaterAndKind() {
    assertThat(names("--base", "9a")).contains("12AX7", "12AU7").doesNotContain("EL84", "6V6GT");
    assertThat(names("--base", "octal", "--kind", "beam"))
        .contains("6V6GT", "6L6GC")
        .doesNotContain("EL34", "6SN7GT", "5Y3GT");
    assertThat(names("--heater", "6.3V 0.3A")).contains("12AX7", "6AV6").doesNotContain("6V6GT");
    assertThat(names("--heater", "150mA")).contains("12AX7", "35W4").doesNotContain("EL84");
    assertThat(names("--kind", "regulator")).contains("0A2").doesNotContain("GZ34");
    assertThat(names("--kind", "RECTIFIER")).contains("GZ34").doesNotContain("0A2");
  }

  private static List<String> names(String... filter) {
    String[] args = new String[filter.length + 1];
    args[0] = "tubes";
    System.arraycopy(filter, 0, args, 1, filter.length);
    Run run = Run.of(args);
    assertThat(run.code()).isZero();
    return run.out().lines().map(line -> line.split(" ", 2)[0]).toList();
  }

  @Test
  void refusesAFilterWordItDoesNotKnow() {
    refused("no base 11Z: name a kind of socket (", "--base", "11Z");
    refused("no kind lamp: one of triode, pentode, beam", "--kind", "lamp");
    refused("heater hot: expected volts, amperes or both", "--heater", "hot");
    refused("no type has a heater of 99V", "--heater", "99V");
    refused("no type in the catalogue is all of that", "--base", "noval", "--kind", "regulator");
    refused("either name types, or list them", "--kind", "triode", "12AX7");
  }

  private static void refused(String message, String... words) {
    String[] args = new String[words.length + 1];
    args[0] = "tubes";
    System.arraycopy(words, 0, args, 1, words.length);
    Run run = Run.of(args);
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.out()).isEmpty();
    assertThat(run.err()).contains(message);
  }

  @Test
  void showsSeveralTypesOneAfterTheOther() {
    assertThat(Run.of("tubes", "12AX7", "EL84").out())
        .isEqualTo(Run.of("tubes", "12AX7").out() + Run.of("tubes", "EL84").out());
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
  void fitReproducesTheDataFile(@TempDir Path folder) throws IOException {
    Run run = Run.of("fit", "ECC83", "ECL82", "--write", folder.toString());
    assertThat(run.code()).isZero();
    assertThat(run.out()).startsWith("12AX7: worst current").contains("ECL82: worst current");
    for (String name : List.of("12AX7.tube", "ECL82.tube")) {
      try (var file = Catalogue.class.getResourceAsStream(name)) {
        assertThat(file).isNotNull();
        assertThat(Files.readString(folder.resolve(name)))
            .isEqualTo(new String(file.readAllBytes(), StandardCharsets.UTF_8));
      }
    }
  }

  @Test
  void fitWantsTypesOrAll() {
    assertThat(Run.of("fit").err()).contains("--all");
    assertThat(Run.of("fit", "12AX7", "--all").code()).isEqualTo(2);
    assertThat(Run.of("fit", "12AX8").err()).contains("unknown tube type 12AX8");
    assertThat(Run.of("fit", "12AX7", "--write", "no/such/folder").err()).contains("no folder");
  }
}
