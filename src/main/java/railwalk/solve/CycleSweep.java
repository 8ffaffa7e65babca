package railwalk.solve;

import java.util.Arrays;
import java.util.List;

/**
 * One period of the line through a {@link CycleNetwork}: from the states at its start to those at
 * its end and the means over it, with exact derivatives by whatever columns are asked for.
 *
 * <p>Method: the two-stage, second-order, L-stable, stiffly accurate diagonally implicit
 * Runge–Kutta method with γ = 1 − 1/√2 (R. Alexander, "Diagonally implicit Runge–Kutta methods for
 * stiff O.D.E.'s", SIAM J. Numer. Anal. 14 (1977), theorem 5), in fixed steps; the linear parts'
 * answers are found once ({@link StageResponse}) and each stage is solved for its paths by Newton's
 * method ({@link PathEquations}), whose factors the derivatives go through too. Means are taken
 * with the method's own weights, so that the charge balance of every capacitor is exact whatever
 * the step.
 */
final class CycleSweep {
  private static final double GAMMA = 1 - 1 / Math.sqrt(2);

  /** Told of every stage of a sweep that is to be reported on. */
  interface Observer {
    /** Takes the unknowns and path currents of one instant that stands for {@code share}. */
    void stage(double share, double[] unknowns, double[] pathAmps, double[] pathVolts);
  }

  /** Takes one solved stage of a sweep. */
  private interface Follower {
    boolean stage(int half, double carried, double share, double stage, double sine);
  }

  private final CycleNetwork net;
  private final int steps;
  private final double stepSeconds;
  private final double[] sines;
  private final StageResponse response;
  private final PathEquations paths;
  private final ShootingDerivatives shooting;
  private final double[] inputs;
  private final double[] inputMeans;

  final double[] endStates;
  final double[] means;
  double[][] endByColumn = new double[0][];
  double[][] meansByColumn = new double[0][];

  CycleSweep(CycleNetwork net, int steps) {
    this.net = net;
    this.steps = steps;
    this.stepSeconds = 1 / (net.hertz * steps);
    sines = new double[2 * steps];
    for (int step = 0; step < steps; step++) {
      sines[2 * step] = Math.sin(2 * Math.PI * (step + GAMMA) / steps);
      sines[2 * step + 1] = Math.sin(2 * Math.PI * (step + 1.0) / steps);
    }
    response = new StageResponse(net);
    paths = new PathEquations(net, response);
    shooting = new ShootingDerivatives(response, paths);
    inputs = new double[response.firstPort];
    inputMeans = new double[response.firstPort];
    endStates = new double[net.stores.size()];
    means = new double[net.size];
  }

  /** Forgets what was found of the linear parts, since they may have other values. */
  void forget() {
    response.forget();
  }

  /**
   * Runs the period.
   *
   * @param startStates capacitor volts and choke currents at its start
   * @param drawnAmps current drawn from each port by the outside, the part that stays, by node
   * @param drawnSiemens slopes of that current: by node, then by the node whose volts it follows
   * @param storeScale factor on every capacitor and choke (1 but for a quick first charge)
   * @param derive whether to differentiate by the start states and a current drawn at each port
   * @return whether every stage settled
   */
  boolean run(
      double[] startStates,
      double[] drawnAmps,
      double[][] drawnSiemens,
      double storeScale,
      boolean derive) {
    shooting.begin();
    if (!step(
        startStates,
        drawnAmps,
        drawnSiemens,
        storeScale,
        (half, carried, share, stage, sine) -> {
          if (derive) {
            shooting.stage(half, carried, share, stage);
          }
          return true;
        })) {
      return false;
    }
    endByColumn = derive ? shooting.endByColumn() : new double[0][];
    meansByColumn = derive ? shooting.meansByColumn() : new double[0][];
    return true;
  }

  /**
   * Runs the period for a report on it.
   *
   * @param columns what to differentiate by, start states first; none at all will do
   * @param observer told of every stage
   * @return whether every stage settled
   */
  boolean look(
      double[] startStates,
      double[] drawnAmps,
      double[][] drawnSiemens,
      List<CycleColumn> columns,
      Observer observer) {
    double[] unknowns = new double[net.size];
    double[] linear = net.matrix.newValues();
    double[] values = net.matrix.newValues();
    double perStage = 1 / (GAMMA * stepSeconds);
    response.linear(drawnSiemens, perStage, linear);
    CycleDerivatives derivatives = new CycleDerivatives(net, columns);
    if (!step(
        startStates,
        drawnAmps,
        drawnSiemens,
        1,
        (half, carried, share, stage, sine) -> {
          response.expand(inputs, unknowns);
          observer.stage(share, unknowns, paths.amps, paths.volts);
          if (columns.isEmpty()) {
            return true;
          }
          System.arraycopy(linear, 0, values, 0, linear.length);
          for (int p = 0; p < response.paths; p++) {
            net.paths.get(p).add(paths.slopes()[p], values);
          }
          if (!net.matrix.lu().factor(values)) {
            return false;
          }
          derivatives.stage(half, carried, share, stage, perStage, sine, unknowns, paths.amps);
          return true;
        })) {
      return false;
    }
    endByColumn = derivatives.endByColumn();
    meansByColumn = derivatives.meansByColumn();
    return true;
  }

  private boolean step(
      double[] startStates,
      double[] drawnAmps,
      double[][] drawnSiemens,
      double storeScale,
      Follower follower) {
    double stage = GAMMA * stepSeconds;
    if (!response.prepare(drawnAmps, drawnSiemens, storeScale / stage)) {
      return false;
    }
    paths.begin();
    int stores = net.stores.size();
    double[] state = startStates.clone();
    double[] rate = new double[stores];
    Arrays.fill(inputMeans, 0);
    inputs[response.constant] = 1;
    for (int step = 0; step < steps; step++) {
      for (int half = 0; half < 2; half++) {
        double share = (half == 0 ? 1 - GAMMA : GAMMA) / steps;
        double carried = half == 0 ? 0 : (1 - GAMMA) * stepSeconds;
        double sine = sines[2 * step + half];
        for (int s = 0; s < stores; s++) {
          inputs[s] = state[s] + carried * rate[s];
        }
        inputs[response.sine] = sine;
        if (!paths.settle(inputs)) {
          return false;
        }
        for (int i = 0; i < inputs.length; i++) {
          inputMeans[i] += share * inputs[i];
        }
        if (!follower.stage(half, carried, share, stage, sine)) {
          return false;
        }
        for (int s = 0; s < stores; s++) {
          double present = state(s);
          if (half == 0) {
            rate[s] = (present - inputs[s]) / stage;
          } else {
            state[s] = present;
          }
        }
      }
    }
    System.arraycopy(state, 0, endStates, 0, stores);
    response.expand(inputMeans, means);
    return true;
  }

  /** Returns the state of a store at the end of the stage that was solved last. */
  private double state(int store) {
    double[] by = response.stateBy[store];
    double sum = 0;
    for (int i = 0; i < inputs.length; i++) {
      sum += by[i] * inputs[i];
    }
    return sum;
  }
}
