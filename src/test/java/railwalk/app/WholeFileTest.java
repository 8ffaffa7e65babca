package railwalk.app;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class WholeFileTest {
  private static final byte[] BYTES = "312 V".getBytes(StandardCharsets.UTF_8);

  @TempDir private Path folder;

  @Test
  void writesANewFileAndLeavesNothingBesideIt() throws Exception {
    WholeFile.write(folder.resolve("chart.txt"), BYTES);
    assertThat(folder.resolve("chart.txt")).hasBinaryContent(BYTES);
    assertThat(names()).containsExactly("chart.txt");
  }

  @Test
  void replacesWhatStoodThere() throws Exception {
    Path target = Files.writeString(folder.resolve("chart.txt"), "an older and longer chart");
    WholeFile.write(target, BYTES);
    assertThat(target).hasBinaryContent(BYTES);
    assertThat(names()).containsExactly("chart.txt");
  }

  @Test
  void writesThroughALink() throws Exception {
    Path target = Files.writeString(folder.resolve("chart.txt"), "old");
    Path link = Files.createSymbolicLink(folder.resolve("link.txt"), target);
    WholeFile.write(link, BYTES);
    assertThat(link).isSymbolicLink();
    assertThat(target).hasBinaryContent(BYTES);
  }

  @Test
  void refusesAFolder() {
    assertThatThrownBy(() -> WholeFile.write(folder, BYTES))
        .isInstanceOf(CannotDo.class)
        .hasMessage("cannot write " + folder + ": it is a folder");
  }

  @Test
  void refusesAMissingFolder() {
    Path target = folder.resolve("nowhere").resolve("chart.txt");
    assertThatThrownBy(() -> WholeFile.write(target, BYTES))
        .isInstanceOf(CannotDo.class)
        .hasMessage("cannot write %s: there is no folder %s", target, target.getParent());
  }

  /** A name longer than any file system takes fails while writing, not before. */
  @Test
  void leavesNoDraftBehindWhenWritingFails() throws Exception {
    Path target = folder.resolve("x".repeat(400));
    assertThatThrownBy(() -> WholeFile.write(target, BYTES))
        .isInstanceOf(CannotDo.class)
        .hasMessageStartingWith("cannot write " + target);
    assertThat(names()).isEmpty();
  }

  private List<String> names() throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(f -> f.getFileName().toString()).toList();
    }
  }
}
