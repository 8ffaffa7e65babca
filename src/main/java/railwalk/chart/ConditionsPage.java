package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Line;
import railwalk.circuit.Meter;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Spread;
import railwalk.circuit.State;
import railwalk.circuit.Switch;
import railwalk.source.Diagnostic;
import railwalk.spread.Sampling;
import railwalk.units.Quantity;

/** The first page: what the figures hold for, and the cautions. */
final class ConditionsPage {
  private final ChartInput input;
  private final List<Diagnostic> findings;
  private final Circuit circuit;
  private final Wording wording;

  /**
   * @param findings on the netlist as it stands, most urgent first
   */
  ConditionsPage(ChartInput input, List<Diagnostic> findings, Wording wording) {
    this.input = input;
    this.findings = findings;
    this.circuit = input.first().circuit();
    this.wording = wording;
  }

  Page page() {
    Cautions cautions = new Cautions(input.first(), findings, wording);
    List<Block> blocks = new ArrayList<>();
    cautions.hotChassis().ifPresent(blocks::add);
    blocks.add(new Heading("Conditions"));
    blocks.add(new KeyFigures(conditions()));
    blocks.add(new FillIn(List.of("Date", "Owner’s mark", "Technician", "Meter used")));
    blocks.add(cautions.box());
    return new Page("", blocks);
  }

  /** Returns the conditions in one line, for the head of every sheet. */
  String inOneLine() {
    Line line = circuit.line();
    String volts =
        line.stated()
            ? Quantity.volts(line.volts()) + wording.say(" {line}")
            : "windings as written";
    return volts
        + " · "
        + meterShort(circuit.meter())
        + " meter · black lead on "
        + circuit.reference().name();
  }

  private List<KeyFigures.Entry> conditions() {
    List<KeyFigures.Entry> entries = new ArrayList<>();
    entries.add(plain(wording.say("{Line}"), lineText(circuit.line())));
    entries.add(plain("Meter", meterText(circuit.meter())));
    entries.add(new KeyFigures.Entry("Black lead on", circuit.reference().name(), true));
    if (chassisApart()) {
      entries.add(
          plain("Chassis", "is not the reference: clip the black lead to the node named above"));
    }
    entries.add(plain("Signal", "none; all volts are DC; load connected to the output"));
    controls().ifPresent(entries::add);
    for (Switch contact : circuit.elements(Switch.class)) {
      entries.add(plain("Switch", contact.name() + " " + SwitchWords.joined(contact)));
    }
    entries.add(plain(wording.say("{Tubes} in"), tubesIn()));
    entries.add(plain("Low–high", bandText(circuit.spread(), input.first().bands().sampling())));
    entries.add(findingsEntry());
    for (State state : statesShown()) {
      entries.add(
          plain("State", state.name() + ": " + new StateWords(circuit, wording).changes(state)));
    }
    return entries;
  }

  private KeyFigures.Entry findingsEntry() {
    long here = findings.stream().filter(NotesPage::isFinding).count();
    long inStates = new NotesPage(input, findings).findings().size() - here;
    String counted =
        (here == 0 ? "none as it stands" : warnings(here))
            + (inStates == 0 ? "" : ", " + inStates + " more in its states");
    return here + inStates == 0
        ? plain("Findings", "none")
        : new KeyFigures.Entry("Findings", counted + ": listed at the end", true);
  }

  private static String warnings(long count) {
    return count + (count == 1 ? " warning" : " warnings");
  }

  private List<State> statesShown() {
    return circuit.states().stream()
        .filter(s -> input.states().stream().anyMatch(c -> c.state().equals(s.name())))
        .toList();
  }

  private boolean chassisApart() {
    return circuit.node("chassis").filter(n -> !n.equals(circuit.reference())).isPresent();
  }

  private String lineText(Line line) {
    String hertz = Quantity.of(line.hertz(), "Hz");
    if (!line.stated()) {
      return "not stated: windings as written, " + hertz;
    }
    String text = Quantity.volts(line.volts()) + " rms, " + hertz;
    return line.designVolts() == line.volts()
        ? text
        : text + "; windings are given for " + Quantity.volts(line.designVolts());
  }

  private static String meterShort(Meter meter) {
    return Double.isNaN(meter.ohmsPerVolt())
        ? Quantity.ohms(meter.ohms())
        : Quantity.ohms(meter.ohmsPerVolt()) + "/V";
  }

  static String meterText(Meter meter) {
    if (Double.isNaN(meter.ohmsPerVolt())) {
      return meterShort(meter) + " on every range";
    }
    String ranges =
        meter.rangesVolts().stream().map(Quantity::plainVolts).collect(Collectors.joining(", "));
    return meterShort(meter) + "; ranges " + ranges + " V, each point on the lowest that holds it";
  }

  private Optional<KeyFigures.Entry> controls() {
    List<Potentiometer> controls = circuit.elements(Potentiometer.class);
    if (controls.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        plain(
            "Controls",
            controls.stream()
                .map(ConditionsPage::controlText)
                .collect(
                    Collectors.joining(
                        ", ",
                        "",
                        " (0 % has the wiper at the first end named, 100 % at the last)"))));
  }

  private static String controlText(Potentiometer control) {
    return control.name()
        + " "
        + Quantity.ohms(control.ohms())
        + " at "
        + Quantity.percent(control.share())
        + " from "
        + control.b().name()
        + " to "
        + control.a().name();
  }

  private String tubesIn() {
    List<Socket> sockets = Socket.in(circuit);
    if (sockets.isEmpty()) {
      return "none";
    }
    return sockets.stream()
        .map(s -> s.name() + " " + s.typeName())
        .collect(Collectors.joining(", ", "all: ", ""));
  }

  private String bandText(Spread spread, @Nullable Sampling sampling) {
    String tubes = spread.usedTubes() ? "used {tubes} −35 % to +20 %" : newTubes(spread);
    String resistors =
        spread.carbonResistors()
            ? "carbon-composition resistors −"
                + Quantity.percent(spread.resistor() - Spread.CARBON_DRIFT)
                + " to +"
                + Quantity.percent(spread.resistor() + Spread.CARBON_DRIFT)
            : "resistors ±" + Quantity.percent(spread.resistor());
    return wording.say(
        "nine healthy amplifiers in ten fall between: "
            + (sampling == null
                ? "first order, ±1.645 standard deviations, with "
                : sampledText(sampling) + ", with ")
            + resistors
            + " where no tolerance is given, "
            + tubes
            + ", windings ±"
            + Quantity.percent(spread.winding())
            + ", {line} ±"
            + Quantity.percent(spread.line()));
  }

  private static String sampledText(Sampling sampling) {
    String builds = String.format(Locale.ROOT, "%,d builds solved", sampling.builds());
    String left =
        sampling.unsettled() == 0
            ? ""
            : " (" + sampling.unsettled() + " without an operating point left out)";
    return "the 5 % and 95 % points of " + builds + left + ", seed " + sampling.seed();
  }

  private static String newTubes(Spread spread) {
    return Double.isNaN(spread.tube())
        ? "each {tube} type’s own limits"
        : "{tube} current ±" + Quantity.percent(spread.tube());
  }

  private static KeyFigures.Entry plain(String label, String text) {
    return new KeyFigures.Entry(label, text, false);
  }
}
