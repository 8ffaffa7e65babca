package railwalk.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import railwalk.circuit.Bottle;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;
import railwalk.source.Diagnostic;
import railwalk.units.Quantity;
import railwalk.walk.RippleGroup;
import railwalk.walk.SupplyNode;

/** The cautions that go with a chart: some always, some where the circuit asks for them. */
final class Cautions {
  /** Code of the finding that line and chassis are one. */
  static final String HOT_CHASSIS = "hot-chassis";

  /** Ways of the line to the chassis that the large box names. */
  private static final int MOST_SHOWN = 3;

  private final List<Diagnostic> findings;
  private final Column first;
  private final Circuit circuit;
  private final Wording wording;
  private final String highest;

  /**
   * @param findings on the netlist as it stands, most urgent first
   */
  Cautions(Column first, List<Diagnostic> findings, Wording wording) {
    this(first, findings, wording, highestOf(first));
  }

  /**
   * @param highest a sentence on the highest volts that the pages show
   */
  Cautions(Column first, List<Diagnostic> findings, Wording wording, String highest) {
    this.first = first;
    this.findings = findings;
    this.circuit = first.circuit();
    this.wording = wording;
    this.highest = highest;
  }

  /** Returns one sentence for the foot of every sheet. */
  static String standing() {
    return "Computed figures: a low one is never proof that a point is safe.";
  }

  /** Returns the large box, where a finding says that the line reaches the chassis. */
  Optional<Caution> hotChassis() {
    List<String> points =
        findings.stream()
            .filter(d -> d.code().equals(HOT_CHASSIS))
            .map(d -> sentence(d.message()))
            .distinct()
            .toList();
    if (points.isEmpty()) {
      return Optional.empty();
    }
    List<String> all = new ArrayList<>(points.subList(0, Math.min(MOST_SHOWN, points.size())));
    if (points.size() > MOST_SHOWN) {
      all.add((points.size() - MOST_SHOWN) + " more ways are listed under Findings.");
    }
    all.add(
        wording.say(
            "Touch nothing metal while the plug is in. Work behind an isolating transformer only, and"
                + " measure chassis to a true {ground} before every session."));
    return Optional.of(new Caution(Caution.Weight.LARGE, "Hot chassis", all));
  }

  /** Returns a finding's message as a sentence; the title says "hot chassis" already. */
  private static String sentence(String message) {
    String plain = message.replaceFirst("^hot chassis: ", "");
    return plain.substring(0, 1).toUpperCase(Locale.ROOT) + plain.substring(1) + ".";
  }

  /** Returns the box of cautions. */
  Caution box() {
    List<String> points = new ArrayList<>();
    points.add(highVolts());
    tappedWinding().ifPresent(points::add);
    points.add(
        "This chart is for people trained to work on live equipment; anyone else hands the"
            + " amplifier to a qualified technician. House wiring is a licensed electrician’s work,"
            + " and local rules come before anything printed here.");
    points.add(discharge());
    points.add(
        "One hand only, the other away from metal. Clip the negative lead first, then probe. Never"
            + " alone, no rings, no watch.");
    points.add(
        "Meter, leads and probes must be rated for these volts and for the measurement category of"
            + " the circuit.");
    points.add(lineOnChassis());
    points.add(powerUp());
    points.add("Replace fuses by the same type and value, nothing else.");
    points.add(
        "All figures here are computed. A low figure on paper is never proof that a point is safe:"
            + " measure before you touch.");
    return new Caution(Caution.Weight.PLAIN, "Before you measure", points);
  }

  private static String highestOf(Column first) {
    Optional<Node> highest =
        Stream.concat(
                first.map().supplyNodes().stream().map(SupplyNode::node),
                first.circuit().nodes().stream())
            .filter(n -> !Double.isNaN(first.point().volts(n)))
            .max(Comparator.comparingLong(n -> Math.round(Math.abs(first.point().volts(n)))));
    return highest
        .map(
            n ->
                "The highest on this chart is "
                    + Quantity.volts(first.point().volts(n))
                    + " at "
                    + n.name()
                    + "; it rises when {tubes} are out.")
        .orElse("");
  }

