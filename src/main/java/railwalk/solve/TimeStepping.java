package railwalk.solve;

import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.walk.SupplyMap;

/**
 * The second engine: the whole netlist stepped through a line period, brought to where it repeats
 * by shooting (Aprille and Trick 1972, as in {@link Supply}). It starts where the first engine
 * ended and assumes nothing of what that one does. Signal sources are at zero; couplings are left
 * out.
 */
public final class TimeStepping {
  private static final int MOST_PERIODS = 60;

  /** Greatest correction left, as a share of the greatest volts. */
  private static final double SETTLED_SHARE = 1e-8;

  /** While corrections are larger, the grid follows the rectifiers' switching. */
  private static final double GRID_SHARE = 1e-4;

  /** Below this the derivatives of the last run serve for the next, while each gains this much. */
  private static final double CHORD_SHARE = 1e-3;

  private static final double CHORD_GAIN = 0.2;

  /** A deviation that grows by more than this in a period is an oscillation. */
  private static final double GROWTH = 1.0005;

  private final OperatingPoint from;
  private final TimeNetwork net;
  private final TimeSweep sweep;
  private final double[] states;
  private double[] grid = TimeGrid.of(List.of());
  private @Nullable DenseLu shooting;
  private int periods;

  private TimeStepping(OperatingPoint from) {
    this.from = from;
    net = new TimeNetwork(from.circuit(), mapOf(from));
    sweep = new TimeSweep(net);
    states = new double[net.stores.size()];
  }

  /** Returns the walk with the ripple groups that were solved, which say what filter chokes are. */
  private static SupplyMap mapOf(OperatingPoint from) {
    return from instanceof SolvedPoint point ? point.solver().map() : from.map();
  }

  /** Returns the settled period of the circuit that {@code averaged} is the operating point of. */
  public static CycleOutcome of(OperatingPoint averaged) {
    return new TimeStepping(averaged).settle();
  }

  private CycleOutcome settle() {
    startFromAverages();
    double before = Double.POSITIVE_INFINITY;
    boolean chord = false;
    double scale = greatestVolts();
    for (int round = 0; round < MOST_PERIODS; round++) {
      TimeRecord seen = new TimeRecord(net);
      if (!sweep.run(grid, states, !chord, seen, null)) {
        return stopped();
      }
      periods++;
      double[] change = correction(chord);
      if (change.length == 0 && states.length > 0) {
        return new CycleOutcome.NotSettled(sweep.worstNode(), "its volts are tied to nothing");
      }
      double size = size(change, scale);
      if (Double.isNaN(size)) {
        return stopped();
      }
      double share = round < 8 ? 1 : 0.5;
      for (int s = 0; s < states.length; s++) {
        states[s] += share * change[s];
      }
      double gain = Math.min(1, size / before);
      if (size * (chord ? gain : Math.max(size, 1e-6)) < SETTLED_SHARE) {
        return finish();
      }
      if (size > GRID_SHARE || round < 2) {
        grid = TimeGrid.of(seen.switchings());
      }
      chord = size < CHORD_SHARE && (size < CHORD_GAIN * before || !chord);
      before = size;
    }
    return sweep.glowChanges() > 0
        ? new CycleOutcome.NotSettled(sweep.worstNode(), "a gas tube there goes on and off")
        : new CycleOutcome.NotSettled(
            sweep.worstNode(), "no two periods are alike after " + MOST_PERIODS);
  }

  private CycleOutcome stopped() {
    String reason =
        sweep.glowChanges() > 0
            ? "a gas tube there goes on and off"
            : "its volts would not come to rest within the period";
    return new CycleOutcome.NotSettled(sweep.worstNode(), reason);
  }

