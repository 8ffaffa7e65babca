package railwalk.cli;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;

/**
 * One run of the whole program in this process, as a shell would see it.
 *
 * @param code the exit code
 */
record Run(int code, String out, String err) {
  /** Runs {@code args} in the project's folder. */
  static Run of(String... args) {
    return in(Path.of(""), args);
  }

  /** Runs {@code args}; files without a path of their own land in {@code folder}. */
  static Run in(Path folder, String... args) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    Console console = new Console(stream(out), stream(err), folder, false);
    int code = Main.run(args, console);
    console.out().flush();
    console.err().flush();
    return new Run(
        code, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }

  private static PrintStream stream(ByteArrayOutputStream bytes) {
    return new PrintStream(bytes, false, StandardCharsets.UTF_8);
  }
}
