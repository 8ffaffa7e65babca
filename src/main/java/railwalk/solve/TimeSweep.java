package railwalk.solve;

import org.jspecify.annotations.Nullable;

/**
 * One period of the line through a {@link TimeNetwork}, on a grid of instants of the caller's
 * choice. Method: as {@link CycleSweep}, every stage solved by Newton's method on the whole
 * network.
 */
final class TimeSweep {
  private static final double GAMMA = 1 - 1 / Math.sqrt(2);
  private static final int MOST_ITERATIONS = 60;

  /** A stage is settled after a step that moves no volt by more than this, and this part of it. */
  private static final double SETTLED_VOLTS = 1e-7;

  private static final double SETTLED_SHARE = 1e-9;

  /** After that many steps rounding is taken to be all that still moves, up to so much more. */
  private static final int ROUNDING_ITERATIONS = 10;

  private static final double ROUNDING_FACTOR = 100;

  private static final StepLimit LIMIT = StepLimit.tubes(4, 100);

  /** A stage in which gas tubes light and go out more often has no answer. */
  private static final int MOST_GLOW_CHANGES = 6;

  /** Told of the start of the period and of the end of every step. */
  interface Observer {
    void instant(double seconds, double[] unknowns);
  }

  /** Told of every stage with the share of the period that it stands for. */
  interface Weigher {
    void stage(double share, double[] unknowns);
  }

  private final TimeNetwork net;
  private final double[] base;
  private final double[] jacobian;
  private final double[] residual;
  private final double[] fixed;
  private final double[] step;
  private int worstNode = -1;
  private int glowChanges;

  /** Unknowns at the end of the last stage; a guess for the first one of the next run. */
  final double[] unknowns;

  final double[] endStates;
  double[][] endByStart = new double[0][];

  TimeSweep(TimeNetwork net) {
    this.net = net;
    base = net.matrix.newValues();
    jacobian = net.matrix.newValues();
    residual = new double[net.size];
    fixed = new double[net.size];
    step = new double[net.size];
    unknowns = new double[net.size];
    endStates = new double[net.stores.size()];
  }

  /** Returns the name of the node that moved most where a stage did not settle. */
  String worstNode() {
    return worstNode < 0 ? "?" : net.nodes.get(worstNode).name();
  }

  /** Returns how often gas tubes lit or went out in the last run. */
  int glowChanges() {
    return glowChanges;
  }

  /**
   * Runs the period.
   *
   * @param grid instants as shares of the period, rising from 0 to 1
   * @param startStates capacitor volts and coil currents at its start
   * @param derive whether {@link #endByStart} is wanted
   * @return whether every stage settled
   */
  boolean run(
      double[] grid,
      double[] startStates,
      boolean derive,
      @Nullable Observer observer,
      @Nullable Weigher weigher) {
    int stores = net.stores.size();
    double period = 1 / net.hertz;
    double[] state = startStates.clone();
    double[] history = new double[stores];
    double[] rate = new double[stores];
    Derivatives derivatives = new Derivatives(net.stores, net.matrix, derive ? stores : 0);
    glowChanges = 0;
    for (int k = 0; k + 1 < grid.length; k++) {
      double from = grid[k];
      double width = grid[k + 1] - from;
      double stage = GAMMA * width * period;
      prepareBase(1 / stage);
      for (int half = 0; half < 2; half++) {
        double at = half == 0 ? from + GAMMA * width : from + width;
        double share = (half == 0 ? 1 - GAMMA : GAMMA) * width;
        double carried = half == 0 ? 0 : (1 - GAMMA) * width * period;
        for (int s = 0; s < stores; s++) {
          history[s] = state[s] + carried * rate[s];
        }
        if (!settle(history, Math.sin(2 * Math.PI * at), 1 / stage)) {
          return false;
        }
        if (weigher != null) {
          weigher.stage(share, unknowns);
        }
        if (derive) {
          derivatives.stage(half, carried, share, stage, 1 / stage, rightSides -> {});
        }
        for (int s = 0; s < stores; s++) {
          double present = net.stores.get(s).state(unknowns);
          if (half == 0) {
            rate[s] = (present - history[s]) / stage;
          } else {
            state[s] = present;
          }
        }
      }
      if (observer != null) {
        observer.instant(grid[k + 1] * period, unknowns);
      }
    }
    System.arraycopy(state, 0, endStates, 0, stores);
    if (derive) {
      endByStart = derivatives.endByColumn();
    }
    return true;
  }

  private void prepareBase(double perStage) {
    System.arraycopy(net.linear, 0, base, 0, base.length);
    for (Stores.Store store : net.stores) {
      store.addCompanion(perStage, base);
    }
  }

  private boolean settle(double[] history, double sine, double perStage) {
    System.arraycopy(net.source, 0, fixed, 0, net.size);
    for (Windings.Emf emf : net.emfs) {
      fixed[emf.branch()] += emf.peakVolts() * sine;
    }
    for (int s = 0; s < history.length; s++) {
      net.stores.get(s).addHistory(history[s], perStage, fixed);
    }
    for (int change = 0; change <= MOST_GLOW_CHANGES; change++) {
      if (!newton()) {
        return false;
      }
      if (!net.devices.updateGlow(unknowns)) {
        return true;
      }
      glowChanges++;
    }
    return false;
  }

  private boolean newton() {
    for (int iteration = 0; iteration < MOST_ITERATIONS; iteration++) {
      System.arraycopy(base, 0, jacobian, 0, base.length);
      for (int n = 0; n < net.size; n++) {
        residual[n] = -fixed[n];
      }
      net.matrix.addProduct(base, unknowns, residual);
      net.devices.addTo(unknowns, residual, jacobian);
      if (!net.matrix.lu().factor(jacobian)) {
        return false;
      }
      for (int n = 0; n < net.size; n++) {
        step[n] = -residual[n];
      }
      net.matrix.lu().solve(step, step);
      double share = LIMIT.share(net.devices, unknowns, step);
      boolean settled = share == 1;
      double worst = 0;
      for (int n = 0; n < net.size; n++) {
        if (Double.isNaN(step[n])) {
          return false;
        }
        unknowns[n] += share * step[n];
        if (n < net.nodeCount) {
          double size = Math.abs(step[n]) / (SETTLED_VOLTS + SETTLED_SHARE * Math.abs(unknowns[n]));
          settled &= size <= (iteration < ROUNDING_ITERATIONS ? 1 : ROUNDING_FACTOR);
          if (size > worst) {
            worst = size;
            worstNode = n;
          }
        }
      }
      if (settled) {
        return true;
      }
    }
    return false;
  }

  /** Sets the first guess. */
  void start(double[] guess) {
    System.arraycopy(guess, 0, unknowns, 0, unknowns.length);
  }
}
