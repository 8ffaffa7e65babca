package railwalk.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Node;
import railwalk.circuit.RegulatorSection;
import railwalk.device.AmplifierLaw;
import railwalk.device.GasLaw;
import railwalk.device.SectionCurrents;
import railwalk.device.SectionLaw;
import railwalk.device.TwoPoleCurrent;
import railwalk.device.TwoPoleLaw;
import railwalk.walk.SupplyMap;

/**
 * The equations of everything outside the ripple groups, for direct current: modified nodal
 * analysis (C.-W. Ho, A. E. Ruehli, P. A. Brennan, "The modified nodal approach to network
 * analysis", IEEE Trans. Circuits and Systems 22 (1975)). Unknowns are node volts, then the
 * currents of parts that have no resistance or follow a law of volts, among them the current each
 * supply port delivers.
 *
 * <p>The pattern is made once; {@link #load} writes the values of a circuit of the same topology.
 */
final class DcNetwork {
  /** A tube section: unknowns of its electrodes (−1: reference) and places of its 4 × 4 block. */
  record Amplifier(
      AmplifierSection section, int plate, int screen, int grid, int cathode, int[] places) {}

  /** A diode or one plate of a rectifier or regulator. */
  record TwoPole(Element element, int anode, int cathode, int[] places) {}

  /**
   * Where a supply port stands: which port of which group, its node, the unknown of its current,
   * and the number of the first entry of its row of source resistances.
   */
  record Port(int group, int number, int node, int branch, int firstOhms) {}

  /** Ties nodes that have no DC path, so that the equations of the others can be solved. */
  private static final double TIE_SIEMENS = 1e-12;

  final Map<Node, Integer> unknowns = new HashMap<>();
  final int nodeCount;
  final int size;
  final SparseMatrix matrix;
  final List<Amplifier> amplifiers = new ArrayList<>();
  final List<TwoPole> twoPoles = new ArrayList<>();
  final List<Port> ports = new ArrayList<>();
  final int[] diagonal;
  final List<Element> elements;
  final List<Integer> elementPlaces;
  final List<Node> nodes;

  private final SupplyMap map;
  private final Stamps stamps = new Stamps();
  private int firstDiagonal;
  private final double[] linear;
  private double[] source;
  private AmplifierLaw[] laws;
  private TwoPoleLaw[] twoPoleLaws;
  private final int[] glow;
  private Map<Element, Integer> branches;
  private final SectionCurrents currents = new SectionCurrents();
  private final TwoPoleCurrent current = new TwoPoleCurrent();

  DcNetwork(Circuit circuit, SupplyMap map) {
    this.map = map;
    Set<Element> inGroups = new HashSet<>();
    map.groups().forEach(g -> inGroups.addAll(g.elements()));
    elements = new ArrayList<>();
    elementPlaces = new ArrayList<>();
    Set<Node> touched = new HashSet<>();
    for (int i = 0; i < circuit.elements().size(); i++) {
      Element element = circuit.elements().get(i);
      boolean opens = element instanceof Capacitor c && Double.isInfinite(c.leakOhms());
      if (!inGroups.contains(element) && !opens) {
        elements.add(element);
        elementPlaces.add(i);
        touched.addAll(element.nodes());
      }
    }
    map.groups().forEach(g -> touched.addAll(g.ports()));
    nodes = new ArrayList<>();
    for (Node node : circuit.nodes()) {
      if (node.equals(circuit.reference())) {
        unknowns.put(node, -1);
      } else if (touched.contains(node)) {
        unknowns.put(node, nodes.size());
        nodes.add(node);
      }
    }
    nodeCount = nodes.size();
    DcStamper stamper = stamp(elements);
    size = stamps.size();
    matrix = new SparseMatrix(stamps);
    branches = stamper.branches();
    diagonal = run(firstDiagonal, nodeCount);
    for (DcStamper.AmplifierDraft d : stamper.amplifiers) {
      amplifiers.add(
          new Amplifier(
              d.section(), d.plate(), d.screen(), d.grid(), d.cathode(), run(d.entry(), 16)));
    }
    for (DcStamper.TwoPoleDraft d : stamper.twoPoles) {
      twoPoles.add(new TwoPole(d.element(), d.anode(), d.cathode(), run(d.entry(), 4)));
    }
    glow = new int[twoPoles.size()];
    linear = matrix.newValues();
    source = new double[0];
    laws = new AmplifierLaw[0];
    twoPoleLaws = new TwoPoleLaw[0];
    take(stamper);
  }

  /** Writes all equations: parts, ties, then the supply ports group by group. */
  private DcStamper stamp(List<Element> parts) {
    stamps.start(nodeCount);
    DcStamper stamper = new DcStamper(stamps, unknowns);
    parts.forEach(e -> e.accept(stamper));
    stamper.finish();
    firstDiagonal = stamps.count();
    for (int n = 0; n < nodeCount; n++) {
      stamps.entry(n, n, map.undefined().contains(nodes.get(n)) ? TIE_SIEMENS : 0);
    }
    ports.clear();
    for (int g = 0; g < map.groups().size(); g++) {
      stampPorts(g, map.groups().get(g).ports());
    }
    return stamper;
  }

