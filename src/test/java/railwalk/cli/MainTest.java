package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class MainTest {
  @ParameterizedTest
  @ValueSource(strings = {"", "chart", "check", "walk", "tubes", "fit", "completion"})
  void everyCommandHasHelpAndVersion(String command) {
    Run help = Run.of((command + " --help").trim().split(" "));
    assertThat(help.code()).isZero();
    assertThat(help.out()).startsWith("Usage: railwalk").contains("--version");
    assertThat(help.err()).isEmpty();

    Run version = Run.of((command + " --version").trim().split(" "));
    assertThat(version.code()).isZero();
    assertThat(version.out()).startsWith("railwalk ");
    assertThat(version.err()).isEmpty();
  }

  @Test
  void asksForACommandWhenThereIsNone() {
    Run run = Run.of();
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.out()).isEmpty();
    assertThat(run.err()).startsWith("railwalk: which command?\nUsage: railwalk");
  }

  @Test
  void explainsAnUnknownOption() {
    Run run = Run.of("completion", "--colour");
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.out()).isEmpty();
    assertThat(run.err())
        .isEqualTo(
            """
            railwalk completion: Unknown option: '--colour'
            'railwalk completion --help' lists what it takes
            """);
  }

  @Test
  void offersTheNearestCommand() {
    Run run = Run.of("completoin");
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.err()).contains("did you mean completion?");
  }

  /** The script must be one that the shell itself accepts. */
  @Test
  void completionScriptIsGoodShell() throws Exception {
    Run run = Run.of("completion");
    assertThat(run.code()).isZero();
    assertThat(bashAccepts(run.out())).isTrue();
    assertThat(bashAccepts(run.out() + "\nif then")).isFalse();
  }

  private static boolean bashAccepts(String script) throws IOException, InterruptedException {
    Process bash = new ProcessBuilder("bash", "-n").redirectErrorStream(true).start();
    try (var toBash = bash.getOutputStream()) {
      toBash.write(script.getBytes(StandardCharsets.UTF_8));
    }
    bash.getInputStream().readAllBytes();
    return bash.waitFor() == 0;
  }
}
