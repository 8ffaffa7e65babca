package railwalk.solve;

import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.device.TwoPoleCurrent;

/**
 * One period of the line through a {@link CycleNetwork}: from the states at its start to those at
 * its end and the means over it, with exact derivatives by whatever columns are asked for.
 *
 * <p>Method: the two-stage, second-order, L-stable, stiffly accurate diagonally implicit
 * Runge–Kutta method with γ = 1 − 1/√2 (R. Alexander, "Diagonally implicit Runge–Kutta methods for
 * stiff O.D.E.'s", SIAM J. Numer. Anal. 14 (1977), theorem 5), in fixed steps; each stage is solved
 * by Newton's method, and the derivatives go through the same factors. Means are taken with the
 * method's own weights, so that the charge balance of every capacitor is exact whatever the step.
 */
final class CycleSweep {
  private static final double GAMMA = 1 - 1 / Math.sqrt(2);

  /** A stage is settled when no path's current is further than this from its straight line. */
  private static final double SETTLED_AMPS = 2e-10;

  private static final int MOST_ITERATIONS = 80;

  /** Slopes that differ by less than this share one factorisation. */
  private static final double SAME_SIEMENS = 1e-11;

  /** Told of every stage of a sweep that is to be reported on. */
  interface Observer {
    /** Takes the unknowns and path currents of one instant that stands for {@code share}. */
    void stage(double share, double[] unknowns, double[] pathAmps, double[] pathVolts);
  }

  private final CycleNetwork net;
  private final int steps;
  private final double stepSeconds;
  private final double[] base;
  private final double[] values;
  private final double[] unknowns;
  private final double[] fixed;
  private final double[] rightHandSide;
  private final double[] slopes;
  private final double[] factoredSlopes;
  private final double[] pathAmps;
  private final double[] pathVolts;
  private final TwoPoleCurrent current = new TwoPoleCurrent();
  private boolean factored;

  final double[] endStates;
  final double[] means;
  double[][] endByColumn = new double[0][];
  double[][] meansByColumn = new double[0][];

  CycleSweep(CycleNetwork net, int steps) {
    this.net = net;
    this.steps = steps;
    this.stepSeconds = 1 / (net.hertz * steps);
    base = net.matrix.newValues();
    values = net.matrix.newValues();
    unknowns = new double[net.size];
    fixed = new double[net.size];
    rightHandSide = new double[net.size];
    slopes = new double[net.paths.size()];
    factoredSlopes = new double[net.paths.size()];
    pathAmps = new double[net.paths.size()];
    pathVolts = new double[net.paths.size()];
    endStates = new double[net.stores.size()];
    means = new double[net.size];
  }

  /**
   * Runs the period.
   *
   * @param startStates capacitor volts and choke currents at its start
   * @param drawnAmps current drawn from each node by the outside, the part that stays
   * @param drawnSiemens slopes of that current: by node, then by the node whose volts it follows
   * @param storeScale factor on every capacitor and choke (1 but for a quick first charge)
   * @param columns what to differentiate by
   * @param observer told of every stage; null when nobody wants to know
   * @return whether every stage settled
   */
  boolean run(
      double[] startStates,
      double[] drawnAmps,
      double[][] drawnSiemens,
      double storeScale,
      List<CycleColumn> columns,
      @Nullable Observer observer) {
    double stage = GAMMA * stepSeconds;
    double perStage = storeScale / stage;
    prepareBase(drawnSiemens, perStage);
    int stores = net.stores.size();
    double[] state = startStates.clone();
    double[] history = new double[stores];
    double[] rate = new double[stores];
    CycleDerivatives derivatives = new CycleDerivatives(net, columns);
    Arrays.fill(means, 0);
    double omega = 2 * Math.PI * net.hertz;
    for (int step = 0; step < steps; step++) {
      double from = step * stepSeconds;
      for (int half = 0; half < 2; half++) {
        double sine = Math.sin(omega * (half == 0 ? from + stage : from + stepSeconds));
        double share = (half == 0 ? 1 - GAMMA : GAMMA) / steps;
        double carried = half == 0 ? 0 : (1 - GAMMA) * stepSeconds;
        for (int s = 0; s < stores; s++) {
          history[s] = state[s] + carried * rate[s];
        }
        if (!settle(history, drawnAmps, sine, perStage)) {
          return false;
        }
        for (int n = 0; n < net.size; n++) {
          means[n] += share * unknowns[n];
        }
        if (observer != null) {
          observer.stage(share, unknowns, pathAmps, pathVolts);
        }
        if (!columns.isEmpty()) {
          derivatives.stage(half, carried, share, stage, perStage, sine, unknowns, pathAmps);
        }
        advance(history, half == 0 ? rate : null, state, stage);
      }
    }
    System.arraycopy(state, 0, endStates, 0, stores);
    endByColumn = derivatives.endByColumn();
    meansByColumn = derivatives.meansByColumn();
    return true;
  }

