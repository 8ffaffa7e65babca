package railwalk.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Node;

/**
 * One ripple group on its way to the periodic steady state, by shooting: the states at the start of
 * a period and the currents drawn at the ports are corrected together until the period ends where
 * it began. Newton's method on the period map, whose derivatives {@link CycleSweep} carries along
 * (T. J. Aprille and T. N. Trick, "Steady-state analysis of nonlinear circuits with periodic
 * inputs", Proc. IEEE 60 (1972)).
 *
 * <p>A port's current follows the ripple: i(t) = I + G · (v(t) − V), I and V being means. G is set
 * by {@link #setSlopes}.
 */
final class Supply {
  /** Steps a period: means then stand within 0.1 % on the hardest of the conduction-angle table. */
  private static final int STEPS = 72;

  /** Steps a period while the states are still far off. */
  private static final int COARSE_STEPS = 24;

  private static final int CHARGE_STEPS = 48;
  private static final double CHARGE_SCALE = 1.0 / 20;

  final CycleNetwork net;
  private final CycleSweep fine;
  private final CycleSweep coarse;
  private CycleSweep sweep;
  private final int[] portUnknowns;
  private final double[] states;
  private final double[] drawnAmps;
  private final double[] drawnSiemens;
  private final List<CycleColumn> columns = new ArrayList<>();
  private @Nullable Linear linear;

  /** The tangent of the period map at the last sweep. */
  private record Linear(
      double[] startStates, double[] startDrawn, double[][] stateByDrawn, double[] stateByGap) {}

  Supply(CycleNetwork net) {
    this.net = net;
    fine = new CycleSweep(net, STEPS);
    coarse = new CycleSweep(net, COARSE_STEPS);
    sweep = fine;
    List<Node> ports = net.group.ports();
    portUnknowns = ports.stream().mapToInt(net::at).toArray();
    states = new double[net.stores.size()];
    drawnAmps = new double[net.nodeCount];
    drawnSiemens = new double[net.nodeCount];
    for (int s = 0; s < states.length; s++) {
      columns.add(new CycleColumn.StartState(s));
    }
    for (int unknown : portUnknowns) {
      columns.add(new CycleColumn.Drawn(unknown));
    }
  }

  /** Charges the reservoirs quickly, as a first guess: a few periods with small capacitors. */
  boolean charge() {
    CycleSweep quick = new CycleSweep(net, CHARGE_STEPS);
    for (int period = 0; period < 3; period++) {
      if (!quick.run(states, drawnAmps, drawnSiemens, CHARGE_SCALE, List.of(), null)) {
        return false;
      }
      System.arraycopy(quick.endStates, 0, states, 0, states.length);
    }
    System.arraycopy(quick.means, 0, sweep.means, 0, sweep.means.length);
    return true;
  }

  /** Empties every reservoir and draws nothing. */
  void reset() {
    Arrays.fill(states, 0);
    Arrays.fill(drawnAmps, 0);
    Arrays.fill(drawnSiemens, 0);
  }

  /** Takes over the states and currents of a neighbouring solution of the same shape. */
  void copyFrom(Supply other) {
    System.arraycopy(other.states, 0, states, 0, states.length);
    System.arraycopy(other.drawnAmps, 0, drawnAmps, 0, drawnAmps.length);
    System.arraycopy(other.drawnSiemens, 0, drawnSiemens, 0, drawnSiemens.length);
    System.arraycopy(other.sweep.means, 0, sweep.means, 0, sweep.means.length);
  }

  /** Returns the mean volts of a port over the last sweep. */
  double portVolts(int port) {
    return sweep.means[portUnknowns[port]];
  }

  int portCount() {
    return portUnknowns.length;
  }

  /** Sets how the current drawn at each port follows that port's ripple (siemens, not negative). */
  void setSlopes(double[] siemens) {
    for (int p = 0; p < portUnknowns.length; p++) {
      int n = portUnknowns[p];
      double changed = Math.max(0, siemens[p]);
      drawnAmps[n] += (drawnSiemens[n] - changed) * sweep.means[n];
      drawnSiemens[n] = changed;
    }
  }

  /**
   * Runs a period and returns the tangent seen from the ports; null when a stage did not settle.
   *
   * @param near whether the states are close to their end, so that full accuracy pays
   */
  @Nullable Thevenin tangent(boolean near) {
    sweep = near ? fine : coarse;
    if (!sweep.run(states, drawnAmps, drawnSiemens, 1, columns, null)) {
      return null;
    }
    int n = states.length;
    int ports = portUnknowns.length;
    double[] gap = new double[n];
    double[][] shooting = new double[n][n];
    for (int i = 0; i < n; i++) {
      gap[i] = sweep.endStates[i] - states[i];
      for (int j = 0; j < n; j++) {
        shooting[i][j] = (i == j ? 1 : 0) - sweep.endByColumn[j][i];
      }
    }
    DenseLu lu = DenseLu.of(shooting);
    if (lu == null) {
      return null;
    }
    double[][] stateByDrawn = new double[ports][];
    for (int p = 0; p < ports; p++) {
      stateByDrawn[p] = lu.solve(sweep.endByColumn[n + p]);
    }
    double[] stateByGap = lu.solve(gap);
    linear = new Linear(states.clone(), drawnAmps.clone(), stateByDrawn, stateByGap);
    return theveninOf(stateByGap, stateByDrawn);
  }

  /**
   * Port volts as a function of the constant part J of the drawn current are v = v0 + T · (J − J0).
   * With J = I − G·v this becomes (1 + T·G) · v = v0 − T·J0 + T·I.
   */
  private Thevenin theveninOf(double[] stateByGap, double[][] stateByDrawn) {
    int ports = portUnknowns.length;
    double[][] byDrawn = new double[ports][ports];
    double[] right = new double[ports];
    double[][] left = new double[ports][ports];
    for (int r = 0; r < ports; r++) {
      int unknown = portUnknowns[r];
      right[r] = sweep.means[unknown] + meanByStates(unknown, stateByGap);
      for (int c = 0; c < ports; c++) {
        byDrawn[r][c] =
            sweep.meansByColumn[states.length + c][unknown]
                + meanByStates(unknown, stateByDrawn[c]);
      }
    }
    for (int r = 0; r < ports; r++) {
      for (int c = 0; c < ports; c++) {
        int n = portUnknowns[c];
        right[r] -= byDrawn[r][c] * drawnAmps[n];
        left[r][c] = (r == c ? 1 : 0) + byDrawn[r][c] * drawnSiemens[n];
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

  private double meanByStates(int unknown, double[] stateChange) {
    double sum = 0;
    for (int s = 0; s < stateChange.length; s++) {
      sum += sweep.meansByColumn[s][unknown] * stateChange[s];
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
    Linear last = linear;
    if (last == null) {
      throw new IllegalStateException("no tangent to correct by");
    }
    double greatestVolts = 1;
    for (double volts : portVolts) {
      greatestVolts = Math.max(greatestVolts, Math.abs(volts));
    }
    double[] change = last.stateByGap.clone();
    for (int p = 0; p < portUnknowns.length; p++) {
      int n = portUnknowns[p];
      double drawn = portAmps[p] - drawnSiemens[n] * portVolts[p];
      double by = drawn - last.startDrawn[n];
      drawnAmps[n] = last.startDrawn[n] + share * by;
      for (int s = 0; s < change.length; s++) {
        change[s] += last.stateByDrawn[p][s] * by;
      }
    }
    double greatest = 0;
    for (int s = 0; s < change.length; s++) {
      states[s] = last.startStates[s] + share * change[s];
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