  private void stampPorts(int group, List<Node> portNodes) {
    int count = portNodes.size();
    int[] branchOf = new int[count];
    for (int p = 0; p < count; p++) {
      branchOf[p] = stamps.newBranch();
      int node = unknowns.getOrDefault(portNodes.get(p), -1);
      stamps.entry(node, branchOf[p], -1);
      stamps.entry(branchOf[p], node, 1);
    }
    for (int p = 0; p < count; p++) {
      ports.add(
          new Port(
              group, p, unknowns.getOrDefault(portNodes.get(p), -1), branchOf[p], stamps.count()));
      for (int q = 0; q < count; q++) {
        stamps.entry(branchOf[p], branchOf[q], 0);
      }
    }
  }

  /** Writes the values of a circuit of the same topology. */
  void load(Circuit circuit) {
    List<Element> parts = new ArrayList<>(elementPlaces.size());
    for (int place : elementPlaces) {
      parts.add(circuit.elements().get(place));
    }
    take(stamp(parts));
  }

  private void take(DcStamper stamper) {
    matrix.load(stamps, linear);
    source = stamps.rightHandSide();
    branches = stamper.branches();
    laws = stamper.amplifiers.stream().map(d -> d.section().law()).toArray(AmplifierLaw[]::new);
    twoPoleLaws = new TwoPoleLaw[twoPoles.size()];
    for (int i = 0; i < twoPoleLaws.length; i++) {
      twoPoleLaws[i] = branchOf(stamper.twoPoles.get(i).law(), glow[i]);
    }
  }

  private static TwoPoleLaw branchOf(SectionLaw law, int glow) {
    if (law instanceof GasLaw gas) {
      return glow == 0 ? gas.dark() : glow > 0 ? gas.lit() : new Turned(gas.lit());
    }
    return (TwoPoleLaw) law;
  }

  /** A neon lamp lit the other way round. */
  private record Turned(TwoPoleLaw law) implements TwoPoleLaw {
    @Override
    public void evaluate(double volts, TwoPoleCurrent out) {
      law.evaluate(-volts, out);
      out.amps = -out.amps;
    }

    @Override
    public TwoPoleLaw withEmission(double emission) {
      return this;
    }
  }

  /** Sets what a port sees: {@code open volts − Σ ohms · I}. */
  void setSupply(int group, Thevenin thevenin) {
    for (Port port : ports) {
      if (port.group == group) {
        source[port.branch] = thevenin.openVolts()[port.number];
        for (int q = 0; q < thevenin.openVolts().length; q++) {
          linear[matrix.place(port.firstOhms + q)] = thevenin.ohms()[port.number][q];
        }
      }
    }
  }

  /** Returns the source resistance between a port and port {@code other} of its group. */
  double portOhms(Port port, int other) {
    return linear[matrix.place(port.firstOhms + other)];
  }

  /** Adds a conductance from a node to the reference, such as a meter's; take it off with minus. */
  void addLoad(int node, double siemens) {
    linear[diagonal[node]] += siemens;
  }

  /**
   * Puts the residuals of the equations at {@code x} into {@code residual} (node rows: ampere that
   * leave the node) and their derivatives into {@code jacobian}.
   *
   * @param drive factor on every source, 1 for the real circuit
   * @param tieSiemens from every node to the reference, 0 for the real circuit
   */
  void evaluate(double[] x, double drive, double tieSiemens, double[] residual, double[] jacobian) {
    System.arraycopy(linear, 0, jacobian, 0, linear.length);
    for (int n = 0; n < size; n++) {
      residual[n] = -drive * source[n];
    }
    matrix.addProduct(linear, x, residual);
    if (tieSiemens > 0) {
      for (int n = 0; n < nodeCount; n++) {
        jacobian[diagonal[n]] += tieSiemens;
        residual[n] += tieSiemens * x[n];
      }
    }
    for (int i = 0; i < twoPoles.size(); i++) {
      TwoPole pole = twoPoles.get(i);
      twoPoleLaws[i].evaluate(at(x, pole.anode) - at(x, pole.cathode), current);
      add(residual, pole.anode, current.amps);
      add(residual, pole.cathode, -current.amps);
      int[] p = pole.places;
      jacobian[p[0]] += current.siemens;
      jacobian[p[1]] -= current.siemens;
      jacobian[p[2]] -= current.siemens;
      jacobian[p[3]] += current.siemens;
    }
    for (int i = 0; i < laws.length; i++) {
      Amplifier tube = amplifiers.get(i);
      law(i, x);
      add(residual, tube.plate, currents.plateAmps);
      add(residual, tube.screen, currents.screenAmps);
      add(residual, tube.grid, currents.gridAmps);
      add(residual, tube.cathode, -currents.plateAmps - currents.screenAmps - currents.gridAmps);
      stampSection(tube.places, jacobian);
    }
  }

  private void law(int tube, double[] x) {
    Amplifier a = amplifiers.get(tube);
    double cathode = at(x, a.cathode);
    double screen = a.section.screen() == null ? 0 : at(x, a.screen) - cathode;
    laws[tube].evaluate(at(x, a.plate) - cathode, screen, at(x, a.grid) - cathode, currents);
  }

