package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
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
  final Devices devices;
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
  private Map<Element, Integer> branches;

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
    diagonal = matrix.places(firstDiagonal, nodeCount);
    devices = new Devices(stamper, matrix);
    linear = matrix.newValues();
    source = new double[0];
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

  /**
   * Writes the values of a circuit of the same topology. Returns false, and writes none, when one
   * asks for equations of another shape: a resistance that got so small that it needs its current
   * as an unknown.
   */
  boolean load(Circuit circuit) {
    List<Element> parts = new ArrayList<>(elementPlaces.size());
    for (int place : elementPlaces) {
      parts.add(circuit.elements().get(place));
    }
    DcStamper stamper = stamp(parts);
    boolean fits = matrix.fits(stamps);
    if (fits) {
      take(stamper);
    }
    return fits;
  }

  private void take(DcStamper stamper) {
    matrix.load(stamps, linear);
    source = stamps.rightHandSide();
    branches = stamper.branches();
    devices.load(stamper);
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
    devices.addTo(x, residual, jacobian);
  }

  /** Returns the name of the node of an unknown. */
  String nodeName(int unknown) {
    return unknown < 0 || unknown >= nodeCount ? "?" : nodes.get(unknown).name();
  }

  /** Returns the unknown of a part's current; null when it has none. */
  @Nullable Integer branchOf(Element element) {
    return branches.get(element);
  }

  static double at(double[] x, int unknown) {
    return unknown < 0 ? 0 : x[unknown];
  }
}
