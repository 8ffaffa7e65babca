package railwalk.solve;

/**
 * Newton's method on a {@link DcNetwork}, with steps shortened by a {@link StepLimit}. Works in
 * place on a vector of unknowns; a run that fails leaves it where it ended.
 */
final class Newton {
  private static final int MOST_ITERATIONS = 200;

  /** A step is the last when no volt moves by more than this part of itself, or this many volts. */
  private static final double SETTLED_SHARE = 1e-9;

  private static final double SETTLED_VOLTS = 1e-8;

  /**
   * After that many steps rounding is taken to be all that still moves, up to this many times the
   * limits above; the currents must balance all the same.
   */
  private static final int ROUNDING_ITERATIONS = 30;

  private static final double ROUNDING_FACTOR = 1e3;

  /** Greatest current that may be missing at a node of a settled network. */
  private static final double SETTLED_AMPS = 1e-11;

  private final DcNetwork net;
  private final StepLimit limit;
  private final Trace trace;
  private final double[] residual;
  private final double[] step;
  private final double[] jacobian;
  private int worstNode = -1;
  private int iterations;

  Newton(DcNetwork net, StepLimit limit, Trace trace) {
    this.net = net;
    this.limit = limit;
    this.trace = trace;
    residual = new double[net.size];
    step = new double[net.size];
    jacobian = net.matrix.newValues();
  }

  /** Returns the number of the node that moved most in the last step; −1 before any. */
  int worstNode() {
    return worstNode;
  }

  /** Returns how many steps all runs took. */
  int iterations() {
    return iterations;
  }

  /**
   * Runs from {@code x} until the network settles.
   *
   * @param drive factor on all sources
   * @param tieSiemens from every node to the reference
   * @return whether it settled
   */
  boolean run(double[] x, double drive, double tieSiemens) {
    for (int iteration = 1; iteration <= MOST_ITERATIONS; iteration++) {
      net.evaluate(x, drive, tieSiemens, residual, jacobian);
      if (!net.matrix.lu().factor(jacobian)) {
        trace.add("no pivot at iteration %d", iteration);
        return false;
      }
      for (int n = 0; n < net.size; n++) {
        step[n] = -residual[n];
      }
      net.matrix.lu().solve(step, step);
      double share = limit.share(net.devices, x, step);
      boolean settled = share == 1;
      double limitFactor = iteration < ROUNDING_ITERATIONS ? 1 : ROUNDING_FACTOR;
      double worst = 0;
      for (int n = 0; n < net.size; n++) {
        double move = share * step[n];
        if (Double.isNaN(move)) {
          return false;
        }
        x[n] += move;
        if (n < net.nodeCount) {
          double scale = SETTLED_SHARE * Math.abs(x[n]) + SETTLED_VOLTS;
          double size = Math.abs(move) / scale;
          settled &= size <= limitFactor;
          if (size > worst) {
            worst = size;
            worstNode = n;
          }
        }
      }
      iterations++;
      if (trace.wanted()) {
        trace.add("%d: step share %.3g, worst node %s", iteration, share, net.nodeName(worstNode));
      }
      if (settled && unbalancedAmps(x, drive, tieSiemens) <= SETTLED_AMPS) {
        return true;
      }
    }
    return false;
  }

  /** Returns whether no more than {@code amps} are missing at any node, ties taken off. */
  boolean balanced(double[] x, double amps) {
    return unbalancedAmps(x, 1, 0) <= amps;
  }

  private double unbalancedAmps(double[] x, double drive, double tieSiemens) {
    net.evaluate(x, drive, tieSiemens, residual, jacobian);
    double greatest = 0;
    for (int n = 0; n < net.nodeCount; n++) {
      greatest = Math.max(greatest, Math.abs(residual[n]));
    }
    return greatest;
  }
}
