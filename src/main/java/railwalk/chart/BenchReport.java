package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.circuit.Circuit;
import railwalk.diagnosis.Diagnosis;
import railwalk.diagnosis.Fault;
import railwalk.diagnosis.FoundValue;
import railwalk.diagnosis.JudgedReading;
import railwalk.diagnosis.NextProbe;
import railwalk.diagnosis.Probe;
import railwalk.diagnosis.Suspect;
import railwalk.diagnosis.Verdict;
import railwalk.readings.Reading;
import railwalk.units.PreferredOhms;
import railwalk.units.Quantity;

/**
 * What a sheet of readings comes to, as pages: conditions, the likeliest explanations with their
 * evidence, what to read next, and every reading through the three steps to its verdict.
 */
public final class BenchReport {

  /** From here on what is left to do is to prove it. */
  private static final double NEARLY_CERTAIN = 0.9;

  private static final int MOST_SILENT = 40;

  private final ChartInput input;
  private final Diagnosis diagnosis;
  private final Circuit circuit;
  private final Wording wording;
  private final FaultWords faults;
  private final BenchWords words;
  private final ConfirmWords confirm;
  private final List<FoundValue> values;

  private BenchReport(ChartInput input, Diagnosis diagnosis, List<FoundValue> values) {
    this.values = List.copyOf(values);
    this.input = input;
    this.diagnosis = diagnosis;
    this.circuit = diagnosis.benched().circuit();
    this.wording = new Wording(circuit.words());
    this.faults = new FaultWords(circuit, wording);
    this.words = new BenchWords(diagnosis, faults);
    this.confirm = new ConfirmWords(circuit, wording, words);
  }

  /**
   * Returns the report.
   *
   * @param input the amplifier at the bench's line, in its first column
   * @param values found from the readings; empty when the netlist leaves none open
   */
  public static BenchReport of(ChartInput input, Diagnosis diagnosis, List<FoundValue> values) {
    return new BenchReport(input, diagnosis, values);
  }

  /** Returns the report's pages. */
  public Chart chart() {
    return new Chart(
        circuit.title(),
        "Bench report, " + input.fileName(),
        new ConditionsPage(input, input.first().findings(), wording).inOneLine(),
        Cautions.standing(),
        List.of(
            verdictPage(),
            new ReadingsPage(circuit, wording).page(diagnosis.readings()),
            cautionsPage()),
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
    List<BenchFigures.Value> found = values.stream().map(BenchReport::figures).toList();
    return new BenchFigures(conditions, points, suspects, next, found);
  }

  private static BenchFigures.Value figures(FoundValue value) {
    boolean preferred = value.determined() && value.resistor();
    return new BenchFigures.Value(
        value.element(),
        value.determined(),
        value.determined() ? value.ohms() : Double.NaN,
        value.logDeviation(),
        preferred ? PreferredOhms.nearest(value.ohms()) : Double.NaN,
        value.toldBy(),
        value.missing().map(Probe::name).orElse(""),
        value.missing().map(probe -> probe.kind().word()).orElse(""));
  }

  private BenchFigures.Suspect figures(Suspect suspect) {
    List<String> supporting = suspect.supporting().stream().map(words::speaksFor).toList();
    List<String> against =
        suspect.against().stream().map(e -> words.speaksAgainst(e, suspect)).toList();
    boolean one = suspect.faults().size() == 1;
    return new BenchFigures.Suspect(
        suspect.faults().stream().map(Fault::element).collect(Collectors.joining(" and ")),
        suspect.kind() == Suspect.Kind.HEALTHY
            ? "healthy"
            : suspect.kind() == Suspect.Kind.FAULT ? words.name(suspect) : "not this amp",
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
          .ifPresent(suspect -> meant.add(words.name(suspect)));
    }
    return String.join("; or ", meant);
  }

  private Page verdictPage() {
    List<Block> blocks = new ArrayList<>();
    Cautions cautions = new Cautions(input.first(), input.first().findings(), wording);
    cautions.hotChassis().ifPresent(blocks::add);
    blocks.add(new KeyFigures(conditions()));
    if (!values.isEmpty()) {
      blocks.add(new Heading("Values found"));
      blocks.add(ValuesTable.of(values));
    }
    blocks.add(new Heading("What explains the readings"));
    blocks.add(new SuspectTable(diagnosis, faults, words).table());
    blocks.add(new Heading("Read next"));
    blocks.add(next());
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
    String slips = slips();
    if (!slips.isEmpty()) {
      entries.add(new KeyFigures.Entry("Read again", slips, true));
    }
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
      case HEALTHY ->
          slips().isEmpty()
              ? "nothing wrong shows in these readings"
              : "nothing wrong shows, but for what looks like a slip: read it again";
      case NOT_THIS_AMPLIFIER ->
          "no single fault explains the readings: is the netlist this amplifier?";
      case FAULT -> {
        List<String> alike =
            firstGroup().stream()
                .filter(s -> s.kind() == Suspect.Kind.FAULT)
                .map(words::name)
                .toList();
        double together = firstGroup().stream().mapToDouble(Suspect::probability).sum();
        String sure =
            together >= NEARLY_CERTAIN
                ? ""
                : "most likely (" + SuspectTable.share(together) + "): ";
        yield alike.size() == 1
            ? sure + alike.get(0)
            : sure
                + "one of "
                + alike.size()
                + " that read alike: "
                + String.join("; ", alike.subList(0, alike.size() - 1))
                + "; or "
                + alike.get(alike.size() - 1);
      }
    };
  }

  private String slips() {
    return diagnosis.readings().stream()
        .map(Slips::question)
        .flatMap(Optional::stream)
        .collect(Collectors.joining(" "));
  }

  private List<Suspect> firstGroup() {
    return SuspectTable.groups(diagnosis).get(0);
  }

  private Block next() {
    List<Remarks.Remark> steps = new ArrayList<>();
    Suspect first = diagnosis.suspects().get(0);
    double together = firstGroup().stream().mapToDouble(Suspect::probability).sum();
    if (together >= NEARLY_CERTAIN) {
      confirm
          .test(first)
          .ifPresent(
              test -> steps.add(new Remarks.Remark("Before a part is changed", "", test, "")));
    }
    if (diagnosis.nextProbe().isEmpty()) {
      if (!steps.isEmpty()) {
        return new Remarks(steps);
      }
      return new Paragraph(
          diagnosis.healthy()
              ? "No further reading would change this answer much."
              : "No further reading tells the suspects above apart better than these do.");
    }
    NextProbe next = diagnosis.nextProbe().get();
    steps.add(new Remarks.Remark("", "", action(next.probe()), ""));
    for (NextProbe.Outcome outcome : next.outcomes()) {
      steps.add(new Remarks.Remark(about(next.probe(), outcome.value()), "", meant(outcome), ""));
    }
    return new Remarks(steps);
  }

  private static String about(Probe probe, double value) {
    String figure = BenchWords.figure(probe.kind(), value);
    return figure.equals("open") ? "No end to it" : "About " + figure;
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
