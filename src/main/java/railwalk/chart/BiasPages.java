package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import railwalk.chart.Table.Use;
import railwalk.circuit.Circuit;
import railwalk.circuit.Inductor;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.device.Ratings;
import railwalk.diagnosis.BiasSheet;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;
import railwalk.units.Quantity;

/** The bias sheet as pages: each output tube at rest, then what other settings come to. */
public final class BiasPages {
  /** From this share of its watts on a plate at rest is marked as over. */
  private static final double FULL = 1;

  private static final String PER_CENT = "%";

  private final ChartInput input;
  private final BiasSheet sheet;
  private final OperatingPoint point;
  private final Circuit circuit;
  private final Wording wording;

  /**
   * Makes the pages.
   *
   * @param input the amplifier in its first column
   */
  public BiasPages(ChartInput input, BiasSheet sheet) {
    this.input = input;
    this.sheet = sheet;
    this.point = sheet.point();
    this.circuit = point.circuit();
    this.wording = new Wording(circuit.words());
  }

  /** Returns the pages. */
  public Chart chart() {
    Cautions cautions = new Cautions(input.first(), input.first().findings(), wording);
    List<Block> blocks = new ArrayList<>();
    cautions.hotChassis().ifPresent(blocks::add);
    blocks.add(new FillIn(List.of("Date", "Owner’s mark", "Technician", "Meter used")));
    for (BiasSheet.Tube tube : sheet.tubes()) {
      blocks.add(tube(tube));
    }
    blocks.add(new Paragraph(words()));
    for (BiasSheet.Group group : sheet.groups()) {
      settings(group, blocks);
    }
    return new Chart(
        circuit.title(),
        "Bias sheet, " + input.fileName(),
        new ConditionsPage(input, input.first().findings(), wording).inOneLine(),
        Cautions.standing(),
        List.of(new Page("Bias", blocks), new Page("Cautions", List.of(cautions.box()))),
        List.of());
  }

  private String words() {
    return wording.say(
        "Output {tubes} here are sections whose {plate} hangs on a coil, or whose {plate} is rated "
            + Quantity.watts(BiasSheet.OUTPUT_WATTS)
            + " or more. Common practice at rest: 60 to 70 % of the {plate}’s watts in fixed bias, 90"
            + " to 100 % in cathode bias. A sense resistor shows cathode current: take the screen’s"
            + " off before you work out {plate} watts.");
  }

  private Table tube(BiasSheet.Tube tube) {
    List<Table.Row> rows = new ArrayList<>();
    SectionPoint at = tube.at();
    Ratings limits = tube.section().type().ratings();
    String system = limits.system().isEmpty() ? "" : limits.system() + " rating";
    row(rows, "Cathode current", Quantity.amps(at.cathodeAmps()), "");
    row(
        rows,
        wording.say("{Plate} current"),
        Quantity.amps(at.plateAmps()),
        wording.say("{plate} to cathode ") + Quantity.volts(at.plateVolts()));
    row(
        rows,
        wording.say("{Plate} watts"),
        Quantity.watts(at.plateWatts()),
        of(at.plateWatts(), limits.plateWattsMax(), system));
    if (!Double.isNaN(at.screenAmps())) {
      row(
          rows,
          "Screen current",
          Quantity.amps(at.screenAmps()),
          "screen to cathode " + Quantity.volts(at.screenVolts()));
      row(
          rows,
          "Screen watts",
          Quantity.watts(at.screenWatts()),
          of(at.screenWatts(), limits.screenWattsMax(), system));
    }
    row(
        rows,
        "Grid",
        Quantity.volts(point.volts(tube.section().grid())),
        "grid to cathode " + Quantity.volts(at.gridVolts()));
    Resistor sense = tube.sense();
    if (sense != null) {
      double volts = Math.abs(point.volts(sense.a()) - point.volts(sense.b()));
      row(
          rows,
          "Across " + sense.name(),
          Quantity.of(volts, "V"),
          "sense resistor " + Quantity.ohms(sense.ohms()));
    }
    Resistor own = tube.cathodeResistor();
    if (own != null) {
      row(
          rows,
          "Across " + own.name(),
          Quantity.volts(Math.abs(point.volts(own.a()) - point.volts(own.b()))),
          "cathode resistor "
              + Quantity.ohms(own.ohms())
              + ", "
              + Share.of(point.watts(own), own.ratedWatts())
              + shared(own));
    }
    Inductor coil = tube.coil();
    if (coil != null) {
      boolean known = coil.dcOhms() > 0;
      row(
          rows,
          "Across " + coil.name(),
          known ? Quantity.volts(Math.abs(point.volts(coil.a()) - point.volts(coil.b()))) : "–",
          known
              ? "winding " + Quantity.ohms(coil.dcOhms()) + ": volts over ohms is its current"
              : "winding resistance not given");
    }
    String kind = tube.biasesItself() ? "cathode bias" : "fixed bias";
    List<Table.Column> columns =
        List.of(
            new Table.Column("Measure", Use.WORDS),
            new Table.Column("Expected", Use.KEY_FIGURES),
            new Table.Column("Reading", Use.WRITING),
            new Table.Column("Note", Use.WORDS));
    String title = tube.section().name() + " " + typeName(tube) + ", " + kind + ", at rest";
    return Table.of(title, columns, rows);
  }

