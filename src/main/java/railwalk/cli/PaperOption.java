package railwalk.cli;

import java.util.List;
import java.util.Locale;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.TypeConversionException;
import railwalk.render.pdf.Paper;

/** The option that names the size of paper. */
final class PaperOption {
  private static final String NAME = "--paper";
  private static final List<String> SIZES = List.of("a4", "letter");

  private PaperOption() {}

  static OptionSpec spec() {
    return OptionSpec.builder(NAME)
        .paramLabel("SIZE")
        .type(Paper.class)
        .converters(PaperOption::paper)
        .completionCandidates(SIZES)
        .description("a4 (used when nothing is said) or letter.")
        .build();
  }

  static Paper given(ParseResult given) {
    return given.matchedOptionValue(NAME, Paper.A4);
  }

  private static Paper paper(String word) {
    return switch (SIZES.indexOf(word.toLowerCase(Locale.ROOT))) {
      case 0 -> Paper.A4;
      case 1 -> Paper.LETTER;
      default -> throw new TypeConversionException("expected one of " + String.join(", ", SIZES));
    };
  }
}
