package railwalk.device;

import java.util.List;
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
  private final List<LikeSections> groups;

  PointReader(Map<String, String> sources, DataFile file) {
    this.sources = sources;
    this.groups = file.likeSections();
  }

  PublishedPoint read(DataLine line) {
    line.allow(OPTIONS);
    LikeSections group = group(line);
    PublishedPoint point =
        new PublishedPoint(line.option("section", ""), setup(line), figures(line), credit(line));
    PublishedPoint.Figures figures = point.published();
    if (Double.isNaN(figures.plateAmps()) && Double.isNaN(figures.cathodeAmps())) {
      throw line.error("the point has no current", "current=… or cathodecurrent=…");
    }
    check(line, group.kind(), point.setup());
    double product = figures.gmSiemens() * figures.plateOhms();
    if (Math.abs(figures.mu() / product - 1) > ROUNDING) {
      throw line.error(
          "mu", "mu and gm · rp differ by more than 15 %", "one of the three is misread");
    }
    return point;
  }

  /** Returns the sections that the point speaks of. */
  private LikeSections group(DataLine line) {
    if (groups.isEmpty()) {
      throw line.error("a regulator has no points", "gas strike=… operating=…");
    }
    if (!line.has("section")) {
      if (groups.stream().filter(LikeSections::amplify).count() > 1) {
        throw line.error("the type has unlike sections: which one is meant?", "section=…");
      }
      return groups.get(0);
    }
    String id = line.option("section", "");
    for (LikeSections group : groups) {
      if (group.ids().contains(id)) {
        return group;
      }
    }
    throw line.error("section", "no section " + id, "");
  }

  /** Complains about volts that such a section has no electrode for, and about missing ones. */
  private static void check(DataLine line, String kind, PublishedPoint.Setup setup) {
    boolean hasScreen = kind.equals("pentode") || kind.equals("beam");
    boolean hasGrid = hasScreen || kind.equals("triode");
    if (!hasScreen) {
      for (String odd : List.of("screen", "screencurrent", "screenmu", "screenload")) {
        if (line.has(odd)) {
          throw line.error(odd, "a " + kind + " has no screen", "");
        }
      }
    } else if (setup.triodeConnected() == line.has("screen")) {
      throw line.error(
          setup.triodeConnected()
              ? "the screen is joined to the plate and has no volts of its own"
              : "the screen volts are missing",
          "screen=…, or connection=triode");
    }
    if (hasGrid && Double.isNaN(setup.gridVolts())) {
      throw line.error("neither grid volts nor a cathode resistor", "grid=… or cathode=…");
    }
    if (!(setup.plateVolts() > 0)) {
      throw line.error("plate", "plate volts of " + line.option("plate", "") + " draw nothing", "");
    }
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
