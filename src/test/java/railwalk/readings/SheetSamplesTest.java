package railwalk.readings;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.circuit.Circuit;
import railwalk.source.DiagnosticPrinter;

/**
 * Every bad sheet prints exactly what stands beside it. Its first line names the netlist; in a file
 * {@code .words} each further line is a word of the command line. With {@code -Dsheets.write=true}
 * the texts are written again, to be read before they are committed.
 */
class SheetSamplesTest {
  private static final Path SAMPLES = Path.of("test-netlists", "bench");
  private static final Pattern NETLIST = Pattern.compile("\ufeff?# netlist: (\\S+)");
  private static final Pattern CODE = Pattern.compile("(?m)(?:^|: )[a-z]+\\[([a-z0-9-]+)]: ");

  static Stream<Path> samples() throws IOException {
    try (Stream<Path> files = Files.list(SAMPLES)) {
      return files
          .filter(file -> file.toString().endsWith(".csv") || file.toString().endsWith(".words"))
          .sorted()
          .toList()
          .stream();
    }
  }

  private static Path expected(Path sample) {
    String name = sample.getFileName().toString().replaceFirst("\\.[a-z]+$", ".expected");
    return SAMPLES.resolve(name);
  }

  private static SheetReading read(Path sample) throws IOException {
    String text = Files.readString(sample);
    Matcher netlist = NETLIST.matcher(text);
    Circuit circuit = netlist.lookingAt() ? Amps.of(netlist.group(1)) : Amps.millrace();
    if (sample.toString().endsWith(".words")) {
      List<String> lines = text.lines().toList();
      return SheetReader.ofWords(lines.subList(1, lines.size()), circuit);
    }
    return SheetReader.read(sample.getFileName().toString(), text, circuit);
  }

  @ParameterizedTest
  @MethodSource("samples")
  void printsWhatIsExpected(Path sample) throws IOException {
    String printed = DiagnosticPrinter.print(read(sample).diagnostics());
    if (Boolean.getBoolean("sheets.write")) {
      Files.writeString(expected(sample), printed);
    }
    assertThat(printed).isEqualTo(Files.readString(expected(sample)));
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
        Arrays.stream(SheetProblem.values())
            .map(SheetProblem::code)
            .collect(Collectors.toCollection(TreeSet::new));
    System.out.println(samples().count() + " bad sheets show " + shown.size() + " codes");
    assertThat(shown).isEqualTo(all);
  }
}
