package railwalk.device;

/** What a socket pin can lead to inside a tube, by the trade's names. */
public enum Electrode {
  PLATE("plate"),
  SCREEN("screen"),
  SUPPRESSOR("suppressor"),
  GRID("grid"),
  CATHODE("cathode"),
  PLATE1("plate1"),
  PLATE2("plate2"),
  DIODE1("diode1"),
  DIODE2("diode2"),
  HEATER1("heater1"),
  HEATER2("heater2"),
  HEATER_TAP("heatertap");

  private final String word;

  Electrode(String word) {
    this.word = word;
  }

  /** Returns the word used in netlists and data files. */
  public String word() {
    return word;
  }

  /** Returns whether the pin belongs to the heater. */
  public boolean isHeater() {
    return this == HEATER1 || this == HEATER2 || this == HEATER_TAP;
  }
}
