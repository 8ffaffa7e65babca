package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Table.Use;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.diagnosis.ColdOhms;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/** Cold ohms of every supply node and pin, as pages. */
public final class OhmsPages {
  private final ChartInput input;
  private final ColdOhms ohms;
  private final Circuit circuit;
  private final Wording wording;

  /**
   * Makes the pages.
   *
   * @param input the amplifier in its first column
   */
  public OhmsPages(ChartInput input, ColdOhms ohms) {
    this.input = input;
    this.ohms = ohms;
    this.circuit = input.first().circuit();
    this.wording = new Wording(circuit.words());
  }

  /** Returns the pages. */
  public Chart chart() {
    Cautions cautions = new Cautions(input.first(), input.first().findings(), wording);
    List<Block> blocks = new ArrayList<>();
    cautions.hotChassis().ifPresent(blocks::add);
    blocks.add(new KeyFigures(conditions()));
    blocks.add(new FillIn(List.of("Date", "Owner’s mark", "Technician", "Meter used")));
    if (!input.first().map().supplyNodes().isEmpty()) {
      blocks.add(supplies());
    }
    blocks.add(tubes());
    return new Chart(
        circuit.title(),
        "Cold ohms, " + input.fileName(),
        wording.say(
            "unplugged, discharged, {tubes} out · black lead on " + circuit.reference().name()),
        Cautions.standing(),
        List.of(new Page("Cold ohms", blocks), new Page("Cautions", List.of(cautions.box()))),
        List.of());
  }

  private List<KeyFigures.Entry> conditions() {
    return List.of(
        new KeyFigures.Entry(
            "Set",
            wording.say("unplugged, every capacitor discharged and checked, all {tubes} out"),
            true),
        new KeyFigures.Entry("Black lead on", circuit.reference().name(), true),
        new KeyFigures.Entry("Controls", "controls and switches as in the netlist", false),
        new KeyFigures.Entry(
            "Low–high",
            "nine builds in ten, by the resistors’ tolerances; windings as given",
            false),
        new KeyFigures.Entry(
            "Diodes",
            "taken as open: where one is noted, exchange the leads and keep the higher reading",
            false),
        new KeyFigures.Entry(
            "Rises",
            "an electrolytic charges from the meter: wait until the reading has gone past the"
                + " figure; one that stops below leaks (common practice)",
            false));
  }

  private static List<Table.Column> figures() {
    return List.of(
        new Table.Column("Expected", Use.KEY_FIGURES),
        new Table.Column("Low–high", Use.FIGURES),
        new Table.Column("Reading", Use.WRITING));
  }

  private Table supplies() {
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Node", Use.WORDS));
    columns.addAll(figures());
    List<Table.Row> rows = new ArrayList<>();
    for (SupplyNode supply : input.first().map().supplyNodes()) {
      rows.add(row(List.of(supply.node().name()), supply.node()));
    }
    return Table.of("Supply nodes", columns, rows);
  }

  private Table tubes() {
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Sec", Use.WORDS));
    columns.add(new Table.Column("Pin", Use.WORDS));
    columns.add(new Table.Column("Electrode", Use.WORDS));
    columns.add(new Table.Column("Node", Use.WORDS));
    columns.addAll(figures());
    List<Table.Group> groups = new ArrayList<>();
    for (Socket socket : Socket.in(circuit)) {
      List<Table.Row> rows = new ArrayList<>();
      for (Socket.Pin pin : socket.pins()) {
        rows.add(
            row(
                List.of(
                    pin.section(),
                    pin.label(),
                    TubesPage.electrode(socket.bottle(), pin, wording),
                    pin.node().name()),
                pin.node()));
      }
      groups.add(new Table.Group(socket.name(), socket.typeName(), rows, List.of()));
    }
    return new Table(wording.say("{Tubes} by pin"), columns, groups);
  }

  private Table.Row row(List<String> place, Node node) {
    ColdOhms.Reading reading = ohms.at(node);
    List<String> cells = new ArrayList<>(place);
    boolean open = Double.isInfinite(reading.ohms());
    String low = open ? "" : Quantity.ohms(reading.lowOhms());
    String high = open ? "" : Quantity.ohms(reading.highOhms());
    cells.add(open ? "open" : Quantity.ohms(reading.ohms()));
    cells.add(low.equals(high) ? "" : low + "–\u200B" + high);
    cells.add("");
    List<String> remarks = new ArrayList<>();
    if (!Double.isNaN(reading.pastOhms())) {
      remarks.add(
          "starts near "
              + Quantity.ohms(reading.startOhms() < 1 ? 0 : reading.startOhms())
              + ", rises past "
              + Quantity.ohms(reading.pastOhms()));
    }
    if (reading.throughDiode()) {
      remarks.add("lower the way a diode conducts");
    }
    return new Table.Row(cells, String.join("; ", remarks));
  }
}
