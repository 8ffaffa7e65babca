package railwalk.chart;

import java.util.List;
import java.util.Optional;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.device.Electrode;
import railwalk.device.SectionCurrents;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;
import railwalk.units.Quantity;
import railwalk.walk.DcPath;
import railwalk.walk.DcPaths;
import railwalk.walk.DcStep;

/** What the tube's own law says at the volts found, and a little beside them. */
final class WalkLaw {
  /** How much more current the cross-check tries, before it is rounded. */
  private static final double TRIAL = 1.05;

  /** How much more it tries at least when rounded. */
  private static final double LEAST_TRIAL = 1.02;

  /** Below this a cathode circuit does not follow the current: it is grounded, or measured. */
  private static final double FOLLOWING_VOLTS = 0.2;

  /** Below this share of the current tried there is none worth the name. */
  private static final double CUT_OFF_SHARE = 0.02;

  /** Less than this is no current that anything could be told from. */
  private static final double NO_AMPS = 1e-6;

  private final OperatingPoint point;
  private final Circuit circuit;
  private final Wording wording;
  private final AmplifierSection section;
  private final SectionPoint at;

  WalkLaw(OperatingPoint point, Wording wording, AmplifierSection section) {
    this.point = point;
    this.circuit = point.circuit();
    this.wording = wording;
    this.section = section;
    this.at = point.at(section);
  }

  /** Returns the volts between the electrodes and the current that the type passes there. */
  String sentence() {
    boolean pentode = !Double.isNaN(at.screenVolts());
    return wording.say(
        "So grid to cathode "
            + Quantity.volts(at.gridVolts())
            + (pentode ? ", screen to cathode " + Quantity.volts(at.screenVolts()) : "")
            + " and {plate} to cathode "
            + Quantity.volts(at.plateVolts())
            + ": there "
            + article(typeName())
            + typeName()
            + " passes "
            + (cutOff() ? "no current to speak of" : currents(pentode))
            + ".");
  }

  private String currents(boolean pentode) {
    String plate = WalkAmps.said(at.plateAmps()).text();
    return pentode
        ? plate + " at its {plate} and " + WalkAmps.said(at.screenAmps()).text() + " at its screen"
        : plate;
  }

  private boolean cutOff() {
    return at.plateAmps() < NO_AMPS;
  }

  /** Returns "an " before a name that is spoken with a vowel first, such as EL84 or 807. */
  private static String article(String name) {
    return "AEFHILMNORSX8".indexOf(Character.toUpperCase(name.charAt(0))) < 0 ? "a " : "an ";
  }

  private String typeName() {
    return circuit.bottle(section.bottle()).map(b -> b.type().name()).orElse(section.name());
  }

  /**
   * Returns what would happen with a little more current, or with a volt more on the grid; empty
   * for a tube that is cut off.
   */
  Optional<String> crossCheck() {
    if (cutOff()) {
      return Optional.empty();
    }
    Optional<AmplifierSection> below = tubeBelow();
    if (below.isPresent()) {
      return Optional.of(
          below.get().name() + " below it sets the current; this section passes it on.");
    }
    double cathodeOhms = cathodeOhms();
    SectionCurrents here = new SectionCurrents();
    section.law().evaluate(at.plateVolts(), at.screenVolts(), at.gridVolts(), here);
    if (cathodeOhms * at.cathodeAmps() < FOLLOWING_VOLTS) {
      return said(
          "The cathode does not follow the current: the grid alone sets it, and a volt more there"
              + " moves it by about "
              + Quantity.amps(here.plateByGridSiemens)
              + ".");
    }
    double trial = trial(at.plateAmps());
    double more = trial - at.plateAmps();
    double share = trial / at.plateAmps();
    double cathodeVolts =
        point.volts(section.cathode()) + cathodeOhms * at.cathodeAmps() * (share - 1);
    double plateVolts = point.volts(section.plate()) - loadOhms(Electrode.PLATE) * more;
    double rise = cathodeVolts - point.volts(section.cathode());
    double screenFall =
        Double.isNaN(at.screenAmps())
            ? 0
            : loadOhms(Electrode.SCREEN) * at.screenAmps() * (share - 1);
    SectionCurrents there = new SectionCurrents();
    section
        .law()
        .evaluate(
            plateVolts - cathodeVolts,
            at.screenVolts() - screenFall - rise,
            at.gridVolts() - rise + gridRise(at.cathodeAmps() * (share - 1)),
            there);
    return said(
        "Were it "
            + WalkAmps.said(trial).text()
            + ", the cathode would rise to "
            + Quantity.volts(cathodeVolts)
            + " and the {plate} come to "
            + Quantity.volts(plateVolts)
            + outcome(there.plateAmps, trial));
  }

