package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Spread;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.spread.SpreadFactors;
import railwalk.walk.Walk;

/**
 * What an ohmmeter reads from any node of an amplifier to its reference: unplugged, discharged,
 * tubes out, diodes taken as open, controls and switches as the netlist has them.
 */
public final class ColdOhms {
  /** From this size up a capacitor is an electrolytic, which the meter has to charge. */
  private static final double ELECTROLYTIC_FARADS = 1e-6;

  /** What a formed electrolytic leaks at least under a meter's few volts (common practice). */
  private static final double FORMED_OHMS = 500e3;

  /** Below this the meter's current charges any capacitor at once, ohm. */
  private static final double QUICK_OHMS = 10e3;

  /** A reading that changes by less than this share is not worth a word. */
  private static final double NOTABLE = 0.05;

  /** Nine in ten of a normal spread lie within this many deviations. */
  private static final double DEVIATIONS = 1.645;

  private final OperatingPoint cold;
  private final OperatingPoint uncharged;
  private final OperatingPoint formed;
  private final OperatingPoint conducting;
  private final SpreadFactors spread;

  /**
   * What one node reads.
   *
   * @param ohms with nominal parts; infinite where nothing that the meter shows leads to the
   *     reference
   * @param lowOhms below this one build in twenty lies, by the resistors' tolerances
   * @param highOhms above this one build in twenty lies
   * @param startOhms the first reading where electrolytics must be charged; NaN where none shows
   * @param pastOhms what it must rise past then; NaN where none shows
   * @param throughDiode whether a diode that conducts would change the reading
   */
  public record Reading(
      double ohms,
      double lowOhms,
      double highOhms,
      double startOhms,
      double pastOhms,
      boolean throughDiode) {}

  private ColdOhms(Circuit circuit) throws NoOperatingPoint {
    Circuit plain = ColdAmplifier.of(circuit);
    cold = solve(plain);
    uncharged = solve(electrolytics(plain, Rewire.SHORT_OHMS));
    formed = solve(electrolytics(plain, FORMED_OHMS));
    conducting = solve(diodes(plain, circuit));
    spread = SpreadFactors.of(cold);
  }

  /**
   * Returns the cold ohms of {@code circuit}.
   *
   * @throws NoOperatingPoint when its resistors make no network that can be solved
   */
  public static ColdOhms of(Circuit circuit) throws NoOperatingPoint {
    return new ColdOhms(circuit);
  }

  private static OperatingPoint solve(Circuit circuit) throws NoOperatingPoint {
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, Walk.of(circuit));
    if (outcome instanceof SolveOutcome.Solved solved) {
      return solved.point();
    }
    SolveOutcome.NotSolved failure = (SolveOutcome.NotSolved) outcome;
    throw new NoOperatingPoint("power off", failure.worstNode(), failure.reason());
  }

  private static Circuit electrolytics(Circuit plain, double ohms) {
    return Rewire.replace(
        plain,
        e -> e instanceof Capacitor c && c.farads() >= ELECTROLYTIC_FARADS,
        e -> List.of(new Resistor(e.name(), e.nodes().get(0), e.nodes().get(1), ohms)));
  }

  private static Circuit diodes(Circuit plain, Circuit original) {
    return Rewire.replace(
        plain,
        e -> original.element(e.name()).filter(Diode.class::isInstance).isPresent(),
        e ->
            List.of(new Resistor(e.name(), e.nodes().get(0), e.nodes().get(1), Rewire.SHORT_OHMS)));
  }

  /** Returns what the meter shows at {@code node}. */
  public Reading at(Node node) {
    double ohms = shown(cold, node);
    double start = shown(uncharged, node);
    double past = shown(formed, node);
    boolean charges = ohms >= QUICK_OHMS && start < past && ohms - start > NOTABLE * start;
    boolean open = Double.isInfinite(ohms);
    double shift = open ? 0 : shift(node);
    double half = open ? 0 : DEVIATIONS * deviation(node);
    double through = shown(conducting, node);
    return new Reading(
        ohms,
        ohms + shift - half,
        ohms + shift + half,
        charges ? start : Double.NaN,
        charges ? Math.max(start, past * (open ? 1 : (ohms + shift - half) / ohms)) : Double.NaN,
        Math.abs(through - ohms) > NOTABLE * Math.min(through, ohms));
  }

  private static double shown(OperatingPoint point, Node node) {
    double ohms = point.sourceOhms(node);
    boolean open = Double.isNaN(ohms) || ohms >= Predictor.OPEN_READING_OHMS;
    return open ? Double.POSITIVE_INFINITY : Math.max(0, ohms);
  }

  /** Returns one standard deviation of a node's ohms. */
  private double deviation(Node node) {
    double variance = 0;
    for (Element element : parts()) {
      int factor = spread.names().indexOf(element.name());
      if (factor >= 0) {
        double ohms = slope(node, element) * spread.deviation(factor);
        variance += ohms * ohms;
      }
    }
    return Math.sqrt(variance);
  }

  private double shift(Node node) {
    if (!cold.circuit().spread().carbonResistors()) {
      return 0;
    }
    double ohms = 0;
    for (Element element : parts()) {
      if (element instanceof Resistor r && Double.isNaN(r.tolerance())) {
        ohms += slope(node, r) * Spread.CARBON_DRIFT;
      }
    }
    return ohms;
  }

  private List<Element> parts() {
    List<Element> parts = new ArrayList<>();
    for (Resistor r : cold.circuit().elements(Resistor.class)) {
      if (r.ohms() > 0 && r.ohms() < Rewire.OPEN_OHMS) {
        parts.add(r);
      }
    }
    return parts;
  }

  /**
   * Returns how a node's ohms go with a resistor, per share of its value: with one ampere into the
   * node, the square of its current times its ohms (Cohn's theorem).
   */
  private double slope(Node node, Element element) {
    double ohms = ((Resistor) element).ohms();
    double volts =
        transferOhms(node, element.nodes().get(0)) - transferOhms(node, element.nodes().get(1));
    return Double.isNaN(volts) ? 0 : volts * volts / ohms;
  }

  /** Returns the volts at {@code other} for one ampere into {@code node}. */
  private double transferOhms(Node node, Node other) {
    if (other.equals(cold.circuit().reference())) {
      return 0;
    }
    if (other.equals(node)) {
      return cold.sourceOhms(node);
    }
    return (cold.sourceOhms(node) + cold.sourceOhms(other) - cold.sourceOhms(node, other)) / 2;
  }
}
