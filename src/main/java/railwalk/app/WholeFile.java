package railwalk.app;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/**
 * Writes a file whole or not at all: the bytes go to a file beside it, which then takes its place
 * in one step. A reader sees the old file or the new one, never half of either.
 */
final class WholeFile {
  private WholeFile() {}

  /**
   * Writes {@code bytes} to {@code target}, over what stood there. A link keeps pointing where it
   * did; what is no ordinary file, such as a pipe, is written to as it stands.
   */
  static void write(Path target, byte[] bytes) throws CannotDo {
    Path folder = target.toAbsolutePath().getParent();
    if (folder == null || Files.isDirectory(target)) {
      throw new CannotDo("cannot write " + target + ": it is a folder");
    }
    if (!Files.isDirectory(folder)) {
      throw new CannotDo("cannot write " + target + ": there is no folder " + folder);
    }
    if (Files.exists(target) && !Files.isWritable(target)) {
      throw new CannotDo("cannot write " + target + ": it is write-protected");
    }
    try {
      if (!Files.exists(target)) {
        replace(target.toAbsolutePath(), bytes);
      } else if (Files.isRegularFile(target)) {
        replace(target.toRealPath(), bytes);
      } else {
        Files.write(target, bytes);
      }
    } catch (IOException failure) {
      throw new CannotDo("cannot write " + target + ": " + reason(failure));
    }
  }

  private static void replace(Path target, byte[] bytes) throws IOException {
    String draftName = "." + target.getFileName() + "." + ProcessHandle.current().pid() + ".part";
    Path draft = target.resolveSibling(draftName);
    try {
      Files.write(draft, bytes);
      move(draft, target);
    } finally {
      Files.deleteIfExists(draft);
    }
  }

  private static void move(Path draft, Path target) throws IOException {
    try {
      Files.move(draft, target, StandardCopyOption.ATOMIC_MOVE);
    } catch (AtomicMoveNotSupportedException unsupported) {
      Files.move(draft, target, StandardCopyOption.REPLACE_EXISTING);
    }
  }

  /** Returns why the system refused, in a few words. */
  static String reason(IOException failure) {
    if (failure instanceof NoSuchFileException) {
      return "no such file";
    }
    if (failure instanceof AccessDeniedException) {
      return "permission denied";
    }
    if (failure instanceof FileSystemException refused && refused.getReason() != null) {
      return refused.getReason();
    }
    String message = failure.getMessage();
    return message == null ? failure.getClass().getSimpleName() : message;
  }
}
