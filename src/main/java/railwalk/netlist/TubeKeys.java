package railwalk.netlist;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.device.ElectrodeNames;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;
import railwalk.units.Measure;

/** The {@code key=value} words of a {@code .tube} line, sorted by the data-file line they go to. */
final class TubeKeys {
  /** What a section may be called, with its kind. */
  static final Map<String, SectionKind> KINDS = new LinkedHashMap<>();

  private static final String USUAL =
      "like base kind heater, pins (1=plate), points (plate screen grid cathode current gm mu rp),"
          + " limits (maxplate platewatts)";

  private static final Map<String, Key> KEYS = new LinkedHashMap<>();

  static {
    KINDS.put("triode", SectionKind.TRIODE);
    KINDS.put("pentode", SectionKind.PENTODE);
    KINDS.put("beam", SectionKind.PENTODE);
    KINDS.put("rectifier", SectionKind.RECTIFIER);
    KINDS.put("vapour", SectionKind.RECTIFIER);
    KINDS.put("regulator", SectionKind.REGULATOR);
    for (String word : List.of("like", "base", "heater", "spread", "system")) {
      key(word, Group.TYPE, null);
    }
    KEYS.put("kind", new Key("kind", Group.TYPE, null, List.copyOf(KINDS.keySet())));
    for (String volts : List.of("plate", "screen", "grid")) {
      key(volts, Group.POINT, Measure.VOLTAGE);
    }
    for (String amps : List.of("current", "screencurrent", "cathodecurrent")) {
      key(amps, Group.POINT, Measure.CURRENT);
    }
    for (String ohms : List.of("cathode", "load", "screenload", "rp")) {
      key(ohms, Group.POINT, Measure.RESISTANCE);
    }
    key("gm", Group.POINT, Measure.CONDUCTANCE);
    key("mu", Group.POINT, Measure.NUMBER);
    key("screenmu", Group.POINT, Measure.NUMBER);
    key("section", Group.POINT, null);
    KEYS.put("connection", new Key("connection", Group.POINT, null, List.of("triode")));
    KEYS.put("reference", new Key("reference", Group.POINT, null, List.of("cathode", "supply")));
    for (String volts : List.of("heatercathode", "heatertap", "inverse", "rms")) {
      key(volts, Group.RATING, Measure.VOLTAGE);
    }
    key("platewatts", Group.RATING, Measure.POWER);
    key("screenwatts", Group.RATING, Measure.POWER);
    key("gridleak", Group.RATING, Measure.RESISTANCE);
    key("gridleakfixed", Group.RATING, Measure.RESISTANCE);
    key("peak", Group.RATING, Measure.CURRENT);
    key("dc", Group.RATING, Measure.CURRENT);
    key("capacitor", Group.RATING, Measure.CAPACITANCE);
    KEYS.put("maxplate", new Key("plate", Group.RATING, Measure.VOLTAGE, List.of()));
    KEYS.put("maxscreen", new Key("screen", Group.RATING, Measure.VOLTAGE, List.of()));
    KEYS.put("maxcathode", new Key("cathodecurrent", Group.RATING, Measure.CURRENT, List.of()));
    for (String volts : List.of("strike", "operating", "regulation")) {
      key(volts, Group.GAS, Measure.VOLTAGE);
    }
    key("minimum", Group.GAS, Measure.CURRENT);
    key("maximum", Group.GAS, Measure.CURRENT);
  }

  /** The data-file line that a key goes to. */
  private enum Group {
    TYPE,
    POINT,
    RATING,
    GAS
  }

  /**
   * One key.
   *
   * @param name what the data file calls it
   * @param measure what it measures; null when it is a word
   * @param words the words that may stand there; none when any may
   */
  record Key(String name, Group group, @Nullable Measure measure, List<String> words) {}

  /** An amount as the data file wants it, and where it was given. */
  record Given(String amount, SourceSpan span) {}

  private final Map<String, Field.Option> words = new HashMap<>();
  private final List<Field.Option> pins = new ArrayList<>();
  private final List<Map<String, Given>> points = new ArrayList<>();
  private final Map<String, Given> ratings = new LinkedHashMap<>();
  private final Map<String, Given> gas = new LinkedHashMap<>();

