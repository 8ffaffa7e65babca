package railwalk.readings;

/** What a reading measures. */
public enum ReadingKind {
  /** Direct volts against the reference, or across a part. */
  DC("dc", "V"),
  /** Alternating volts of a winding, rms. */
  AC("ac", "V"),
  /** Alternating volts that ride on a supply node, rms. */
  RIPPLE("ripple", "V"),
  /** Resistance to the reference: off, discharged, tubes out. */
  OHMS("ohms", "Ω"),
  /** Current through a part or into an electrode, ampere here, milliampere on the sheet. */
  MA("ma", "mA");

  private final String word;
  private final String unit;

  ReadingKind(String word, String unit) {
    this.word = word;
    this.unit = unit;
  }

  /** Returns the word that a sheet uses. */
  public String word() {
    return word;
  }

  /** Returns the unit that people read it in. */
  public String unit() {
    return unit;
  }
}
