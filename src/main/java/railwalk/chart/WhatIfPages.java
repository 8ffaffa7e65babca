package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import railwalk.chart.Table.Use;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.diagnosis.StatedFault;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/** An amplifier with supposed faults beside the healthy one, as pages. */
public final class WhatIfPages {
  /** A meter that takes less than this share off is not worth a word. */
  private static final double NOTABLE_LOADING = 0.01;

  private final ChartInput input;
  private final OperatingPoint healthy;
  private final OperatingPoint faulted;
  private final List<StatedFault> faults;
  private final List<Diagnostic> danger;
  private final Circuit circuit;
  private final Wording wording;
  private final FaultWords words;

  /**
   * Makes the pages.
   *
   * @param input the healthy amplifier in its first column
   * @param danger findings that the faults give rise to
   */
  public WhatIfPages(
      ChartInput input, OperatingPoint faulted, List<StatedFault> faults, List<Diagnostic> danger) {
    this.input = input;
    this.healthy = input.first().point();
    this.faulted = faulted;
    this.faults = List.copyOf(faults);
    this.danger = List.copyOf(danger);
    this.circuit = healthy.circuit();
    this.wording = new Wording(circuit.words());
    this.words = new FaultWords(circuit, wording);
  }

  /** Returns the pages. */
  public Chart chart() {
    List<Block> first = new ArrayList<>();
    Cautions cautions = new Cautions(input.first(), input.first().findings(), wording, highest());
    cautions.hotChassis().ifPresent(first::add);
    first.add(new KeyFigures(conditions()));
    first.add(new Heading("In danger"));
    first.add(danger());
    return new Chart(
        circuit.title(),
        "What if, " + input.fileName(),
        new ConditionsPage(input, input.first().findings(), wording).inOneLine(),
        Cautions.standing(),
        List.of(
            new Page("What if", first),
            new Page("Healthy and faulted", List.of(supplies(), tubes())),
            new Page("Cautions", List.of(cautions.box()))),
        List.of());
  }

  private List<KeyFigures.Entry> conditions() {
    List<KeyFigures.Entry> entries = new ArrayList<>();
    for (StatedFault fault : faults) {
      entries.add(new KeyFigures.Entry("Fault", name(fault), true));
    }
    String line =
        circuit.line().stated() ? Quantity.volts(circuit.line().volts()) : "windings as written";
    entries.add(new KeyFigures.Entry(wording.say("{Line}"), line, false));
    entries.add(new KeyFigures.Entry("Meter", ConditionsPage.meterText(circuit.meter()), false));
    entries.add(new KeyFigures.Entry("Shows most", showsMost(), false));
    return entries;
  }

  private String name(StatedFault stated) {
    return stated.fault().detail().equals(StatedFault.PULLED)
        ? stated.fault().element() + " " + StatedFault.PULLED
        : words.name(stated.fault(), stated.stated()).replace("about ", "");
  }

  /** Returns the place whose reading on this meter changes most, for its size. */
  private String showsMost() {
    String most = "";
    double greatest = 0;
    for (Place place : places()) {
      double before = shown(healthy, place.node);
      double after = shown(faulted, place.node);
      double share = Math.abs(after - before) / (Math.abs(before) + Math.abs(after) + 1);
      if (share > greatest) {
        greatest = share;
        most = place.name + ": " + Quantity.volts(before) + " becomes " + Quantity.volts(after);
      }
    }
    return greatest < 1e-3 ? "no DC reading changes by more than 0.1 %" : most;
  }

  private double shown(OperatingPoint point, Node node) {
    double volts = point.volts(node);
    return Double.isNaN(volts) ? volts : point.meterVolts(node, circuit.meter().inputOhms(volts));
  }

  private record Place(String name, Node node) {}

  private List<Place> places() {
    List<Place> places = new ArrayList<>();
    for (Socket socket : Socket.in(circuit)) {
      for (Socket.Pin pin : socket.pins()) {
        places.add(new Place(socket.nameOf(pin), pin.node()));
      }
    }
    for (SupplyNode supply : input.first().map().supplyNodes()) {
      places.add(new Place(supply.node().name(), supply.node()));
    }
    return places;
  }

  private Block danger() {
    List<Remarks.Remark> remarks = new ArrayList<>();
    for (Diagnostic diagnostic : danger) {
      if (NotesPage.isFinding(diagnostic)) {
        SourceSpan span = diagnostic.span();
        String place = span == null ? "" : span.text().fileName() + " line " + span.line();
        remarks.add(
            new Remarks.Remark(
                diagnostic.severity().word(), place, diagnostic.message(), diagnostic.hint()));
      }
    }
    return remarks.isEmpty()
        ? new Paragraph(
            "No part goes over a rating that it kept when healthy; parts without a stated rating"
                + " are not judged.")
        : new Remarks(remarks);
  }

