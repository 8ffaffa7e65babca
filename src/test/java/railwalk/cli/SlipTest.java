package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.TreeMap;
import org.junit.jupiter.api.Assertions;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Slips of the pencil: the demo netlists with a few random changes each go through the whole
 * program. Every one must end with a proper exit code and say what is wrong in words, never with an
 * internal fault and never not at all.
 */
class SlipTest {
  private static final long SEED = 1937;
  private static final String SIGNS = "0123456789.+-*/=?{}()';,_ kKmMuURCLVXD\t\"\\µΩ%&#@";
  private static final Duration HANG = Duration.ofSeconds(60);

  @TempDir private Path folder;

  @Test
  void everySlipEndsInWords() throws IOException {
    run(150);
  }

  @Test
  @Tag("slow")
  void everyOneOfTwoThousandSlipsEndsInWords() throws IOException {
    run(2000);
  }

  private void run(int rounds) throws IOException {
    List<List<String>> demos = new ArrayList<>();
    for (String name : DemosTest.demos()) {
      demos.add(Files.readAllLines(Path.of("test-netlists", "amps", name + ".cir")));
    }
    Random random = new Random(SEED);
    TreeMap<Integer, Integer> codes = new TreeMap<>();
    for (int round = 0; round < rounds; round++) {
      List<String> lines = new ArrayList<>(demos.get(round % demos.size()));
      int changes = 1 + random.nextInt(4);
      for (int change = 0; change < changes; change++) {
        mutate(lines, random);
      }
      String text = String.join("\n", lines) + "\n";
      Path netlist = Files.writeString(folder.resolve("slip.cir"), text);
      Run run =
          Assertions.assertTimeoutPreemptively(
              HANG, () -> Run.of("chart", netlist.toString(), "--as", "text"), text);
      assertThat(run.err()).as(text).doesNotContain("internal fault", "\tat ");
      assertThat(run.code()).as(text).isIn(0, 2);
      assertThat(run.code() == 0 ? run.out() : run.err()).as(text).isNotBlank();
      codes.merge(run.code(), 1, Integer::sum);
    }
    System.out.println("Exit codes of " + rounds + " slips: " + codes);
    assertThat(codes.keySet()).containsExactly(0, 2);
  }

  private static void mutate(List<String> lines, Random random) {
    int at = 1 + random.nextInt(lines.size() - 1);
    String line = lines.get(at);
    int place = line.isEmpty() ? 0 : random.nextInt(line.length());
    String sign = String.valueOf(SIGNS.charAt(random.nextInt(SIGNS.length())));
    switch (random.nextInt(7)) {
      case 0 -> lines.set(at, line.substring(0, place) + sign + line.substring(place));
      case 1 -> lines.set(at, line.isEmpty() ? line : cut(line, place));
      case 2 -> lines.set(at, line.isEmpty() ? sign : cut(line, place) + sign);
      case 3 -> lines.remove(at);
      case 4 -> lines.add(at, lines.get(random.nextInt(lines.size())));
      case 5 -> lines.set(at, swapped(line, random));
      default -> lines.set(at, line.substring(0, place));
    }
    if (lines.size() < 2) {
      lines.add("R1 a 0 1k");
    }
  }

  private static String cut(String line, int place) {
    return line.substring(0, place) + line.substring(place + 1);
  }

  private static String swapped(String line, Random random) {
    String[] words = line.split(" ", -1);
    int one = random.nextInt(words.length);
    int other = random.nextInt(words.length);
    String kept = words[one];
    words[one] = words[other];
    words[other] = kept;
    return String.join(" ", words);
  }
}
