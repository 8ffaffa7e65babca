package railwalk.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.walk.RippleGroup;
import railwalk.walk.SupplyMap;

/**
 * DC network and supplies brought to rest together. In turn, each supply runs one period and
 * answers with the tangent of its port volts; the DC network settles against these tangents and
 * answers with the currents drawn; the supplies correct their start states and currents by the
 * tangent. Since every tangent is exact this is Newton's method on both at once.
 */
final class CoupledSolver {
  private static final int MOST_ROUNDS = 120;
  private static final int PATIENT_ROUNDS = 10;

  /** From corrections of this size on, periods are run at full accuracy. */
  private static final double NEAR_SHARE = 1e-2;

  /**
   * When to stop, and when the derivatives of an earlier sweep will do.
   *
   * @param settledShare greatest error that may be left, as a share of the greatest volts. A
   *     correction leaves about its square where the sweep carried its derivatives, and itself
   *     times the last gain where derivatives of an earlier sweep served
   * @param chordShare after a correction this small the derivatives of the last sweep serve for the
   *     next
   * @param chordGain … as long as each correction is no more than this share of the one before
   */
  record Accuracy(double settledShare, double chordShare, double chordGain) {
    /** Of a solution that is charted. */
    static final Accuracy CHARTED = new Accuracy(2e-11, 1e-4, 0.2);

    /**
     * Of one of thousands that start from the same neighbour: its derivatives serve for all, and a
     * few millivolts in the rails don't show in a band.
     */
    static final Accuracy SAMPLED = new Accuracy(1e-7, 5e-2, 0.5);
  }

  /** Rounds after which the slopes of the drawn currents stay, so that the end is quadratic. */
  private static final int SLOPE_ROUNDS = 4;

  private Circuit circuit;
  private SupplyMap map;
  private final Trace trace;
  final DcNetwork dc;
  final List<Supply> supplies = new ArrayList<>();
  private final DcSolver dcSolver;
  final double[] x;
  private String failure = "";
  private String failedNode = "";
  private boolean near;

  CoupledSolver(Circuit circuit, SupplyMap map, boolean tracing) {
    this.circuit = circuit;
    this.map = map;
    trace = new Trace(tracing);
    dc = new DcNetwork(circuit, map);
    for (RippleGroup group : map.groups()) {
      supplies.add(new Supply(new CycleNetwork(circuit, group)));
    }
    dcSolver = new DcSolver(dc, trace);
    x = new double[dc.size];
  }

  /**
   * Takes the values of a circuit of the same topology. Returns false when they ask for equations
   * of another shape; this solver is of no use then until others have been taken that fit.
   */
  boolean load(Circuit changed, SupplyMap changedMap) {
    boolean fits = dc.load(changed);
    for (int g = 0; fits && g < supplies.size(); g++) {
      fits = supplies.get(g).load(changed, changedMap.groups().get(g));
    }
    circuit = changed;
    map = changedMap;
    return fits;
  }

  Circuit circuit() {
    return circuit;
  }

  SupplyMap map() {
    return map;
  }

  Trace trace() {
    return trace;
  }

  String failure() {
    return failure;
  }

  String failedNode() {
    return failedNode;
  }

  /** Starts from a solved neighbour of the same topology. */
  void startFrom(CoupledSolver neighbour) {
    System.arraycopy(neighbour.x, 0, x, 0, x.length);
    dc.devices.copyGlow(neighbour.dc.devices);
    for (int g = 0; g < supplies.size(); g++) {
      supplies.get(g).copyFrom(neighbour.supplies.get(g));
    }
    near = true;
  }

  /**
   * Starts from a solved circuit that is like this one but for a part or two: node volts and the
   * supplies of the same shape are taken over. Returns false when nothing settles to start from.
   */
  boolean startNear(CoupledSolver neighbour) {
    if (dc.size == neighbour.dc.size && dc.nodes.equals(neighbour.dc.nodes)) {
      System.arraycopy(neighbour.x, 0, x, 0, x.length);
    } else {
      for (int n = 0; n < dc.nodeCount; n++) {
        x[n] = DcNetwork.at(neighbour.x, neighbour.dc.unknowns.getOrDefault(dc.nodes.get(n), -1));
      }
    }
    dc.devices.glowAs(neighbour.dc.devices);
    for (int g = 0; g < supplies.size(); g++) {
      if (supplies.size() != neighbour.supplies.size()
          || !supplies.get(g).isLike(neighbour.supplies.get(g))) {
        return startCold();
      }
    }
    for (int g = 0; g < supplies.size(); g++) {
      supplies.get(g).copyFrom(neighbour.supplies.get(g));
    }
    near = true;
    return true;
  }

