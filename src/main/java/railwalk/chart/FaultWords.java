package railwalk.chart;

import java.util.Optional;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Resistor;
import railwalk.diagnosis.Fault;
import railwalk.diagnosis.FaultKind;
import railwalk.units.Quantity;

/** Faults in the trade's words: what is wrong, what usually causes it, how to make sure. */
final class FaultWords {
  private final Circuit circuit;
  private final Wording wording;

  FaultWords(Circuit circuit, Wording wording) {
    this.circuit = circuit;
    this.wording = wording;
  }

  /**
   * Returns what is wrong, as a clause: "R30 high, about 164 kΩ (marked 82 kΩ)".
   *
   * @param estimate the likeliest severity in the fault's unit; NaN where there is none
   */
  String name(Fault fault, double estimate) {
    String part = fault.element();
    String about = Double.isNaN(estimate) ? "" : ", about " + figure(fault, estimate);
    return wording.say(
        switch (fault.kind()) {
          case RESISTOR_HIGH, RESISTOR_LOW ->
              part + " " + fault.kind().word() + about + marked(part);
          case RESISTOR_OPEN, COIL_OPEN, DIODE_OPEN, CONTACT_OPEN -> part + " open";
          case RESISTOR_SHORTED, CAPACITOR_SHORTED, DIODE_SHORTED, COIL_SHORTED ->
              part + " shorted";
          case WIPER_OPEN -> part + ": wiper open";
          case CAPACITOR_LEAKY -> part + " leaky" + about;
          case SECTION_DEAD -> part + " dead: no current";
          case SECTION_WEAK -> part + " weak: passes" + about.replace(",", "") + " of its current";
          case GRID_CURRENT -> part + " gassy: grid current" + about;
          case HEATER_LEAK -> part + ": leakage heater to cathode" + about;
          case SCREEN_SHORT -> part + ": screen to grid inside the {tube}" + about;
          case TUBE_DARK -> part + " cold: heater open, socket contact bad, or pulled";
          case OTHER_TYPE -> part + ": a " + fault.detail() + " in its socket";
          case RECTIFIER_WEAK ->
              part + " weak: passes" + about.replace(",", "") + " of its current";
          case RECTIFIER_HALF -> part + ": {plate} at " + fault.detail() + " dead";
          case SILICON_FITTED -> part + ": silicon diodes in its place";
          case REGULATOR_DARK -> part + " dark";
          case WINDING_OPEN -> part + " open from " + fault.detail();
          case TURNS_SHORTED ->
              part + ": shorted turns," + about.replace(",", "") + " of its volts";
          case BOARD_LEAK -> "leakage across board or socket, " + fault.detail() + about;
          case PINS_EXCHANGED -> part + ": " + fault.detail() + " exchanged";
          case WRONG_SUPPLY -> part + " fed from " + fault.detail();
          case LINE_OFF -> "the {line} is not as stated" + about;
        });
  }

  private String marked(String part) {
    Optional<Element> element = circuit.element(part);
    return element.isPresent() && element.get() instanceof Resistor r
        ? " (marked " + Quantity.ohms(r.ohms()) + ")"
        : "";
  }

  /** Returns a severity with its unit; a share in per cent. */
  static String figure(Fault fault, double value) {
    return fault.range().unit().isEmpty()
        ? Quantity.percent(value)
        : Quantity.of(value, fault.range().unit());
  }

  /** Returns what usually causes it and the test before power returns; common practice. */
  Optional<String> cause(Fault fault) {
    String text =
        switch (fault.kind()) {
          case RESISTOR_OPEN, RESISTOR_HIGH -> burnt(fault);
          case CONTACT_OPEN ->
              "A blown fuse has a cause: before power, measure the rectifier for a short, the"
                  + " output transformer to its core, and the bias with the output {tubes} out.";
          case DIODE_OPEN, DIODE_SHORTED, RECTIFIER_HALF ->
              "A rectifier mostly dies of a shorted or too large reservoir: before power, measure"
                  + " the supply node to the reference, discharged.";
          case COIL_OPEN ->
              "A winding burns out behind a shorted {tube} or lost bias: before power, check the"
                  + " {tube} it feeds, its grid’s coupling capacitor and its bias.";
          case CAPACITOR_SHORTED, CAPACITOR_LEAKY ->
              "Before power, measure what it loaded: the resistor in front of it may have burnt.";
          case WINDING_OPEN, TURNS_SHORTED ->
              "A transformer that failed was overloaded: before power, measure every supply node and"
                  + " heater string for a short.";
          default -> "";
        };
    return text.isEmpty() ? Optional.empty() : Optional.of(wording.say(text));
  }

