package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import railwalk.chart.Table.Use;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;
import railwalk.device.Electrode;
import railwalk.findings.WindingDuty;
import railwalk.solve.SupplyPoint;
import railwalk.solve.WindingLoad;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/** The supply: its drawing, its nodes from the rectifier down, the rectifiers, the windings. */
final class SupplyPage {
  /** Below this a winding carries nothing: its load is not in the netlist. */
  private static final double NOTABLE_AMPS = 1e-6;

  private final Column column;
  private final Circuit circuit;
  private final PointCells cells;
  private final SupplyFlow flow;
  private final Wording wording;

  SupplyPage(Column column, PointCells cells, Wording wording) {
    this.column = column;
    this.circuit = column.circuit();
    this.cells = cells;
    this.flow = new SupplyFlow(column);
    this.wording = wording;
  }

  Page page() {
    List<Block> blocks = new ArrayList<>();
    if (column.map().supplyNodes().isEmpty()) {
      blocks.add(
          new Paragraph(
              wording.say("No supply node found: no rectifier or source feeds the {tubes}.")));
    } else {
      blocks.add(new LadderBuilder(column, cells).ladder());
      blocks.add(nodes());
    }
    if (!column.point().supplies().isEmpty()) {
      blocks.add(rectifiers());
    }
    if (!column.point().acLoads().windings().isEmpty()) {
      blocks.add(windings());
    }
    return new Page("Supply", blocks);
  }

  private Table nodes() {
    boolean meter = column.map().supplyNodes().stream().anyMatch(s -> cells.loadsNotably(s.node()));
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Node", Use.WORDS));
    columns.add(new Table.Column("Fed through", Use.WORDS));
    columns.add(new Table.Column("Expected V", Use.KEY_FIGURES));
    columns.add(new Table.Column("Low–high V", Use.FIGURES));
    if (meter) {
      columns.add(new Table.Column("Meter V", Use.FIGURES));
    }
    columns.add(new Table.Column("Reading V", Use.WRITING));
    columns.add(new Table.Column("Fed", Use.FIGURES));
    columns.add(new Table.Column("Ripple rms", Use.FIGURES));
    List<Table.Row> rows =
        column.map().supplyNodes().stream().map(supply -> row(supply, meter)).toList();
    return Table.of("Supply nodes", columns, rows);
  }

  private Table.Row row(SupplyNode supply, boolean meter) {
    Node node = supply.node();
    List<String> row = new ArrayList<>();
    row.add(node.name());
    row.add(fedThrough(supply));
    row.add(cells.volts(node));
    row.add(cells.band(node));
    if (meter) {
      row.add(cells.meter(node));
    }
    row.add("");
    row.add(flow.fed(supply).map(Quantity::amps).orElse(""));
    row.add(cells.ripple(node));
    List<String> remarks = new ArrayList<>(cells.remarks(node));
    String fed = feeds(node);
    if (!fed.isEmpty()) {
      remarks.add(0, "feeds " + fed);
    }
    return new Table.Row(row, String.join("; ", remarks));
  }

  private String fedThrough(SupplyNode supply) {
    String droppers =
        Rung.to(supply).stream()
            .map(rung -> (rung.names() + " " + rung.values()).strip())
            .collect(Collectors.joining(", "));
    Node parent = supply.parent();
    if (parent == null) {
      String from =
          supply.group() < 0
              ? "fixed source"
              : RectifierFeed.of(circuit, column.map().groups().get(supply.group()), supply.node())
                  .names();
      return droppers.isEmpty() ? from : from + ", " + droppers;
    }
    return droppers.isEmpty() ? parent.name() : droppers + " from " + parent.name();
  }

  /** Returns which plates and screens hang on {@code node}: "plates V3 V4, screen V5". */
  private String feeds(Node node) {
    Map<String, List<String>> byElectrode = new LinkedHashMap<>();
    for (Socket socket : Socket.in(circuit)) {
      for (Socket.Pin pin : socket.pins()) {
        Electrode electrode = pin.electrode();
        boolean fed =
            (electrode == Electrode.PLATE || electrode == Electrode.SCREEN)
                && column.map().supplyOf(pin.node()).filter(node::equals).isPresent();
        if (fed && electrode != null) {
          List<String> names =
              byElectrode.computeIfAbsent(wording.electrode(electrode), e -> new ArrayList<>());
          String name = socket.name() + pin.section();
          if (!names.contains(name)) {
            names.add(name);
          }
        }
      }
    }
    return byElectrode.entrySet().stream()
        .map(
            e ->
                e.getKey()
                    + (e.getValue().size() > 1 ? "s " : " ")
                    + String.join(" ", e.getValue()))
        .collect(Collectors.joining(", "));
  }

