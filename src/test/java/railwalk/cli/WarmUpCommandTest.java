package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code railwalk warmup}. */
class WarmUpCommandTest {
  private static final String WEIRSIDE = "test-netlists/amps/weirside.cir";

  @TempDir Path folder;

  @Test
  void showsHighestVoltsOfEveryWayOfSwitchingOn() throws IOException {
    Run run = Run.in(folder, "warmup", "test-netlists/amps/millrace.cir", "-o", "on.pdf");
    assertThat(run.code()).isZero();
    assertThat(run.out())
        .contains(
            "Cold switch-on  ",
            "Cold switch-on in state standby",
            "standby left after 30 s",
            "Hot restart",
            "When cathodes conduct",
            "Node n0: volts",
            "First charge");
    assertThat(run.out().lines()).allMatch(line -> line.codePointCount(0, line.length()) <= 80);
    assertThat(Files.readAllBytes(folder.resolve("on.pdf"))).startsWith('%', 'P', 'D', 'F');
  }

  /** The highest volts in the cautions are those of the warm-up, not the running ones. */
  @Test
  void warnsOfTheHighestVoltsItShows() throws IOException {
    String out = Run.in(folder, "warmup", WEIRSIDE).out().replaceAll("[\\s|]+", " ");
    assertThat(out).containsPattern("The highest on these pages is 4\\d\\d V at b1, after");
  }

  @Test
  void findsACapacitorThatIsOverItsRatingOnTheWay() throws IOException {
    Path netlist = folder.resolve("over.cir");
    String text = Files.readString(Path.of(WEIRSIDE));
    int line = 1 + (int) text.substring(0, text.indexOf("\nC8 ")).lines().count();
    Files.writeString(
        netlist,
        text.replace("C8 b1 0 16u 450V", "C8 b1 0 16u 350V").replaceAll("(?m)^\\.state.*$", ""));
    Run run = Run.in(folder, "warmup", netlist.toString());
    assertThat(run.code()).isZero();
    assertThat(run.out()).containsPattern("b1 +\\d+ +\\d+ .*C8 +350 +over for");
    assertThat(run.out().replaceAll("\\s+", " "))
        .contains("after a cold switch-on and is rated 350 V; above for", "over.cir line " + line);
  }

  /** Two capacitors with balancing resistors stand what both together stand (common practice). */
  @Test
  void addsUpAStack() throws IOException {
    Path netlist = folder.resolve("stack.cir");
    Files.writeString(
        netlist,
        """
        * Two capacitors in series
        .line 120 60
        VHT h1 0 h2 RMS 350-0-350 rdc=60,60
        D1 h1 b 1N4007
        D2 h2 b 1N4007
        C1 b m 47u 300V
        C2 m 0 47u 300V
        R1 b m 220k
        R2 m 0 220k
        RL b 0 10k 30W
        """);
    assertThat(Run.in(folder, "warmup", netlist.toString()).out())
        .containsPattern("b +\\d+ +\\d+ .*C1 \\+ C2 +600 +within");
  }

  @Test
  void refusesWhatItCannotRead() {
    assertThat(Run.in(folder, "warmup", "nowhere.cir").code()).isEqualTo(Main.COULD_NOT);
    Run csv = Run.in(folder, "warmup", WEIRSIDE, "-o", "on.csv");
    assertThat(csv.code()).isEqualTo(Main.COULD_NOT);
    assertThat(csv.err()).contains("-o writes a PDF");
    assertThat(folder.resolve("on.csv")).doesNotExist();
    Run line = Run.in(folder, "warmup", WEIRSIDE, "--line", "wall");
    assertThat(line.code()).isEqualTo(Main.COULD_NOT);
    assertThat(line.err()).contains("wall");
  }
}
