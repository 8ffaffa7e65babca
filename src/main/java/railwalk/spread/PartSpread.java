package railwalk.spread;

import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.Spread;
import railwalk.solve.SpreadPart;

/** How far a part's figure lies from build to build, as a share of it. */
final class PartSpread {
  /**
   * Correlation of the sections of one bottle: with each section ±30 % at two deviations, a section
   * difference of ±30 % (a maker's limit for twin triodes) leaves half the variance in common.
   */
  static final double SECTION_CORRELATION = 0.5;

  /** A gas regulator's operating volts from tube to tube, one deviation (common practice). */
  private static final double GLOW_DEVIATION = 0.02;

  /** A rectifier's current at a given drop, one deviation: as tubes in general, 30 % at two. */
  private static final double USUAL_RECTIFIER_DEVIATION = 0.15;

  /** Middle of the limits of used tubes. */
  private static final double USED_SHIFT = (Spread.USED_HIGH + Spread.USED_LOW) / 2;

  private static final double USED_DEVIATION = (Spread.USED_HIGH - Spread.USED_LOW) / 4;

  private PartSpread() {}

  /** Returns one standard deviation of a part's figure, as a share of it. */
  static double deviation(Circuit circuit, SpreadPart part) {
    if (part instanceof SpreadPart.Ohms ohms) {
      return tolerance(circuit, ohms.element()) / Math.sqrt(3);
    }
    if (part instanceof SpreadPart.SpaceCurrent current) {
      AmplifierSection section = current.section();
      double tube = circuit.spread().tube();
      if (circuit.spread().usedTubes()) {
        return USED_DEVIATION;
      }
      return Double.isNaN(tube)
          ? (section.type().spreadHigh() - section.type().spreadLow()) / 4
          : tube / 2;
    }
    if (part instanceof SpreadPart.Emission) {
      double tube = circuit.spread().tube();
      if (circuit.spread().usedTubes()) {
        return USED_DEVIATION;
      }
      return Double.isNaN(tube) ? USUAL_RECTIFIER_DEVIATION : tube / 2;
    }
    if (part instanceof SpreadPart.WindingVolts) {
      return circuit.spread().winding() / Math.sqrt(3);
    }
    return part instanceof SpreadPart.GlowVolts ? GLOW_DEVIATION : 0;
  }

  /** Returns how far the mean of a part's figure lies from the nominal one, as a share of it. */
  static double shift(Circuit circuit, SpreadPart part) {
    Spread spread = circuit.spread();
    if (part instanceof SpreadPart.Ohms ohms) {
      boolean drifts =
          spread.carbonResistors()
              && ohms.element() instanceof Resistor r
              && Double.isNaN(r.tolerance());
      return drifts ? Spread.CARBON_DRIFT : 0;
    }
    boolean tube = part instanceof SpreadPart.SpaceCurrent || isTubeRectifier(part);
    return tube && spread.usedTubes() ? USED_SHIFT : 0;
  }

  private static boolean isTubeRectifier(SpreadPart part) {
    return part instanceof SpreadPart.Emission emission
        && emission.rectifier() instanceof RectifierSection;
  }

  private static double tolerance(Circuit circuit, Element element) {
    return element instanceof Resistor r && !Double.isNaN(r.tolerance())
        ? r.tolerance()
        : circuit.spread().resistor();
  }
}
