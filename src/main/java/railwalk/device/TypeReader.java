package railwalk.device;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
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
    return new TubeType(
        file.name(),
        file.all("alias").stream().flatMap(line -> line.words().stream()).toList(),
        file.one("summary").rest(0),
        base.word(0),
        base.word(1),
        heater(),
        sections,
        pins(sections));
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
              amplifies ? ratings(id) : Ratings.NONE,
              kind == SectionKind.RECTIFIER ? rectifierRatings(id) : RectifierRatings.NONE,
              spread(amplifies, 0),
              spread(amplifies, 1)));
    }
    return sections;
  }

  /** Returns a limit of the spread; NaN for kinds that have none. */
  private double spread(boolean amplifies, int index) {
    if (!amplifies) {
      return Double.NaN;
    }
    DataLine line = file.one("spread");
    line.allow(Set.of("source"));
    return line.figure(index);
  }

  private static SectionKind kind(DataLine line, String word) {
    return switch (word) {
      case "triode" -> SectionKind.TRIODE;
      case "pentode", "beam" -> SectionKind.PENTODE;
      case "rectifier" -> SectionKind.RECTIFIER;
      case "regulator" -> SectionKind.REGULATOR;
      case "diode" -> SectionKind.DIODE;
      default ->
          throw line.error(
              "no such kind of section: " + word,
              "one of triode, pentode, beam, rectifier, regulator, diode");
    };
  }

  private Heater heater() {
    List<Heater.Connection> connections = new ArrayList<>();
    double tapVolts = Double.NaN;
    boolean direct = false;
    boolean joined = false;
    for (DataLine line : file.all("heater")) {
      line.allow(Set.of("tap"));
      connections.add(new Heater.Connection(line.figure(0), line.figure(1)));
      tapVolts = line.figure("tap", tapVolts);
      for (int i = 2; i < line.size(); i++) {
        switch (line.word(i)) {
          case "direct" -> direct = true;
          case "joined" -> joined = true;
          default -> throw line.error(i, "unknown word " + line.word(i), "direct or joined");
        }
      }
    }
    return new Heater(connections, tapVolts, direct, joined);
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
    DataLine found = null;
    for (DataLine line : file.all("rating")) {
      line.allow(RATINGS);
      if (!line.has("system")) {
        throw line.error("the rating system is missing", "system=design-centre and the like");
      }
      if (line.option("section", id).equals(id)) {
        if (found != null) {
          throw line.error("a second rating for the same section", "");
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

  private SortedMap<Integer, PinUse> pins(List<SectionType> sections) {
    SortedMap<Integer, PinUse> pins = new TreeMap<>();
    for (DataLine line : file.all("pin")) {
      line.allow(Set.of());
      int number = (int) line.figure(0);
      String id = line.size() > 2 ? line.word(1) : "";
      if (sections.stream().noneMatch(s -> id.isEmpty() || s.id().equals(id))) {
        throw line.error(1, "no section " + id, "");
      }
      PinUse use = pinUse(line, id, line.word(line.size() > 2 ? 2 : 1));
      if (pins.put(number, use) != null) {
        throw line.error(0, "pin " + number + " stands twice", "");
      }
    }
    return pins;
  }

  private static final Map<String, PinUse.Role> ROLES =
      Map.of(
          "empty", PinUse.Role.EMPTY,
          "internal", PinUse.Role.INTERNAL,
          "shield", PinUse.Role.SHIELD,
          "sleeve", PinUse.Role.SLEEVE);

  private static PinUse pinUse(DataLine line, String id, String word) {
    PinUse.Role role = ROLES.get(word);
    if (role != null) {
      return new PinUse(role, id, null);
    }
    for (Electrode electrode : Electrode.values()) {
      if (electrode.word().equals(word.toLowerCase(Locale.ROOT))) {
        return new PinUse(PinUse.Role.ELECTRODE, id, electrode);
      }
    }
    throw line.error("no electrode is called " + word, "plate, screen, grid, cathode, heater1 …");
  }
}
