package railwalk.findings;

import railwalk.circuit.Words;
import railwalk.source.Severity;

/** Every kind of finding, in the order they are told: what can hurt people first. */
public enum FindingCode {
  HOT_CHASSIS(
      "hot-chassis",
      "treat all metal as live: work behind an isolating transformer, never put {ground} or a"
          + " scope's clip on it"),
  LINE_CAPACITOR(
      "line-capacitor",
      "a plain capacitor here can fail shorted: a qualified person fits a safety-rated part (class"
          + " Y), or leaves it out"),
  RECTIFIER_IN_PHASE(
      "rectifier-in-phase",
      "exchange the two ends of one half of the winding; a tapped winding in one line cannot go"
          + " wrong"),
  SCREEN_GRID_EXCHANGED("screen-grid-exchanged", "check the order of the electrodes or the pins"),
  PLATE_SCREEN_EXCHANGED("plate-screen-exchanged", "check the order of the electrodes or the pins"),
  GRID_NO_LEAK(
      "grid-no-leak", "a grid needs a resistor to {ground}, to its cathode circuit or to its bias"),
  NO_CURRENT("no-current", "look for a part left out of the netlist, or a node named in two ways"),
  REFLECTED_LOAD(
      "reflected-load",
      "rdc= is what an ohmmeter reads across the winding, often 50 to 500 ohm; the reflected load"
          + " is no part at DC"),
  CAPACITOR_NOWHERE("capacitor-nowhere", "check the node's name"),
  CAPACITOR_VOLTS(
      "capacitor-volts", "fit one whose rating also covers the volts before the {tubes} warm up"),
  CAPACITOR_UNLOADED(
      "capacitor-unloaded",
      "electrolytics stand 10 to 15 % more than their rating for seconds only (common practice): fit"
          + " one of higher rating, or a bleeder or a slower rectifier"),
  FIRST_CAPACITOR(
      "first-capacitor",
      "the limit depends on the resistance in series with each {plate}: more of that allows more"
          + " capacitance"),
  RECTIFIER_DC("rectifier-dc", ""),
  RECTIFIER_PEAK(
      "rectifier-peak", "a smaller reservoir, or resistance in each {plate} lead, brings it down"),
  RECTIFIER_INVERSE("rectifier-inverse", ""),
  CHOKE_INPUT(
      "choke-input",
      "a bleeder that draws the rest, or a choke of more henries, holds the volts down"),
  WINDING_CURRENT(
      "winding-current", "a winding that carries too much runs hot: find what to take off"),
  HEATER_VOLTS(
      "heater-volts",
      "the life of a {tube} shortens fast: a resistor in the heater lead brings it down"),
  PLATE_WATTS("plate-watts", ""),
  SCREEN_WATTS("screen-watts", ""),
  PLATE_VOLTS("plate-volts", ""),
  SCREEN_VOLTS("screen-volts", ""),
  CATHODE_CURRENT("cathode-current", ""),
  HEATER_CATHODE(
      "heater-cathode",
      "lift the heater supply toward the cathode's volts, or expect leakage and hum"),
  GRID_LEAK(
      "grid-leak",
      "grid current or gas in a tired {tube} then lifts the grid and the current runs up"),
  POSITIVE_GRID("positive-grid", "look at the part that feeds the grid"),
  REGULATOR_DARK("regulator-dark", "it needs more volts to strike, or less load across it"),
  REGULATOR_CURRENT("regulator-current", ""),
  RESISTOR_WATTS("resistor-watts", "common practice is twice the heat or more"),
  FUSE_CURRENT("fuse-current", "same type and value only; find out what draws the current"),
  NOT_PREDICTABLE("not-predictable", Severity.NOTE, "");

  private final String code;
  private final Severity severity;
  private final String hint;

  FindingCode(String code, String hint) {
    this(code, Severity.WARNING, hint);
  }

  FindingCode(String code, Severity severity, String hint) {
    this.code = code;
    this.severity = severity;
    this.hint = hint;
  }

  /** Returns the stable name. */
  public String code() {
    return code;
  }

  /** Returns a finding of this kind; words that differ stand in braces. */
  Finding of(Words words, String elementName, String message) {
    return of(words, elementName, message, hint);
  }

  /** Returns a finding of this kind with a hint of its own. */
  Finding of(Words words, String elementName, String message, String ownHint) {
    return new Finding(severity, code, words.say(message), words.say(ownHint), elementName);
  }
}
