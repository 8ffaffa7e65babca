package railwalk.device;

import java.util.Set;

/** Makes a section's law of a data file's fit and gas lines. One piece of {@link DataFile}. */
final class LawReader {
  private static final Set<String> CONSTANTS =
      Set.of(
          "section",
          "mu",
          "exponent",
          "kg",
          "kp",
          "kvb",
          "contact",
          "lambda",
          "knee",
          "screenshare",
          "screenrise",
          "gridperveance",
          "gridstart",
          "gridslope",
          "perveance",
          "drop");

  private final DataFile file;

  LawReader(DataFile file) {
    this.file = file;
  }

  /** Returns the law of the section that {@code line} declares. */
  SectionLaw law(DataLine line, String id, String word) {
    return switch (word) {
      case "triode" -> triode(fit(line, id, word));
      case "pentode", "beam" -> pentode(fit(line, id, word));
      case "regulator" -> gas(file.one("gas"));
      case "vapour" -> new VapourLaw(constant(fit(line, id, word), "drop"));
      default -> new RectifierLaw(constant(fit(line, id, word), "perveance"));
    };
  }

  private DataLine fit(DataLine section, String id, String word) {
    DataLine found = null;
    for (DataLine line : file.all("fit")) {
      line.allow(CONSTANTS);
      if (line.word(0).equals(word) && line.option("section", id).equals(id)) {
        if (found != null) {
          throw line.error("a second fit line for the same section", "");
        }
        found = line;
      }
    }
    if (found != null) {
      return found;
    }
    throw section.error("no fit line for this " + word + " section", "fit " + word + " …");
  }

  private static TriodeLaw triode(DataLine line) {
    return new TriodeLaw(
        constant(line, "mu"),
        constant(line, "exponent"),
        constant(line, "kg"),
        constant(line, "kp"),
        constant(line, "kvb"),
        line.required("contact"),
        grid(line));
  }

  private static PentodeLaw pentode(DataLine line) {
    return new PentodeLaw(
        constant(line, "mu"),
        constant(line, "exponent"),
        constant(line, "kg"),
        constant(line, "kp"),
        constant(line, "kvb"),
        line.required("contact"),
        constant(line, "lambda"),
        constant(line, "knee"),
        constant(line, "screenshare"),
        constant(line, "screenrise"),
        grid(line));
  }

  private static GridLaw grid(DataLine line) {
    return new GridLaw(
        constant(line, "gridperveance"), line.required("gridstart"), constant(line, "gridslope"));
  }

  private static double constant(DataLine line, String name) {
    double value = line.required(name);
    if (value <= 0) {
      throw line.error(
          name, "a constant of " + line.option(name, "") + " makes no sense", "above zero");
    }
    return value;
  }

  private static GasLaw gas(DataLine line) {
    line.allow(Set.of("strike", "operating", "minimum", "maximum", "regulation", "source"));
    double minimum = line.required("minimum");
    double maximum = line.required("maximum");
    return new GasLaw(
        line.required("strike"),
        line.required("operating"),
        (minimum + maximum) / 2,
        line.required("regulation") / (maximum - minimum),
        minimum,
        maximum);
  }
}
