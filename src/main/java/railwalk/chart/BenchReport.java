package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.chart.Table.Use;
import railwalk.circuit.Circuit;
import railwalk.diagnosis.Diagnosis;
import railwalk.diagnosis.Evidence;
import railwalk.diagnosis.Fault;
import railwalk.diagnosis.JudgedReading;
import railwalk.diagnosis.NextProbe;
import railwalk.diagnosis.Probe;
import railwalk.diagnosis.Suspect;
import railwalk.diagnosis.Verdict;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;
import railwalk.units.Quantity;

/**
 * What a sheet of readings comes to, as pages: conditions, the likeliest explanations with their
 * evidence, what to read next, and every reading through the three steps to its verdict.
 */
public final class BenchReport {
  private static final int MOST_EVIDENCE = 3;
  private static final int MOST_SILENT = 40;

  private final ChartInput input;
  private final Diagnosis diagnosis;
  private final Circuit circuit;
  private final Wording wording;
  private final FaultWords faults;

  private BenchReport(ChartInput input, Diagnosis diagnosis) {
    this.input = input;
    this.diagnosis = diagnosis;
    this.circuit = diagnosis.benched().circuit();
    this.wording = new Wording(circuit.words());
    this.faults = new FaultWords(circuit, wording);
  }

  /**
   * Returns the report.
   *
   * @param input the amplifier at the bench's line, in its first column
   */
  public static BenchReport of(ChartInput input, Diagnosis diagnosis) {
    return new BenchReport(input, diagnosis);
  }

  /** Returns the report's pages. */
  public Chart chart() {
    return new Chart(
        circuit.title(),
        "Bench report, " + input.fileName(),
        new ConditionsPage(input, input.first().findings(), wording).inOneLine(),
        Cautions.standing(),
        List.of(verdictPage(), readingsPage(), cautionsPage()),
        List.of());
  }

  /** Returns the same for machines. */
  public BenchFigures figures() {
    List<BenchFigures.Point> points = new ArrayList<>();
    for (JudgedReading judged : diagnosis.readings()) {
      Reading r = judged.reading();
      points.add(
          new BenchFigures.Point(
              r.point(),
              r.kind().word(),
              r.state(),
              r.value(),
              judged.expected(),
              judged.low(),
              judged.high(),
              judged.meter(),
              judged.verdict().word()));
    }
    List<BenchFigures.Suspect> suspects = new ArrayList<>();
    for (Suspect suspect : diagnosis.suspects()) {
      suspects.add(figures(suspect));
    }
    List<BenchFigures.NextProbe> next = new ArrayList<>();
    diagnosis.nextProbe().ifPresent(probe -> next.add(figures(probe)));
    Figures.Conditions conditions =
        new FiguresBuilder(input.first(), circuit).build(List.of(), "").conditions();
    return new BenchFigures(conditions, points, suspects, next);
  }

  private BenchFigures.Suspect figures(Suspect suspect) {
    List<String> supporting =
        suspect.supporting().stream()
            .map(e -> sentence(e, "healthy ", e.healthy(), ", with this ", e.suspected()))
            .toList();
    List<String> against =
        suspect.against().stream()
            .map(e -> sentence(e, "with this ", e.suspected(), "", Double.NaN))
            .toList();
    boolean one = suspect.faults().size() == 1;
    return new BenchFigures.Suspect(
        suspect.faults().stream().map(Fault::element).collect(Collectors.joining(" and ")),
        suspect.kind() == Suspect.Kind.HEALTHY
            ? "healthy"
            : suspect.kind() == Suspect.Kind.FAULT ? name(suspect) : "not this amp",
        one ? suspect.estimates().get(0) : Double.NaN,
        one ? suspect.faults().get(0).range().unit() : "",
        suspect.probability(),
        supporting,
        against,
        suspect.group());
  }

  private BenchFigures.NextProbe figures(NextProbe next) {
    List<BenchFigures.Outcome> outcomes = new ArrayList<>();
    for (NextProbe.Outcome outcome : next.outcomes()) {
      outcomes.add(new BenchFigures.Outcome(outcome.value(), meant(outcome)));
    }
    return new BenchFigures.NextProbe(
        next.probe().name(), next.probe().kind().word(), action(next.probe()), why(next), outcomes);
  }

