package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.function.DoubleFunction;
import java.util.stream.Collectors;
import railwalk.device.Electrode;
import railwalk.device.PinUse;
import railwalk.device.Ratings;
import railwalk.device.RectifierRatings;
import railwalk.device.SectionType;
import railwalk.device.TubeType;
import railwalk.fit.Comparison;
import railwalk.fit.TypeSheet;
import railwalk.units.Quantity;

/**
 * One tube type on a page: what it is, its pins, its ratings, and every published figure beside
 * what its law gives there.
 */
public final class TypePage {
  private static final List<Table.Column> PIN_COLUMNS =
      List.of(new Table.Column("Pin", Table.Use.FIGURES), new Table.Column("Use", Table.Use.WORDS));
  private static final List<Table.Column> LAW_COLUMNS =
      List.of(
          new Table.Column("Published point", Table.Use.WORDS),
          new Table.Column("Figure", Table.Use.WORDS),
          new Table.Column("Sheet", Table.Use.FIGURES),
          new Table.Column("Law", Table.Use.FIGURES),
          new Table.Column("Off by %", Table.Use.FIGURES));

  private final TypeSheet sheet;
  private final TubeType type;

  private TypePage(TypeSheet sheet) {
    this.sheet = sheet;
    this.type = sheet.type();
  }

  /** Returns the page of the type on {@code sheet}. */
  public static Page of(TypeSheet sheet) {
    return new TypePage(sheet).page();
  }

  private Page page() {
    List<Block> blocks = new ArrayList<>();
    blocks.add(new Paragraph(type.summary()));
    blocks.add(new KeyFigures(keyFigures()));
    blocks.add(Table.of("Pins, seen from below", PIN_COLUMNS, pins()));
    if (!sheet.rows().isEmpty()) {
      blocks.add(Table.of("How the law meets the published figures", LAW_COLUMNS, law()));
    }
    blocks.add(new Heading("Sources"));
    String sources = sheet.sources().stream().distinct().collect(Collectors.joining(". "));
    blocks.add(new Paragraph(sources + "."));
    return new Page(type.name(), blocks);
  }

  private List<KeyFigures.Entry> keyFigures() {
    List<KeyFigures.Entry> entries = new ArrayList<>();
    if (!type.aliases().isEmpty()) {
      entries.add(entry("Also", String.join(", ", type.aliases())));
    }
    entries.add(entry("Base", type.base() + ", " + type.family()));
    if (!type.heater().connections().isEmpty()) {
      String kind = type.heater().directlyHeated() ? "Filament" : "Heater";
      entries.add(
          entry(
              kind,
              type.heater().connections().stream()
                  .map(CataloguePage::heater)
                  .collect(Collectors.joining(" or "))));
    }
    type.sections().stream()
        .collect(
            Collectors.groupingBy(
                TypePage::ratings, java.util.LinkedHashMap::new, Collectors.toList()))
        .forEach((ratings, sections) -> add(entries, ratings, sections));
    return entries;
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

  private List<Table.Row> pins() {
    return type.pins().entrySet().stream().map(TypePage::pin).toList();
  }

  private static Table.Row pin(Map.Entry<Integer, PinUse> pin) {
    PinUse use = pin.getValue();
    String label = pin.getKey() == 0 ? "cap" : Integer.toString(pin.getKey());
    String letter = use.section().isEmpty() ? "" : " of " + use.section();
    return new Table.Row(label, leadsTo(use) + letter);
  }

  private static String leadsTo(PinUse use) {
    return switch (use.role()) {
      case ELECTRODE -> use.electrode() == null ? "" : electrode(use.electrode());
      case EMPTY -> "nothing";
      case INTERNAL -> "internal connection: leave free";
      case SHIELD -> "shield";
      case SLEEVE -> "shell or base sleeve";
    };
  }

  private static String electrode(Electrode electrode) {
    return electrode == Electrode.HEATER_TAP
        ? "heater tap"
        : electrode.isHeater() ? "heater" : electrode.word();
  }

  private List<Table.Row> law() {
    return sheet.rows().stream().map(TypePage::law).toList();
  }

  private static Table.Row law(Comparison row) {
    return new Table.Row(
        row.pointWords(),
        row.measure().words(),
        row.publishedWords(),
        row.lawWords(),
        row.errorWords());
  }

  private static KeyFigures.Entry entry(String label, String text) {
    return new KeyFigures.Entry(label, text, false);
  }
}
