package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Plot.Spot;
import railwalk.chart.Table.Use;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Winding;
import railwalk.device.RectifierRatings;
import railwalk.solve.LineCycle;
import railwalk.solve.OperatingPoint;
import railwalk.solve.RectifierLoad;
import railwalk.solve.WindingLoad;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/**
 * One settled period of the line as pages: what supply nodes, windings and rectifiers do in it, and
 * how the first supply nodes look on a scope.
 */
public final class PeriodChart {
  private static final int TICKS = 7;

  /** Of a plot's span, left free above and below the curve. */
  private static final double MARGIN = 0.05;

  private final ChartInput input;
  private final LineCycle cycle;
  private final Circuit circuit;
  private final OperatingPoint averaged;
  private final Wording wording;

  private PeriodChart(ChartInput input, LineCycle cycle) {
    this.input = input;
    this.cycle = cycle;
    this.circuit = cycle.circuit();
    this.averaged = input.first().point();
    this.wording = new Wording(circuit.words());
  }

  /**
   * Returns the pages.
   *
   * @param input the averaged solution, its first column being the one stepped through
   */
  public static Chart of(ChartInput input, LineCycle cycle) {
    PeriodChart chart = new PeriodChart(input, cycle);
    return new Chart(
        chart.circuit.title(),
        "One period of the line, " + input.fileName(),
        chart.wording.line(chart.circuit.line()),
        Cautions.standing(),
        List.of(chart.figures(), chart.curves()),
        List.of());
  }

  private Page figures() {
    List<Block> blocks = new ArrayList<>();
    Cautions cautions = new Cautions(input.first(), input.first().findings(), wording);
    cautions.hotChassis().ifPresent(blocks::add);
    blocks.add(
        new KeyFigures(
            List.of(
                new KeyFigures.Entry(
                    wording.say("{Line}"),
                    Quantity.volts(circuit.line().volts())
                        + " rms, "
                        + Quantity.of(circuit.line().hertz(), "Hz"),
                    false),
                new KeyFigures.Entry(
                    "Signal", "none; load connected to the output; settled", false),
                new KeyFigures.Entry(
                    "Reckoned",
                    "the whole netlist stepped through time, "
                        + cycle.periods()
                        + " periods, until the last was like the one before",
                    false))));
    blocks.add(supplyNodes());
    if (!cycle.rectifiers().isEmpty()) {
      blocks.add(rectifiers());
    }
    if (!cycle.windings().isEmpty()) {
      blocks.add(windings());
    }
    blocks.add(cautions.box());
    return new Page("One period", blocks);
  }

  private Table supplyNodes() {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Node", Use.WORDS),
            new Table.Column("Mean V", Use.KEY_FIGURES),
            new Table.Column("Lowest", Use.FIGURES),
            new Table.Column("Highest", Use.FIGURES),
            new Table.Column("Ripple rms", Use.FIGURES),
            new Table.Column("Chart says", Use.FIGURES));
    List<Table.Row> rows = new ArrayList<>();
    for (SupplyNode supply : averaged.map().supplyNodes()) {
      Node node = supply.node();
      double lowest = Double.POSITIVE_INFINITY;
      double highest = Double.NEGATIVE_INFINITY;
      for (double volts : cycle.volts(node)) {
        lowest = Math.min(lowest, volts);
        highest = Math.max(highest, volts);
      }
      rows.add(
          new Table.Row(
              node.name(),
              Quantity.plainVolts(cycle.meanVolts(node)),
              Quantity.plainVolts(lowest),
              Quantity.plainVolts(highest),
              Quantity.of(cycle.rippleVoltsRms(node), "V"),
              Quantity.plainVolts(averaged.volts(node))));
    }
    return Table.of("Supply nodes", columns, rows);
  }

  private Table rectifiers() {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Rectifier", Use.WORDS),
            new Table.Column("Mean", Use.FIGURES),
            new Table.Column("Peak", Use.KEY_FIGURES),
            new Table.Column("Limit", Use.FIGURES),
            new Table.Column("Inverse V", Use.KEY_FIGURES),
            new Table.Column("Limit V", Use.FIGURES));
    List<Table.Row> rows = new ArrayList<>();
    for (RectifierLoad load : cycle.rectifiers()) {
      Element part = load.rectifier();
      double peakLimit = Double.NaN;
      double inverseLimit = Double.NaN;
      String name = part.name();
      if (part instanceof RectifierSection section) {
        RectifierRatings ratings = section.type().rectifierRatings();
        peakLimit = ratings.peakPlateAmpsMax();
        inverseLimit = ratings.peakInverseVoltsMax();
        name += section.plates().size() > 1 ? wording.say(" {plate} ") + (load.plate() + 1) : "";
      }
      rows.add(
          new Table.Row(
              name,
              Quantity.amps(load.meanAmps()),
              Quantity.amps(load.peakAmps()),
              Double.isNaN(peakLimit) ? "" : Quantity.amps(peakLimit),
              Quantity.plainVolts(load.inverseVolts()),
              Double.isNaN(inverseLimit) ? "" : Quantity.plainVolts(inverseLimit)));
    }
    return Table.of("Rectifiers", columns, rows);
  }

  private Table windings() {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Winding", Use.WORDS),
            new Table.Column("Between", Use.WORDS),
            new Table.Column("No load V AC", Use.FIGURES),
            new Table.Column("Under load V AC", Use.KEY_FIGURES),
            new Table.Column("Current rms", Use.FIGURES),
            new Table.Column("Peak", Use.FIGURES));
    List<Table.Row> rows = new ArrayList<>();
    for (WindingLoad load : cycle.windings()) {
      Winding winding = load.winding();
      Winding.Section section = winding.sections().get(load.section());
      double scale = circuit.line().scale(winding.atLineVolts());
      rows.add(
          new Table.Row(
              winding.name(),
              section.a().name() + " and " + section.b().name(),
              Quantity.plainVolts(section.openRmsVolts() * scale),
              Quantity.plainVolts(load.rmsVolts()),
              Quantity.amps(load.rmsAmps()),
              Quantity.amps(load.peakAmps())));
    }
    return Table.of("Windings under load", columns, rows);
  }

  private Page curves() {
    List<Block> blocks = new ArrayList<>();
    for (SupplyNode supply : averaged.map().supplyNodes()) {
      if (supply.parent() == null && supply.group() >= 0) {
        blocks.add(curve(supply.node()));
      }
    }
    if (blocks.isEmpty()) {
      blocks.add(new Paragraph("No rectifier feeds a supply node."));
    }
    return new Page("What a scope shows", blocks);
  }

  private Plot curve(Node node) {
    double[] seconds = cycle.seconds();
    double[] volts = cycle.volts(node);
    List<Spot> spots = new ArrayList<>();
    double lowest = volts[volts.length - 1];
    double highest = lowest;
    spots.add(new Spot(0, lowest));
    for (int k = 0; k < seconds.length; k++) {
      spots.add(new Spot(1000 * seconds[k], volts[k]));
      lowest = Math.min(lowest, volts[k]);
      highest = Math.max(highest, volts[k]);
    }
    double margin = Math.max(MARGIN * (highest - lowest), 1e-3 * Math.abs(highest));
    Plot.Axis time = Ticks.axis("time, ms", 1000 * seconds[seconds.length - 1], TICKS);
    Plot.Axis axis = Ticks.around("volts", lowest - margin, highest + margin, TICKS);
    return new Plot(
        "Node " + node.name(),
        time,
        axis,
        List.of(new Plot.Curve("", Plot.Line.PLAIN, spots)),
        List.of());
  }
}
