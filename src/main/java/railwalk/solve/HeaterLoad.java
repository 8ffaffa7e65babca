package railwalk.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Transformer;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;

/**
 * The heaters and lamps on windings that feed no rectifier, as a network of resistances. To a
 * transformer they are one conductance across its primary: with e on the core, section k drives Nk
 * · e round its loop, and the currents come back as G · e = Σ Nk · ik.
 */
final class HeaterLoad {
  /** The least resistance of a winding. */
  private static final double LEAST_OHMS = 1e-3;

  /** Resistance of a wire or a closed contact. */
  private static final double CONTACT_OHMS = 1e-6;

  /** Ties what floats. */
  private static final double TIE_SIEMENS = 1e-9;

  private final Node reference;
  private final Map<Node, Integer> unknowns = new HashMap<>();
  private final Map<Element, List<Conductor>> loads = new LinkedHashMap<>();
  private final List<Drive> drives = new ArrayList<>();

  /**
   * A winding section between two nodes.
   *
   * @param openVolts that it drives, as written
   */
  private record Drive(
      Winding winding, int number, Node a, Node b, double openVolts, double ohms) {}

  /** A resistance between two nodes. */
  private record Conductor(Node a, Node b, double ohms) {}

  /**
   * @param transformer name of the one whose windings these are; empty for windings without one
   * @param others windings that are reckoned with elsewhere
   */
  private HeaterLoad(Circuit circuit, String transformer, Set<Winding> others) {
    reference = circuit.reference();
    for (Winding winding : circuit.elements(Winding.class)) {
      if (winding.transformer().equals(transformer) && !others.contains(winding)) {
        for (int s = 0; s < winding.sections().size(); s++) {
          Winding.Section section = winding.sections().get(s);
          double ohms = Math.max(LEAST_OHMS, Windings.ohms(winding, section));
          drives.add(new Drive(winding, s, section.a(), section.b(), section.openRmsVolts(), ohms));
          unknown(section.a());
          unknown(section.b());
        }
      }
    }
    boolean grown = !drives.isEmpty();
    while (grown) {
      grown = false;
      for (Element element : circuit.elements()) {
        if (!loads.containsKey(element) && belongs(element)) {
          loads.put(element, conductors(element));
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
    HeaterLoad load = new HeaterLoad(circuit, transformer.name(), others);
    return load.loads.isEmpty() ? 0 : load.primarySiemens(transformer);
  }

  /**
   * Adds what the windings give and carry and what stands across the filaments.
   *
   * @param transformer name of the one whose windings these are; empty for windings without one
   * @param others windings that are reckoned with elsewhere
   * @param coreShare what the core gives, as a share of the open volts as written; NaN to find it
   *     from the line and what the primary drops
   */
  static void addLoads(
      Circuit circuit,
      String transformer,
      Set<Winding> others,
      double coreShare,
      List<WindingLoad> windings,
      Map<Filament, Double> filaments) {
    HeaterLoad load = new HeaterLoad(circuit, transformer, others);
    if (load.drives.isEmpty()) {
      return;
    }
    double[] shares = load.shares(circuit, transformer, coreShare);
    double[] volts = load.solve(shares);
    for (int d = 0; d < load.drives.size(); d++) {
      Drive drive = load.drives.get(d);
      double across = volts[load.unknown(drive.a)] - volts[load.unknown(drive.b)];
      double amps = Math.abs(shares[d] * drive.openVolts - across) / drive.ohms;
      windings.add(
          new WindingLoad(
              drive.winding, drive.number, Math.abs(across), amps, Math.sqrt(2) * amps));
    }
    for (Element element : load.loads.keySet()) {
      if (element instanceof Filament filament) {
        double across = volts[load.unknown(filament.a())] - volts[load.unknown(filament.b())];
        filaments.put(filament, Math.abs(across));
      }
    }
  }

  /** Returns what each section drives as a share of its open volts as written. */
  private double[] shares(Circuit circuit, String transformerName, double coreShare) {
    double[] shares = new double[drives.size()];
    @Nullable Transformer transformer = circuit.transformer(transformerName).orElse(null);
    double drop = 1;
    if (transformer != null && transformer.primaryOhms() > 0) {
      drop = 1 / (1 + transformer.primaryOhms() * primarySiemens(transformer));
    }
    for (int d = 0; d < shares.length; d++) {
      double line = circuit.line().scale(drives.get(d).winding.atLineVolts());
      shares[d] = Double.isNaN(coreShare) ? drop * line : coreShare;
    }
    return shares;
  }

  private double primarySiemens(Transformer transformer) {
    double[] ones = new double[drives.size()];
    Arrays.fill(ones, 1);
    double[] volts = solve(ones);
    double siemens = 0;
    for (Drive drive : drives) {
      double across = volts[unknown(drive.a)] - volts[unknown(drive.b)];
      siemens += drive.openVolts * (drive.openVolts - across) / drive.ohms;
    }
    return siemens / (transformer.primaryVolts() * transformer.primaryVolts());
  }

  /** Returns the volts of all nodes when each section drives that share of its open volts. */
  private double[] solve(double[] shares) {
    int count = unknowns.size();
    double[][] matrix = new double[count][count];
    double[] source = new double[count];
    for (int n = 0; n < count; n++) {
      matrix[n][n] = TIE_SIEMENS;
    }
    for (List<Conductor> conductors : loads.values()) {
      for (Conductor conductor : conductors) {
        conductance(matrix, conductor.a, conductor.b, 1 / conductor.ohms);
      }
    }
    for (int d = 0; d < shares.length; d++) {
      Drive drive = drives.get(d);
      conductance(matrix, drive.a, drive.b, 1 / drive.ohms);
      source[unknown(drive.a)] += shares[d] * drive.openVolts / drive.ohms;
      source[unknown(drive.b)] -= shares[d] * drive.openVolts / drive.ohms;
    }
    @Nullable DenseLu lu = DenseLu.of(matrix);
    if (lu == null) {
      throw new IllegalStateException("a heater circuit has no unique answer");
    }
    return lu.solve(source);
  }

  /**
   * Returns whether a part is one of the heater circuit's: heaters, lamps and leads that touch it
   * anywhere but at the reference, and resistances between two of its nodes.
   */
  private boolean belongs(Element element) {
    if (element instanceof Resistor resistor) {
      return inside(resistor.a()) && inside(resistor.b());
    }
    if (element instanceof Potentiometer pot) {
      return inside(pot.a()) && inside(pot.b());
    }
    boolean carries =
        element instanceof Filament
            || element instanceof Lamp
            || element instanceof Wire
            || element instanceof Fuse
            || (element instanceof Switch contact && contact.position() > 0);
    return carries && touches(element);
  }

  private boolean inside(Node node) {
    return node.equals(reference) || unknowns.containsKey(node);
  }

  private boolean touches(Element element) {
    for (Node node : element.nodes()) {
      if (unknowns.containsKey(node) && !node.equals(reference)) {
        return true;
      }
    }
    return false;
  }

  private static List<Conductor> conductors(Element element) {
    if (element instanceof Potentiometer pot) {
      double upper = Math.max(CONTACT_OHMS, (1 - pot.share()) * pot.ohms());
      double lower = Math.max(CONTACT_OHMS, pot.share() * pot.ohms());
      return List.of(
          new Conductor(pot.a(), pot.wiper(), upper), new Conductor(pot.wiper(), pot.b(), lower));
    }
    if (element instanceof Switch contact) {
      Node pole = contact.poles().get(contact.position() - 1);
      return List.of(new Conductor(contact.common(), pole, CONTACT_OHMS));
    }
    boolean lead = element instanceof Wire || element instanceof Fuse;
    double ohms = lead ? CONTACT_OHMS : Math.max(CONTACT_OHMS, TwoTerminal.ohms(element));
    return List.of(new Conductor(element.nodes().get(0), element.nodes().get(1), ohms));
  }

  private int unknown(Node node) {
    Integer known = unknowns.get(node);
    if (known == null) {
      known = unknowns.size();
      unknowns.put(node, known);
    }
    return known;
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