  private String typeName(BiasSheet.Tube tube) {
    return circuit.bottle(tube.section().bottle()).map(b -> b.type().name()).orElse("");
  }

  private static void row(List<Table.Row> rows, String measure, String expected, String note) {
    rows.add(new Table.Row(measure, expected, "", note));
  }

  private static String of(double watts, double most, String system) {
    if (Double.isNaN(most)) {
      return "no rating on file";
    }
    double share = watts / most;
    return Quantity.percent(share)
        + " of "
        + Quantity.watts(most)
        + (system.isEmpty() ? "" : ", " + system)
        + (share > FULL ? ": over" : "");
  }

  private String shared(Resistor own) {
    List<String> names = new ArrayList<>();
    for (BiasSheet.Tube tube : sheet.tubes()) {
      if (own.equals(tube.cathodeResistor())) {
        names.add(tube.section().name());
      }
    }
    return names.size() > 1 ? ", shared by " + String.join(" ", names) : "";
  }

  private void settings(BiasSheet.Group group, List<Block> blocks) {
    Potentiometer control = group.control();
    List<String> names = new ArrayList<>();
    group.tubes().forEach(t -> names.add(t.section().name()));
    blocks.add(
        new Heading(
            "Fixed bias of "
                + String.join(" ", names)
                + (control == null ? ", no control" : ", set by " + control.name())));
    List<Table.Row> rows = new ArrayList<>();
    for (int i = 0; i < BiasSheet.TARGETS.size(); i++) {
      String label = Quantity.percent(BiasSheet.TARGETS.get(i));
      Optional<BiasSheet.Setting> setting = group.targets().get(i);
      if (setting.isPresent()) {
        rows.add(row(label, setting.get()));
      } else {
        rows.add(new Table.Row(List.of(label, "–", "–", "–", "–", "–"), "not found"));
      }
    }
    for (BiasSheet.Setting end : group.ends()) {
      rows.add(row(control == null ? "" : control.name() + " at " + percent(end), end));
    }
    blocks.add(
        Table.of(
            "",
            List.of(
                new Table.Column(wording.say("{Plate} watts"), Use.WORDS),
                new Table.Column("Setting", Use.FIGURES),
                new Table.Column("Grid V", Use.KEY_FIGURES),
                new Table.Column("Cathode mA", Use.FIGURES),
                new Table.Column(wording.say("{Plate} W"), Use.FIGURES),
                new Table.Column("Of maximum", Use.FIGURES)),
            rows));
    blocks.add(new Paragraph(note(group)));
  }

  private static String percent(BiasSheet.Setting setting) {
    return Quantity.fixed(100 * setting.controlShare(), 0) + " " + PER_CENT;
  }

  private static Table.Row row(String label, BiasSheet.Setting setting) {
    return new Table.Row(
        label,
        Double.isNaN(setting.controlShare())
            ? "–"
            : Quantity.fixed(100 * setting.controlShare(), 1) + " " + PER_CENT,
        Quantity.plainVolts(setting.gridVolts()),
        Quantity.plainVolts(1000 * setting.at().cathodeAmps()),
        Quantity.plainVolts(setting.at().plateWatts()),
        Quantity.percent(setting.share()));
  }

  private String note(BiasSheet.Group group) {
    Potentiometer control = group.control();
    if (control == null) {
      return "No control moves this bias: the grid volts are what a changed bias supply would have"
          + " to give.";
    }
    StringBuilder text =
        new StringBuilder(
            control.name()
                + " stands at "
                + Quantity.fixed(100 * control.share(), 1)
                + " % from "
                + control.b().name()
                + " to "
                + control.a().name()
                + ". Each line is for the hottest of the group.");
    boolean beyond =
        group.targets().stream()
            .flatMap(Optional::stream)
            .anyMatch(s -> Double.isNaN(s.controlShare()));
    if (beyond) {
      text.append(" A dash: the control does not reach it.");
    }
    BiasSheet.Setting hottest = null;
    for (BiasSheet.Setting end : group.ends()) {
      if (hottest == null || end.at().plateWatts() > hottest.at().plateWatts()) {
        hottest = end;
      }
    }
    if (hottest != null) {
      text.append(" Hottest end: ")
          .append(percent(hottest))
          .append(", ")
          .append(hottest.hottest())
          .append(" draws ")
          .append(Quantity.amps(hottest.at().cathodeAmps()))
          .append(" and burns ")
          .append(Quantity.watts(hottest.at().plateWatts()))
          .append(wording.say(" at the {plate}"))
          .append(
              hottest.share() > FULL
                  ? wording.say(": over its rating, turn the control there and the {tube} is lost.")
                  : ": within its rating.");
    }
    return text.toString();
  }
}
