package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Transformer;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;

/**
 * The heaters and lamps on a transformer's windings that feed no rectifier, as one conductance
 * across its primary: with e on the core, section k drives Nk · e round its loop, and the currents
 * come back as G · e = Σ Nk · ik.
 */
final class HeaterLoad {
  /** Resistance of a wire, and the least of a winding. */
  private static final double LEAST_OHMS = 1e-3;

  /** Ties what floats. */
  private static final double TIE_SIEMENS = 1e-9;

  private final Map<Node, Integer> unknowns = new HashMap<>();
  private final List<Element> loads = new ArrayList<>();
  private final List<Drive> drives = new ArrayList<>();

  /** A winding section between two nodes. */
  private record Drive(Winding.Section section, double turnsRatio, double ohms) {}

  private HeaterLoad(Circuit circuit, Transformer transformer, Set<Winding> others) {
    for (Winding winding : circuit.elements(Winding.class)) {
      if (winding.transformer().equals(transformer.name()) && !others.contains(winding)) {
        for (Winding.Section section : winding.sections()) {
          double ohms = Math.max(LEAST_OHMS, Windings.ohms(winding, section));
          drives.add(new Drive(section, section.openRmsVolts() / transformer.primaryVolts(), ohms));
          unknown(section.a());
          unknown(section.b());
        }
      }
    }
    boolean grown = !drives.isEmpty();
    while (grown) {
      grown = false;
      for (Element element : circuit.elements()) {
        boolean carries =
            element instanceof Filament || element instanceof Lamp || element instanceof Wire;
        if (carries && touches(element) && !loads.contains(element)) {
          loads.add(element);
          element.nodes().forEach(this::unknown);
          grown = true;
        }
      }
    }
  }

  /**
   * Returns the conductance, siemens across the primary.
   *
   * @param others windings that are reckoned with elsewhere
   */
  static double primarySiemens(Circuit circuit, Transformer transformer, Set<Winding> others) {
    HeaterLoad load = new HeaterLoad(circuit, transformer, others);
    return load.loads.isEmpty() ? 0 : load.primarySiemens();
  }

  private double primarySiemens() {
    int count = unknowns.size();
    double[][] matrix = new double[count][count];
    double[] source = new double[count];
    for (int n = 0; n < count; n++) {
      matrix[n][n] = TIE_SIEMENS;
    }
    for (Element load : loads) {
      conductance(matrix, load.nodes().get(0), load.nodes().get(1), 1 / ohms(load));
    }
    for (Drive drive : drives) {
      Winding.Section section = drive.section;
      conductance(matrix, section.a(), section.b(), 1 / drive.ohms);
      source[unknown(section.a())] += drive.turnsRatio / drive.ohms;
      source[unknown(section.b())] -= drive.turnsRatio / drive.ohms;
    }
    @Nullable DenseLu lu = DenseLu.of(matrix);
    if (lu == null) {
      throw new IllegalStateException("a heater circuit has no unique answer");
    }
    double[] volts = lu.solve(source);
    double siemens = 0;
    for (Drive drive : drives) {
      double across = volts[unknown(drive.section.a())] - volts[unknown(drive.section.b())];
      siemens += drive.turnsRatio * (drive.turnsRatio - across) / drive.ohms;
    }
    return siemens;
  }

  private static double ohms(Element load) {
    double ohms = load instanceof Wire ? LEAST_OHMS : TwoTerminal.ohms(load);
    return Math.max(LEAST_OHMS, ohms);
  }

  private boolean touches(Element element) {
    for (Node node : element.nodes()) {
      if (unknowns.containsKey(node)) {
        return true;
      }
    }
    return false;
  }

  private int unknown(Node node) {
    return unknowns.computeIfAbsent(node, n -> unknowns.size());
  }

  private void conductance(double[][] matrix, Node a, Node b, double siemens) {
    int i = unknown(a);
    int j = unknown(b);
    matrix[i][i] += siemens;
    matrix[j][j] += siemens;
    matrix[i][j] -= siemens;
    matrix[j][i] -= siemens;
  }
}
