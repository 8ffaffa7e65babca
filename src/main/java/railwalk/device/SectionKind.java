package railwalk.device;

/** What a section of a bottle does; it decides the law and the electrodes. */
public enum SectionKind {
  /** Plate, grid, cathode. */
  TRIODE,
  /** Plate, screen, grid, cathode, and a suppressor or beam plates: pentodes and beam tubes. */
  PENTODE,
  /** One or two plates and a cathode or filament. */
  RECTIFIER,
  /** A glow-discharge regulator: anode (plate) and cathode. */
  REGULATOR,
  /** A small detector diode that shares a triode's cathode. */
  DIODE
}
