package railwalk.netlist;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.source.FileBytes;
import railwalk.source.SourceText;

/**
 * Finds the files that a netlist includes: in its own folder and below, or lying directly in one of
 * its parent folders. What a link leads to counts, not where the link lies.
 */
final class Includes {
  private final @Nullable Path home;

  private Includes(@Nullable Path home) {
    this.home = home;
  }

  /** Returns the includes of text that stands alone: there are none. */
  static Includes none() {
    return new Includes(null);
  }

  /**
   * Returns the includes of the netlist at {@code file}.
   *
   * @throws IOException when its folder cannot be found
   */
  static Includes of(Path file) throws IOException {
    return new Includes(file.toRealPath().getParent());
  }

  /** What became of an include. */
  sealed interface Outcome {
    /** It was read. */
    record Found(SourceFile file) implements Outcome {}

    /** There is no such file, or text that stands alone asks for one. */
    record Missing() implements Outcome {}

    /** It lies, or a link leads, where a netlist may not reach. */
    record Refused() implements Outcome {}

    /** It cannot be read as text. */
    record Unreadable(String reason) implements Outcome {}
  }

  /** Returns what {@code written} leads to from the file {@code from}. */
  Outcome find(String written, SourceFile from) {
    Path folder = from.path() == null ? null : from.path().getParent();
    if (home == null || folder == null) {
      return new Outcome.Missing();
    }
    Path named;
    try {
      named = folder.resolve(written.replace('\\', '/')).normalize();
    } catch (InvalidPathException e) {
      return new Outcome.Unreadable("no file can have this name");
    }
    if (!isAllowed(named)) {
      return new Outcome.Refused();
    }
    try {
      if (!Files.exists(named)) {
        return new Outcome.Missing();
      }
      Path real = named.toRealPath();
      return isAllowed(real) ? read(written, real) : new Outcome.Refused();
    } catch (IOException e) {
      return new Outcome.Unreadable("it cannot be read");
    }
  }

  private boolean isAllowed(Path path) {
    Path parent = path.getParent();
    return home != null && parent != null && (path.startsWith(home) || home.startsWith(parent));
  }

  private static Outcome read(String written, Path real) throws IOException {
    if (!Files.isRegularFile(real)) {
      return new Outcome.Unreadable("it is not a file");
    }
    if (Files.size(real) > FileBytes.LARGEST_BYTES) {
      return new Outcome.Unreadable("it is far too large for a netlist");
    }
    byte[] bytes = Files.readAllBytes(real);
    String text = FileBytes.decode(bytes);
    Optional<String> kind = FileBytes.foreignKind(text);
    if (kind.isPresent()) {
      return new Outcome.Unreadable("it is " + kind.get());
    }
    String name = written.replace('\\', '/');
    return new Outcome.Found(new SourceFile(SourceText.of(name, text), real));
  }
}
