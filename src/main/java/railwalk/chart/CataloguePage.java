package railwalk.chart;

import java.util.Comparator;
import java.util.List;
import railwalk.device.Heater;
import railwalk.device.TubeType;
import railwalk.units.Quantity;

/** The list of the tube types that Railwalk knows. */
public final class CataloguePage {
  private static final List<Table.Column> COLUMNS =
      List.of(
          new Table.Column("Type", Table.Use.WORDS),
          new Table.Column("Also", Table.Use.WORDS),
          new Table.Column("Base", Table.Use.WORDS),
          new Table.Column("Heater", Table.Use.WORDS),
          new Table.Column("What it is", Table.Use.WORDS));

  private CataloguePage() {}

  /** Returns the page with a row for each of {@code types}. */
  public static Page of(List<TubeType> types) {
    List<Table.Row> rows =
        types.stream()
            .sorted(Comparator.comparing(TubeType::name, NaturalOrder.INSTANCE))
            .map(CataloguePage::row)
            .toList();
    return new Page("Tube types", List.of(Table.of("", COLUMNS, rows)));
  }

  private static Table.Row row(TubeType type) {
    return new Table.Row(
        type.name(),
        String.join(", ", type.aliases()),
        TypeFacts.baseCode(type),
        type.heater().connections().stream().findFirst().map(CataloguePage::heater).orElse(""),
        type.summary());
  }

  /** Returns one rated connection of a heater: "6.3 V 0.3 A". */
  static String heater(Heater.Connection connection) {
    return Quantity.of(connection.volts(), "V") + " " + Quantity.amps(connection.amps());
  }
}