  private static String why(NextProbe next) {
    return "tells "
        + Quantity.fixed(next.gainBits(), 2)
        + " bit of what is still open, more for its trouble than any other point";
  }

  /** Returns the likeliest suspect of each group that an outcome speaks for. */
  private String meant(NextProbe.Outcome outcome) {
    List<String> meant = new ArrayList<>();
    for (int group : outcome.groups()) {
      diagnosis.suspects().stream()
          .filter(suspect -> suspect.group() == group)
          .findFirst()
          .ifPresent(suspect -> meant.add(name(suspect)));
    }
    return String.join("; or ", meant);
  }

  private Page verdictPage() {
    List<Block> blocks = new ArrayList<>();
    Cautions cautions = new Cautions(input.first(), input.first().findings(), wording);
    cautions.hotChassis().ifPresent(blocks::add);
    blocks.add(new KeyFigures(conditions()));
    blocks.add(new Heading("What explains the readings"));
    blocks.add(new Remarks(suspects()));
    blocks.add(new Heading("Read next"));
    blocks.add(next());
    List<String> apart = apart();
    if (!apart.isEmpty()) {
      blocks.add(new Heading("Suspects that no reading tells apart"));
      apart.forEach(text -> blocks.add(new Paragraph(text)));
    }
    return new Page("Bench report", blocks);
  }

  private List<KeyFigures.Entry> conditions() {
    List<KeyFigures.Entry> entries = new ArrayList<>();
    double charted = diagnosis.charted().circuit().line().volts();
    double actual = circuit.line().volts();
    String line =
        Double.isNaN(actual)
            ? "not stated: windings as written"
            : Quantity.volts(actual)
                + (charted == actual ? ", as the chart" : "; the chart is for " + volts(charted));
    entries.add(new KeyFigures.Entry(wording.say("{Line}"), line, false));
    entries.add(new KeyFigures.Entry("Meter", ConditionsPage.meterText(circuit.meter()), false));
    entries.add(new KeyFigures.Entry("Readings", counted(), false));
    entries.add(new KeyFigures.Entry("Result", result(), true));
    if (diagnosis.starving()) {
      entries.add(
          new KeyFigures.Entry(
              wording.say("{Line} low"),
              wording.say(
                  "under 85 % of design: heaters starve, so only opens and shorts are judged"),
              true));
    }
    return entries;
  }

  private static String volts(double volts) {
    return Double.isNaN(volts) ? "windings as written" : Quantity.volts(volts);
  }

  private String counted() {
    long outside = diagnosis.readings().stream().filter(r -> r.verdict().outside()).count();
    long within = diagnosis.readings().stream().filter(r -> r.verdict() == Verdict.WITHIN).count();
    long rest = diagnosis.readings().size() - outside - within;
    return diagnosis.readings().size()
        + ": "
        + within
        + " within, "
        + outside
        + " outside"
        + (rest == 0 ? "" : ", " + rest + " not judged");
  }

  private String result() {
    Suspect first = diagnosis.suspects().get(0);
    return switch (first.kind()) {
      case HEALTHY -> "nothing wrong shows in these readings";
      case NOT_THIS_AMPLIFIER ->
          "no single fault explains the readings: is the netlist this amplifier?";
      case FAULT -> name(first);
    };
  }

  private String name(Suspect suspect) {
    return switch (suspect.kind()) {
      case HEALTHY -> "a healthy amplifier, or a fault that these readings do not show";
      case NOT_THIS_AMPLIFIER -> "not the amplifier of this netlist, or more than one fault";
      case FAULT -> {
        List<String> names = new ArrayList<>();
        for (int i = 0; i < suspect.faults().size(); i++) {
          names.add(faults.name(suspect.faults().get(i), suspect.estimates().get(i)));
        }
        yield String.join("; and ", names);
      }
    };
  }

  private List<Remarks.Remark> suspects() {
    List<Remarks.Remark> remarks = new ArrayList<>();
    for (Suspect suspect : diagnosis.suspects()) {
      List<String> hints = new ArrayList<>();
      range(suspect, hints);
      evidence(suspect, hints);
      if (remarks.isEmpty()) {
        suspect.fault().flatMap(faults::cause).ifPresent(hints::add);
      }
      remarks.add(
          new Remarks.Remark(
              share(suspect.probability()), "", name(suspect), String.join(" ", hints)));
    }
    return remarks;
  }

