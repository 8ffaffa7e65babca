package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Table.Use;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Line;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.findings.CapacitorDuty;
import railwalk.findings.ChokeInput;
import railwalk.findings.FirstCapacitor;
import railwalk.findings.HeaterDuty;
import railwalk.findings.RectifierDuty;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;

/** Rectifiers, choke inputs, supply capacitors and heaters against what they are made for. */
final class LoadsPage {
  private final Column column;
  private final Circuit circuit;
  private final Wording wording;

  LoadsPage(Column column, Wording wording) {
    this.column = column;
    this.circuit = column.circuit();
    this.wording = wording;
  }

  /** Returns the tables; none where there is nothing of the kind. */
  List<Block> blocks() {
    List<Block> blocks = new ArrayList<>();
    List<RectifierDuty> rectifiers = RectifierDuty.of(column.point(), column.unloaded());
    if (!rectifiers.isEmpty()) {
      blocks.add(rectifiers(rectifiers));
    }
    List<ChokeInput> chokes = ChokeInput.of(column.point());
    if (!chokes.isEmpty()) {
      blocks.add(chokes(chokes));
    }
    List<CapacitorDuty> capacitors = new ArrayList<>();
    for (CapacitorDuty duty : CapacitorDuty.of(column.point(), column.unloaded())) {
      if (inSupply(duty.capacitor())) {
        capacitors.add(duty);
      }
    }
    if (!capacitors.isEmpty()) {
      blocks.add(capacitors(capacitors));
    }
    List<HeaterDuty> heaters = new ArrayList<>(HeaterDuty.of(column.point()));
    heaters.sort((a, b) -> NaturalOrder.INSTANCE.compare(a.bottle().name(), b.bottle().name()));
    if (!heaters.isEmpty()) {
      blocks.add(heaters(heaters));
    }
    return blocks;
  }