  private Table rectifiers() {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Output", Use.WORDS),
            new Table.Column("Rectifier", Use.WORDS),
            new Table.Column("Arrangement", Use.WORDS),
            new Table.Column("DC out", Use.KEY_FIGURES),
            new Table.Column("Charging peak", Use.FIGURES),
            new Table.Column("Ripple rms", Use.FIGURES));
    List<Table.Row> rows = column.point().supplies().stream().map(this::row).toList();
    return Table.of("Rectifiers", columns, rows);
  }

  private Table.Row row(SupplyPoint supply) {
    Optional<RectifierFeed> feed =
        column.map().groups().stream()
            .filter(g -> g.outputs().contains(supply.node()))
            .map(g -> RectifierFeed.of(circuit, g, supply.node()))
            .findFirst();
    return new Table.Row(
        List.of(
            supply.node().name(),
            feed.map(f -> (f.names() + " " + f.types()).strip()).orElse(""),
            feed.map(RectifierFeed::arrangement).orElse(""),
            Quantity.amps(supply.dcAmps()),
            Quantity.amps(supply.peakAmps()),
            Quantity.of(supply.rippleVoltsRms(), "V")),
        "");
  }

  private Table windings() {
    List<WindingDuty> duties = WindingDuty.of(column.point());
    boolean rated = duties.stream().anyMatch(d -> !Double.isNaN(d.winding().ratedAmps()));
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Winding", Use.WORDS));
    columns.add(new Table.Column("Between", Use.WORDS));
    columns.add(new Table.Column("No load V AC", Use.FIGURES));
    columns.add(new Table.Column("Under load V AC", Use.KEY_FIGURES));
    columns.add(new Table.Column("Reading V AC", Use.WRITING));
    columns.add(new Table.Column("Current rms", Use.FIGURES));
    if (rated) {
      columns.add(new Table.Column("Rated", Use.FIGURES));
    }
    List<Table.Row> rows = new ArrayList<>();
    for (WindingLoad load : column.point().acLoads().windings()) {
      Winding winding = load.winding();
      Winding.Section section = winding.sections().get(load.section());
      double scale = circuit.line().scale(winding.atLineVolts());
      List<String> row = new ArrayList<>();
      row.add(winding.name());
      row.add(section.a().name() + " and " + section.b().name());
      row.add(Quantity.plainVolts(section.openRmsVolts() * scale));
      row.add(Quantity.plainVolts(load.rmsVolts()));
      row.add("");
      row.add(load.rmsAmps() < NOTABLE_AMPS ? "–" : Quantity.amps(load.rmsAmps()));
      if (rated) {
        double amps = winding.ratedAmps();
        row.add(Double.isNaN(amps) ? "" : Quantity.amps(amps));
      }
      boolean last = load.section() == winding.sections().size() - 1;
      rows.add(new Table.Row(row, last ? heaters(winding, duties) : ""));
    }
    return Table.of("Windings, AC volts rms", columns, rows);
  }

  /** Returns what the heaters on a winding ask for: "heaters of V1 V2: 600 mA at rated volts". */
  private static String heaters(Winding winding, List<WindingDuty> duties) {
    for (WindingDuty duty : duties) {
      if (duty.winding().equals(winding) && !duty.tubes().isEmpty()) {
        return (duty.tubes().size() == 1 ? "heater of " : "heaters of ")
            + String.join(" ", duty.tubes())
            + ": "
            + Quantity.amps(duty.heaterAmps())
            + " at rated volts"
            + (Double.isNaN(winding.ratedAmps())
                ? ""
                : " of " + Quantity.amps(winding.ratedAmps()));
      }
    }
    return "";
  }
}
