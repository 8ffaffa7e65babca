package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code railwalk settle}. */
class SettleTest {
  @TempDir Path folder;

  /** The inverse volts of a centre-tap rectifier come to nearly twice the peak (handbooks). */
  @Test
  void showsLoadsOfWindingsAndRectifiers() throws IOException {
    Run run = Run.in(folder, "settle", "test-netlists/amps/weirside.cir", "-o", "scope.pdf");
    assertThat(run.code()).isZero();
    assertThat(run.out())
        .contains("Windings under load", "What a scope shows", "Node b1")
        .containsPattern("V3 plate 1 .*1400");
    assertThat(run.out().lines()).allMatch(line -> line.codePointCount(0, line.length()) <= 80);
    assertThat(Files.readAllBytes(folder.resolve("scope.pdf"))).startsWith('%', 'P', 'D', 'F');
  }

  /** Two grounded-cathode stages, each feeding the other's grid: the textbook multivibrator. */
  @Test
  void namesALoopThatOscillates() throws IOException {
    Path netlist = folder.resolve("loop.cir");
    Files.writeString(
        netlist,
        """
        * Two stages that feed each other
        VHT h1 0 h2 RMS 250-0-250 rdc=100,100
        D1 h1 b 1N4007
        D2 h2 b 1N4007
        CB b 0 47u
        RP1 b p1 100k
        XV1A p1 g1 0 12AX7
        RP2 b p2 100k
        XV1B p2 g2 0 12AX7
        C1 p1 g2 10n
        C2 p2 g1 10n
        RG1 g1 0 470k
        RG2 g2 0 470k
        """);
    Run run = Run.in(folder, "settle", netlist.toString());
    assertThat(run.code()).isEqualTo(Main.COULD_NOT);
    assertThat(run.err()).contains("does not settle: node ", "oscillates");
  }

  @Test
  void writesNoPdfUnderAnotherName() {
    Run run = Run.in(folder, "settle", "test-netlists/amps/first.cir", "-o", "scope.csv");
    assertThat(run.code()).isEqualTo(Main.COULD_NOT);
    assertThat(run.err()).contains("-o writes a PDF");
    assertThat(folder.resolve("scope.csv")).doesNotExist();
  }
}
