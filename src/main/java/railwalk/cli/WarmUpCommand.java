package railwalk.cli;

import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.BenchConditions;
import railwalk.app.CannotDo;
import railwalk.app.WarmUpJob;
import railwalk.render.pdf.Paper;

/** Follows a netlist from switch-on. */
final class WarmUpCommand implements Command {
  @Override
  public String name() {
    return "warmup";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                CommandTree.argument("NETLIST", "1", "The amplifier as traced.", Path.class))
            .addOption(
                OptionSpec.builder("-o", "--output")
                    .paramLabel("FILE")
                    .type(Path.class)
                    .description("Write a PDF with curves to this file as well.")
                    .build())
            .addOption(LineOption.spec())
            .addOption(PaperOption.spec());
    spec.usageMessage()
        .description(
            "Follow the supply for a minute from switch-on, cold, in every state and hot: highest"
                + " volts and when, against the capacitors' ratings.");
    return spec;
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    Path netlist = given.matchedPositionalValue(0, Path.of(""));
    Optional<Path> output = Optional.ofNullable(given.matchedOptionValue("-o", null));
    if (output.isPresent() && !output.get().toString().toLowerCase(Locale.ROOT).endsWith(".pdf")) {
      throw new CannotDo("-o writes a PDF: " + output.get() + " does not end in .pdf");
    }
    Paper paper = PaperOption.given(given);
    BenchConditions conditions = new BenchConditions(LineOption.given(given), Optional.empty());
    WarmUpJob job =
        Progress.during(console, "warming up …", () -> WarmUpJob.of(netlist, conditions));
    if (output.isPresent()) {
      Path target = console.folder().resolve(output.get());
      job.write(target, paper);
      console.err().println("wrote " + target);
    }
    console.out().print(job.print());
    return Main.DONE;
  }
}
