package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import railwalk.device.DataFile;
import railwalk.device.PinUse;
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

  private static final List<Table.Column> ALTERNATIVE_COLUMNS =
      List.of(
          new Table.Column("Type", Table.Use.WORDS),
          new Table.Column("What would change", Table.Use.WORDS));
  private static final List<Table.Column> IDLE_COLUMNS =
      List.of(
          new Table.Column("Fitted", Table.Use.WORDS),
          new Table.Column("Section", Table.Use.WORDS),
          new Table.Column("Plate current", Table.Use.FIGURES),
          new Table.Column("Plate to cathode", Table.Use.FIGURES),
          new Table.Column("Plate watts", Table.Use.WORDS));

  private final TypeSheet sheet;
  private final TubeType type;
  private final List<Alternative> alternatives;
  private final Optional<StagesIdle> idle;

  private TypePage(DataFile file, List<Alternative> alternatives, Optional<StagesIdle> idle) {
    this.sheet = TypeSheet.of(file);
    this.type = sheet.type();
    this.alternatives = alternatives;
    this.idle = idle;
  }

  /**
   * Returns the page of the type in {@code file}.
   *
   * @param alternatives types that come near it, nearest first
   * @param idle how an amplifier's stages idle with each of them
   */
  public static Page of(DataFile file, List<Alternative> alternatives, Optional<StagesIdle> idle) {
    return new TypePage(file, alternatives, idle).page();
  }

  private Page page() {
    List<Block> blocks = new ArrayList<>();
    blocks.add(new Paragraph(type.summary()));
    blocks.add(new KeyFigures(new TypeFacts(type).withOtherNames()));
    if (type.pins().isEmpty()) {
      blocks.add(new Heading("Pins, seen from below"));
      blocks.add(new Paragraph("Pins not confirmed: use electrodes."));
    } else {
      blocks.add(Table.of("Pins, seen from below", PIN_COLUMNS, pins()));
    }
    if (!alternatives.isEmpty()) {
      blocks.add(Table.of("Where it is not at hand", ALTERNATIVE_COLUMNS, alternativeRows()));
    }
    idle.ifPresent(stages -> blocks.add(idle(stages)));
    if (!sheet.rows().isEmpty()) {
      blocks.add(Table.of("How the law meets the published figures", LAW_COLUMNS, law()));
    }
    blocks.add(new Heading("Sources"));
    String sources = sheet.sources().stream().distinct().collect(Collectors.joining(". "));
    blocks.add(new Paragraph(sources + "."));
    return new Page(type.name(), blocks);
  }

  private List<Table.Row> pins() {
    return type.pins().entrySet().stream().map(this::pin).toList();
  }

  private Table.Row pin(Map.Entry<Integer, PinUse> pin) {
    String label = pin.getKey() == 0 ? "cap" : Integer.toString(pin.getKey());
    return new Table.Row(label, PinWords.of(type, pin.getValue()));
  }

  private List<Table.Row> alternativeRows() {
    return alternatives.stream()
        .map(a -> new Table.Row(a.type().name(), String.join("; ", a.changes())))
        .toList();
  }

  private static Table idle(StagesIdle stages) {
    List<Table.Row> rows = new ArrayList<>();
    String before = "";
    for (StageIdle stage : stages.sections()) {
      rows.add(
          new Table.Row(
              stage.type().equals(before) ? "" : stage.type(),
              stage.section(),
              Quantity.amps(stage.plateAmps()),
              Quantity.volts(stage.plateVolts()),
              Share.of(stage.plateWatts(), stage.plateWattsMax())));
      before = stage.type();
    }
    List<String> notes = List.of("Fitted electrode for electrode, its heater fed as it should be.");
    return new Table(
        "Idling in " + stages.netlist(),
        IDLE_COLUMNS,
        List.of(new Table.Group("", "", rows, notes)));
  }

  private List<Table.Row> law() {
    return sheet.rows().stream().map(TypePage::law).toList();
  }

  private static Table.Row law(Comparison row) {
    return new Table.Row(
        PointTable.words(row),
        row.measure().words(),
        row.publishedWords(),
        row.lawWords(),
        row.errorWords());
  }
}
