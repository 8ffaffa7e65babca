package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;
import railwalk.chart.Table.Use;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/** The main points at several line voltages, side by side. */
final class LinePage {
  private final Column column;
  private final List<OperatingPoint> lines;
  private final Wording wording;

  /**
   * @param lines the same circuit at line volts that rise
   */
  LinePage(Column column, List<OperatingPoint> lines, Wording wording) {
    this.column = column;
    this.lines = lines;
    this.wording = wording;
  }

  Page page() {
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Point", Use.WORDS));
    for (OperatingPoint line : lines) {
      double volts = line.circuit().line().volts();
      Use use = volts == column.circuit().line().volts() ? Use.KEY_FIGURES : Use.FIGURES;
      columns.add(new Table.Column(wording.say("{Line}"), Quantity.volts(volts), use));
    }
    List<Table.Group> groups = new ArrayList<>();
    Set<Node> shown = new LinkedHashSet<>();
    for (SupplyNode supply : column.map().supplyNodes()) {
      shown.add(supply.node());
    }
    groups.add(nodes("Supply nodes, volts", shown));
    groups.add(electrodes("{Plates}, volts", AmplifierSection::plate, shown));
    groups.add(electrodes("Cathodes, volts", AmplifierSection::cathode, shown));
    groups.add(currents());
    groups.removeIf(group -> group.rows().isEmpty());
    Paragraph note =
        new Paragraph(
            wording.say(
                "Bands, watts and findings are on the other pages, for the {line} volts named in the"
                    + " conditions. Heaters follow the {line} too: a {tube} kept far below its"
                    + " heater’s rating passes less than reckoned here."));
    return new Page(
        wording.say("Other {line} volts"), List.of(new Table("", columns, groups), note));
  }

  private Table.Group nodes(String title, Set<Node> nodes) {
    List<Table.Row> rows = new ArrayList<>();
    for (Node node : nodes) {
      rows.add(row(node.name(), point -> point.volts(node), Quantity::plainVolts));
    }
    return new Table.Group(title, "", rows, List.of());
  }

  private Table.Group electrodes(
      String title, Function<AmplifierSection, Node> electrode, Set<Node> shown) {
    List<Table.Row> rows = new ArrayList<>();
    for (AmplifierSection section : column.circuit().elements(AmplifierSection.class)) {
      Node node = electrode.apply(section);
      boolean still = node.equals(column.circuit().reference()) || column.point().volts(node) == 0;
      if (!still && !column.map().undefined().contains(node) && shown.add(node)) {
        rows.add(
            row(
                section.name() + ", " + node.name(),
                point -> point.volts(node),
                Quantity::plainVolts));
      }
    }
    return new Table.Group(wording.say(title), "", rows, List.of());
  }

  private Table.Group currents() {
    List<Table.Row> rows = new ArrayList<>();
    for (AmplifierSection section : column.circuit().elements(AmplifierSection.class)) {
      rows.add(row(section.name(), point -> point.at(section).plateAmps(), Quantity::amps));
    }
    return new Table.Group(wording.say("{Plate} currents"), "", rows, List.of());
  }

  private Table.Row row(
      String name, ToDoubleFunction<OperatingPoint> figure, Function<Double, String> words) {
    List<String> cells = new ArrayList<>();
    cells.add(name);
    for (OperatingPoint line : lines) {
      double value = figure.applyAsDouble(line);
      cells.add(Double.isNaN(value) ? "–" : words.apply(value));
    }
    return new Table.Row(cells, "");
  }
}