  /** Returns by how much to move the start states; none when the period map has no answer. */
  private double[] correction(boolean chord) {
    int n = states.length;
    double[] gap = new double[n];
    for (int s = 0; s < n; s++) {
      gap[s] = sweep.endStates[s] - states[s];
    }
    if (!chord) {
      double[][] left = new double[n][n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          left[i][j] = (i == j ? 1 : 0) - sweep.endByStart[j][i];
        }
      }
      shooting = DenseLu.of(left);
    }
    DenseLu lu = shooting;
    return lu == null ? new double[0] : lu.solve(gap);
  }

  private double size(double[] change, double greatestVolts) {
    double greatest = 0;
    for (int s = 0; s < change.length; s++) {
      double scale = net.stores.get(s).isChoke() ? 1e-3 * greatestVolts : greatestVolts;
      double size = Math.abs(change[s]) / scale;
      if (Double.isNaN(size)) {
        return Double.NaN;
      }
      greatest = Math.max(greatest, size);
    }
    return greatest;
  }

  private void startFromAverages() {
    Map<Element, Double> known = new HashMap<>();
    if (from instanceof SolvedPoint point) {
      for (Supply supply : point.solver().supplies) {
        for (int s = 0; s < supply.net.stores.size(); s++) {
          Element part = supply.net.stores.get(s).part();
          if (part != null) {
            known.put(part, supply.startState(s));
          }
        }
      }
      net.devices.glowAs(point.solver().dc.devices);
    }
    for (int s = 0; s < states.length; s++) {
      states[s] = start(net.stores.get(s), known);
    }
    double[] guess = new double[net.size];
    for (Node node : net.nodes) {
      double volts = from.volts(node);
      guess[net.at(node)] = Double.isNaN(volts) ? 0 : volts;
    }
    sweep.start(guess);
  }

  private double start(Stores.Store store, Map<Element, Double> known) {
    Element part = store.part();
    if (part == null) {
      double omega = 2 * Math.PI * net.hertz;
      for (Windings.Emf emf : net.emfs) {
        if (emf.branch() == store.branch()) {
          return emf.peakVolts() / (omega * store.size());
        }
      }
      return 0;
    }
    Double settled = known.get(part);
    if (settled != null) {
      return settled;
    }
    double mean =
        part instanceof Capacitor capacitor
            ? from.volts(capacitor.a()) - from.volts(capacitor.b())
            : from.amps(part);
    return Double.isNaN(mean) ? 0 : mean;
  }

  private double greatestVolts() {
    double greatest = 1;
    for (Node node : net.nodes) {
      double volts = Math.abs(from.volts(node));
      greatest = volts > greatest ? volts : greatest;
    }
    return greatest;
  }

  private CycleOutcome finish() {
    TimeRecord shown = new TimeRecord(net);
    double[] means = new double[net.size];
    double[] squares = new double[net.size];
    int[] rectifiers = shown.rectifiers();
    double[] rectifierMeans = new double[rectifiers.length];
    boolean done =
        sweep.run(
            grid,
            states,
            true,
            shown,
            (share, x) -> {
              for (int n = 0; n < x.length; n++) {
                means[n] += share * x[n];
                squares[n] += share * x[n] * x[n];
              }
              for (int r = 0; r < rectifiers.length; r++) {
                rectifierMeans[r] += share * net.devices.twoPoleAmps(rectifiers[r], x);
              }
            });
    periods++;
    if (!done) {
      return stopped();
    }
    int growing = Growth.worst(sweep.endByStart, GROWTH);
    if (growing >= 0) {
      Stores.Store store = net.stores.get(growing);
      int unknown = store.isChoke() ? -1 : Math.max(store.a(), store.b());
      String node = unknown < 0 ? sweep.worstNode() : net.nodes.get(unknown).name();
      return new CycleOutcome.NotSettled(
          node, "a small disturbance grows from period to period: the loop through it oscillates");
    }
    return new CycleOutcome.Settled(
        new LineCycle(net, from.map(), means, squares, shown, rectifierMeans, periods));
  }

  /** Whether deviations die away from one period to the next. */
  private static final class Growth {
    private static final int DOUBLINGS = 16;

    private Growth() {}

    /**
     * Returns the state that grows most, −1 when none does: by the period map raised to the 2^16th
     * power, whose size is that power of the growth in a period.
     */
    static int worst(double[][] endByStart, double limit) {
      double[][] power = endByStart;
      double logarithm = 0;
      double weight = 1;
      for (int d = 0; d < DOUBLINGS; d++) {
        power = product(power, power);
        weight /= 2;
        double greatest = greatest(power);
        if (greatest == 0) {
          return -1;
        }
        logarithm += weight * Math.log(greatest);
        for (double[] row : power) {
          for (int j = 0; j < row.length; j++) {
            row[j] /= greatest;
          }
        }
      }
      if (logarithm <= Math.log(limit)) {
        return -1;
      }
      int worst = 0;
      double most = 0;
      for (double[] byState : power) {
        for (int j = 0; j < byState.length; j++) {
          if (Math.abs(byState[j]) > most) {
            most = Math.abs(byState[j]);
            worst = j;
          }
        }
      }
      return worst;
    }

    private static double greatest(double[][] matrix) {
      double greatest = 0;
      for (double[] row : matrix) {
        greatest = Math.max(greatest, Arrays.stream(row).map(Math::abs).max().orElse(0));
      }
      return greatest;
    }

    private static double[][] product(double[][] a, double[][] b) {
      int n = a.length;
      double[][] c = new double[n][n];
      for (int i = 0; i < n; i++) {
        for (int k = 0; k < n; k++) {
          double factor = a[i][k];
          if (factor != 0) {
            for (int j = 0; j < n; j++) {
              c[i][j] += factor * b[k][j];
            }
          }
        }
      }
      return c;
    }
  }
}
