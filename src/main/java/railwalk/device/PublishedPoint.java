package railwalk.device;

/**
 * One published point of a section as its data file has it: where it stands, what was published
 * there, and who says so. NaN where the source gives no figure.
 *
 * @param section id of the section; empty for all alike
 */
public record PublishedPoint(String section, Setup setup, Figures published, Credit credit) {
  /** From where plate and screen volts count. */
  public enum Reference {
    /** Electrode volts, against the cathode. */
    CATHODE,
    /** Supply volts, against the foot of the cathode resistor. */
    SUPPLY
  }

  /**
   * The volts and resistors around the section. A plain point names electrode volts; with {@code
   * cathodeOhms} the bias comes of a cathode resistor; with {@code loadOhms} the plate is fed
   * through a resistor (a resistance-coupled stage), with {@code screenOhms} the screen too.
   *
   * @param plateVolts at the plate, or feeding its resistor
   * @param screenVolts at the screen, or feeding its resistor; NaN in a triode and when joined to
   *     the plate
   * @param gridVolts of the grid, against the cathode or the cathode resistor's foot
   * @param sharing how many like tubes share the cathode resistor
   * @param triodeConnected whether screen and plate are joined; the plate current is then the sum
   */
  public record Setup(
      double plateVolts,
      double screenVolts,
      double gridVolts,
      double cathodeOhms,
      Reference reference,
      int sharing,
      double loadOhms,
      double screenOhms,
      boolean triodeConnected) {

    /** A triode, or one plate of a rectifier, at electrode volts. */
    public static Setup triode(double plateVolts, double gridVolts) {
      return new Setup(plateVolts, Double.NaN, gridVolts, 0, Reference.CATHODE, 1, 0, 0, false);
    }
  }

  /**
   * What was published.
   *
   * @param plateAmps plate current, or a rectifier plate's
   * @param gmSiemens mutual conductance
   * @param screenMu amplification factor of the grid against the screen
   * @param plateOhms differential plate resistance
   */
  public record Figures(
      double plateAmps,
      double screenAmps,
      double cathodeAmps,
      double gmSiemens,
      double mu,
      double screenMu,
      double plateOhms) {

    /** A plate current and nothing else. */
    public static Figures current(double plateAmps) {
      double none = Double.NaN;
      return new Figures(plateAmps, none, none, none, none, none, none);
    }
  }

  /**
   * Who says so, and how far to trust it.
   *
   * @param source text of the source
   * @param provenance "transcription", "memory" or "mixed"
   * @param confidence "high" or "medium"
   * @param of type the figures were printed for, when it is a like one and not this; else empty
   * @param weight share of the usual weight in the fit; 0.5 for rows that contradict each other
   */
  public record Credit(
      String source, String provenance, String confidence, String of, double weight) {
    /** Returns whether the figures were printed for this very type and are surely right. */
    public boolean isHigh() {
      return of.isEmpty() && confidence.equals("high");
    }
  }
}