  private String highVolts() {
    return wording
        .say(
            "These volts kill. More than 300 V DC is ordinary under such a chassis, 500 V common in"
                + " larger amplifiers, 700 V and more does occur, and a few tens of milliamperes"
                + " through the chest are enough. "
                + highest)
        .strip();
  }

  private Optional<String> tappedWinding() {
    return first.map().groups().stream()
        .map(RippleGroup::elements)
        .flatMap(List::stream)
        .filter(Winding.class::isInstance)
        .map(Winding.class::cast)
        .filter(w -> w.sections().size() > 1)
        .max(Comparator.comparingDouble(this::endToEndVolts))
        .map(
            w ->
                w.name()
                    + " has "
                    + Quantity.volts(endToEndVolts(w))
                    + " AC from end to end, beyond the range of many meters: read each half to the"
                    + " tap, never across the whole.");
  }

  private double endToEndVolts(Winding winding) {
    double written = winding.sections().stream().mapToDouble(Winding.Section::openRmsVolts).sum();
    return written * circuit.line().scale(winding.atLineVolts());
  }

  private String discharge() {
    String text =
        "Pull the plug for everything but the reading itself. Capacitors stay charged: bring each"
            + " down through a power resistor on insulated clips, leave the clip on, check with the"
            + " meter, then check again.";
    return canBelowReference()
        ? text
            + " Here a supply capacitor’s can or negative end is not at the reference: it carries"
            + " volts of its own."
        : text;
  }

  /** Returns whether a reservoir stands with its negative end off the reference. */
  private boolean canBelowReference() {
    List<Node> outputs =
        first.map().groups().stream().map(RippleGroup::outputs).flatMap(List::stream).toList();
    return circuit.elements(Capacitor.class).stream()
        .filter(c -> outputs.contains(c.a()) || outputs.contains(c.b()))
        .map(c -> outputs.contains(c.a()) ? c.b() : c.a())
        .filter(n -> !outputs.contains(n))
        .mapToDouble(n -> first.point().volts(n))
        .anyMatch(volts -> Math.abs(volts) > 1);
  }

  private String lineOnChassis() {
    String general =
        "Transformerless sets and old ones with a two-wire cord can have the {line} on the chassis,"
            + " through a capacitor or outright. Have a qualified person replace a"
            + " {line}-to-chassis capacitor by a safety-rated part.";
    if (!lineIsInTheCircuit()) {
      return wording.say(general);
    }
    return wording.say(
        general
            + " This one is wired to the {line}: feed it from an isolating transformer (a variable"
            + " transformer does not isolate; behind an isolating one a {ground}-fault trip no longer"
            + " protects you). Never join a live chassis to {ground} or to a scope’s clip.");
  }

  private boolean lineIsInTheCircuit() {
    return circuit.elements(Winding.class).stream().anyMatch(Winding::wall)
        || hotChassis().isPresent();
  }

  private String powerUp() {
    StringBuilder text =
        new StringBuilder(
            "First power-up through a series lamp, with a load on the output. Glass is hot enough"
                + " to burn.");
    if (circuit.bottles().stream().anyMatch(Cautions::holdsMercury)) {
      text.append(" There is mercury in this set: broken glass means poisonous vapour.");
    }
    if (circuit.elements(Diode.class).stream().anyMatch(Cautions::isSelenium)) {
      text.append(" A burnt selenium rectifier gives off poisonous fumes: air the room.");
    }
    return text.toString();
  }

  private static boolean holdsMercury(Bottle bottle) {
    return bottle.type().summary().toLowerCase(Locale.ROOT).contains("mercury");
  }

  private static boolean isSelenium(Diode diode) {
    return diode.typeName().toUpperCase(Locale.ROOT).startsWith("SELEN");
  }
}
