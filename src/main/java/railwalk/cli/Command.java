package railwalk.cli;

import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.CannotDo;

/** One command: how it is spelled and what it does. The work itself is done in {@code app}. */
interface Command {
  /** Returns the word it is called by. */
  String name();

  /** Returns name, options and help text. */
  CommandSpec spec();

  /** Carries it out and returns the exit code. */
  int run(ParseResult given, Console console) throws CannotDo;
}
