package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.device.Catalogue;
import railwalk.source.DiagnosticPrinter;

/** Every bad sample prints exactly what stands beside it. */
class DiagnosticsGoldenTest {
  private static final Path SAMPLES = Path.of("test-netlists", "errors");
  private static final Pattern CODE = Pattern.compile("\\[([a-z0-9-]+)]: ");

  /** Words by which the parser generator would betray itself. */
  private static final Pattern PARSER_WORDS =
      Pattern.compile("mismatched|extraneous|viable|NEWLINE|EOF|WORD|EXPRESSION|JUNK");

  static Stream<Path> samples() throws IOException {
    try (Stream<Path> files = Files.list(SAMPLES)) {
      return files.filter(file -> file.toString().endsWith(".cir")).sorted().toList().stream();
    }
  }

  private static Path expected(Path sample) {
    return SAMPLES.resolve(sample.getFileName().toString().replace(".cir", ".expected"));
  }

  @ParameterizedTest
  @MethodSource("samples")
  void printsWhatIsExpected(Path sample) throws IOException {
    NetlistResult result = NetlistReader.read(sample, Catalogue.standard(), Reading.FITTER);
    String printed = DiagnosticPrinter.print(result.diagnostics());
    assertThat(printed).isEqualTo(Files.readString(expected(sample)));
    assertThat(printed).doesNotContainPattern(PARSER_WORDS);
    assertThat(result.circuit().isPresent())
        .isEqualTo(result.diagnostics().stream().noneMatch(d -> d.isError()));
  }

  @Test
  void everyCodeHasASample() throws IOException {
    Set<String> shown = new TreeSet<>();
    for (Path sample : samples().toList()) {
      Matcher code = CODE.matcher(Files.readString(expected(sample)));
      while (code.find()) {
        shown.add(code.group(1));
      }
    }
    Set<String> all =
        Arrays.stream(Problem.values())
            .map(Problem::code)
            .collect(Collectors.toCollection(TreeSet::new));
    System.out.println(samples().count() + " bad samples show " + shown.size() + " codes");
    assertThat(shown).isEqualTo(all);
  }
}