  private static String share(double probability) {
    return probability < 0.01
        ? "<1 %"
        : probability > 0.99 ? ">99 %" : Quantity.percent(probability);
  }

  private static void range(Suspect suspect, List<String> hints) {
    for (int i = 0; i < suspect.faults().size(); i++) {
      double low = suspect.lows().get(i);
      double high = suspect.highs().get(i);
      if (!Double.isNaN(low) && high > low) {
        Fault fault = suspect.faults().get(i);
        hints.add(
            "Likely from "
                + FaultWords.figure(fault, low)
                + " to "
                + FaultWords.figure(fault, high)
                + ".");
      }
    }
  }

  private void evidence(Suspect suspect, List<String> hints) {
    List<Evidence> supporting = first(suspect.supporting());
    if (!supporting.isEmpty()) {
      hints.add(
          "For: "
              + supporting.stream()
                  .map(e -> sentence(e, "healthy ", e.healthy(), ", with this ", e.suspected()))
                  .collect(Collectors.joining("; "))
              + ".");
    }
    List<Evidence> against = first(suspect.against());
    if (!against.isEmpty()) {
      hints.add(
          "Against: "
              + against.stream()
                  .map(e -> sentence(e, "with this ", e.suspected(), "", Double.NaN))
                  .collect(Collectors.joining("; "))
              + ".");
    }
  }

  private static List<Evidence> first(List<Evidence> all) {
    return all.subList(0, Math.min(MOST_EVIDENCE, all.size()));
  }

  private String sentence(Evidence e, String one, double value, String other, double second) {
    Reading reading = diagnosis.readings().get(e.reading()).reading();
    return place(reading)
        + " reads "
        + figure(reading.kind(), reading.value())
        + ", "
        + one
        + figure(reading.kind(), value)
        + (Double.isNaN(second) ? "" : other + figure(reading.kind(), second));
  }

  private static String place(Reading reading) {
    String kind = reading.kind() == ReadingKind.DC ? "" : " (" + reading.kind().word() + ")";
    String state = reading.state().isEmpty() ? "" : " in " + reading.state();
    return reading.point() + kind + state;
  }

  static String figure(ReadingKind kind, double value) {
    return switch (kind) {
      case DC, AC -> Quantity.volts(value);
      case RIPPLE -> Quantity.of(value, "V");
      case OHMS -> Double.isInfinite(value) || value >= 2e7 ? "open" : Quantity.ohms(value);
      case MA -> Quantity.amps(value);
    };
  }

  private Block next() {
    if (diagnosis.nextProbe().isEmpty()) {
      return new Paragraph(
          diagnosis.healthy()
              ? "No further reading would change this answer much."
              : "No further reading tells the suspects above apart better than these do.");
    }
    NextProbe next = diagnosis.nextProbe().get();
    List<Remarks.Remark> outcomes = new ArrayList<>();
    for (NextProbe.Outcome outcome : next.outcomes()) {
      outcomes.add(
          new Remarks.Remark(
              "about " + figure(next.probe().kind(), outcome.value()), "", meant(outcome), ""));
    }
    outcomes.add(0, new Remarks.Remark("", "", action(next.probe()), ""));
    return new Remarks(outcomes);
  }

  /** Returns how to take a reading, in a sentence. */
  static String action(Probe probe) {
    return switch (probe.kind()) {
      case OHMS -> "Power off, discharged, tubes out: measure " + probe.name() + " in ohms.";
      case RIPPLE -> "Read the AC volts at " + probe.name() + ".";
      case AC -> "Read the AC volts of " + probe.name() + ".";
      case MA -> "Read the current through " + probe.name() + ".";
      case DC ->
          "Read the DC volts at "
              + probe.name()
              + (probe.state().isEmpty() ? "." : " with " + probe.state() + ".");
    };
  }

