package railwalk.cli;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.Model.PositionalParamSpec;

/** All commands under the program's name. */
final class CommandTree {
  private static final List<Command> COMMANDS =
      List.of(
          new ChartCommand(),
          new CheckCommand(),
          new WalkCommand(),
          new CompareCommand(),
          new WhatIfCommand(),
          new BiasCommand(),
          new OhmsCommand(),
          new SettleCommand(),
          new WarmUpCommand(),
          new TubesCommand(),
          new FitCommand(),
          new CompletionCommand());

  private CommandTree() {}

  /**
   * Returns the parser for the whole command line; without the other commands where {@code words}
   * begin with the name of one, since laying out each takes its part of a cold start.
   */
  static CommandLine build(String... words) {
    String named = named(words);
    CommandSpec root = named("railwalk", null);
    root.usageMessage()
        .description(
            "Works out the DC voltages of a valve amplifier from its traced netlist and prints"
                + " them as a chart for the bench.")
        .footer(
            "",
            "Exit codes: 0 done, 1 check found errors or compare a fault, 2 could not do it.",
            "High voltage kills. No small number in a chart makes a point safe to touch.");
    for (Command command : COMMANDS) {
      if (named.isEmpty() || command.name().equals(named)) {
        CommandSpec spec = command.spec();
        root.addSubcommand(spec.name(), spec);
      }
    }
    return new CommandLine(root);
  }

  /** Returns the first word where it is a command's name; empty for any other. */
  private static String named(String[] words) {
    for (Command command : COMMANDS) {
      if (words.length > 0 && command.name().equals(words[0])) {
        return words[0];
      }
    }
    return "";
  }

  /** Returns a command's bare spec: its name, --help and --version. */
  static CommandSpec named(String name, @Nullable Command command) {
    return bare(command)
        .name(name)
        .version("railwalk " + version())
        .addOption(
            OptionSpec.builder("-h", "--help")
                .usageHelp(true)
                .description("Print this help and stop.")
                .build())
        .addOption(
            OptionSpec.builder("-V", "--version")
                .versionHelp(true)
                .description("Print the version and stop.")
                .build());
  }

  /** Returns a command's only argument. */
  static PositionalParamSpec argument(
      String label, String arity, String description, Class<?> type) {
    return PositionalParamSpec.builder()
        .paramLabel(label)
        .index("0")
        .arity(arity)
        .required(!arity.startsWith("0"))
        .type(type)
        .description(description)
        .build();
  }

  private static CommandSpec bare(@Nullable Command command) {
    return command == null ? CommandSpec.create() : CommandSpec.wrapWithoutInspection(command);
  }

  private static String version() {
    return Optional.ofNullable(Main.class.getPackage().getImplementationVersion())
        .orElse("(not packaged)");
  }
}
