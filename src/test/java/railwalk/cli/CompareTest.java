package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.jr.ob.JSON;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Sheets of readings, each with the report that stands beside it. The readings are what a meter
 * shows of the faulted amplifier, each moved by up to a hundredth by hand. With {@code
 * -Dbench.write=true} the reports are written again, to be read before they are committed.
 */
class CompareTest {
  private static final Path AMPS = Path.of("test-netlists", "amps");
  private static final Path SHEETS = Path.of("test-netlists", "bench", "faults");
  private static final Pattern NETLIST = Pattern.compile("# netlist: amps/(\\S+)");

  @TempDir Path folder;

  static Stream<Path> sheets() throws IOException {
    try (Stream<Path> files = Files.list(SHEETS)) {
      return files.filter(f -> f.toString().endsWith(".csv")).sorted().toList().stream();
    }
  }

  private static String netlist(Path sheet) throws IOException {
    Matcher netlist = NETLIST.matcher(Files.readString(sheet));
    assertThat(netlist.lookingAt()).isTrue();
    return AMPS.resolve(netlist.group(1)).toString();
  }

  private static Run compare(String name, String... more) throws IOException {
    Path sheet = SHEETS.resolve(name + ".csv");
    List<String> words = new ArrayList<>(List.of("compare", netlist(sheet), sheet.toString()));
    words.addAll(List.of(more));
    return Run.of(words.toArray(new String[0]));
  }

  @ParameterizedTest
  @MethodSource("sheets")
  void reportsWhatStandsBesideTheSheet(Path sheet) throws IOException {
    Path expected = Path.of(sheet.toString().replace(".csv", ".expected"));
    Run run = Run.of("compare", netlist(sheet), sheet.toString());
    if (Boolean.getBoolean("bench.write")) {
      Files.writeString(expected, run.out());
    }
    assertThat(run.err()).isEmpty();
    assertThat(run.out()).isEqualTo(Files.readString(expected));
    assertThat(run.out().lines()).allMatch(line -> line.length() <= 80);
  }

  /** The fault that was put in comes first, and its exit code tells a script. */
  @ParameterizedTest
  @CsvSource({
    "healthy, 0, nothing wrong shows",
    "low-line, 0, nothing wrong shows",
    "needle-meter, 0, nothing wrong shows",
    "slip, 0, a slip",
    "leaky-coupling, 1, C3 leaky",
    "cathode-open, 1, R16 open",
    "dropper-high, 1, R13 high",
    "screen-open, 1, R36 open",
    "half-rectifier, 1, ht2",
    "leak-or-gas, 1, C5 leaky",
    "weak-tube, 1, V4 weak"
  })
  void namesTheFaultThatWasPutIn(String name, int code, String words) throws IOException {
    Run run = compare(name);
    String result = run.out().substring(run.out().indexOf("Result"), run.out().indexOf("-- What"));
    assertThat(run.code()).isEqualTo(code);
    assertThat(result.replaceAll("\\s+", " ")).contains(words);
  }

  /** A like figure of 16.8 for 168 is asked about, and so is a minus that belongs nowhere. */
  @Test
  void asksAboutSlips() throws IOException {
    String said = compare("slip").out().replaceAll("\\s+", " ");
    assertThat(said).contains("V1.6 reads 16.8 V, expected 168 V: a decimal point, or the range?");
    assertThat(said).contains("V2.8 reads −16.7 V, expected 16.7 V: the sign");
  }

  /** The form that scripts rely on: every member there, in this order. */
  @Test
  void isWrittenForMachinesInThePromisedForm() throws IOException {
    Map<String, Object> report = json("half-rectifier");
    assertThat(report.keySet()).containsExactly("conditions", "points", "suspects", "next_probe");
    for (Map<String, Object> point : list(report, "points")) {
      assertThat(point.keySet())
          .containsExactly(
              "point", "kind", "state", "read", "expected", "low", "high", "meter", "verdict");
      assertThat(point.get("state")).isNull();
    }
    for (Map<String, Object> suspect : list(report, "suspects")) {
      assertThat(suspect.keySet())
          .containsExactly(
              "element", "fault", "estimate", "unit", "probability", "for", "against", "group");
    }
    Map<String, Object> next = member(report, "next_probe");
    assertThat(next.keySet()).containsExactly("point", "kind", "action", "why", "outcomes");
    assertThat(list(next, "outcomes")).isNotEmpty();
    for (Map<String, Object> outcome : list(next, "outcomes")) {
      assertThat(outcome.keySet()).containsExactly("reading", "suspect");
    }
    String chart = Run.of("chart", AMPS.resolve("weirside.cir").toString(), "--as", "json").out();
    assertThat(member(report, "conditions").keySet())
        .containsExactlyElementsOf(member(JSON.std.mapFrom(chart), "conditions").keySet());
  }

