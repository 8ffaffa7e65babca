package railwalk.cli;

import java.util.Optional;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;

/** The option that names the line volts of this bench. */
final class LineOption {
  private static final String NAME = "--line";

  private LineOption() {}

  static OptionSpec spec() {
    return OptionSpec.builder(NAME)
        .paramLabel("VOLTS")
        .type(String.class)
        .description("Line volts in place of the netlist's.")
        .build();
  }

  static Optional<String> given(ParseResult given) {
    return Optional.ofNullable(given.matchedOptionValue(NAME, null));
  }
}
