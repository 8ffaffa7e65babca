package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.jr.ob.JSON;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.stream.Stream;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Every netlist in {@code test-netlists/amps} through the whole program, against its chart in
 * {@code charts}. Run with {@code -Dcharts.write=true} it writes the charts before comparing them.
 */
class DemosTest {
  private static final Path AMPS = Path.of("test-netlists", "amps");
  private static final Path CHARTS = Path.of("charts");
  private static final boolean WRITE = Boolean.getBoolean("charts.write");

  @TempDir private Path folder;

  static List<String> demos() throws IOException {
    try (Stream<Path> files = Files.list(AMPS)) {
      return files
          .map(f -> f.getFileName().toString())
          .filter(f -> f.endsWith(".cir"))
          .map(f -> f.substring(0, f.length() - ".cir".length()))
          .sorted()
          .toList();
    }
  }

  @BeforeAll
  static void writeCharts() throws IOException {
    if (WRITE) {
      Files.createDirectories(CHARTS);
      for (String name : demos()) {
        String pdf = CHARTS.resolve(name + ".pdf").toString();
        Files.writeString(
            CHARTS.resolve(name + ".txt"), Run.of("chart", netlist(name), "-o", pdf).out());
      }
    }
  }

  @ParameterizedTest
  @MethodSource("demos")
  void printsTheChartAndWritesThePdf(String name) throws IOException {
    Run run = Run.in(folder, "chart", netlist(name));
    assertThat(run.err()).contains(name + "-chart.pdf");
    assertThat(run.code()).isZero();
    Path pdf = folder.resolve(name + "-chart.pdf");
    assertThat(run.out()).isEqualTo(Files.readString(CHARTS.resolve(name + ".txt")));
    assertThat(words(Files.readAllBytes(pdf)))
        .isEqualTo(words(Files.readAllBytes(CHARTS.resolve(name + ".pdf"))));
  }

  @ParameterizedTest
  @MethodSource("demos")
  void textAloneIsTheSameText(String name) throws IOException {
    Run run = Run.in(folder, "chart", netlist(name), "--as", "text");
    assertThat(run.err()).isEmpty();
    assertThat(run.out()).isEqualTo(Files.readString(CHARTS.resolve(name + ".txt")));
    assertThat(run.out().lines().filter(line -> line.codePointCount(0, line.length()) > 80))
        .isEmpty();
    assertThat(files()).isEmpty();
  }

  @ParameterizedTest
  @MethodSource("demos")
  void jsonHoldsWhatIsPromised(String name) throws IOException {
    Run run = Run.in(folder, "chart", netlist(name), "--as", "json");
    assertThat(run.code()).isZero();
    Map<String, Object> chart = JSON.std.mapFrom(run.out());
    assertThat(chart.keySet())
        .containsExactlyInAnyOrder(
            "title", "conditions", "points", "tubes", "supplies", "findings", "states");
    assertThat(objects(chart, "points"))
        .isNotEmpty()
        .allSatisfy(
            point ->
                assertThat(point.keySet())
                    .containsExactlyInAnyOrder(
                        "node", "kind", "volts", "low_volts", "high_volts", "meter_volts", "pins"));
    assertThat(objects(chart, "tubes")).isNotEmpty();
    assertThat(objects(chart, "supplies")).isNotEmpty();
    assertThat(objects(chart, "states"))
        .allSatisfy(
            state ->
                assertThat(state.keySet())
                    .containsExactlyInAnyOrder(
                        "name", "conditions", "points", "tubes", "supplies", "findings"));
  }

  @ParameterizedTest
  @MethodSource("demos")
  void csvHasOneRowForEachDcPointOfTheJson(String name) throws IOException {
    Run csv = Run.in(folder, "chart", netlist(name), "--as", "csv");
    Map<String, Object> json =
        JSON.std.mapFrom(Run.in(folder, "chart", netlist(name), "--as", "json").out());
    long points = count(json, "dc");
    for (Map<String, Object> state : objects(json, "states")) {
      points += count(state, "dc");
    }
    List<String> lines = csv.out().lines().toList();
    assertThat(lines.get(0)).endsWith("node,pins,volts,low_volts,high_volts,meter_volts");
    assertThat(lines).hasSize((int) points + 1);
  }

  /** Every winding under load, every supply node's ripple, beside the DC points. */
  @ParameterizedTest
  @MethodSource("demos")
  void jsonHasWindingsAndRipple(String name) throws IOException {
    Map<String, Object> json =
        JSON.std.mapFrom(Run.in(folder, "chart", netlist(name), "--as", "json").out());
    List<Map<String, Object>> points = objects(json, "points");
    for (String line : Files.readAllLines(Path.of(netlist(name)))) {
      if (line.matches("V\\w+ .*RMS.*")) {
        String winding = line.substring(0, line.indexOf(' '));
        assertThat(points)
            .filteredOn(p -> "ac".equals(p.get("kind")) && winding.equals(p.get("node")))
            .singleElement()
            .satisfies(p -> assertThat((Double) p.get("volts")).isPositive());
      }
    }
    assertThat(count(json, "ac")).isPositive();
    assertThat(points)
        .filteredOn(p -> "ripple".equals(p.get("kind")))
        .isNotEmpty()
        .allSatisfy(p -> assertThat((Double) p.get("volts")).isNotNegative());
  }

  private static long count(Map<String, Object> column, String kind) {
    return objects(column, "points").stream().filter(p -> kind.equals(p.get("kind"))).count();
  }

  @ParameterizedTest
  @MethodSource("demos")
  void theSameInputGivesTheSameBytes(String name) throws IOException {
    for (String format : List.of("pdf", "text", "csv", "json")) {
      Path first = folder.resolve("first." + format);
      Path second = folder.resolve("second." + format);
      Run.in(folder, "chart", netlist(name), "--as", format, "-o", first.toString());
      Run.in(folder, "chart", netlist(name), "--as", format, "-o", second.toString());
      assertThat(first).hasSameBinaryContentAs(second);
    }
  }

  @ParameterizedTest
  @MethodSource("demos")
  void checkFindsNoError(String name) {
    Run run = Run.in(folder, "check", netlist(name));
    assertThat(run.code()).isZero();
    assertThat(run.out()).doesNotContain("error[");
  }

  @ParameterizedTest
  @MethodSource("demos")
  void walkPrintsThePaths(String name) {
    Run run = Run.in(folder, "walk", netlist(name));
    assertThat(run.err()).isEmpty();
    assertThat(run.code()).isZero();
    assertThat(run.out()).contains(" mA");
  }

  private List<String> files() throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(Path::toString).toList();
    }
  }

  private static String netlist(String name) {
    return AMPS.resolve(name + ".cir").toString();
  }

  private static String words(byte[] pdf) throws IOException {
    try (PDDocument document = Loader.loadPDF(pdf)) {
      return new PDFTextStripper().getText(document);
    }
  }

  @SuppressWarnings("unchecked")
  private static List<Map<String, Object>> objects(Map<String, Object> parent, String member) {
    return (List<Map<String, Object>>) Objects.requireNonNull(parent.get(member), member);
  }
}
