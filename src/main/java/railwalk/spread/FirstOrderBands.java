package railwalk.spread;

import java.util.HashMap;
import java.util.Map;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.Spread;
import railwalk.solve.OperatingPoint;
import railwalk.solve.Sensitivities;
import railwalk.solve.SpreadPart;

/**
 * The first-order band of every node: expected volts ∓ 1.645 times the root of the summed variances
 * of all parts, each variance carried to the node by the sensitivity of the solved point. 1.645
 * standard deviations leave 5 % of a normal distribution on either side.
 *
 * <p>Standard deviations: a resistor or winding is uniform between its limits (limit / √3); a
 * tube's limits stand at two standard deviations; sections of one bottle go together in part.
 *
 * <p>Parts whose limits lie unevenly about their figure by age, used tubes and carbon compositions,
 * move the middle of the band: their mean shift is carried to the node by the same sensitivity, and
 * the deviations are counted from there. The expected volts, of an amplifier with nominal parts,
 * always stay inside the band. A type's own acceptance limits bound tubes about the published
 * figure and move nothing.
 */
public final class FirstOrderBands {
  /** Standard deviations on each side of the expected volts: 5 % and 95 % of a normal spread. */
  public static final double DEVIATIONS = 1.645;

  /**
   * Correlation of the sections of one bottle: with each section ±30 % at two deviations, a section
   * difference of ±30 % (a maker's limit for twin triodes) leaves half the variance in common.
   */
  private static final double SECTION_CORRELATION = 0.5;

  /** A gas regulator's operating volts from tube to tube, one deviation (common practice). */
  private static final double GLOW_DEVIATION = 0.02;

  /** A rectifier's current at a given drop, one deviation: as tubes in general, 30 % at two. */
  private static final double USUAL_RECTIFIER_DEVIATION = 0.15;

  /** Middle of the limits of used tubes. */
  private static final double USED_SHIFT = (Spread.USED_HIGH + Spread.USED_LOW) / 2;

  private static final double USED_DEVIATION = (Spread.USED_HIGH - Spread.USED_LOW) / 4;

  private FirstOrderBands() {}

  /** Returns the bands of a solved point. */
  public static Bands of(OperatingPoint point) {
    Circuit circuit = point.circuit();
    Sensitivities sensitivities = Sensitivities.of(point);
    int count = sensitivities.parts().size();
    double[] deviations = new double[count];
    double[] shifts = new double[count];
    String[] bottles = new String[count];
    boolean[] followsLine = new boolean[count];
    for (int p = 0; p < count; p++) {
      SpreadPart part = sensitivities.parts().get(p);
      deviations[p] = deviation(circuit, part);
      shifts[p] = shift(circuit, part);
      bottles[p] = part instanceof SpreadPart.SpaceCurrent s ? s.section().bottle() : "";
      followsLine[p] = part instanceof SpreadPart.WindingVolts;
    }
    double lineDeviation = circuit.spread().line() / Math.sqrt(3);
    Map<Node, Band> bands = new HashMap<>();
    for (Node node : circuit.nodes()) {
      double volts = point.volts(node);
      if (node.equals(circuit.reference()) || Double.isNaN(volts)) {
        continue;
      }
      double middle = volts;
      double variance = 0;
      double byLine = 0;
      Map<String, Double> byBottle = new HashMap<>();
      for (int p = 0; p < count; p++) {
        double share = sensitivities.volts(node, p);
        double moved = share * deviations[p];
        middle += share * shifts[p];
        byLine += followsLine[p] ? share : 0;
        if (bottles[p].isEmpty()) {
          variance += moved * moved;
        } else {
          variance += (1 - SECTION_CORRELATION) * moved * moved;
          byBottle.merge(bottles[p], moved, Double::sum);
        }
      }
      for (double moved : byBottle.values()) {
        variance += SECTION_CORRELATION * moved * moved;
      }
      variance += byLine * byLine * lineDeviation * lineDeviation;
      double half = DEVIATIONS * Math.sqrt(variance);
      bands.put(node, new Band(Math.min(volts, middle - half), Math.max(volts, middle + half)));
    }
    return new Bands(bands);
  }

  /** Returns one standard deviation of a part's figure, as a share of it. */
  private static double deviation(Circuit circuit, SpreadPart part) {
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
  private static double shift(Circuit circuit, SpreadPart part) {
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
