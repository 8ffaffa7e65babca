package railwalk.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.Model.PositionalParamSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.CannotDo;
import railwalk.app.SocketJob;
import railwalk.app.TubeFilter;
import railwalk.app.TubesJob;
import railwalk.render.pdf.Paper;

/** Lists the tube types, shows some, or prints their pages. */
final class TubesCommand implements Command {
  @Override
  public String name() {
    return "tubes";
  }

  @Override
  public CommandSpec spec() {
    CommandSpec spec =
        CommandTree.named(name(), this)
            .addPositional(
                PositionalParamSpec.builder()
                    .paramLabel("TYPE")
                    .index("0..*")
                    .arity("0..*")
                    .type(List.class)
                    .auxiliaryTypes(String.class)
                    .description("Types by any of their names.")
                    .build())
            .addOption(
                text("--base", "BASE", "List types of this base (9A) or socket (noval, octal)."))
            .addOption(
                text(
                    "--heater",
                    "HEATER",
                    "List types with this heater: 6.3V, 0.3A, \"6.3V 0.3A\"."))
            .addOption(
                OptionSpec.builder("--kind")
                    .paramLabel("KIND")
                    .type(String.class)
                    .completionCandidates(TubeFilter.KINDS)
                    .description(
                        "List types with such a section: "
                            + String.join(", ", TubeFilter.KINDS)
                            + ".")
                    .build())
            .addOption(
                OptionSpec.builder("--in")
                    .paramLabel("NETLIST")
                    .type(Path.class)
                    .description(
                        "Show how this amplifier idles with each of the types that could stand in.")
                    .build())
            .addOption(
                OptionSpec.builder("--socket")
                    .paramLabel("NETLIST")
                    .type(Path.class)
                    .description(
                        "List types that go with the wires of a socket in this amplifier: name the"
                            + " tube (V2), or the wires (1=p1 2=g1 3=k1), in place of a type.")
                    .build())
            .addOption(
                OptionSpec.builder("-o", "--output")
                    .paramLabel("FILE")
                    .type(Path.class)
                    .description("Write the type's page to this PDF.")
                    .build())
            .addOption(
                OptionSpec.builder("--all")
                    .paramLabel("FOLDER")
                    .type(Path.class)
                    .description(
                        "Write the pages of all types, or of those listed, to this folder.")
                    .build())
            .addOption(PaperOption.spec());
    spec.usageMessage()
        .description(
            "List the tube types, or show some with their pins, limits and how well their laws meet"
                + " the published figures, or print their pages with base, curves and published"
                + " points.");
    return spec;
  }

  private static OptionSpec text(String name, String label, String description) {
    return OptionSpec.builder(name)
        .paramLabel(label)
        .type(String.class)
        .description(description)
        .build();
  }

  @Override
  public int run(ParseResult given, Console console) throws CannotDo {
    List<String> types = given.matchedPositionalValue(0, List.of());
    Optional<Path> output = Optional.ofNullable(given.matchedOptionValue("-o", null));
    Optional<Path> netlist = Optional.ofNullable(given.matchedOptionValue("--in", null));
    Optional<Path> all = Optional.ofNullable(given.matchedOptionValue("--all", null));
    TubeFilter filter =
        new TubeFilter(
            Optional.ofNullable(given.matchedOptionValue("--base", null)),
            Optional.ofNullable(given.matchedOptionValue("--heater", null)),
            Optional.ofNullable(given.matchedOptionValue("--kind", null)));
    Optional<Path> socket = Optional.ofNullable(given.matchedOptionValue("--socket", null));
    boolean filtered =
        filter.base().isPresent() || filter.heater().isPresent() || filter.kind().isPresent();
    if (socket.isPresent()) {
      if (all.isPresent() || output.isPresent() || netlist.isPresent()) {
        throw new CannotDo("--socket makes a list: leave out --in, --all and -o");
      }
      Progress.Job<String> search = () -> SocketJob.of(socket.get(), types, filter);
      console.out().print(Progress.during(console, "solving …", search));
      return Main.DONE;
    }
    if (!types.isEmpty() && (filtered || all.isPresent())) {
      throw new CannotDo(
          "either name types, or list them with --base, --heater, --kind, or print all with --all");
    }
    if (netlist.isPresent() && (types.isEmpty() || output.isPresent())) {
      throw new CannotDo("--in goes with the name of a type to replace, and without -o");
    }
    Paper paper = PaperOption.given(given);
    if (all.isPresent()) {
      if (output.isPresent()) {
        throw new CannotDo("--all names the folder itself: leave out -o");
      }
      writeAll(filter, console.folder().resolve(all.get()), paper, console);
    } else if (output.isPresent()) {
      write(types, console.folder().resolve(output.get()), paper, console);
    } else if (types.isEmpty()) {
      console.out().print(TubesJob.list(filter));
    } else {
      for (String type : types) {
        console
            .out()
            .print(Progress.during(console, "solving …", () -> TubesJob.show(type, netlist)));
      }
    }
    return Main.DONE;
  }

  private static void write(List<String> types, Path target, Paper paper, Console console)
      throws CannotDo {
    if (types.isEmpty()) {
      throw new CannotDo("-o needs a type; --all FOLDER writes the pages of all");
    }
    if (types.size() > 1) {
      throw new CannotDo("-o takes the page of one type; --all FOLDER writes the pages of all");
    }
    Progress.during(
        console,
        "drawing …",
        () -> {
          TubesJob.write(types.get(0), target, paper);
          return target;
        });
    console.err().println("wrote " + target);
  }

  private static void writeAll(TubeFilter filter, Path folder, Paper paper, Console console)
      throws CannotDo {
    ProgressLine line = new ProgressLine(console);
    try {
      int count = TubesJob.writeAll(filter, folder, paper, line::show);
      line.end();
      console.err().println("wrote " + count + " pages to " + folder);
    } finally {
      line.end();
    }
  }
}
