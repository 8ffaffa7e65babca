package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.chart.Table.Use;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.RectifierSection;
import railwalk.solve.WarmUpCourse;
import railwalk.solve.WarmUpOutcome;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;
import railwalk.units.Quantity;

/** What the supply does from switch-on, as pages. */
public final class WarmUpChart {
  private final ChartInput input;
  private final List<WarmUpCase> cases;
  private final WarmUpCourse hot;
  private final List<Diagnostic> findings;
  private final Circuit circuit;
  private final Wording wording;

  private WarmUpChart(
      ChartInput input, List<WarmUpCase> cases, WarmUpCourse hot, List<Diagnostic> findings) {
    this.input = input;
    this.cases = cases;
    this.hot = hot;
    this.findings = findings;
    this.circuit = input.first().circuit();
    this.wording = new Wording(circuit.words());
  }

  /**
   * Returns the pages.
   *
   * @param input the averaged solution of the netlist as it stands
   * @param cases ways of switching on, the cold one of the netlist as it stands first; that one was
   *     followed to its end
   * @param hot the course of a hot restart, for the first charge of its reservoirs
   * @param findings of the warm-up, with their places
   */
  public static Chart of(
      ChartInput input, List<WarmUpCase> cases, WarmUpCourse hot, List<Diagnostic> findings) {
    WarmUpChart chart = new WarmUpChart(input, cases, hot, findings);
    return new Chart(
        chart.circuit.title(),
        "From switch-on, " + input.fileName(),
        chart.wording.line(chart.circuit.line()),
        Cautions.standing(),
        List.of(chart.figures(), chart.curves()),
        List.of());
  }

  private Page figures() {
    List<Block> blocks = new ArrayList<>();
    Cautions cautions =
        new Cautions(
            input.first(), input.first().findings(), wording, new WarmUpTable(cases).highest());
    cautions.hotChassis().ifPresent(blocks::add);
    blocks.add(conditions());
    blocks.add(new WarmUpTable(cases).table());
    blocks.add(new CathodeTable(circuit, wording).table());
    Table charges = firstCharges();
    if (charges != null) {
      blocks.add(charges);
    }
    blocks.add(new Heading("Findings"));
    blocks.add(findings.isEmpty() ? new Paragraph("None.") : remarks());
    blocks.add(
        new Paragraph(
            wording.say(
                "How far to trust it: seconds are those of a usual {tube} of its kind and differ by"
                    + " a third and more from one to the next. The highest volts hardly depend on"
                    + " them as long as rectifier and {tubes} come up in the same order; where they"
                    + " come up within a few seconds of each other it can go either way. A cathode"
                    + " on its way up is taken to pass a share of its hot current at the same volts."
                    + " Volts are means over a {line} period: half the ripple comes on top. Heaters"
                    + " are taken to get their rated volts from the first moment. After: when the"
                    + " volts first come within half a per cent of the highest.")));
    blocks.add(cautions.box());
    return new Page("From switch-on", blocks);
  }

  private KeyFigures conditions() {
    return new KeyFigures(
        List.of(
            new KeyFigures.Entry(
                wording.say("{Line}"),
                Quantity.volts(circuit.line().volts())
                    + " rms, "
                    + Quantity.of(circuit.line().hertz(), "Hz"),
                false),
            new KeyFigures.Entry("Signal", "none; load connected to the output", false),
            new KeyFigures.Entry(
                "Reckoned",
                wording.say(
                    "a minute of {line} periods, each averaged, while cathodes warm up and"
                        + " capacitors charge"),
                false)));
  }

  private @Nullable Table firstCharges() {
    Map<Element, Double> peaks = new LinkedHashMap<>();
    for (WarmUpCourse.FirstCharge charge : hot.firstCharges()) {
      if (charge.peakAmps() > 0) {
        peaks.merge(charge.rectifier(), charge.peakAmps(), Math::max);
      }
    }
    if (peaks.isEmpty()) {
      return null;
    }
    List<Table.Row> rows = new ArrayList<>();
    peaks.forEach(
        (rectifier, amps) -> {
          double limit =
              rectifier instanceof RectifierSection section
                  ? section.type().rectifierRatings().peakPlateAmpsMax()
                  : Double.NaN;
          rows.add(
              new Table.Row(
                  rectifier.name(),
                  Quantity.amps(amps),
                  Double.isNaN(limit) ? "" : Quantity.amps(limit)));
        });
    return new Table(
        "First charge, rectifier hot, capacitors empty",
        List.of(
            new Table.Column("Rectifier", Use.WORDS),
            new Table.Column("Peak", Use.KEY_FIGURES),
            new Table.Column("Limit", Use.FIGURES)),
        List.of(
            new Table.Group(
                "",
                "",
                rows,
                List.of(
                    wording.say(
                        "Switched on as the {line} passes zero; at its crest more. Windings and"
                            + " {tube} alone hold it down, the {line}’s own resistance and the"
                            + " transformer’s leakage are left out. The limit is that of every"
                            + " period; for the few of a first charge sheets allow more, how much"
                            + " is not in the data.")))));
  }

  private Remarks remarks() {
    List<Remarks.Remark> remarks = new ArrayList<>();
    for (Diagnostic finding : findings) {
      SourceSpan span = finding.span();
      String place = span == null ? "" : span.text().fileName() + " line " + span.line();
      remarks.add(
          new Remarks.Remark(finding.severity().word(), place, finding.message(), finding.hint()));
    }
    return new Remarks(remarks);
  }

  private Page curves() {
    WarmUpCase cold = cases.get(0);
    List<Block> blocks = new ArrayList<>();
    if (cold.outcome() instanceof WarmUpOutcome.Followed followed) {
      blocks.addAll(new WarmUpCurves(followed.course()).plots(cold.running().map()));
    }
    if (blocks.isEmpty()) {
      blocks.add(new Paragraph("There is no supply node."));
    }
    return new Page(cold.title() + ": volts against time", blocks);
  }
}
