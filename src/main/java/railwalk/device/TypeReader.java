package railwalk.device;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import org.jspecify.annotations.Nullable;

/** Makes a {@link TubeType} of a data file's lines. One piece of {@link DataFile}. */
final class TypeReader {
  private static final Set<String> RATINGS =
      Set.of(
          "section",
          "source",
          "system",
          "plate",
          "screen",
          "platewatts",
          "screenwatts",
          "cathodecurrent",
          "heatercathode",
          "gridleak",
          "gridleakfixed",
          "inverse",
          "peak",
          "dc",
          "capacitor",
          "rms");

  private final DataFile file;

  TypeReader(DataFile file) {
    this.file = file;
  }

  TubeType read() {
    List<SectionType> sections = sections();
    DataLine base = file.one("base");
    base.allow(Set.of("source"));
    SortedMap<Integer, PinUse> pins = new PinReader(file, sections).pins();
    new FigureCheck(file).check();
    return new TubeType(
        file.name(),
        file.all("alias").stream().flatMap(line -> line.words().stream()).toList(),
        file.one("summary").rest(0),
        base.word(0),
        base.word(1),
        heater(),
        sections,
        pins,
        care(pins));
  }

  private TubeType.Care care(SortedMap<Integer, PinUse> pins) {
    List<List<Integer>> straps = new ArrayList<>();
    for (DataLine line : file.all("strap")) {
      List<Integer> strap = new ArrayList<>();
      for (int i = 0; i < line.size(); i++) {
        int pin = (int) line.figure(i);
        if (!pins.containsKey(pin)) {
          throw line.error(i, "pin " + pin + " leads nowhere", "");
        }
        strap.add(pin);
      }
      straps.add(List.copyOf(strap));
    }
    List<TubeType.LookAlike> lookAlikes = new ArrayList<>();
    for (DataLine line : file.all("unlike")) {
      lookAlikes.add(new TubeType.LookAlike(line.word(0), line.rest(1)));
    }
    List<String> cautions = new ArrayList<>();
    for (DataLine line : file.all("caution")) {
      cautions.add(line.rest(0));
    }
    return cautions.isEmpty() && straps.isEmpty() && lookAlikes.isEmpty()
        ? TubeType.Care.NONE
        : new TubeType.Care(cautions, straps, lookAlikes);
  }

  private List<SectionType> sections() {
    LawReader laws = new LawReader(file);
    List<SectionType> sections = new ArrayList<>();
    file.one("section");
    for (DataLine line : file.all("section")) {
      line.allow(Set.of());
      String id = line.size() > 1 ? line.word(0) : "";
      String word = line.word(line.size() > 1 ? 1 : 0);
      SectionKind kind = kind(line, word);
      if (sections.stream().anyMatch(s -> s.id().equals(id))) {
        throw line.error("section " + id + " stands twice", "");
      }
      boolean amplifies = kind == SectionKind.TRIODE || kind == SectionKind.PENTODE;
      sections.add(
          new SectionType(
              id,
              kind,
              laws.law(line, id, word),
              amplifies || kind == SectionKind.RECTIFIER ? ratings(id) : Ratings.NONE,
              kind == SectionKind.RECTIFIER ? rectifierRatings(id) : RectifierRatings.NONE,
              amplifies ? spread(id).figure(0) : Double.NaN,
              amplifies ? spread(id).figure(1) : Double.NaN));
    }
    return sections;
  }

  private DataLine spread(String id) {
    DataLine line = only("spread", id);
    if (line == null) {
      throw file.one("type").error("the file has no spread line" + of(id), "spread 0.70 1.30");
    }
    line.allow(Set.of("section", "source"));
    if (!(line.figure(0) > 0 && line.figure(0) < 1 && line.figure(1) > 1)) {
      throw line.error("the spread does not straddle 1", "shares of the current: 0.70 1.30");
    }
    return line;
  }

  private static String of(String id) {
    return id.isEmpty() ? "" : " for section " + id;
  }

  private static SectionKind kind(DataLine line, String word) {
    return switch (word) {
      case "triode" -> SectionKind.TRIODE;
      case "pentode", "beam" -> SectionKind.PENTODE;
      case "rectifier", "vapour" -> SectionKind.RECTIFIER;
      case "regulator" -> SectionKind.REGULATOR;
      case "diode" -> SectionKind.DIODE;
      default ->
          throw line.error(
              "no such kind of section: " + word,
              "one of triode, pentode, beam, rectifier, vapour, regulator, diode");
    };
  }

  private Heater heater() {
    List<Heater.Connection> connections = new ArrayList<>();
    double tapVolts = Double.NaN;
    boolean direct = false;
    boolean joined = false;
    boolean slow = false;
    double warmUpSeconds = Double.NaN;
    for (DataLine line : file.all("heater")) {
      line.allow(Set.of("tap", "warmup", "source"));
      connections.add(new Heater.Connection(line.figure(0), line.figure(1)));
      tapVolts = line.figure("tap", tapVolts);
      if (line.has("warmup")) {
        warmUpSeconds = positive(line, "warmup");
      }
      for (int i = 2; i < line.size(); i++) {
        switch (line.word(i)) {
          case "direct" -> direct = true;
          case "joined" -> joined = true;
          case "slow" -> slow = true;
          default -> throw line.error(i, "unknown word " + line.word(i), "direct, joined or slow");
        }
      }
    }
    return new Heater(connections, tapVolts, direct, joined, slow, warmUpSeconds);
  }

  private Ratings ratings(String id) {
    DataLine line = rating(id);
    if (line == null) {
      return Ratings.NONE;
    }
    return new Ratings(
        line.option("system", ""),
        positive(line, "plate"),
        positive(line, "screen"),
        positive(line, "platewatts"),
        positive(line, "screenwatts"),
        positive(line, "cathodecurrent"),
        positive(line, "heatercathode"),
        positive(line, "gridleak"),
        positive(line, "gridleakfixed"));
  }

  private RectifierRatings rectifierRatings(String id) {
    DataLine line = rating(id);
    if (line == null) {
      return RectifierRatings.NONE;
    }
    return new RectifierRatings(
        positive(line, "inverse"),
        positive(line, "peak"),
        positive(line, "dc"),
        positive(line, "capacitor"),
        positive(line, "rms"));
  }

  private @Nullable DataLine rating(String id) {
    for (DataLine line : file.all("rating")) {
      line.allow(RATINGS);
      if (!line.has("system")) {
        throw line.error("the rating system is missing", "system=design-centre and the like");
      }
    }
    return only("rating", id);
  }

  /** Returns the line with {@code key} that speaks of section {@code id}; null without one. */
  private @Nullable DataLine only(String key, String id) {
    DataLine found = null;
    for (DataLine line : file.all(key)) {
      if (line.option("section", id).equals(id)) {
        if (found != null) {
          throw line.error("a second " + key + " for the same section", "");
        }
        found = line;
      }
    }
    return found;
  }

  private static double positive(DataLine line, String name) {
    double value = line.figure(name);
    if (value <= 0) {
      throw line.error(name, "a limit of " + line.option(name, "") + " makes no sense", "");
    }
    return value;
  }
}