  /** Takes the states out of a solved stage: their rates after the first, themselves after both. */
  private void advance(double[] history, double @Nullable [] rate, double[] state, double stage) {
    for (int s = 0; s < history.length; s++) {
      double present = net.stores.get(s).state(unknowns);
      if (rate != null) {
        rate[s] = (present - history[s]) / stage;
      } else {
        state[s] = present;
      }
    }
  }

  private static double volts(double[] x, int a, int b) {
    return (a < 0 ? 0 : x[a]) - (b < 0 ? 0 : x[b]);
  }

  private void prepareBase(double[][] drawnSiemens, double perStage) {
    System.arraycopy(net.constant, 0, base, 0, base.length);
    for (int n = 0; n < net.nodeCount; n++) {
      base[net.diagonal[n]] += drawnSiemens[n][n];
    }
    for (CycleNetwork.Slope slope : net.slopes) {
      base[slope.place()] += drawnSiemens[slope.drawn()][slope.by()];
    }
    for (Stores.Store store : net.stores) {
      store.addCompanion(perStage, base);
    }
    factored = false;
  }

  /** Solves one stage by Newton's method, each path linearised where the stage before left it. */
  private boolean settle(double[] history, double[] drawnAmps, double sine, double perStage) {
    System.arraycopy(net.source, 0, fixed, 0, net.size);
    for (int n = 0; n < net.nodeCount; n++) {
      fixed[n] -= drawnAmps[n];
    }
    for (Windings.Emf emf : net.emfs) {
      fixed[emf.branch()] += emf.peakVolts() * sine;
    }
    for (int s = 0; s < history.length; s++) {
      net.stores.get(s).addHistory(history[s], perStage, fixed);
    }
    List<CycleNetwork.Path> paths = net.paths;
    for (int iteration = 0; iteration < MOST_ITERATIONS; iteration++) {
      System.arraycopy(fixed, 0, rightHandSide, 0, net.size);
      boolean sameSlopes = factored;
      for (int p = 0; p < paths.size(); p++) {
        CycleNetwork.Path path = paths.get(p);
        double rest = pathAmps[p] - slopes[p] * pathVolts[p];
        add(rightHandSide, path.anode(), -rest);
        add(rightHandSide, path.cathode(), rest);
        sameSlopes &= Math.abs(slopes[p] - factoredSlopes[p]) <= SAME_SIEMENS;
      }
      if (!sameSlopes && !factorWithSlopes()) {
        return false;
      }
      net.matrix.lu().solve(rightHandSide, unknowns);
      if (linearise() < SETTLED_AMPS) {
        return true;
      }
    }
    return false;
  }

  /**
   * Evaluates every path where it stands; returns the greatest difference between the current of
   * its law and that of the straight line that the stage was solved with.
   */
  private double linearise() {
    double difference = 0;
    for (int p = 0; p < slopes.length; p++) {
      CycleNetwork.Path path = net.paths.get(p);
      double volts = volts(unknowns, path.anode(), path.cathode());
      path.law().evaluate(volts, current);
      double straight = pathAmps[p] + slopes[p] * (volts - pathVolts[p]);
      difference = Math.max(difference, Math.abs(current.amps - straight));
      pathVolts[p] = volts;
      pathAmps[p] = current.amps;
      slopes[p] = current.siemens;
    }
    return difference;
  }

  private boolean factorWithSlopes() {
    System.arraycopy(base, 0, values, 0, base.length);
    for (int p = 0; p < slopes.length; p++) {
      int[] places = net.paths.get(p).places();
      values[places[0]] += slopes[p];
      values[places[1]] -= slopes[p];
      values[places[2]] -= slopes[p];
      values[places[3]] += slopes[p];
      factoredSlopes[p] = slopes[p];
    }
    factored = net.matrix.lu().factor(values);
    return factored;
  }

  private static void add(double[] target, int index, double amount) {
    if (index >= 0) {
      target[index] += amount;
    }
  }
}