  /** Forgets everything but the topology and the values. */
  void reset() {
    near = false;
    Arrays.fill(x, 0);
    supplies.forEach(Supply::reset);
  }

  /** Starts from nothing: reservoirs charged without load, everything else dead. */
  boolean startCold() {
    for (int g = 0; g < supplies.size(); g++) {
      Supply supply = supplies.get(g);
      if (!supply.charge()) {
        return fail(supply, "its first charge did not settle");
      }
      dc.setSupply(g, held(supply));
    }
    return settleDc();
  }

  private static Thevenin held(Supply supply) {
    int ports = supply.portCount();
    double[] volts = new double[ports];
    for (int p = 0; p < ports; p++) {
      volts[p] = supply.portVolts(p);
    }
    return new Thevenin(volts, new double[ports][ports]);
  }

  /** Brings both sides to rest, as exactly as is charted. */
  boolean settle() {
    return settle(Accuracy.CHARTED);
  }

  /** Brings both sides to rest. */
  boolean settle(Accuracy accuracy) {
    if (supplies.isEmpty()) {
      return settleDc();
    }
    boolean chord = near && guessByNeighbour(accuracy);
    double before = Double.POSITIVE_INFINITY;
    for (int round = 0; round < MOST_ROUNDS; round++) {
      double share = near ? 1 : correctionShare(round);
      for (int g = 0; g < supplies.size(); g++) {
        Supply supply = supplies.get(g);
        if (!chord && round < SLOPE_ROUNDS) {
          supply.setSlopes(loadSlopes(g));
        }
        Thevenin tangent = supply.tangent(near, chord);
        if (tangent == null) {
          return fail(supply, "a rectifier did not settle within the period");
        }
        dc.setSupply(g, tangent);
      }
      if (!settleDc()) {
        return false;
      }
      double change = 0;
      for (int g = 0; g < supplies.size(); g++) {
        change = Math.max(change, supplies.get(g).correct(portAmps(g), portVolts(g), share));
      }
      trace.add("supply round %d, %s: change %.3g", round + 1, near ? "fine" : "coarse", change);
      double gain = round == 0 ? 1 : Math.min(1, change / before);
      double left = change * (chord ? gain : change);
      if (near && left < accuracy.settledShare) {
        return true;
      }
      chord = near && change < accuracy.chordShare && change < accuracy.chordGain * before;
      before = change;
      near |= change < NEAR_SHARE;
    }
    return fail(supplies.get(0), "the reservoir volts did not come to rest");
  }

  /**
   * Takes the first step by the neighbour's tangents, which hold as long as only parts outside the
   * supplies differ. Returns whether they may serve for the next sweep too.
   */
  private boolean guessByNeighbour(Accuracy accuracy) {
    for (int g = 0; g < supplies.size(); g++) {
      Thevenin tangent = supplies.get(g).tangentAsBefore();
      if (tangent == null) {
        return false;
      }
      dc.setSupply(g, tangent);
    }
    if (!settleDc()) {
      return false;
    }
    double change = 0;
    for (int g = 0; g < supplies.size(); g++) {
      change = Math.max(change, supplies.get(g).correct(portAmps(g), portVolts(g), 1));
    }
    trace.add("by the neighbour's tangents: change %.3g", change);
    return change < accuracy.chordShare;
  }

  /**
   * Returns how much of a correction to make: all of it at first; less and less when a supply hunts
   * between two patterns of conduction, full corrections being tried again now and then.
   */
  private static double correctionShare(int round) {
    return round < PATIENT_ROUNDS || round % 6 == 0 ? 1 : PATIENT_ROUNDS / (2.0 * round);
  }

