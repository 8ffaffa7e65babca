package railwalk.solve;

import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.walk.RippleGroup;

/**
 * One ripple group on its way to the periodic steady state, by shooting: the states at the start of
 * a period and the currents drawn at the ports are corrected together until the period ends where
 * it began. Newton's method on the period map, whose derivatives {@link CycleSweep} carries along
 * (T. J. Aprille and T. N. Trick, "Steady-state analysis of nonlinear circuits with periodic
 * inputs", Proc. IEEE 60 (1972)).
 *
 * <p>The ports' currents follow the ripple: i(t) = I + G · (v(t) − V), I and V being means by port
 * and G a matrix. It is set by {@link #setSlopes}.
 */
final class Supply {
  /** Steps a period: means then stand within 0.1 % on the hardest of the conduction-angle table. */
  private static final int STEPS = 72;

  /** Steps a period while the states are still far off, and for the first charge. */
  private static final int COARSE_STEPS = 24;

  /** Size of the stores for the first charge. */
  private static final double CHARGE_SCALE = 1.0 / 20;

  final CycleNetwork net;
  private final CycleSweep fine;
  private final CycleSweep coarse;
  private CycleSweep sweep;
  private final int[] portUnknowns;
  private final double[] states;
  private final double[] drawnAmps;
  private final double[][] drawnSiemens;
  private final double[] meterSiemens;
  private final double[] lead;
  private final double[] carried;
  private @Nullable PeriodMap map;
  private @Nullable Start start;

  /** The derivatives of the period map, from the last sweep that carried them. */
  private record PeriodMap(DenseLu shooting, double[][] stateByDrawn, double[][] meansByColumn) {}

  /** Where the last sweep started, and how far its start is to move to close the period. */
  private record Start(double[] states, double[] drawnAmps, double[] stateByGap) {}

  Supply(CycleNetwork net) {
    this.net = net;
    fine = new CycleSweep(net, STEPS);
    coarse = new CycleSweep(net, COARSE_STEPS);
    sweep = fine;
    List<Node> ports = net.group.ports();
    portUnknowns = ports.stream().mapToInt(net::at).toArray();
    states = new double[net.stores.size()];
    drawnAmps = new double[net.nodeCount];
    drawnSiemens = new double[net.nodeCount][net.nodeCount];
    meterSiemens = new double[net.nodeCount];
    lead = new double[states.length];
    carried = new double[states.length];
  }

  /** Takes the values of a group of the same topology; false when they do not fit the equations. */
  boolean load(Circuit circuit, RippleGroup group) {
    fine.forget();
    coarse.forget();
    return net.load(circuit, group);
  }

  /** Charges the reservoirs quickly, as a first guess: a few periods with small capacitors. */
  boolean charge() {
    for (int period = 0; period < 3; period++) {
      if (!coarse.run(states, drawnAmps, drawnSiemens, CHARGE_SCALE, false)) {
        return false;
      }
      System.arraycopy(coarse.endStates, 0, states, 0, states.length);
    }
    System.arraycopy(coarse.means, 0, sweep.means, 0, sweep.means.length);
    return true;
  }

  /** Empties every reservoir and draws nothing. */
  void reset() {
    Arrays.fill(states, 0);
    Arrays.fill(drawnAmps, 0);
    for (double[] row : drawnSiemens) {
      Arrays.fill(row, 0);
    }
  }

  /** Returns whether {@code other} has the same states and ports. */
  boolean isLike(Supply other) {
    return states.length == other.states.length
        && net.size == other.net.size
        && net.group.nodes().equals(other.net.group.nodes())
        && net.group.ports().equals(other.net.group.ports());
  }

  /** Takes over the states and currents of a neighbouring solution of the same shape. */
  void copyFrom(Supply other) {
    System.arraycopy(other.states, 0, states, 0, states.length);
    System.arraycopy(other.drawnAmps, 0, drawnAmps, 0, drawnAmps.length);
    for (int n = 0; n < drawnSiemens.length; n++) {
      System.arraycopy(other.drawnSiemens[n], 0, drawnSiemens[n], 0, drawnSiemens.length);
    }
    sweep = fine;
    System.arraycopy(other.sweep.means, 0, sweep.means, 0, sweep.means.length);
    System.arraycopy(other.sweep.endStates, 0, sweep.endStates, 0, sweep.endStates.length);
    map = other.map;
    start = other.start;
  }

