package railwalk.cli;

import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;
import railwalk.app.BenchPaper;
import railwalk.app.CannotDo;
import railwalk.app.ChartFormat;

/** Where pages for the bench go: to the screen, or with {@code -o} into a file. */
final class PaperOutput {
  private PaperOutput() {}

  static OptionSpec spec() {
    return OptionSpec.builder("-o", "--output")
        .paramLabel("FILE")
        .type(Path.class)
        .description("Write to this file: a PDF, or text where it ends in .txt.")
        .build();
  }

  /** Returns the option of commands that always print, and write a PDF beside that. */
  static OptionSpec besideScreen() {
    return OptionSpec.builder("-o", "--output")
        .paramLabel("FILE")
        .type(Path.class)
        .description("Write a PDF with curves to this file as well.")
        .build();
  }

  /** Refuses anything but a PDF before any work is done. */
  static void checkBesideScreen(ParseResult given) throws CannotDo {
    Optional<Path> output = output(given);
    if (output.isPresent() && !output.get().toString().toLowerCase(Locale.ROOT).endsWith(".pdf")) {
      throw new CannotDo("-o writes a PDF: " + output.get() + " does not end in .pdf");
    }
  }

  static void putBesideScreen(BenchPaper paper, ParseResult given, Console console)
      throws CannotDo {
    if (output(given).isPresent()) {
      put(paper, given, console);
    }
    console.out().print(paper.print());
  }

  /** Refuses a file of another kind before any work is done. */
  static void check(ParseResult given) throws CannotDo {
    Optional<Path> output = output(given);
    if (output.isPresent() && isOther(output.get())) {
      throw new CannotDo(
          "these pages are a PDF, or text where the name ends in .txt: " + output.get());
    }
  }

  static void put(BenchPaper paper, ParseResult given, Console console) throws CannotDo {
    Optional<Path> output = output(given);
    if (output.isEmpty()) {
      console.out().print(paper.print());
      return;
    }
    Path target = console.folder().resolve(output.get());
    ChartFormat format = isText(target) ? ChartFormat.TEXT : ChartFormat.PDF;
    paper.write(target, format, PaperOption.given(given));
    console.err().println("wrote " + target);
  }

  private static Optional<Path> output(ParseResult given) {
    return Optional.ofNullable(given.matchedOptionValue("-o", null));
  }

  private static boolean isOther(Path file) {
    String name = String.valueOf(file.getFileName()).toLowerCase(Locale.ROOT);
    return name.endsWith(".csv") || name.endsWith(".json");
  }

  private static boolean isText(Path file) {
    return String.valueOf(file.getFileName()).toLowerCase(Locale.ROOT).endsWith(".txt");
  }
}