  /** Returns the section that this one's cathode current goes on through, if there is one. */
  private Optional<AmplifierSection> tubeBelow() {
    DcPath path = new DcPaths(point.map(), circuit).to(section, Electrode.CATHODE);
    return path.back().stream()
        .takeWhile(step -> !step.from().equals(circuit.reference()))
        .map(DcStep::element)
        .filter(AmplifierSection.class::isInstance)
        .map(AmplifierSection.class::cast)
        .findFirst();
  }

  private Optional<String> said(String sentence) {
    return Optional.of(wording.say(sentence));
  }

  private static String outcome(double amps, double trial) {
    if (amps < trial * CUT_OFF_SHARE) {
      return ", but there the {tube} would be cut off.";
    }
    return amps < trial
        ? ", but there the {tube} would pass only " + WalkAmps.said(amps).text() + "."
        : "; there it passes " + WalkAmps.said(amps).text() + ".";
  }

  /**
   * Returns how far the grid rises when the cathode's current grows by {@code moreAmps}: it does
   * where its leak hangs on the cathode circuit, by what the resistors below that tap gain.
   */
  private double gridRise(double moreAmps) {
    List<DcStep> leak = new DcPaths(point.map(), circuit).to(section, Electrode.GRID).there();
    double ohmsBelow = 0;
    for (DcStep step : cathodeSteps()) {
      if (leak.stream().anyMatch(other -> other.from().equals(step.from()))) {
        ohmsBelow = 0;
      }
      ohmsBelow += known(WalkTerms.ohms(step));
    }
    boolean hangsThere =
        cathodeSteps().stream()
            .anyMatch(step -> leak.stream().anyMatch(o -> o.from().equals(step.from())));
    return hangsThere ? ohmsBelow * moreAmps : 0;
  }

  /** Returns the steps from the cathode to the reference, or to a supply or tube below it. */
  private List<DcStep> cathodeSteps() {
    DcPath path = new DcPaths(point.map(), circuit).to(section, Electrode.CATHODE);
    return path.back().stream()
        .takeWhile(
            step ->
                !step.from().equals(circuit.reference())
                    && point.map().supplyNode(step.from()).isEmpty()
                    && !(step.element() instanceof AmplifierSection))
        .toList();
  }

  /** Returns the resistance that a plate's or screen's current passes from its supply. */
  private double loadOhms(Electrode electrode) {
    DcPath path = new DcPaths(point.map(), circuit).to(section, electrode);
    return WalkBranch.afterSupply(path).stream()
        .mapToDouble(step -> known(WalkTerms.ohms(step)))
        .sum();
  }

  /**
   * Returns the resistance that the cathode's current meets: of each part of its way as much as
   * this current's share of what flows there.
   */
  private double cathodeOhms() {
    double shared =
        circuit.elements(AmplifierSection.class).stream()
            .filter(other -> other.cathode().equals(section.cathode()))
            .filter(other -> !point.map().idleSections().contains(other.name()))
            .mapToDouble(other -> point.at(other).cathodeAmps())
            .sum();
    WalkTerms terms = new WalkTerms(point);
    return cathodeSteps().stream()
        .mapToDouble(
            step -> known(WalkTerms.ohms(step)) * Math.min(1, Math.abs(terms.amps(step)) / shared))
        .sum();
  }

  private static double known(double ohms) {
    return Double.isNaN(ohms) ? 0 : ohms;
  }

  /** Returns a current a little above {@code amps}, with two significant digits. */
  private static double trial(double amps) {
    double step = Math.pow(10, Math.floor(Math.log10(amps)) - 1);
    double rounded = Math.rint(amps * TRIAL / step) * step;
    return rounded > amps * LEAST_TRIAL ? rounded : rounded + step;
  }
}
