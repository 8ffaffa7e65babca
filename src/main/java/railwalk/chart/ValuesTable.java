package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Table.Use;
import railwalk.diagnosis.FoundValue;
import railwalk.units.PreferredOhms;
import railwalk.units.Quantity;

/** Values that the netlist leaves open, as the readings tell them. */
final class ValuesTable {
  private ValuesTable() {}

  static Table of(List<FoundValue> values) {
    List<Table.Row> rows = new ArrayList<>();
    for (FoundValue value : values) {
      rows.add(row(value));
    }
    return Table.of(
        "",
        List.of(
            new Table.Column("Part", Use.WORDS),
            new Table.Column("Found", Use.KEY_FIGURES),
            new Table.Column("±", Use.FIGURES),
            new Table.Column("Preferred", Use.FIGURES),
            new Table.Column("Told by", Use.WORDS)),
        rows);
  }

  private static Table.Row row(FoundValue value) {
    String name =
        value.element() + (value.section() > 0 ? ", section " + (value.section() + 1) : "");
    if (!value.determined()) {
      String remark =
          "These readings can’t determine it; "
              + Quantity.ohms(value.ohms())
              + " is only a stand-in. "
              + value.missing().map(BenchReport::action).orElse("");
      return new Table.Row(List.of(name, "open", "", "", ""), remark.strip());
    }
    return new Table.Row(
        name,
        Quantity.ohms(value.ohms()),
        Quantity.fixed(100 * value.logDeviation(), value.logDeviation() < 0.1 ? 1 : 0) + " %",
        value.resistor() ? Quantity.ohms(PreferredOhms.nearest(value.ohms())) : "",
        String.join(", ", value.toldBy()));
  }
}
