package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The commands for the bench beside the chart: what if, bias, cold ohms. */
class BenchPapersTest {
  private static final String WEIRSIDE = "test-netlists/amps/weirside.cir";
  private static final String MILLRACE = "test-netlists/amps/millrace.cir";
  private static final int WIDTH = 80;

  private static void fits(Run run) {
    assertThat(run.code()).as(run.err()).isZero();
    assertThat(run.out().lines()).allMatch(line -> line.length() <= WIDTH);
    assertThat(run.out()).contains("Computed figures: a low one is never proof");
  }

  @Test
  void whatIfTellsWhatIsInDangerWithItsLine() {
    Run run = Run.of("whatif", WEIRSIDE, "C3 leak=1M", "V1A weak=50%");
    fits(run);
    assertThat(run.out())
        .contains("C3 leaky, 1 MΩ", "V1A weak", "weirside.cir line 41", "plate", "over its 12 W");
  }

  @Test
  void whatIfRefusesWhatItDoesNotUnderstand() {
    Run run = Run.of("whatif", WEIRSIDE, "R5 burnt");
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.out()).isEmpty();
    assertThat(run.err())
        .isEqualTo(
            "railwalk: \"R5 burnt\": R5 can be: open, xN, =VALUE, shorted"
                + System.lineSeparator());
  }

  @Test
  void biasTellsTheControlAndItsHottestEnd() {
    Run run = Run.of("bias", MILLRACE);
    fits(run);
    assertThat(run.out()).contains("set by P1", "Hottest end: 0 %", "design-maximum", "Across R38");
  }

  @Test
  void biasNeedsAnOutputTube() {
    Run run = Run.of("bias", "test-netlists/amps/first.cir");
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.err()).contains("has no output tube");
  }

  @Test
  void ohmsTellWhatRises() {
    Run run = Run.of("ohms", WEIRSIDE);
    fits(run);
    assertThat(run.out()).contains("rises past", "1.05 MΩ", "335 kΩ");
  }

  @Test
  void pagesAreWrittenAsPdfOrText(@TempDir Path folder) throws IOException {
    assertThat(Run.in(folder, "ohms", WEIRSIDE, "-o", "ohms.pdf").code()).isZero();
    assertThat(
            Files.readString(
                folder.resolve("ohms.pdf"), java.nio.charset.StandardCharsets.ISO_8859_1))
        .startsWith("%PDF");
    assertThat(Run.in(folder, "ohms", WEIRSIDE, "-o", "ohms.txt").code()).isZero();
    assertThat(Files.readString(folder.resolve("ohms.txt")))
        .isEqualTo(Run.of("ohms", WEIRSIDE).out());
    Run wrong = Run.in(folder, "ohms", WEIRSIDE, "-o", "ohms.csv");
    assertThat(wrong.code()).isEqualTo(2);
    assertThat(folder.resolve("ohms.csv")).doesNotExist();
  }
}