  private String highest() {
    Place highest = null;
    for (Place place : places()) {
      double volts = Math.abs(faulted.volts(place.node));
      if (!Double.isNaN(volts)
          && (highest == null || volts > Math.abs(faulted.volts(highest.node)))) {
        highest = place;
      }
    }
    return highest == null
        ? ""
        : "With this fault the highest is "
            + Quantity.volts(faulted.volts(highest.node))
            + " at "
            + highest.name
            + ".";
  }

  private Table supplies() {
    List<Table.Row> rows = new ArrayList<>();
    for (SupplyNode supply : input.first().map().supplyNodes()) {
      List<String> cells = new ArrayList<>();
      cells.add(supply.node().name());
      cells.addAll(volts(supply.node()));
      rows.add(new Table.Row(cells, meter(supply.node())));
    }
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Node", Use.WORDS));
    columns.addAll(figures());
    return Table.of("Supply nodes", columns, rows);
  }

  private static List<Table.Column> figures() {
    return List.of(
        new Table.Column("Healthy V", Use.FIGURES),
        new Table.Column("Faulted V", Use.KEY_FIGURES),
        new Table.Column("Change V", Use.FIGURES),
        new Table.Column("Reading V", Use.WRITING));
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
        List<String> cells = new ArrayList<>();
        cells.add(pin.section());
        cells.add(pin.label());
        cells.add(TubesPage.electrode(socket.bottle(), pin, wording));
        cells.add(pin.node().name());
        cells.addAll(volts(pin.node()));
        rows.add(new Table.Row(cells, meter(pin.node())));
      }
      groups.add(new Table.Group(socket.name(), socket.typeName(), rows, currents(socket)));
    }
    return new Table(wording.say("{Tubes} by pin"), columns, groups);
  }

  private List<String> volts(Node node) {
    double before = healthy.volts(node);
    double after = faulted.volts(node);
    String change = Quantity.plainVolts(after - before);
    boolean same = Quantity.plainVolts(before).equals(Quantity.plainVolts(after));
    return List.of(
        Quantity.plainVolts(before),
        Quantity.plainVolts(after),
        same ? "" : (after > before ? "+" : "") + change,
        "");
  }

  /** Returns what the meter makes of both, where it shows. */
  private String meter(Node node) {
    Optional<String> before = read(healthy, node);
    Optional<String> after = read(faulted, node);
    return before.isEmpty() && after.isEmpty()
        ? ""
        : "this meter reads "
            + before.orElseGet(() -> Quantity.volts(healthy.volts(node)))
            + " healthy, "
            + after.orElseGet(() -> Quantity.volts(faulted.volts(node)))
            + " faulted";
  }

  private Optional<String> read(OperatingPoint point, Node node) {
    double volts = point.volts(node);
    if (Double.isNaN(volts)) {
      return Optional.empty();
    }
    double read = point.meterVolts(node, circuit.meter().inputOhms(volts));
    boolean notable =
        Math.abs(read - volts) > NOTABLE_LOADING * Math.abs(volts)
            && !Quantity.plainVolts(read).equals(Quantity.plainVolts(volts));
    return notable ? Optional.of(Quantity.volts(read)) : Optional.empty();
  }

  private List<String> currents(Socket socket) {
    List<String> lines = new ArrayList<>();
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      if (section.bottle().equals(socket.name())) {
        String letter = section.section().isEmpty() ? "" : section.section() + " ";
        String before = currents(healthy, section);
        String after = "no current: out of its socket";
        for (AmplifierSection now : faulted.circuit().elements(AmplifierSection.class)) {
          if (now.name().equals(section.name())) {
            after = currents(faulted, now);
          }
        }
        lines.add(letter + "healthy: " + before);
        lines.add(letter + "faulted: " + after);
      }
    }
    return lines;
  }

  private String currents(OperatingPoint point, AmplifierSection section) {
    if (point.map().idleSections().contains(section.name())) {
      return wording.say("no current: {plate} or cathode leads nowhere");
    }
    SectionPoint at = point.at(section);
    String plate =
        wording.say("{plate} ")
            + Quantity.amps(at.plateAmps())
            + ", "
            + Share.of(at.plateWatts(), section.type().ratings().plateWattsMax());
    return Double.isNaN(at.screenAmps())
        ? plate
        : plate
            + "; screen "
            + Quantity.amps(at.screenAmps())
            + ", "
            + Share.of(at.screenWatts(), section.type().ratings().screenWattsMax());
  }
}
