package railwalk.device;

/**
 * One published point of a section as its data file has it: where it stands and what flows. NaN
 * where the source gives no figure.
 *
 * <p>A plain point names electrode volts. With {@code cathodeOhms} the bias comes of a cathode
 * resistor; {@code reference} says whether the plate and screen volts are counted from the cathode
 * or are supply volts against the resistor's foot. With {@code loadOhms} the plate is fed through a
 * resistor (a resistance-coupled stage), with {@code screenOhms} the screen too.
 *
 * @param section id of the section; empty for all alike
 * @param plateVolts at the plate, or feeding its resistor
 * @param screenVolts at the screen, or feeding its resistor; NaN in a triode and when joined to the
 *     plate
 * @param gridVolts of the grid, against the cathode or the cathode resistor's foot
 * @param sharing how many like tubes share the cathode resistor
 * @param triodeConnected whether screen and plate are joined; {@code plateAmps} is then the sum
 * @param plateAmps plate current, or a rectifier plate's
 * @param gmSiemens mutual conductance
 * @param screenMu amplification factor of the grid against the screen
 * @param plateOhms differential plate resistance
 * @param confidence "high" or "medium"
 * @param provenance "transcription", "memory" or "mixed"
 * @param of type the figures were printed for, when it is a like one and not this
 * @param weight share of the usual weight in the fit; 0.5 for rows that contradict each other
 */
public record PublishedPoint(
    String section,
    double plateVolts,
    double screenVolts,
    double gridVolts,
    double cathodeOhms,
    Reference reference,
    int sharing,
    double loadOhms,
    double screenOhms,
    boolean triodeConnected,
    double plateAmps,
    double screenAmps,
    double cathodeAmps,
    double gmSiemens,
    double mu,
    double screenMu,
    double plateOhms,
    String confidence,
    String provenance,
    String source,
    String of,
    double weight) {
  /** From where plate and screen volts count. */
  public enum Reference {
    CATHODE,
    SUPPLY
  }
}