  @Test
  void writesWhatIsUnknownAsNull() throws IOException {
    Map<String, Object> report = json("healthy");
    assertThat(report).containsEntry("next_probe", null);
    List<Map<String, Object>> suspects = list(report, "suspects");
    assertThat(suspects.stream().map(s -> s.get("fault")))
        .containsExactly("healthy", "not this amp");
    for (Map<String, Object> suspect : suspects) {
      assertThat(suspect)
          .containsEntry("element", null)
          .containsEntry("estimate", null)
          .containsEntry("unit", null);
    }
  }

  @Test
  void sortsSuspectsByProbability() throws IOException {
    double sum = 0;
    double before = 1;
    for (Map<String, Object> suspect : list(json("half-rectifier"), "suspects")) {
      double probability =
          ((Number) Objects.requireNonNull(suspect.get("probability"))).doubleValue();
      assertThat(probability).isLessThanOrEqualTo(before);
      before = probability;
      sum += probability;
    }
    assertThat(sum).isBetween(0.9, 1.0 + 1e-9);
  }

  private static Map<String, Object> json(String name) throws IOException {
    return JSON.std.mapFrom(compare(name, "--as", "json").out());
  }

  @SuppressWarnings("unchecked")
  private static Map<String, Object> member(Map<String, Object> of, String name) {
    return (Map<String, Object>) Objects.requireNonNull(of.get(name));
  }

  @SuppressWarnings("unchecked")
  private static List<Map<String, Object>> list(Map<String, Object> of, String name) {
    return (List<Map<String, Object>>) Objects.requireNonNull(of.get(name));
  }

  @Test
  void refusesWhatItCannotDo() throws IOException {
    String amp = AMPS.resolve("weirside.cir").toString();
    String bad = Path.of("test-netlists", "errors", "zero-value.cir").toString();
    refuses("no such file", "compare", amp, "no-such-sheet.csv");
    refuses("no sheet of readings", "compare", amp, pdf().toString());
    refuses("error[", "compare", bad, "b1=300");
    refuses("no such file", "compare", "no-such.cir", "b1=300");
    refuses("error[", "compare", amp, "b77=300");
    refuses("expected one of pdf, text, json", "compare", amp, "b1=300", "--as", "csv");
    refuses("--as pdf needs -o", "compare", amp, "b1=300", "--as", "pdf");
    refuses("expected line volts", "compare", amp, "b1=300", "--line", "dim");
    refuses("there is no folder", "compare", amp, "b1=300", "-o", "no/such/folder/report.pdf");
  }

  private Path pdf() throws IOException {
    return Files.writeString(folder.resolve("scan.csv"), "%PDF-1.7\n%stream\n");
  }

  private static void refuses(String words, String... args) {
    Run run = Run.of(args);
    assertThat(run.code()).isEqualTo(Main.COULD_NOT);
    assertThat(run.err()).contains(words).doesNotContain("Exception");
    assertThat(run.out()).isEmpty();
  }

  /** A bad row costs itself only. */
  @Test
  void keepsCountingAfterABadWord() {
    Run run = Run.of("compare", AMPS.resolve("weirside.cir").toString(), "b1=303", "b77=12");
    assertThat(run.code()).isEqualTo(Main.DONE);
    assertThat(run.err()).contains("b77");
    assertThat(run.out()).contains("1: 1 within, 0 outside");
  }

  @Test
  void writesPages() throws IOException {
    Path report = folder.resolve("report.pdf");
    Run run = compare("dropper-high", "-o", report.toString());
    assertThat(run.err()).contains("wrote");
    assertThat(run.out()).contains("R13 high");
    assertThat(Files.readAllBytes(report)).startsWith('%', 'P', 'D', 'F');
  }

  /** What was saved as found is compared again to the same report, but for the readings' order. */
  @Test
  void savesASheetThatCanBeComparedAgain() throws IOException {
    Path saved = folder.resolve("as-found.csv");
    Run first = compare("half-rectifier", "--save", saved.toString());
    String netlist = AMPS.resolve("weirside.cir").toString();
    Run again = Run.of("compare", netlist, saved.toString());
    assertThat(Files.readString(saved))
        .contains("b2,0.66,ripple,,,,0.17")
        .contains("far off, high");
    assertThat(again.out()).isEqualTo(first.out());
    Run over = Run.of("compare", netlist, saved.toString(), "--save", saved.toString());
    assertThat(over.code()).isEqualTo(Main.COULD_NOT);
    assertThat(over.err()).contains("name another file");
  }
}
