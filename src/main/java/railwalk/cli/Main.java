package railwalk.cli;

import java.io.BufferedOutputStream;
import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import picocli.CommandLine;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.UnmatchedArgumentException;
import railwalk.app.CannotDo;

/**
 * The program's door: command line in, exit code out. 0 is done, 1 is findings of error level from
 * {@code check}, 2 is could not do it. No stack trace ever reaches the person at the bench.
 */
public final class Main {
  static final int DONE = 0;
  static final int FOUND_ERRORS = 1;
  static final int COULD_NOT = 2;

  private Main() {}

  /** Runs the command line and ends the process with its exit code. */
  public static void main(String[] args) {
    PrintStream out = utf8(FileDescriptor.out);
    PrintStream err = utf8(FileDescriptor.err);
    int code = run(args, new Console(out, err, Path.of(""), Terminal.isWatched()));
    out.flush();
    err.flush();
    System.exit(code);
  }

  /** Runs the command line with output to the given streams and returns its exit code. */
  public static int run(String[] args, PrintStream out, PrintStream err) {
    return run(args, new Console(out, err, Path.of(""), false));
  }

  static int run(String[] args, Console console) {
    try {
      ParseResult given = CommandTree.build(args).parseArgs(args);
      while (given.hasSubcommand()) {
        given = given.subcommand();
      }
      CommandLine line = given.commandSpec().commandLine();
      if (given.isUsageHelpRequested()) {
        line.usage(console.out());
        return DONE;
      }
      if (given.isVersionHelpRequested()) {
        line.printVersionHelp(console.out());
        return DONE;
      }
      if (given.commandSpec().userObject() instanceof Command command) {
        return command.run(given, console);
      }
      console.err().println("railwalk: which command?");
      line.usage(console.err());
      return COULD_NOT;
    } catch (ParameterException misspelt) {
      return explain(misspelt, console.err());
    } catch (CannotDo refusal) {
      console.err().println("railwalk: " + refusal.lines().stripTrailing());
      return COULD_NOT;
    } catch (OutOfMemoryError | StackOverflowError tooBig) {
      console.err().println("railwalk: out of memory: the netlist is too large for this machine");
      return COULD_NOT;
    } catch (RuntimeException | LinkageError | AssertionError fault) {
      console.err().println("railwalk: internal fault " + oneLine(fault));
      return COULD_NOT;
    }
  }

  private static int explain(ParameterException misspelt, PrintStream err) {
    String command = misspelt.getCommandLine().getCommandSpec().qualifiedName();
    err.println(command + ": " + misspelt.getMessage());
    if (misspelt instanceof UnmatchedArgumentException unmatched
        && !unmatched.getSuggestions().isEmpty()) {
      err.println("did you mean " + unmatched.getSuggestions().get(0) + "?");
    }
    err.println("'" + command + " --help' lists what it takes");
    return COULD_NOT;
  }

  /** Returns what went wrong and where, short enough to read out over the telephone. */
  private static String oneLine(Throwable fault) {
    StackTraceElement[] trace = fault.getStackTrace();
    String place = trace.length == 0 ? "" : " at " + trace[0];
    String message = fault.getMessage() == null ? "" : ": " + fault.getMessage();
    return (fault.getClass().getSimpleName() + message + place).replaceAll("\\s+", " ");
  }

  private static PrintStream utf8(FileDescriptor descriptor) {
    return new PrintStream(
        new BufferedOutputStream(new FileOutputStream(descriptor)), false, StandardCharsets.UTF_8);
  }
}
