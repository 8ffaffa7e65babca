package railwalk.fit;

/** What of a published point is compared with the law. */
public enum FigureKind {
  PLATE_CURRENT("plate current", "current", "A"),
  SCREEN_CURRENT("screen current", "screencurrent", "A"),
  CATHODE_CURRENT("cathode current", "cathodecurrent", "A"),
  /** Grid volts that give the published current, for points near cut-off. */
  BIAS("bias", "grid", "V"),
  /** Volts at the plate of a resistance-coupled stage, against its foot. */
  PLATE_VOLTS("plate volts", "volts", "V"),
  MUTUAL_CONDUCTANCE("gm", "gm", "S"),
  AMPLIFICATION("mu", "mu", ""),
  SCREEN_AMPLIFICATION("screen mu", "screenmu", ""),
  PLATE_RESISTANCE("rp", "rp", "Ω"),
  /** Volts across a rectifier plate at the published current. */
  DROP("drop", "drop", "V");

  private final String words;
  private final String key;
  private final String unit;

  FigureKind(String words, String key, String unit) {
    this.words = words;
    this.key = key;
    this.unit = unit;
  }

  /** Returns its name for people. */
  public String words() {
    return words;
  }

  /** Returns its key word in a data file's residual lines. */
  String key() {
    return key;
  }

  /** Returns whether it is the figure a type is judged by: current, bias near cut-off, or drop. */
  public boolean decides() {
    return this == PLATE_CURRENT || this == BIAS || this == DROP;
  }

  /** Returns its SI unit; empty for a plain number. */
  public String unit() {
    return unit;
  }
}