  private Table rectifiers(List<RectifierDuty> duties) {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Rectifier", Use.WORDS),
            new Table.Column("DC", Use.KEY_FIGURES),
            new Table.Column("Limit", Use.FIGURES),
            new Table.Column("Peak", Use.KEY_FIGURES),
            new Table.Column("Limit", Use.FIGURES),
            new Table.Column("Inverse V", Use.KEY_FIGURES),
            new Table.Column("Limit V", Use.FIGURES));
    List<FirstCapacitor> firsts = FirstCapacitor.of(column.point());
    List<Table.Row> rows = new ArrayList<>();
    boolean unloaded = false;
    for (RectifierDuty duty : duties) {
      unloaded |= duty.unloaded();
      rows.add(
          new Table.Row(
              List.of(
                  name(duty.rectifier()),
                  Quantity.amps(duty.meanAmps()),
                  amps(duty.meanAmpsMax()),
                  Quantity.amps(duty.peakAmps()),
                  amps(duty.peakAmpsMax()),
                  Quantity.plainVolts(duty.inverseVolts()),
                  volts(duty.inverseVoltsMax())),
              firstCapacitor(duty.rectifier(), firsts)));
    }
    List<String> notes = new ArrayList<>();
    if (unloaded) {
      notes.add(wording.say("Silicon’s inverse volts: before the {tubes} warm up, " + highLine()));
    }
    return new Table(
        "Rectifiers against their limits", columns, List.of(new Table.Group("", "", rows, notes)));
  }

  private String name(Element rectifier) {
    if (rectifier instanceof RectifierSection section) {
      String type = circuit.bottle(section.bottle()).map(b -> b.type().name()).orElse("");
      return (section.name() + " " + type).strip();
    }
    return rectifier instanceof Diode diode
        ? diode.name() + " " + diode.typeName()
        : rectifier.name();
  }

  private static String firstCapacitor(Element rectifier, List<FirstCapacitor> firsts) {
    for (FirstCapacitor first : firsts) {
      if (first.section().equals(rectifier)
          && !Double.isNaN(first.faradsMax())
          && first.farads() > 0) {
        return "first capacitor "
            + Quantity.of(first.farads(), "F")
            + ", usual limit "
            + Quantity.of(first.faradsMax(), "F")
            + ", more with more resistance in series";
      }
    }
    return "";
  }

  private Table chokes(List<ChokeInput> inputs) {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Choke input", Use.WORDS),
            new Table.Column("Output", Use.WORDS),
            new Table.Column("Carries", Use.KEY_FIGURES),
            new Table.Column("Critical current", Use.FIGURES));
    List<Table.Row> rows = new ArrayList<>();
    for (ChokeInput input : inputs) {
      rows.add(
          new Table.Row(
              List.of(
                  input.choke().name(),
                  input.output().name(),
                  Quantity.amps(input.drawnAmps()),
                  Quantity.amps(input.criticalAmps())),
              input.isBelow()
                  ? "below: the output rises towards the peak"
                  : "above: the output keeps to the mean of the rectified volts"));
    }
    return Table.of("Choke input", columns, rows);
  }

  private boolean inSupply(Capacitor capacitor) {
    for (Node node : capacitor.nodes()) {
      if (!node.equals(circuit.reference())
          && (column.map().supplyNode(node).isPresent()
              || column.map().groups().stream().anyMatch(g -> g.nodes().contains(node)))) {
        return true;
      }
    }
    return false;
  }

  private Table capacitors(List<CapacitorDuty> duties) {
    boolean unloaded = column.unloaded() != null;
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Capacitor", Use.WORDS));
    columns.add(new Table.Column("Between", Use.WORDS));
    columns.add(new Table.Column("Running V", Use.KEY_FIGURES));
    if (unloaded) {
      columns.add(new Table.Column("Cold V", Use.KEY_FIGURES));
    }
    columns.add(new Table.Column("Rated V", Use.FIGURES));
    List<Table.Row> rows = new ArrayList<>();
    for (CapacitorDuty duty : duties) {
      Capacitor capacitor = duty.capacitor();
      List<String> row = new ArrayList<>();
      row.add(capacitor.name() + " " + Quantity.of(capacitor.farads(), "F"));
      row.add(capacitor.a().name() + " and " + capacitor.b().name());
      row.add(volts(duty.runningVolts()));
      if (unloaded) {
        row.add(volts(duty.unloadedVolts()));
      }
      row.add(volts(capacitor.ratedVolts()));
      rows.add(new Table.Row(row, verdict(duty)));
    }
    List<String> notes =
        unloaded
            ? List.of(wording.say("Cold: before the {tubes} warm up, " + highLine()))
            : List.of();
    return new Table(
        "Supply capacitors, DC volts", columns, List.of(new Table.Group("", "", rows, notes)));
  }

  private String verdict(CapacitorDuty duty) {
    if (duty.isOverRunning()) {
      return "over its rating";
    }
    return duty.isOverUnloaded() ? wording.say("over its rating before the {tubes} warm up") : "";
  }

  /** Returns which line the figures at no load hold for: "with 132 V on the line (10 % high)". */
  private String highLine() {
    OperatingPoint unloaded = column.unloaded();
    Line line = unloaded == null ? Line.NOT_STATED : unloaded.circuit().line();
    return circuit.line().stated()
        ? "with " + Quantity.volts(line.volts()) + " on the {line} (10 % high)."
        : "with the {line} 10 % high.";
  }

  private Table heaters(List<HeaterDuty> duties) {
    List<Table.Column> columns =
        List.of(
            new Table.Column(wording.say("{Tube}"), Use.WORDS),
            new Table.Column("Heater", "Rated V", Use.FIGURES),
            new Table.Column("Heater", "Gets V rms", Use.KEY_FIGURES),
            new Table.Column("Heater", "Stands at V", Use.FIGURES),
            new Table.Column("Cathode at V", Use.FIGURES),
            new Table.Column("Between them V", Use.KEY_FIGURES),
            new Table.Column("Limit V", Use.FIGURES));
    List<Table.Row> rows = new ArrayList<>();
    boolean peaks = false;
    boolean open = false;
    for (HeaterDuty duty : duties) {
      peaks |= duty.atPeak();
      open |= !duty.isWired();
      rows.add(
          new Table.Row(
              duty.bottle().name() + " " + duty.bottle().type().name(),
              volts(duty.ratedVolts()),
              volts(duty.rmsVolts()),
              volts(duty.heaterVolts()),
              volts(duty.cathodeVolts()),
              volts(duty.acrossVolts()),
              duty.section().isEmpty() ? "" : volts(duty.acrossVoltsMax())));
    }
    List<String> notes = new ArrayList<>();
    if (open) {
      notes.add(
          wording.say(
              "A heater whose pins the netlist leaves out counts as heated at rated volts, and at"
                  + " the reference."));
    }
    if (peaks) {
      notes.add(
          wording.say(
              "Between heater and cathode: at the peak where the heater swings with the {line}."));
    }
    return new Table(
        wording.say("Heaters under load"), columns, List.of(new Table.Group("", "", rows, notes)));
  }

  private static String amps(double amps) {
    return Double.isNaN(amps) ? "" : Quantity.amps(amps);
  }

  private static String volts(double volts) {
    return Double.isNaN(volts) ? "" : Quantity.plainVolts(volts);
  }
}