  private String burnt(Fault fault) {
    return switch (Role.of(circuit, fault.element())) {
      case SCREEN ->
          "A screen resistor burns when the {tube} shorts or loses its bias: before power, measure"
              + " screen to grid and screen to cathode with the {tube} out, then the bias.";
      case CATHODE ->
          "A cathode resistor burns when the {tube} runs away: before power, check the coupling"
              + " capacitor at its grid and fit another {tube}.";
      case SUPPLY ->
          "A dropper burns when what it feeds is shorted: before power, measure the node behind it"
              + " to the reference, discharged, {tubes} out.";
      case PLATE, OTHER -> "";
    };
  }

  /**
   * Returns the trade's test that tells two faults apart which read alike; empty when none does.
   */
  Optional<String> apart(Fault one, Fault other) {
    String tube = tubeOf(one).or(() -> tubeOf(other)).orElse("");
    boolean capacitor = isCapacitor(one) || isCapacitor(other);
    boolean inTube = isInTube(one) || isInTube(other);
    if (inTube && capacitor && !tube.isEmpty()) {
      return Optional.of(
          wording.say(
              "Pull "
                  + tube
                  + " and read its socket again: what stays comes from outside, what goes came from"
                  + " the {tube}."));
    }
    if (inTube && !tube.isEmpty()) {
      return Optional.of(wording.say("Fit a known good {tube} as " + tube + " and read again."));
    }
    if (capacitor) {
      Fault leaky = isCapacitor(one) ? one : other;
      return Optional.of(
          "Power off and discharged, lift one end of " + leaky.element() + " and read again.");
    }
    boolean measurable =
        circuit.element(one.element()).filter(Resistor.class::isInstance).isPresent();
    return measurable
        ? Optional.of("Power off and discharged, measure " + one.element() + " by itself.")
        : Optional.empty();
  }

  private Optional<String> tubeOf(Fault fault) {
    if (circuit.bottle(fault.element()).isPresent()) {
      return Optional.of(fault.element());
    }
    return circuit
        .element(fault.element())
        .map(Element::bottle)
        .filter(bottle -> !bottle.isEmpty());
  }

  private static boolean isCapacitor(Fault fault) {
    return fault.kind() == FaultKind.CAPACITOR_LEAKY
        || fault.kind() == FaultKind.CAPACITOR_SHORTED
        || fault.kind() == FaultKind.BOARD_LEAK;
  }

  private static boolean isInTube(Fault fault) {
    return switch (fault.kind()) {
      case SECTION_DEAD,
          SECTION_WEAK,
          GRID_CURRENT,
          HEATER_LEAK,
          SCREEN_SHORT,
          TUBE_DARK,
          OTHER_TYPE,
          RECTIFIER_WEAK,
          RECTIFIER_HALF ->
          true;
      default -> false;
    };
  }

  /** What a resistor does where it stands. */
  private enum Role {
    SCREEN,
    CATHODE,
    PLATE,
    SUPPLY,
    OTHER;

    static Role of(Circuit circuit, String name) {
      Optional<Element> part = circuit.element(name);
      if (part.isEmpty()) {
        return OTHER;
      }
      for (railwalk.circuit.AmplifierSection s :
          circuit.elements(railwalk.circuit.AmplifierSection.class)) {
        if (s.screen() != null && part.get().nodes().contains(s.screen())) {
          return SCREEN;
        }
        if (part.get().nodes().contains(s.cathode()) && !s.cathode().equals(circuit.reference())) {
          return CATHODE;
        }
        if (part.get().nodes().contains(s.plate())) {
          return PLATE;
        }
      }
      boolean toReference = part.get().nodes().contains(circuit.reference());
      return toReference ? OTHER : SUPPLY;
    }
  }
}
