package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatCode;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import railwalk.device.Catalogue;
import railwalk.source.Diagnostic;
import railwalk.source.DiagnosticPrinter;

/** Good netlists damaged at random: reading them never throws and never hangs. */
class MutationTest {
  private static final int MUTATIONS = 2000;
  private static final String SIGNS =
      "+-*/=(){}',;.:?\"%\\_ \t\n\r0123456789abkmMuRVXLC\u00b5\u03a9\u2212\u0000\u0007\ufeff\ud83d";

  private static List<String> seeds() throws IOException {
    List<Path> files = new ArrayList<>();
    for (Path folder :
        List.of(Path.of("test-netlists/amps"), Path.of("src/test/resources/netlist"))) {
      try (Stream<Path> found = Files.list(folder)) {
        found.filter(file -> file.toString().endsWith(".cir")).sorted().forEach(files::add);
      }
    }
    List<String> seeds = new ArrayList<>();
    for (Path file : files) {
      seeds.add(Files.readString(file));
    }
    return seeds;
  }

  @Test
  @Timeout(120)
  void damagedNetlistsAreReadCalmly() throws IOException {
    List<String> seeds = seeds();
    assertThat(seeds).hasSizeGreaterThanOrEqualTo(5);
    Random random = new Random(20_260_101);
    int withErrors = 0;
    int stillGood = 0;
    int longest = 0;
    for (int i = 0; i < MUTATIONS; i++) {
      String text = seeds.get(i % seeds.size());
      int hits = 1 + random.nextInt(4);
      for (int hit = 0; hit < hits; hit++) {
        text = damaged(text, random);
      }
      NetlistResult result = readCalmly(text, i);
      boolean error = result.diagnostics().stream().anyMatch(Diagnostic::isError);
      assertThat(result.circuit().isPresent()).isEqualTo(!error);
      withErrors += error ? 1 : 0;
      stillGood += error ? 0 : 1;
      longest = Math.max(longest, result.diagnostics().size());
    }
    System.out.println(
        MUTATIONS
            + " mutations of "
            + seeds.size()
            + " netlists: "
            + withErrors
            + " with errors, "
            + stillGood
            + " still read, at most "
            + longest
            + " remarks");
    assertThat(withErrors).isGreaterThan(MUTATIONS / 4);
    assertThat(stillGood).isGreaterThan(MUTATIONS / 10);
  }

  private static NetlistResult readCalmly(String text, int number) {
    List<NetlistResult> results = new ArrayList<>();
    assertThatCode(
            () -> {
              NetlistResult result =
                  NetlistReader.readText("mutation.cir", text, Catalogue.standard());
              DiagnosticPrinter.print(result.diagnostics());
              results.add(result);
            })
        .as("mutation %d:%n%s", number, text)
        .doesNotThrowAnyException();
    return results.get(0);
  }

  private static String damaged(String text, Random random) {
    if (text.isEmpty()) {
      return "R";
    }
    int at = random.nextInt(text.length());
    String sign = String.valueOf(SIGNS.charAt(random.nextInt(SIGNS.length())));
    return switch (random.nextInt(8)) {
      case 0 -> text.substring(0, at) + text.substring(at + 1);
      case 1 -> text.substring(0, at) + sign + text.substring(at);
      case 2 -> text.substring(0, at) + sign + text.substring(at + 1);
      case 3 -> linesChanged(text, random, LineChange.SWAP);
      case 4 -> linesChanged(text, random, LineChange.DOUBLE);
      case 5 -> linesChanged(text, random, LineChange.DROP);
      case 6 -> wordMoved(text, random);
      default -> text.substring(0, at) + sign.repeat(1 + random.nextInt(60)) + text.substring(at);
    };
  }

  private enum LineChange {
    SWAP,
    DOUBLE,
    DROP
  }

  private static String linesChanged(String text, Random random, LineChange change) {
    List<String> lines = new ArrayList<>(List.of(text.split("\n", -1)));
    int one = random.nextInt(lines.size());
    int other = random.nextInt(lines.size());
    switch (change) {
      case SWAP -> Collections.swap(lines, one, other);
      case DOUBLE -> lines.add(other, lines.get(one));
      case DROP -> lines.remove(one);
    }
    return String.join("\n", lines);
  }

  private static String wordMoved(String text, Random random) {
    String[] words = text.split(" ", -1);
    int one = random.nextInt(words.length);
    int other = random.nextInt(words.length);
    String word = words[one];
    words[one] = words[other];
    words[other] = word;
    return String.join(" ", words);
  }

  @Test
  @Timeout(60)
  void bytesOfAllKindsAreReadCalmly() throws IOException {
    Random random = new Random(7);
    Path file = Files.createTempFile("railwalk", ".cir");
    try {
      for (int i = 0; i < 200; i++) {
        byte[] bytes = new byte[random.nextInt(400)];
        random.nextBytes(bytes);
        if (i % 2 == 0) {
          byte[] start = "* title\nR1 a 0 ".getBytes(StandardCharsets.US_ASCII);
          System.arraycopy(start, 0, bytes, 0, Math.min(start.length, bytes.length));
        }
        Files.write(file, bytes);
        assertThatCode(() -> NetlistReader.read(file, Catalogue.standard()))
            .doesNotThrowAnyException();
      }
    } finally {
      Files.deleteIfExists(file);
    }
  }

  /** Inputs made to tire a parser out. */
  @Test
  @Timeout(60)
  void exhaustingInputsAreReadCalmly() {
    List<String> inputs =
        List.of(
            "* t\nR1 a 0 " + "{".repeat(10_000),
            "* t\nR1 a 0 {" + "(".repeat(10_000) + "}",
            "* t\nR1 a 0 {" + "-".repeat(10_000) + "1}",
            "* t\nR1 a 0 {" + "1+".repeat(9_000) + "1}",
            "* t\nV1 a 0 " + "SIN(".repeat(4_000),
            "* t\n" + "+ a\n".repeat(20_000),
            "* t\n" + "* c\n".repeat(20_000) + "R1 a 0 1k",
            "* t\nR1" + " a".repeat(9_000),
            "* t\nR1 a 0 " + "=".repeat(10_000),
            "* t\n" + ".subckt a b\n".repeat(5_000),
            "* t\n" + ".param a={b}\n.param b={a}\n".repeat(2_000) + "R1 a 0 {a}",
            "* t\n" + chain(3_000) + "R1 a 0 {p0}",
            "* t\nR1 a 0 1k" + "\n".repeat(100_000),
            "* t\nR1 a 0 \"" + "x".repeat(15_000));
    for (String input : inputs) {
      readCalmly(input, -1);
    }
  }

  private static String chain(int length) {
    StringBuilder chain = new StringBuilder();
    for (int i = 0; i < length; i++) {
      chain.append(".param p").append(i).append("={p").append(i + 1).append("}\n");
    }
    return chain.append(".param p").append(length).append("=1\n").toString();
  }
}
