package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import railwalk.device.PinUse;
import railwalk.device.TubeType;
import railwalk.fit.Comparison;
import railwalk.fit.TypeSheet;

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
    blocks.add(new KeyFigures(new TypeFacts(type).withOtherNames()));
    blocks.add(Table.of("Pins, seen from below", PIN_COLUMNS, pins()));
    if (!sheet.rows().isEmpty()) {
      blocks.add(Table.of("How the law meets the published figures", LAW_COLUMNS, law()));
    }
    blocks.add(new Heading("Sources"));
    String sources = sheet.sources().stream().distinct().collect(Collectors.joining(". "));
    blocks.add(new Paragraph(sources + "."));
    return new Page(type.name(), blocks);
  }

  private List<Table.Row> pins() {
    return type.pins().entrySet().stream().map(TypePage::pin).toList();
  }

  private static Table.Row pin(Map.Entry<Integer, PinUse> pin) {
    String label = pin.getKey() == 0 ? "cap" : Integer.toString(pin.getKey());
    return new Table.Row(label, PinWords.of(pin.getValue()));
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