  private boolean settleDc() {
    if (dcSolver.settle(x)) {
      return true;
    }
    failedNode = dc.nodeName(dcSolver.newton().worstNode());
    failure = "the volts of this node would not come to rest";
    return false;
  }

  private boolean fail(Supply supply, String reason) {
    List<Node> outputs = supply.net.group.outputs();
    failedNode = outputs.isEmpty() ? supply.net.group.nodes().get(0).name() : outputs.get(0).name();
    failure = reason;
    return false;
  }

  private double[] portAmps(int group) {
    return dc.ports.stream()
        .filter(p -> p.group() == group)
        .mapToDouble(p -> x[p.branch()])
        .toArray();
  }

  private double[] portVolts(int group) {
    return dc.ports.stream()
        .filter(p -> p.group() == group)
        .mapToDouble(p -> DcNetwork.at(x, p.node()))
        .toArray();
  }

  /**
   * Returns by how much the current drawn at each port (row) rises with the volts of each port
   * (column), the others held: L, where Y = dI/dE is found through the source resistances Z and Y⁻¹
   * = L⁻¹ + Z, so L = Y · (1 − Z·Y)⁻¹.
   */
  private double[][] loadSlopes(int group) {
    List<DcNetwork.Port> ports = dc.ports.stream().filter(p -> p.group() == group).toList();
    int count = ports.size();
    double[] residual = new double[dc.size];
    double[] jacobian = dc.matrix.newValues();
    dc.evaluate(x, 1, 0, residual, jacobian);
    double[][] slopes = new double[count][count];
    if (!dc.matrix.lu().factor(jacobian)) {
      return slopes;
    }
    double[][] y = new double[count][count];
    for (int c = 0; c < count; c++) {
      double[] unit = new double[dc.size];
      unit[ports.get(c).branch()] = 1;
      dc.matrix.lu().solve(unit, unit);
      for (int r = 0; r < count; r++) {
        y[r][c] = unit[ports.get(r).branch()];
      }
    }
    double[][] left = new double[count][count];
    for (int r = 0; r < count; r++) {
      for (int c = 0; c < count; c++) {
        double zy = 0;
        for (int k = 0; k < count; k++) {
          zy += dc.portOhms(ports.get(r), k) * y[k][c];
        }
        left[c][r] = (r == c ? 1 : 0) - zy;
      }
    }
    DenseLu lu = DenseLu.of(left);
    if (lu == null) {
      return slopes;
    }
    for (int r = 0; r < count; r++) {
      slopes[r] = lu.solve(y[r]);
    }
    return slopes;
  }

  /**
   * Returns the settled network's derivatives, factored; valid until the network is used again.
   * Nodes that float are tied by as little as will do.
   */
  SparseLu factored() {
    double[] residual = new double[dc.size];
    double[] jacobian = dc.matrix.newValues();
    for (double tieSiemens : new double[] {0, 1e-12, 1e-9}) {
      dc.evaluate(x, 1, tieSiemens, residual, jacobian);
      if (dc.matrix.lu().factor(jacobian)) {
        return dc.matrix.lu();
      }
    }
    throw new IllegalStateException("a settled network has no unique answer");
  }

  /** Returns the greatest current that is missing at any node of the DC network, ampere. */
  double unbalancedAmps() {
    double[] residual = new double[dc.size];
    dc.evaluate(x, 1, 0, residual, dc.matrix.newValues());
    double greatest = 0;
    for (int n = 0; n < dc.nodeCount; n++) {
      greatest = Math.max(greatest, Math.abs(residual[n]));
    }
    return greatest;
  }

  /** Returns the volts at {@code node} with a load of {@code ohms} from it to the reference. */
  double loadedVolts(int node, double ohms) {
    double[] loaded = x.clone();
    dc.addLoad(node, 1 / ohms);
    boolean settled = new Newton(dc, StepLimit.tubes(4, 100), new Trace(false)).run(loaded, 1, 0);
    dc.addLoad(node, -1 / ohms);
    return settled ? loaded[node] : Double.NaN;
  }

  @Nullable Supply supplyOf(Node node) {
    for (Supply supply : supplies) {
      if (supply.net.unknowns.containsKey(node)) {
        return supply;
      }
    }
    return null;
  }
}
