package railwalk.diagnosis;

/** What can be wrong with a part. */
public enum FaultKind {
  RESISTOR_OPEN("open"),
  RESISTOR_HIGH("high"),
  RESISTOR_LOW("low"),
  RESISTOR_SHORTED("shorted"),
  WIPER_OPEN("wiper open"),
  CAPACITOR_LEAKY("leaky"),
  CAPACITOR_SHORTED("shorted"),
  SECTION_DEAD("section dead"),
  SECTION_WEAK("weak"),
  GRID_CURRENT("gassy"),
  HEATER_LEAK("heater-cathode leakage"),
  SCREEN_SHORT("screen shorted to grid"),
  TUBE_DARK("pulled or heater open"),
  OTHER_TYPE("other type fitted"),
  RECTIFIER_WEAK("rectifier weak"),
  RECTIFIER_HALF("half of the rectifier dead"),
  SILICON_FITTED("silicon in its place"),
  DIODE_OPEN("open"),
  DIODE_SHORTED("shorted"),
  REGULATOR_DARK("dark"),
  WINDING_OPEN("winding open"),
  TURNS_SHORTED("shorted turns"),
  COIL_OPEN("open"),
  COIL_SHORTED("shorted"),
  CONTACT_OPEN("open"),
  BOARD_LEAK("leakage across the board or socket"),
  PINS_EXCHANGED("two wires exchanged"),
  WRONG_SUPPLY("on another supply node"),
  LINE_OFF("line not as stated");

  private final String word;

  FaultKind(String word) {
    this.word = word;
  }

  /** Returns what is wrong, in a word or a few: "open". */
  public String word() {
    return word;
  }
}