  /**
   * Has the states run on instead of coming to rest: over the period state s, at its start, is to
   * gain {@code lead · s − carried}.
   */
  void runOn(double[] leadOfEach, double[] carriedOfEach) {
    System.arraycopy(leadOfEach, 0, lead, 0, lead.length);
    System.arraycopy(carriedOfEach, 0, carried, 0, carried.length);
  }

  /** Starts the period from {@code given} states. */
  void startAt(double[] given) {
    System.arraycopy(given, 0, states, 0, states.length);
  }

  /** Puts a meter from {@code node} to the reference. */
  void connectMeter(Node node, double siemens) {
    meterSiemens[net.at(node)] = siemens;
  }

  /** Returns the state of store {@code number} at the start of the period. */
  double startState(int number) {
    return states[number];
  }

  /** Returns the mean volts of a node over the last sweep. */
  double meanVolts(Node node) {
    return sweep.means[net.at(node)];
  }

  /** Returns the mean volts of a port over the last sweep. */
  double portVolts(int port) {
    return sweep.means[portUnknowns[port]];
  }

  int portCount() {
    return portUnknowns.length;
  }

  /**
   * Sets how the current drawn at each port (row) follows the ripple of each port (column),
   * siemens; what falls as the port's own volts rise is left out.
   */
  void setSlopes(double[][] siemens) {
    for (int p = 0; p < portUnknowns.length; p++) {
      int row = portUnknowns[p];
      for (int q = 0; q < portUnknowns.length; q++) {
        int column = portUnknowns[q];
        double changed = p == q ? Math.max(0, siemens[p][q]) : siemens[p][q];
        drawnAmps[row] += (drawnSiemens[row][column] - changed) * sweep.means[column];
        drawnSiemens[row][column] = changed;
      }
    }
  }

  /**
   * Runs a period and returns the tangent seen from the ports; null when a stage did not settle.
   *
   * @param near whether the states are close to their end, so that full accuracy pays
   * @param chord whether the derivatives of an earlier sweep will do
   */
  @Nullable Thevenin tangent(boolean near, boolean chord) {
    sweep = near ? fine : coarse;
    boolean derive = !chord || map == null;
    if (!sweep.run(states, drawnAmps, siemensAtNodes(), 1, derive)) {
      return null;
    }
    if (derive) {
      map = derivatives();
    }
    return map == null ? null : tangentBy(map);
  }

  private double[][] siemensAtNodes() {
    double[][] sum = new double[drawnSiemens.length][];
    for (int n = 0; n < sum.length; n++) {
      sum[n] = drawnSiemens[n].clone();
      sum[n][n] += meterSiemens[n];
    }
    return sum;
  }

  /** Returns the tangent at the present states without running the period: for a first guess. */
  @Nullable Thevenin tangentAsBefore() {
    return map == null || start == null ? null : tangentBy(map);
  }

  private Thevenin tangentBy(PeriodMap by) {
    double[] gap = new double[states.length];
    for (int i = 0; i < gap.length; i++) {
      gap[i] = sweep.endStates[i] - states[i] - (lead[i] * states[i] - carried[i]);
    }
    double[] stateByGap = by.shooting.solve(gap);
    start = new Start(states.clone(), drawnAmps.clone(), stateByGap);
    return theveninOf(stateByGap, by);
  }

