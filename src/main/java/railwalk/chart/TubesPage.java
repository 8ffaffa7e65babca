package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.chart.Table.Use;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Electrode;
import railwalk.device.Heater;
import railwalk.solve.SectionPoint;

/** The tubes by pin, one group each, then the points that no tube touches. */
final class TubesPage {
  /** A cathode this far up is no mere bias voltage: a follower or a splitter. */
  private static final double LIFTED_CATHODE_VOLTS = 50;

  /** Grid volts to cathode below which a grid-leak-biased grid does not settle, in magnitude. */
  private static final double CONTACT_BIAS_VOLTS = 1.5;

  private final Column column;
  private final Circuit circuit;
  private final PointCells cells;
  private final Wording wording;
  private final SectionWords sectionWords;

  TubesPage(Column column, PointCells cells, Wording wording) {
    this.column = column;
    this.circuit = column.circuit();
    this.cells = cells;
    this.wording = wording;
    this.sectionWords = new SectionWords(column, wording);
  }

  Page page() {
    List<Block> blocks = new ArrayList<>();
    List<Socket> sockets = Socket.in(circuit);
    if (!sockets.isEmpty()) {
      boolean meter =
          sockets.stream()
              .flatMap(s -> s.pins().stream())
              .anyMatch(p -> cells.loadsNotably(p.node()));
      blocks.add(
          new Table("", columns(meter), sockets.stream().map(s -> group(s, meter)).toList()));
    }
    new OtherPoints(column, cells).blocks().forEach(blocks::add);
    return new Page(wording.say("{Tubes} by pin"), blocks);
  }

  private List<Table.Column> columns(boolean meter) {
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Sec", Use.WORDS));
    columns.add(new Table.Column("Pin", Use.WORDS));
    columns.add(new Table.Column("Electrode", Use.WORDS));
    columns.add(new Table.Column("Node", Use.WORDS));
    columns.add(new Table.Column("Expected V", Use.KEY_FIGURES));
    columns.add(new Table.Column("Low–high V", Use.FIGURES));
    if (meter) {
      columns.add(new Table.Column("Meter V", Use.FIGURES));
    }
    columns.add(new Table.Column("Reading V", Use.WRITING));
    columns.add(new Table.Column("Diff", Use.WRITING));
    columns.add(new Table.Column("From", Use.WORDS));
    return columns;
  }

  private Table.Group group(Socket socket, boolean meter) {
    List<Table.Row> rows = socket.pins().stream().map(pin -> row(socket, pin, meter)).toList();
    List<String> notes = new ArrayList<>(sectionWords.of(socket));
    Bottle bottle = socket.bottle();
    if (bottle == null) {
      notes.add("Type not known: constant currents stand in for it.");
    } else if (bottle.wiring() == Bottle.Wiring.BY_POSITION && !bottle.pins().isEmpty()) {
      notes.add("The netlist names electrodes, not pins: pin numbers by bench custom.");
    } else if (bottle.pins().isEmpty()) {
      notes.add("The pins of this type are not on file.");
    }
    String subtitle =
        bottle == null ? "" : bottle.type().name() + " · " + wording.summary(bottle.type());
    return new Table.Group(socket.name(), bottle == null ? "unknown type" : subtitle, rows, notes);
  }

  private Table.Row row(Socket socket, Socket.Pin pin, boolean meter) {
    Node node = pin.node();
    List<String> row = new ArrayList<>();
    row.add(pin.section());
    row.add(pin.label());
    row.add(electrode(socket.bottle(), pin, wording));
    row.add(node.name());
    row.add(cells.volts(node));
    row.add(cells.band(node));
    if (meter) {
      row.add(cells.meter(node));
    }
    row.add("");
    row.add("");
    row.add(cells.supply(node));
    List<String> remarks = new ArrayList<>(cells.remarks(node));
    remarks.addAll(looksWrongIsNormal(socket, pin));
    return new Table.Row(row, String.join("; ", remarks));
  }

  /** Returns what the pin leads to, in words. */
  static String electrode(@Nullable Bottle bottle, Socket.Pin pin, Wording wording) {
    Electrode electrode = pin.electrode();
    if (electrode == null) {
      return switch (pin.role()) {
        case SLEEVE -> "shell, tie point";
        case SHIELD -> "shield, tie point";
        case INTERNAL -> "internal, tie point";
        case EMPTY, ELECTRODE -> "tie point";
      };
    }
    if (electrode.isHeater() && bottle != null) {
      Heater heater = bottle.type().heater();
      return heater.directlyHeated() ? "filament" : wording.electrode(electrode);
    }
    return wording.electrode(electrode);
  }

  /** Returns remarks on readings that alarm people without cause. */
  private List<String> looksWrongIsNormal(Socket socket, Socket.Pin pin) {
    return circuit.elements(AmplifierSection.class).stream()
        .filter(s -> s.bottle().equals(socket.name()) && s.section().equals(pin.section()))
        .map(s -> looksWrongIsNormal(s, pin))
        .filter(remark -> !remark.isEmpty())
        .toList();
  }

  private String looksWrongIsNormal(AmplifierSection section, Socket.Pin pin) {
    SectionPoint at = column.point().at(section);
    if (pin.electrode() == Electrode.SCREEN && at.screenVolts() > at.plateVolts()) {
      return wording.say("above the {plate}, normal here");
    }
    if (pin.electrode() == Electrode.CATHODE
        && column.point().volts(section.cathode()) > LIFTED_CATHODE_VOLTS
        && at.cathodeAmps() > 0) {
      return "high by design";
    }
    boolean contactBias =
        pin.electrode() == Electrode.GRID
            && at.gridAmps() > 0
            && at.gridVolts() < 0
            && at.gridVolts() > -CONTACT_BIAS_VOLTS
            && section.cathode().equals(circuit.reference());
    return contactBias ? "grid-leak bias, normal here" : "";
  }
}
