package railwalk.solve;

import java.util.Arrays;

/**
 * The derivatives of a run through a period by the states at its start and by a current drawn at
 * each port, columns in that order, carried along stage by stage through {@link StageResponse} and
 * {@link PathEquations}.
 */
final class ShootingDerivatives {
  private final StageResponse response;
  private final PathEquations equations;
  private final int states;
  private final int paths;
  private final int count;
  private final double[][] state;
  private final double[][] history;
  private final double[][] rate;
  private final double[][] open;
  private final double[][] beyond;
  private final double[][] historyMeans;
  private final double[][] beyondMeans;
  private final double[] present;

  ShootingDerivatives(StageResponse response, PathEquations equations) {
    this.response = response;
    this.equations = equations;
    states = response.states;
    paths = response.paths;
    count = states + response.ports;
    state = new double[states][count];
    history = new double[states][count];
    rate = new double[states][count];
    open = new double[paths][count];
    beyond = new double[paths][count];
    historyMeans = new double[states][count];
    beyondMeans = new double[paths][count];
    present = new double[count];
  }

  /** Starts at the start of a period. */
  void begin() {
    for (int s = 0; s < states; s++) {
      Arrays.fill(state[s], 0);
      Arrays.fill(rate[s], 0);
      Arrays.fill(historyMeans[s], 0);
      state[s][s] = 1;
    }
    for (int p = 0; p < paths; p++) {
      Arrays.fill(beyondMeans[p], 0);
    }
  }

  /**
   * Carries the derivatives through one stage that has just been solved.
   *
   * @param carried seconds of the first stage's rate that the second starts from, 0 in the first
   * @param share of the period that the stage stands for
   * @param stage its length, seconds
   */
  void stage(int half, double carried, double share, double stage) {
    for (int s = 0; s < states; s++) {
      double[] row = history[s];
      System.arraycopy(state[s], 0, row, 0, count);
      if (half == 1) {
        PathEquations.addRow(row, carried, rate[s]);
      }
      PathEquations.addRow(historyMeans[s], share, row);
    }
    for (int p = 0; p < paths; p++) {
      answer(response.pathVoltsBy[p], open[p]);
    }
    equations.solveMany(open, beyond);
    for (int p = 0; p < paths; p++) {
      double slope = equations.slopeBeyond(p);
      double[] row = beyond[p];
      for (int c = 0; c < count; c++) {
        row[c] *= slope;
      }
      PathEquations.addRow(beyondMeans[p], share, row);
    }
    double perStage = 1 / stage;
    for (int s = 0; s < states; s++) {
      double[] by = response.stateBy[s];
      answer(by, present);
      for (int p = 0; p < paths; p++) {
        PathEquations.addRow(present, by[response.firstPath + p], beyond[p]);
      }
      double[] target = half == 0 ? rate[s] : state[s];
      for (int c = 0; c < count; c++) {
        target[c] = half == 0 ? (present[c] - history[s][c]) * perStage : present[c];
      }
    }
  }

  /** Puts in {@code row} what follows from the stores and the ports alone. */
  private void answer(double[] byInput, double[] row) {
    Arrays.fill(row, 0, states, 0);
    for (int r = 0; r < response.ports; r++) {
      row[states + r] = byInput[response.firstPort + r];
    }
    for (int s = 0; s < states; s++) {
      PathEquations.addRow(row, byInput[s], history[s]);
    }
  }

  /** Returns, by column, what it does to the states at the period's end. */
  double[][] endByColumn() {
    double[][] byColumn = new double[count][states];
    for (int c = 0; c < count; c++) {
      for (int s = 0; s < states; s++) {
        byColumn[c][s] = state[s][c];
      }
    }
    return byColumn;
  }

  /** Returns, by column, what it does to the mean of every unknown. */
  double[][] meansByColumn() {
    double[][] byColumn = new double[count][];
    for (int c = 0; c < count; c++) {
      double[] means = new double[response.unknowns[0].length];
      if (c >= states) {
        PathEquations.addRow(means, 1, response.unknowns[response.firstPort + c - states]);
      }
      for (int s = 0; s < states; s++) {
        PathEquations.addRow(means, historyMeans[s][c], response.unknowns[s]);
      }
      for (int p = 0; p < paths; p++) {
        PathEquations.addRow(means, beyondMeans[p][c], response.unknowns[response.firstPath + p]);
      }
      byColumn[c] = means;
    }
    return byColumn;
  }
}