  private static void key(String name, Group group, @Nullable Measure measure) {
    KEYS.put(name, new Key(name, group, measure, List.of()));
  }

  /** Returns whether sections of {@code kind} amplify. */
  static boolean amplifies(String kind) {
    SectionKind known = KINDS.get(kind);
    return known == SectionKind.TRIODE || known == SectionKind.PENTODE;
  }

  /** Sorts {@code option} in; what is wrong with it is reported to {@code line}. */
  void take(Field.Option option, TubeLine line) {
    Word word = option.key();
    String written = word.text().toLowerCase(Locale.ROOT);
    if (ElectrodeNames.pin(written).isPresent()) {
      pin(option, line);
      return;
    }
    Key key = KEYS.get(written.equals("anode") ? "plate" : written);
    if (key == null) {
      String near = NearNames.hint(written, KEYS.keySet());
      line.refuse(Problem.TUBE_KEY, word.span(), word.text() + "=", near.isEmpty() ? USUAL : near);
      return;
    }
    if (key.group() == Group.TYPE && !written.equals("kind")) {
      once(words.put(written, option), option, line);
      return;
    }
    String amount = line.amount(option, key);
    if (amount == null) {
      return;
    }
    Given given = new Given(amount, TubeLine.span(option));
    switch (key.group()) {
      case POINT -> {
        if (points.isEmpty() || points.get(points.size() - 1).containsKey(key.name())) {
          points.add(new LinkedHashMap<>());
        }
        points.get(points.size() - 1).put(key.name(), given);
      }
      case RATING -> once(ratings.put(key.name(), given), option, line);
      case GAS -> once(gas.put(key.name(), given), option, line);
      case TYPE -> once(words.put(written, option), option, line);
    }
  }

  private static void once(@Nullable Object before, Field.Option option, TubeLine line) {
    if (before != null) {
      line.refuse(Problem.TUBE_KEY_TWICE, option.key().span(), option.key().text() + "=");
    }
  }

  private void pin(Field.Option option, TubeLine line) {
    String word = option.key().text();
    for (Field.Option other : pins) {
      if (other.key().text().equalsIgnoreCase(word)) {
        line.refuse(Problem.TUBE_KEY_TWICE, option.key().span(), "pin " + word);
        return;
      }
    }
    pins.add(option);
  }

  /** Returns the word given for {@code key}; null without one. */
  Field.@Nullable Option word(String key) {
    return words.get(key);
  }

  /** Returns the pins, in the line's order. */
  List<Field.Option> pins() {
    return pins;
  }

  /** Returns the points, each by its keys. */
  List<Map<String, Given>> points() {
    return points;
  }

  Map<String, Given> ratings() {
    return ratings;
  }

  Map<String, Given> gas() {
    return gas;
  }

  /** Returns the limits of a section by the data file's words; none of none. */
  static Map<String, Double> limits(@Nullable SectionType section) {
    Map<String, Double> limits = new LinkedHashMap<>();
    if (section != null) {
      limits.put("plate", section.ratings().plateVoltsMax());
      limits.put("screen", section.ratings().screenVoltsMax());
      limits.put("platewatts", section.ratings().plateWattsMax());
      limits.put("screenwatts", section.ratings().screenWattsMax());
      limits.put("cathodecurrent", section.ratings().cathodeAmpsMax());
      limits.put("heatercathode", section.ratings().heaterCathodeVoltsMax());
      limits.put("gridleak", section.ratings().gridLeakCathodeBiasOhmsMax());
      limits.put("gridleakfixed", section.ratings().gridLeakFixedBiasOhmsMax());
      limits.put("inverse", section.rectifierRatings().peakInverseVoltsMax());
      limits.put("peak", section.rectifierRatings().peakPlateAmpsMax());
      limits.put("dc", section.rectifierRatings().dcAmpsMax());
      limits.put("capacitor", section.rectifierRatings().firstCapacitorFaradsMax());
      limits.put("rms", section.rectifierRatings().plateRmsVoltsMax());
    }
    return limits;
  }
}
