package railwalk.device;

/** What is to be heated before a section conducts; it decides how long that takes. */
public enum CathodeKind {
  /** Nothing: silicon, selenium, glow discharges. */
  COLD("none"),
  /** A filament that is itself the cathode. */
  FILAMENT("filament"),
  /** A cathode sleeve with a heater in it, in a tube that amplifies or detects. */
  INDIRECT("indirect"),
  /** The same in a rectifier: a larger cathode. */
  RECTIFIER("rectifier"),
  /** A rectifier with a thickly insulated heater, such as a television damper. */
  SLOW_RECTIFIER("slow-rectifier");

  private final String word;

  CathodeKind(String word) {
    this.word = word;
  }

  /** Returns the word that the table of warm-up times calls it by. */
  String word() {
    return word;
  }

  /** Returns the kind of cathode that a section of {@code kind} has in a tube of {@code type}. */
  public static CathodeKind of(TubeType type, SectionKind kind) {
    Heater heater = type.heater();
    if (kind == SectionKind.REGULATOR) {
      return COLD;
    }
    if (heater.directlyHeated()) {
      return FILAMENT;
    }
    if (kind != SectionKind.RECTIFIER) {
      return INDIRECT;
    }
    return heater.slow() ? SLOW_RECTIFIER : RECTIFIER;
  }
}
