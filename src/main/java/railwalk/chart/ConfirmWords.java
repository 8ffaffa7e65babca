package railwalk.chart;

import java.util.Optional;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Resistor;
import railwalk.diagnosis.Evidence;
import railwalk.diagnosis.Fault;
import railwalk.diagnosis.Suspect;
import railwalk.readings.Reading;
import railwalk.units.Quantity;

/**
 * The one test that proves a suspect before a part is changed: power off where that will do. Common
 * practice.
 */
final class ConfirmWords {
  private final Circuit circuit;
  private final Wording wording;
  private final BenchWords words;

  ConfirmWords(Circuit circuit, Wording wording, BenchWords words) {
    this.circuit = circuit;
    this.wording = wording;
    this.words = words;
  }

  /** Returns the test in sentences; empty where there is no one fault to prove. */
  Optional<String> test(Suspect suspect) {
    if (suspect.faults().size() != 1) {
      return Optional.empty();
    }
    Fault fault = suspect.faults().get(0);
    String part = fault.element();
    String test =
        switch (fault.kind()) {
          case RESISTOR_HIGH, RESISTOR_LOW, RESISTOR_OPEN, RESISTOR_SHORTED ->
              lifted(part) + "measure it by itself" + ohms(suspect) + ".";
          case CAPACITOR_LEAKY, CAPACITOR_SHORTED -> lifted(part) + "power up" + again(suspect);
          case DIODE_OPEN, DIODE_SHORTED -> lifted(part) + "measure it both ways round.";
          case SECTION_DEAD, SECTION_WEAK, GRID_CURRENT, HEATER_LEAK, SCREEN_SHORT ->
              "Fit a known good {tube} as " + bottle(part) + again(suspect);
          case RECTIFIER_WEAK, RECTIFIER_HALF ->
              "Fit a known good rectifier as " + bottle(part) + again(suspect);
          case TUBE_DARK ->
              "See whether "
                  + part
                  + " glows. Power off, pull it and measure its heater pin to pin; then the heater"
                  + " volts at the empty socket.";
          case OTHER_TYPE -> "Read the type printed on " + bottle(part) + ".";
          case SILICON_FITTED -> "Look into the socket of " + part + ": glass or diodes?";
          case REGULATOR_DARK -> "See whether " + part + " glows.";
          case COIL_OPEN, COIL_SHORTED ->
              "Power off and discharged, measure " + part + " end to end" + ofCoil(part) + ".";
          case WINDING_OPEN ->
              "Unplugged and discharged, measure " + part + " in ohms, each end to its tap.";
          case TURNS_SHORTED ->
              "All {tubes} and rectifiers out, power up through a series lamp: a lamp that stays"
                  + " bright says shorted turns.";
          case CONTACT_OPEN ->
              "Unplugged and discharged, measure across " + part + ": none is good.";
          case WIPER_OPEN ->
              "Power off and discharged, measure from the wiper of "
                  + part
                  + " to each end while you turn it.";
          case BOARD_LEAK ->
              "Power off and discharged, clean and dry the socket and board there" + again(suspect);
          case PINS_EXCHANGED, WRONG_SUPPLY ->
              "Power off and discharged, follow the wires of "
                  + part
                  + " with the netlist at hand.";
          case LINE_OFF -> "Read the {line} at the wall, and the heaters: they follow it.";
        };
    return Optional.of(wording.say(test));
  }

  private static String lifted(String part) {
    return "Power off and discharged, lift one end of " + part + " and ";
  }

  private String ohms(Suspect suspect) {
    Fault fault = suspect.faults().get(0);
    Optional<Element> element = circuit.element(fault.element());
    if (element.isEmpty() || !(element.get() instanceof Resistor resistor)) {
      return "";
    }
    double estimate = suspect.estimates().get(0);
    String found =
        switch (fault.kind()) {
          case RESISTOR_OPEN -> "no end to it";
          case RESISTOR_SHORTED -> "next to none";
          default -> "about " + FaultWords.figure(fault, estimate);
        };
    return ": " + Quantity.ohms(resistor.ohms()) + " when good, " + found + " if this is right";
  }

  private String ofCoil(String part) {
    Optional<Element> element = circuit.element(part);
    return element.isPresent() && element.get() instanceof Inductor coil
        ? ": " + Quantity.ohms(coil.dcOhms()) + " when good"
        : "";
  }

  private String again(Suspect suspect) {
    if (suspect.supporting().isEmpty()) {
      return ", then read again.";
    }
    Evidence strongest = suspect.supporting().get(0);
    Reading reading = words.reading(strongest);
    return ", then read "
        + BenchWords.place(reading)
        + " again: about "
        + BenchWords.figure(reading.kind(), strongest.healthy())
        + " if this was it.";
  }

  private String bottle(String part) {
    return circuit
        .element(part)
        .map(Element::bottle)
        .filter(bottle -> !bottle.isEmpty())
        .orElse(part);
  }
}
