package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code railwalk chart --line-sweep}. */
class LineSweepTest {
  @TempDir Path folder;

  /** A regulator tube holds its node while the supply before it follows the line (handbooks). */
  @Test
  void supplyNodesFollowTheLineAndRegulatedOnesDoNot() throws IOException {
    Path netlist = folder.resolve("regulated.cir");
    Files.writeString(
        netlist,
        """
        * A regulated stage
        .line 230 50
        VHT ht1 0 ht2 RMS 250-0-250 rdc=80,80
        D1 ht1 b1 1N4007
        D2 ht2 b1 1N4007
        C1 b1 0 47u 450V
        RD b1 vr 8k2 5W
        XV2 0A2 anode=vr cathode=0
        RP vr p 47k
        XV1 12AU7 plate=p grid=0 cathode=k
        RK k 0 1k
        """);
    String text = Run.of("chart", netlist.toString(), "--line-sweep", "--as", "text").out();
    double[] raw = row(text, "b1");
    double[] regulated = row(text, "vr");
    assertThat(raw[4] / raw[0]).isBetween(1.15, 1.3);
    assertThat(regulated[4] / regulated[0]).isBetween(1.0, 1.02);
  }

  private static double[] row(String text, String node) {
    return text.lines()
        .dropWhile(line -> !line.startsWith("== Other line volts"))
        .filter(line -> line.startsWith(node + " "))
        .findFirst()
        .map(line -> line.substring(node.length()).strip().split(" +"))
        .map(LineSweepTest::numbers)
        .orElseThrow();
  }

  private static double[] numbers(String[] words) {
    double[] numbers = new double[words.length];
    for (int i = 0; i < words.length; i++) {
      numbers[i] = Double.parseDouble(words[i]);
    }
    return numbers;
  }

  @Test
  void wantsALineInTheNetlist() throws IOException {
    Path netlist = folder.resolve("plain.cir");
    Files.writeString(netlist, "* Plain\nVB b 0 250\nR1 b p 100k\nXV1 12AX7 1=p 2=0 3=0\n");
    Run run = Run.of("chart", netlist.toString(), "--line-sweep", "--as", "text");
    assertThat(run.code()).isEqualTo(Main.COULD_NOT);
    assertThat(run.err()).contains("--line-sweep needs a .line");
  }

  @Test
  void helpSaysPerCentOnce() {
    assertThat(Run.of("chart", "--help").out()).contains("110 %").doesNotContain("%%");
  }
}
