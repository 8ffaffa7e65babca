package railwalk.findings;

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
import railwalk.app.CannotDo;
import railwalk.app.CheckJob;

/** What {@code railwalk check} prints of every sample is exactly what stands beside it. */
class FindingSamplesTest {
  private static final Path SAMPLES = Path.of("test-netlists", "findings");
  private static final Pattern CODE = Pattern.compile(": (?:warning|note)\\[([a-z0-9-]+)]: ");

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
  void printsWhatIsExpected(Path sample) throws IOException, CannotDo {
    assertThat(CheckJob.of(sample).report()).isEqualTo(Files.readString(expected(sample)));
  }

  @Test
  void everyFindingHasASample() throws IOException {
    Set<String> shown = new TreeSet<>();
    for (Path sample : samples().toList()) {
      Matcher code = CODE.matcher(Files.readString(expected(sample)));
      while (code.find()) {
        shown.add(code.group(1));
      }
    }
    Set<String> all =
        Arrays.stream(FindingCode.values())
            .map(FindingCode::code)
            .collect(Collectors.toCollection(TreeSet::new));
    System.out.println(samples().count() + " samples show " + all.size() + " findings");
    assertThat(shown).containsAll(all);
  }
}