  private void stampSection(int[] p, double[] jacobian) {
    SectionCurrents c = currents;
    double plateSum = c.plateByPlateSiemens + c.plateByScreenSiemens + c.plateByGridSiemens;
    double screenSum = c.screenByPlateSiemens + c.screenByScreenSiemens + c.screenByGridSiemens;
    double gridSum = c.gridByPlateSiemens + c.gridByScreenSiemens + c.gridByGridSiemens;
    double byPlate = c.plateByPlateSiemens + c.screenByPlateSiemens + c.gridByPlateSiemens;
    double byScreen = c.plateByScreenSiemens + c.screenByScreenSiemens + c.gridByScreenSiemens;
    double byGrid = c.plateByGridSiemens + c.screenByGridSiemens + c.gridByGridSiemens;
    jacobian[p[0]] += c.plateByPlateSiemens;
    jacobian[p[1]] += c.plateByScreenSiemens;
    jacobian[p[2]] += c.plateByGridSiemens;
    jacobian[p[3]] -= plateSum;
    jacobian[p[4]] += c.screenByPlateSiemens;
    jacobian[p[5]] += c.screenByScreenSiemens;
    jacobian[p[6]] += c.screenByGridSiemens;
    jacobian[p[7]] -= screenSum;
    jacobian[p[8]] += c.gridByPlateSiemens;
    jacobian[p[9]] += c.gridByScreenSiemens;
    jacobian[p[10]] += c.gridByGridSiemens;
    jacobian[p[11]] -= gridSum;
    jacobian[p[12]] -= byPlate;
    jacobian[p[13]] -= byScreen;
    jacobian[p[14]] -= byGrid;
    jacobian[p[15]] += plateSum + screenSum + gridSum;
  }

  /** Returns the currents of a tube section at {@code x}; valid until the next call. */
  SectionCurrents section(int tube, double[] x) {
    law(tube, x);
    return currents;
  }

  /** Returns the current of a two-pole at {@code x}. */
  double twoPoleAmps(int pole, double[] x) {
    TwoPole p = twoPoles.get(pole);
    twoPoleLaws[pole].evaluate(at(x, p.anode) - at(x, p.cathode), current);
    return current.amps;
  }

  /** Returns the name of the node of an unknown. */
  String nodeName(int unknown) {
    return unknown < 0 || unknown >= nodeCount ? "?" : nodes.get(unknown).name();
  }

  /** Returns the unknown of a part's current; null when it has none. */
  @Nullable Integer branchOf(Element element) {
    return branches.get(element);
  }

  /**
   * Lights every gas tube whose volts at {@code x} pass its strike, and puts out every lit one
   * whose current would reverse. Returns whether any changed.
   */
  boolean updateGlow(double[] x) {
    boolean changed = false;
    for (int i = 0; i < twoPoles.size(); i++) {
      TwoPole pole = twoPoles.get(i);
      GasLaw gas = gasOf(pole.element);
      if (gas == null) {
        continue;
      }
      double volts = at(x, pole.anode) - at(x, pole.cathode);
      int next = glow[i];
      if (glow[i] == 0) {
        boolean bothWays = pole.element instanceof GlowLamp;
        if (volts > gas.strikeVolts()) {
          next = 1;
        } else if (bothWays && volts < -gas.strikeVolts()) {
          next = -1;
        }
      } else if (glow[i] * twoPoleAmps(i, x) < 0) {
        next = 0;
      }
      if (next != glow[i]) {
        glow[i] = next;
        twoPoleLaws[i] = branchOf(gas, next);
        changed = true;
      }
    }
    return changed;
  }

  private static @Nullable GasLaw gasOf(Element element) {
    if (element instanceof RegulatorSection regulator) {
      return regulator.law();
    }
    return element instanceof GlowLamp lamp ? lamp.law() : null;
  }

  /** Returns 1 (or −1, turned round) for a gas tube that glows, 0 for a dark one or other part. */
  int glow(int pole) {
    return glow[pole];
  }

  /** Takes over which gas tubes glow. */
  void copyGlow(DcNetwork other) {
    System.arraycopy(other.glow, 0, glow, 0, glow.length);
    for (int i = 0; i < glow.length; i++) {
      GasLaw gas = gasOf(twoPoles.get(i).element);
      if (gas != null) {
        twoPoleLaws[i] = branchOf(gas, glow[i]);
      }
    }
  }

  static double at(double[] x, int unknown) {
    return unknown < 0 ? 0 : x[unknown];
  }

  private static void add(double[] target, int unknown, double amount) {
    if (unknown >= 0) {
      target[unknown] += amount;
    }
  }

  private int[] run(int first, int count) {
    int[] numbers = new int[count];
    Arrays.setAll(numbers, i -> first + i);
    return places(numbers);
  }

  private int[] places(int[] numbers) {
    int[] places = new int[numbers.length];
    for (int i = 0; i < numbers.length; i++) {
      places[i] = matrix.place(numbers[i]);
    }
    return places;
  }
}
