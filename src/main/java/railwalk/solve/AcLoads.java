package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import railwalk.circuit.Circuit;
import railwalk.circuit.Filament;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;

/**
 * What alternates in a solved amplifier: windings and heaters under load, and what the rectifiers
 * stand. Means of the period that the averaged engine settles on; heaters count at their hot
 * resistance.
 *
 * @param windings the loads of all windings in netlist order, sections in order
 * @param rectifiers the loads of the rectifiers of all groups, plate by plate
 * @param heaterRmsVolts across each heater or filament; none for one whose volts are not known
 */
public record AcLoads(
    List<WindingLoad> windings,
    List<RectifierLoad> rectifiers,
    Map<Filament, Double> heaterRmsVolts) {

  /** No windings, no rectifiers. */
  public static final AcLoads NONE = new AcLoads(List.of(), List.of(), Map.of());

  public AcLoads {
    windings = List.copyOf(windings);
    rectifiers = List.copyOf(rectifiers);
    heaterRmsVolts = Map.copyOf(heaterRmsVolts);
  }

  static AcLoads of(OperatingPoint point, List<CycleReport> reports) {
    Circuit circuit = point.circuit();
    List<WindingLoad> found = new ArrayList<>();
    List<RectifierLoad> rectifiers = new ArrayList<>();
    Map<Filament, Double> heaters = new HashMap<>();
    Map<String, Double> cores = new HashMap<>();
    Set<Winding> inGroups = new HashSet<>();
    for (CycleReport report : reports) {
      found.addAll(report.loads().windings());
      rectifiers.addAll(report.loads().rectifiers());
      report.loads().addFilaments(heaters);
      report.loads().addCores(cores);
    }
    found.forEach(load -> inGroups.add(load.winding()));
    Set<String> transformers = new LinkedHashSet<>();
    circuit.elements(Winding.class).forEach(winding -> transformers.add(winding.transformer()));
    for (String transformer : transformers) {
      double core = cores.getOrDefault(transformer, Double.NaN);
      HeaterLoad.addLoads(circuit, transformer, inGroups, core, found, heaters);
    }
    for (Filament filament : circuit.elements(Filament.class)) {
      double volts = Math.abs(point.volts(filament.a()) - point.volts(filament.b()));
      if (!heaters.containsKey(filament) && volts > 0) {
        heaters.put(filament, volts);
      }
    }
    return new AcLoads(inNetlistOrder(circuit, found), rectifiers, heaters);
  }

  private static List<WindingLoad> inNetlistOrder(Circuit circuit, List<WindingLoad> found) {
    List<WindingLoad> sorted = new ArrayList<>();
    for (Winding winding : circuit.elements(Winding.class)) {
      for (WindingLoad load : found) {
        if (load.winding().equals(winding)) {
          sorted.add(load);
        }
      }
    }
    return sorted;
  }

  /** Returns the volts rms from end to end of {@code winding} under load; NaN when not known. */
  public double rmsVolts(Winding winding) {
    double sum = Double.NaN;
    for (WindingLoad load : windings) {
      if (load.winding().equals(winding)) {
        sum = load.rmsVolts() + (Double.isNaN(sum) ? 0 : sum);
      }
    }
    return sum;
  }

  /**
   * Returns the current rms of the section of {@code winding} that carries most; NaN if unknown.
   */
  public double rmsAmps(Winding winding) {
    double most = Double.NaN;
    for (WindingLoad load : windings) {
      if (load.winding().equals(winding)) {
        most = Double.isNaN(most) ? load.rmsAmps() : Math.max(most, load.rmsAmps());
      }
    }
    return most;
  }

  /** Bounds of a node's volts over the period. */
  public record Range(double lowestVolts, double highestVolts) {}

  static Range range(Node node, double meanVolts, List<CycleReport> reports) {
    for (CycleReport report : reports) {
      if (report.loads().holds(node)) {
        return new Range(report.loads().lowestVolts(node), report.loads().highestVolts(node));
      }
    }
    return new Range(meanVolts, meanVolts);
  }
}
