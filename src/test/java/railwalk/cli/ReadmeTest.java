package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

/** What the README shows must be what the program does. */
class ReadmeTest {
  private static final Pattern COMMAND = Pattern.compile("`railwalk ([a-z]+)");
  private static final Pattern BLOCK = Pattern.compile("```\n(.*?)```", Pattern.DOTALL);

  @Test
  void itsFirstNetlistIsTheOneThatIsTested() throws IOException {
    String netlist = Files.readString(Path.of("test-netlists", "amps", "first.cir"));
    List<String> blocks = BLOCK.matcher(readme()).results().map(match -> match.group(1)).toList();
    assertThat(blocks).contains(netlist);
  }

  @Test
  void itExplainsEveryCommandAndNoOther() throws IOException {
    List<String> named =
        COMMAND.matcher(readme()).results().map((MatchResult m) -> m.group(1)).distinct().toList();
    List<String> commands =
        CommandTree.build().getSubcommands().keySet().stream()
            .filter(command -> !command.equals("completion"))
            .toList();
    assertThat(named).containsExactlyInAnyOrderElementsOf(commands);
    assertThat(readme()).contains("railwalk completion");
  }

  private static String readme() throws IOException {
    return Files.readString(Path.of("README.md")).replace("\r\n", "\n");
  }
}