  private @Nullable PeriodMap derivatives() {
    int n = states.length;
    double[][] shooting = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        shooting[i][j] = (i == j ? 1 + lead[i] : 0) - sweep.endByColumn[j][i];
      }
    }
    DenseLu lu = DenseLu.of(shooting);
    if (lu == null) {
      return null;
    }
    double[][] stateByDrawn = new double[portUnknowns.length][];
    for (int p = 0; p < stateByDrawn.length; p++) {
      stateByDrawn[p] = lu.solve(sweep.endByColumn[n + p]);
    }
    return new PeriodMap(lu, stateByDrawn, sweep.meansByColumn);
  }

  /**
   * Port volts as a function of the constant part J of the drawn current are v = v0 + T · (J − J0).
   * With J = I − G·v this becomes (1 + T·G) · v = v0 − T·J0 + T·I.
   */
  private Thevenin theveninOf(double[] stateByGap, PeriodMap by) {
    int ports = portUnknowns.length;
    double[][] byDrawn = new double[ports][ports];
    double[] right = new double[ports];
    double[][] left = new double[ports][ports];
    for (int r = 0; r < ports; r++) {
      int unknown = portUnknowns[r];
      right[r] = sweep.means[unknown] + meanByStates(by, unknown, stateByGap);
      for (int c = 0; c < ports; c++) {
        byDrawn[r][c] =
            by.meansByColumn[states.length + c][unknown]
                + meanByStates(by, unknown, by.stateByDrawn[c]);
      }
    }
    for (int r = 0; r < ports; r++) {
      for (int c = 0; c < ports; c++) {
        right[r] -= byDrawn[r][c] * drawnAmps[portUnknowns[c]];
        left[r][c] = r == c ? 1 : 0;
        for (int k = 0; k < ports; k++) {
          left[r][c] += byDrawn[r][k] * drawnSiemens[portUnknowns[k]][portUnknowns[c]];
        }
      }
    }
    DenseLu lu = DenseLu.of(left);
    if (lu == null) {
      throw new IllegalStateException("a supply's ports are tied to each other");
    }
    double[][] ohms = new double[ports][ports];
    for (int c = 0; c < ports; c++) {
      double[] columnOfDrawn = new double[ports];
      for (int r = 0; r < ports; r++) {
        columnOfDrawn[r] = -byDrawn[r][c];
      }
      double[] solved = lu.solve(columnOfDrawn);
      for (int r = 0; r < ports; r++) {
        ohms[r][c] = solved[r];
      }
    }
    return new Thevenin(lu.solve(right), ohms);
  }

  private static double meanByStates(PeriodMap by, int unknown, double[] stateChange) {
    double sum = 0;
    for (int s = 0; s < stateChange.length; s++) {
      sum += by.meansByColumn[s][unknown] * stateChange[s];
    }
    return sum;
  }

  /**
   * Corrects states and drawn currents after the DC network has answered the last tangent.
   *
   * @param share of the correction to make, 1 for all of it
   * @return the greatest correction, as a share of the group's greatest volts
   */
  double correct(double[] portAmps, double[] portVolts, double share) {
    Start last = start;
    PeriodMap by = map;
    if (last == null || by == null) {
      throw new IllegalStateException("no tangent to correct by");
    }
    double greatestVolts = 1;
    for (double volts : portVolts) {
      greatestVolts = Math.max(greatestVolts, Math.abs(volts));
    }
    double[] change = last.stateByGap.clone();
    for (int p = 0; p < portUnknowns.length; p++) {
      int n = portUnknowns[p];
      double drawn = portAmps[p];
      for (int q = 0; q < portUnknowns.length; q++) {
        drawn -= drawnSiemens[n][portUnknowns[q]] * portVolts[q];
      }
      double more = drawn - last.drawnAmps[n];
      drawnAmps[n] = last.drawnAmps[n] + share * more;
      for (int s = 0; s < change.length; s++) {
        change[s] += by.stateByDrawn[p][s] * more;
      }
    }
    double greatest = 0;
    for (int s = 0; s < change.length; s++) {
      states[s] = last.states[s] + share * change[s];
      double scale = net.stores.get(s).isChoke() ? 1e-3 * greatestVolts : greatestVolts;
      greatest = Math.max(greatest, Math.abs(change[s]) / scale);
    }
    return greatest;
  }

  /** Returns what a last look over the settled period shows. */
  CycleReport report() {
    return CycleReport.of(net, fine, states, drawnAmps, drawnSiemens);
  }
}
