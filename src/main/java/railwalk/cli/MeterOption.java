package railwalk.cli;

import java.util.Optional;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;

/** The option that names the meter of this bench. */
final class MeterOption {
  private static final String NAME = "--meter";

  private MeterOption() {}

  static OptionSpec spec() {
    return OptionSpec.builder(NAME)
        .paramLabel("SPEC")
        .type(String.class)
        .description("Meter in place of the netlist's: 10M, or 20k/V, or \"20k/V 50 250 500\".")
        .build();
  }

  static Optional<String> given(ParseResult given) {
    return Optional.ofNullable(given.matchedOptionValue(NAME, null));
  }
}
