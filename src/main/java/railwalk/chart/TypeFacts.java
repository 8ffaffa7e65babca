package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.DoubleFunction;
import java.util.stream.Collectors;
import railwalk.device.GasLaw;
import railwalk.device.Ratings;
import railwalk.device.RectifierRatings;
import railwalk.device.SectionType;
import railwalk.device.TubeType;
import railwalk.units.Quantity;

/** A type's other names, base, heater, limits and spread as labelled lines. */
final class TypeFacts {
  /** Stands in a data file for a base code that no source gives. */
  private static final String UNKNOWN = "unknown";

  private final TubeType type;

  TypeFacts(TubeType type) {
    this.type = type;
  }

  /** Returns them in reading order, the other names first. */
  List<KeyFigures.Entry> withOtherNames() {
    List<KeyFigures.Entry> entries = new ArrayList<>();
    if (!type.aliases().isEmpty()) {
      entries.add(entry("Also", String.join(", ", type.aliases())));
    }
    entries.addAll(entries());
    return entries;
  }

  /** Returns the base in words: "9A, noval"; the kind of socket alone where the code is unknown. */
  static String base(TubeType type) {
    return type.base().equals(UNKNOWN) ? type.family() : type.base() + ", " + type.family();
  }

  /** Returns the base's code, or the kind of socket where that is unknown. */
  static String baseCode(TubeType type) {
    return type.base().equals(UNKNOWN) ? type.family() : type.base();
  }

  /** Returns them in reading order. */
  List<KeyFigures.Entry> entries() {
    List<KeyFigures.Entry> entries = new ArrayList<>();
    entries.add(entry("Base", base(type)));
    if (!type.heater().connections().isEmpty()) {
      String kind = type.heater().directlyHeated() ? "Filament" : "Heater";
      entries.add(
          entry(
              kind,
              type.heater().connections().stream()
                      .map(CataloguePage::heater)
                      .collect(Collectors.joining(" or "))
                  + (type.heater().cathodeJoined() ? ", cathode joined to it" : "")));
    }
    type.sections().stream()
        .collect(Collectors.groupingBy(TypeFacts::ratings, LinkedHashMap::new, Collectors.toList()))
        .forEach((ratings, sections) -> add(entries, ratings, sections));
    type.care().straps().forEach(strap -> entries.add(entry("At the socket", strap(strap))));
    type.care().cautions().forEach(caution -> entries.add(entry("Mind", caution)));
    addLookAlikes(entries);
    return entries;
  }

  /** Adds the types not to be taken for it, those with the same difference together. */
  private void addLookAlikes(List<KeyFigures.Entry> entries) {
    Map<String, List<String>> typesByDifference = new LinkedHashMap<>();
    for (TubeType.LookAlike other : type.care().lookAlikes()) {
      typesByDifference
          .computeIfAbsent(other.difference(), d -> new ArrayList<>())
          .add(other.type());
    }
    typesByDifference.forEach(
        (difference, types) -> {
          boolean one = types.size() == 1;
          entries.add(
              entry(
                  one ? "Not " + types.get(0) : "Not the same",
                  one ? difference : String.join(", ", types) + ": " + difference));
        });
  }

  private static String strap(List<Integer> pins) {
    String all = pins.stream().map(String::valueOf).collect(Collectors.joining(" and "));
    return "join pins " + all;
  }

  private void add(List<KeyFigures.Entry> entries, String ratings, List<SectionType> sections) {
    String which =
        sections.size() == type.sections().size()
            ? ""
            : " " + sections.stream().map(SectionType::id).collect(Collectors.joining(", "));
    if (!ratings.isEmpty()) {
      entries.add(entry("Limits" + which, ratings));
    }
    SectionType section = sections.get(0);
    if (section.law() instanceof GasLaw gas) {
      entries.add(entry("Glow", glow(gas)));
    }
    if (!Double.isNaN(section.spreadLow())) {
      entries.add(
          entry(
              "Spread" + which,
              "plate current of new tubes from "
                  + Quantity.percent(section.spreadLow())
                  + " to "
                  + Quantity.percent(section.spreadHigh())
                  + " of the published one"));
    }
  }

  private static String glow(GasLaw gas) {
    double change = gas.slopeOhms() * (gas.maximumAmps() - gas.minimumAmps());
    return "strikes by "
        + Quantity.volts(gas.strikeVolts())
        + "; holds "
        + Quantity.volts(gas.operatingVolts())
        + " at "
        + Quantity.amps(gas.referenceAmps())
        + "; regulates from "
        + Quantity.amps(gas.minimumAmps())
        + " to "
        + Quantity.amps(gas.maximumAmps())
        + ", "
        + Quantity.volts(change)
        + " over that range";
  }

  private static String ratings(SectionType section) {
    List<String> limits = new ArrayList<>();
    Ratings tube = section.ratings();
    add(limits, "plate", tube.plateVoltsMax(), Quantity::volts);
    add(limits, "plate", tube.plateWattsMax(), Quantity::watts);
    add(limits, "screen", tube.screenVoltsMax(), Quantity::volts);
    add(limits, "screen", tube.screenWattsMax(), Quantity::watts);
    add(limits, "cathode", tube.cathodeAmpsMax(), Quantity::amps);
    add(limits, "heater to cathode", tube.heaterCathodeVoltsMax(), Quantity::volts);
    add(limits, "grid leak", tube.gridLeakCathodeBiasOhmsMax(), Quantity::ohms);
    add(limits, "grid leak with fixed bias", tube.gridLeakFixedBiasOhmsMax(), Quantity::ohms);
    RectifierRatings rectifier = section.rectifierRatings();
    add(
        limits,
        "each plate",
        rectifier.plateRmsVoltsMax(),
        volts -> Quantity.volts(volts) + " rms");
    add(limits, "peak inverse", rectifier.peakInverseVoltsMax(), Quantity::volts);
    add(limits, "peak of each plate", rectifier.peakPlateAmpsMax(), Quantity::amps);
    add(limits, "DC output", rectifier.dcAmpsMax(), Quantity::amps);
    add(
        limits,
        "first capacitor",
        rectifier.firstCapacitorFaradsMax(),
        farads -> Quantity.of(farads, "F"));
    if (!limits.isEmpty() && !tube.system().isEmpty()) {
      limits.add(tube.system());
    }
    return String.join("; ", limits);
  }

  private static void add(
      List<String> limits, String what, double value, DoubleFunction<String> words) {
    if (!Double.isNaN(value)) {
      limits.add(what + " " + words.apply(value));
    }
  }

  private static KeyFigures.Entry entry(String label, String text) {
    return new KeyFigures.Entry(label, text, false);
  }
}
