package railwalk.cli;

import picocli.AutoComplete;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/** Prints a script that teaches bash or zsh to complete railwalk's commands and options. */
final class CompletionCommand implements Command {
  @Override
  public String name() {
    return "completion";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec = CommandTree.named(name(), this);
    spec.usageMessage()
        .description("Print a completion script for bash and zsh.")
        .footer("", "Load it with: source <(railwalk completion)");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) {
    console.out().print(AutoComplete.bash("railwalk", CommandTree.build()));
    return Main.DONE;
  }
}
