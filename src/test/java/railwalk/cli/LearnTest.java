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
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A netlist with values left open, solved from readings and written again. */
class LearnTest {
  private static final Path WEIRSIDE = Path.of("test-netlists", "amps", "weirside.cir");

  /** The demo's own chart, each figure moved by less than a hundredth by hand. */
  private static final List<String> READINGS =
      List.of("b1=304", "b2=292", "b3=267", "V1.1=168.9", "V1.3=1.44", "V2.8=16.8", "V2.3=290");

  @TempDir Path folder;
  private Path open;
  private String original;

  @BeforeEach
  void openTwoValues() throws IOException {
    original =
        Files.readString(WEIRSIDE)
            .replace("R4 k1 0 1k8", "R4 k1 0 ?")
            .replace("R10 k3 0 390 5W", "R10 k3 0 ? 5W\t; cathode, µ")
            .replace("\n", "\r\n");
    open = folder.resolve("open.cir");
    Files.writeString(open, original);
  }

  private Run compare(Path netlist, List<String> readings, String... more) {
    List<String> words = new ArrayList<>(List.of("compare", netlist.toString()));
    words.addAll(readings);
    words.addAll(List.of(more));
    return Run.in(folder, words.toArray(new String[0]));
  }

  @Test
  void writesTheValuesAndNothingElse() throws IOException {
    Run run = compare(open, READINGS, "--learn", "found.cir");
    assertThat(run.err()).contains("wrote ").contains("found.cir");
    assertThat(run.code()).isZero();
    assertThat(run.out()).contains("Values found").contains("1.8 kΩ").contains("395 Ω");
    assertThat(run.out().indexOf("Values found")).isLessThan(run.out().indexOf("What explains"));
    assertThat(run.out().lines()).allMatch(line -> line.length() <= 80);
    assertThat(Files.readString(open)).isEqualTo(original);
    assertThat(Files.readString(folder.resolve("found.cir")))
        .isEqualTo(
            original
                .replace("R4 k1 0 ?", "R4 k1 0 1.8k ; found, nearest 1.8k")
                .replace(
                    "R10 k3 0 ? 5W\t; cathode, µ",
                    "R10 k3 0 395 5W\t; cathode, µ ; found, nearest 390"));
    Run chart = Run.of("chart", folder.resolve("found.cir").toString(), "--as", "csv");
    assertThat(chart.code()).isZero();
    assertThat(compare(open, READINGS, "--learn", open.toString()).code()).isEqualTo(2);
    assertThat(Files.readString(open)).isEqualTo(original);
  }

  @Test
  void writesNothingWhileAValueIsNotDetermined() throws IOException {
    Run run = compare(open, READINGS.subList(3, 5), "--learn", "found.cir");
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.err()).contains("do not determine R10").doesNotContain("\tat ");
    assertThat(run.out()).contains("can’t determine it").contains("measure R10 in ohms");
    assertThat(folder.resolve("found.cir")).doesNotExist();
  }

  @Test
  void saysThatNothingIsOpen() {
    Run run = compare(WEIRSIDE, READINGS, "--learn", "found.cir");
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.err()).contains("no value written as ?");
    assertThat(folder.resolve("found.cir")).doesNotExist();
  }

  @Test
  void machinesFindTheValuesAtTheEnd() throws IOException {
    Run run = compare(open, READINGS, "--as", "json");
    Map<String, Object> report = JSON.std.mapFrom(run.out());
    assertThat(report.keySet())
        .containsExactly("conditions", "points", "suspects", "next_probe", "values");
    List<?> values = (List<?>) Objects.requireNonNull(report.get("values"));
    assertThat(values).hasSize(2);
    Map<?, ?> first = (Map<?, ?>) Objects.requireNonNull(values.get(0));
    assertThat(first.get("element")).isEqualTo("R4");
    assertThat(first.get("determined")).isEqualTo(true);
    assertThat(first.get("nearest")).isEqualTo(1800.0);
    assertThat(first.get("read_point")).isNull();
  }

  @Test
  void readingsThatCannotBeReadAreRefused() {
    Run run = compare(open, List.of("V9.9=abc"));
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.err()).contains("V9.9").doesNotContain("\tat ");
  }
}
