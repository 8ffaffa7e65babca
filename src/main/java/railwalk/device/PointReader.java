package railwalk.device;

import java.util.Map;
import java.util.Set;

/** Reads the {@code point} lines of a data file. One piece of {@link DataFile}. */
final class PointReader {
  private static final Set<String> OPTIONS =
      Set.of(
          "section",
          "plate",
          "screen",
          "grid",
          "cathode",
          "reference",
          "sharing",
          "load",
          "screenload",
          "connection",
          "current",
          "screencurrent",
          "cathodecurrent",
          "gm",
          "mu",
          "screenmu",
          "rp",
          "confidence",
          "provenance",
          "source",
          "of",
          "weight");

  /** How far mu, gm and rp may be from mu = gm · rp: the sheets round all three. */
  private static final double ROUNDING = 0.15;

  private final Map<String, String> sources;

  PointReader(Map<String, String> sources) {
    this.sources = sources;
  }

  PublishedPoint read(DataLine line) {
    line.allow(OPTIONS);
    PublishedPoint point =
        new PublishedPoint(line.option("section", ""), setup(line), figures(line), credit(line));
    PublishedPoint.Figures figures = point.published();
    if (Double.isNaN(figures.plateAmps()) && Double.isNaN(figures.cathodeAmps())) {
      throw line.error("the point has no current", "current=… or cathodecurrent=…");
    }
    double product = figures.gmSiemens() * figures.plateOhms();
    if (Math.abs(figures.mu() / product - 1) > ROUNDING) {
      throw line.error(
          "mu", "mu and gm · rp differ by more than 15 %", "one of the three is misread");
    }
    return point;
  }

  private static PublishedPoint.Setup setup(DataLine line) {
    return new PublishedPoint.Setup(
        line.required("plate"),
        line.figure("screen"),
        line.figure("grid", line.has("cathode") ? 0 : Double.NaN),
        line.figure("cathode", 0),
        reference(line),
        (int) line.figure("sharing", 1),
        line.figure("load", 0),
        line.figure("screenload", 0),
        line.option("connection", "").equals("triode"));
  }

  private static PublishedPoint.Figures figures(DataLine line) {
    return new PublishedPoint.Figures(
        line.figure("current"),
        line.figure("screencurrent"),
        line.figure("cathodecurrent"),
        line.figure("gm"),
        line.figure("mu"),
        line.figure("screenmu"),
        line.figure("rp"));
  }

  private PublishedPoint.Credit credit(DataLine line) {
    return new PublishedPoint.Credit(
        source(line),
        oneOf(line, "provenance", "transcription", "memory", "mixed"),
        oneOf(line, "confidence", "high", "medium"),
        line.option("of", ""),
        line.figure("weight", 1));
  }

  private static PublishedPoint.Reference reference(DataLine line) {
    return line.has("reference") && oneOf(line, "reference", "cathode", "supply").equals("supply")
        ? PublishedPoint.Reference.SUPPLY
        : PublishedPoint.Reference.CATHODE;
  }

  private String source(DataLine line) {
    String id = line.option("source", "");
    String text = sources.get(id);
    if (text == null) {
      throw line.error(
          "source", "the point's source is not listed", "source=… names a source line");
    }
    return text;
  }

  private static String oneOf(DataLine line, String option, String... allowed) {
    String value = line.option(option, "");
    if (!Set.of(allowed).contains(value)) {
      throw line.error(option, option + "= must be given", "one of " + String.join(", ", allowed));
    }
    return value;
  }
}
