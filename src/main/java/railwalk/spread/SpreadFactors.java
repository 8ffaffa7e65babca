package railwalk.spread;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;
import railwalk.solve.Sensitivities;
import railwalk.solve.SpreadPart;

/**
 * How the volts of an amplifier's nodes go from build to build, to first order: each node follows
 * independent factors of deviation 1 (each part's own share, what the sections of one bottle have
 * in common, the line), by so many volts for each. The covariance of two nodes is the product of
 * their rows.
 *
 * <p>Standard deviations: a resistor or winding is uniform between its limits (limit / √3); a
 * tube's limits stand at two standard deviations; sections of one bottle go together in part.
 *
 * <p>Parts whose limits lie unevenly about their figure by age, used tubes and carbon compositions,
 * move the middle too: their mean shift is carried to the node by the same sensitivity. A type's
 * own acceptance limits bound tubes about the published figure and move nothing.
 */
public final class SpreadFactors {
  private final List<String> names;
  private final double[] deviations;
  private final double[][] rows;
  private final double[] shifts;

  private SpreadFactors(List<String> names, double[] deviations, double[][] rows, double[] shifts) {
    this.deviations = deviations;
    this.names = List.copyOf(names);
    this.rows = rows;
    this.shifts = shifts;
  }

  /** Returns the factors of a solved point. */
  public static SpreadFactors of(OperatingPoint point) {
    Circuit circuit = point.circuit();
    Sensitivities sensitivities = Sensitivities.of(point);
    List<SpreadPart> parts = sensitivities.parts();
    int count = parts.size();
    double[] deviations = new double[count];
    double[] partShifts = new double[count];
    Map<String, List<Integer>> byBottle = new LinkedHashMap<>();
    List<Integer> onLine = new ArrayList<>();
    for (int p = 0; p < count; p++) {
      SpreadPart part = parts.get(p);
      deviations[p] = PartSpread.deviation(circuit, part);
      partShifts[p] = PartSpread.shift(circuit, part);
      if (part instanceof SpreadPart.SpaceCurrent s) {
        byBottle.computeIfAbsent(s.section().bottle(), b -> new ArrayList<>()).add(p);
      } else if (part instanceof SpreadPart.WindingVolts) {
        onLine.add(p);
      }
    }
    double lineDeviation = circuit.spread().line() / Math.sqrt(3);
    double[][] rows = new double[circuit.nodes().size()][];
    double[] shifts = new double[rows.length];
    for (Node node : circuit.nodes()) {
      double[] row = new double[count + byBottle.size() + 1];
      double shift = 0;
      for (int p = 0; p < count; p++) {
        double share = sensitivities.volts(node, p);
        row[p] = share * deviations[p];
        shift += share * partShifts[p];
      }
      int common = count;
      for (List<Integer> sections : byBottle.values()) {
        for (int p : sections) {
          row[common] += Math.sqrt(PartSpread.SECTION_CORRELATION) * row[p];
          row[p] *= Math.sqrt(1 - PartSpread.SECTION_CORRELATION);
        }
        common++;
      }
      for (int p : onLine) {
        row[common] += sensitivities.volts(node, p) * lineDeviation;
      }
      rows[node.index()] = row;
      shifts[node.index()] = shift;
    }
    List<String> names = new ArrayList<>();
    parts.forEach(part -> names.add(name(part)));
    byBottle.keySet().forEach(bottle -> names.add("tube " + bottle));
    names.add("line");
    return new SpreadFactors(names, deviations, rows, shifts);
  }

  private static String name(SpreadPart part) {
    if (part instanceof SpreadPart.Ohms p) {
      return p.element().name();
    }
    if (part instanceof SpreadPart.SpaceCurrent p) {
      return p.section().name();
    }
    if (part instanceof SpreadPart.Emission p) {
      return p.rectifier().name();
    }
    if (part instanceof SpreadPart.WindingVolts p) {
      return p.winding().name();
    }
    return part instanceof SpreadPart.GlowVolts p
        ? p.tube().name()
        : ((SpreadPart.SourceVolts) part).source().name();
  }

  /**
   * Returns the factors' names, in the order of {@link #row}: the same part has the same name in
   * every state of an amplifier, so that rows of two states can be brought together.
   */
  public List<String> names() {
    return names;
  }

  /** Returns the volts of {@code node} for one deviation of each factor; the caller's own copy. */
  public double[] row(Node node) {
    return rows[node.index()].clone();
  }

  /**
   * Returns one deviation of factor {@code number} of {@link #names()}, as a share of its figure.
   */
  public double deviation(int number) {
    return number < deviations.length ? deviations[number] : 0;
  }

  /** Returns how far the middle of the node's spread lies from the nominal amplifier's volts. */
  public double shiftVolts(Node node) {
    return shifts[node.index()];
  }

  /** Returns one standard deviation of the node's volts. */
  public double deviationVolts(Node node) {
    double variance = 0;
    for (double volts : rows[node.index()]) {
      variance += volts * volts;
    }
    return Math.sqrt(variance);
  }
}