  /** Returns for each group of several suspects the test that separates them. */
  private List<String> apart() {
    Map<Integer, List<Suspect>> groups = new LinkedHashMap<>();
    for (Suspect suspect : diagnosis.suspects()) {
      if (suspect.kind() == Suspect.Kind.FAULT) {
        groups.computeIfAbsent(suspect.group(), g -> new ArrayList<>()).add(suspect);
      }
    }
    List<String> texts = new ArrayList<>();
    for (List<Suspect> group : groups.values()) {
      if (group.size() > 1) {
        String names = group.stream().map(this::name).collect(Collectors.joining("; "));
        Set<String> tests = new LinkedHashSet<>();
        for (Suspect other : group.subList(1, group.size())) {
          faults.apart(group.get(0).faults().get(0), other.faults().get(0)).ifPresent(tests::add);
        }
        texts.add(names + ". " + String.join(" ", tests));
      }
    }
    return texts;
  }

  private Page readingsPage() {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Point", Use.WORDS),
            new Table.Column("Expected", "Chart", Use.FIGURES),
            new Table.Column("Expected", wording.say("This {line}"), Use.FIGURES),
            new Table.Column("Expected", "This meter", Use.FIGURES),
            new Table.Column("Healthy", "Low", Use.FIGURES),
            new Table.Column("Healthy", "High", Use.FIGURES),
            new Table.Column("Read", Use.KEY_FIGURES),
            new Table.Column("Verdict", Use.WORDS));
    Map<String, List<Table.Row>> groups = new LinkedHashMap<>();
    for (JudgedReading judged : diagnosis.readings()) {
      Reading r = judged.reading();
      ReadingKind kind = r.kind();
      String title = (r.state().isEmpty() ? "" : "In state " + r.state() + ": ") + title(kind);
      groups
          .computeIfAbsent(title, t -> new ArrayList<>())
          .add(
              new Table.Row(
                  List.of(
                      r.point(),
                      bare(kind, judged.chart()),
                      bare(kind, judged.expected()),
                      bare(kind, judged.meter()),
                      bare(kind, judged.low()),
                      bare(kind, judged.high()),
                      bare(kind, r.value()),
                      judged.verdict().word()),
                  remark(judged)));
    }
    List<Table.Group> parts = new ArrayList<>();
    groups.forEach((title, rows) -> parts.add(new Table.Group(title, "", rows, List.of())));
    return new Page(
        "Readings",
        List.of(
            new Table("", columns, parts),
            new Paragraph(
                wording.say(
                    "Three steps: solved again at this {line}; the meter’s loading counted in; then"
                        + " judged. Low and high hold 99 healthy amplifiers in 100, part spreads"
                        + " carried to first order; the verdict adds the meter’s own error. Far off"
                        + " is a whole band’s width outside."))));
  }

  private static String remark(JudgedReading judged) {
    String note = judged.reading().note();
    String question =
        judged.verdict() == Verdict.QUESTIONED
            ? "Looks like a slip: sign, decimal point or range? Not counted."
            : "";
    return question.isEmpty() ? note : note.isEmpty() ? question : note + ". " + question;
  }

  private static String title(ReadingKind kind) {
    return switch (kind) {
      case DC -> "DC volts";
      case AC -> "AC volts";
      case RIPPLE -> "Ripple, volts rms";
      case OHMS -> "Ohms, power off";
      case MA -> "Milliamperes";
    };
  }

  private static String bare(ReadingKind kind, double value) {
    return switch (kind) {
      case DC, AC, RIPPLE -> Quantity.plainVolts(value);
      case OHMS -> figure(kind, value);
      case MA -> Quantity.plainVolts(1000 * value);
    };
  }

  private Page cautionsPage() {
    List<Block> blocks = new ArrayList<>();
    Cautions cautions = new Cautions(input.first(), input.first().findings(), wording);
    blocks.add(cautions.box());
    if (!diagnosis.silent().isEmpty()) {
      Set<String> names = new LinkedHashSet<>();
      for (Fault fault : diagnosis.silent()) {
        names.add(fault.element());
      }
      List<String> shown = names.stream().limit(MOST_SILENT).toList();
      blocks.add(new Heading("Not shown by these readings"));
      blocks.add(
          new Paragraph(
              diagnosis.tried()
                  + " single faults were tried. Some faults of these parts have no sign in what was"
                  + " read, so don’t stop there: "
                  + String.join(", ", shown)
                  + (names.size() > shown.size()
                      ? " and " + (names.size() - shown.size()) + " more"
                      : "")
                  + ". Open coupling, bypass and filter capacitors show in signal or ripple only."));
    }
    return new Page("Cautions", blocks);
  }
}
