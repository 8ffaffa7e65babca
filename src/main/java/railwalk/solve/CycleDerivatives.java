package railwalk.solve;

import java.util.Arrays;
import java.util.List;

/**
 * The derivatives of a {@link CycleSweep} by all its columns, carried along stage by stage through
 * the factors of the stage itself. All columns go side by side: element (row, column) of a block is
 * at row · columns + column.
 */
final class CycleDerivatives {
  private final CycleNetwork net;
  private final List<CycleColumn> columns;
  private final int count;
  private final double[] state;
  private final double[] history;
  private final double[] rate;
  private final double[] unknowns;
  private final double[] means;

  CycleDerivatives(CycleNetwork net, List<CycleColumn> columns) {
    this.net = net;
    this.columns = columns;
    count = columns.size();
    int stores = net.stores.size();
    state = new double[stores * count];
    history = new double[stores * count];
    rate = new double[stores * count];
    unknowns = new double[net.size * count];
    means = new double[net.size * count];
    for (int c = 0; c < count; c++) {
      if (columns.get(c) instanceof CycleColumn.StartState start) {
        state[start.state() * count + c] = 1;
      }
    }
  }

  /** Carries the derivatives through one stage that has just been solved. */
  void stage(
      int half,
      double carried,
      double share,
      double stage,
      double perStage,
      double sine,
      double[] x,
      double[] pathAmps) {
    for (int i = 0; i < history.length; i++) {
      history[i] = state[i] + carried * rate[i];
    }
    Arrays.fill(unknowns, 0);
    for (int s = 0; s < net.stores.size(); s++) {
      Stores.Store store = net.stores.get(s);
      double companion = store.size() * perStage;
      if (store.isChoke()) {
        addRow(store.branch(), -companion, s);
      } else {
        addRow(store.a(), companion, s);
        addRow(store.b(), -companion, s);
      }
    }
    for (int c = net.stores.size(); c < count; c++) {
      addSource(columns.get(c), c, sine, x, pathAmps);
    }
    net.matrix.lu().solveMany(unknowns, count);
    for (int i = 0; i < means.length; i++) {
      means[i] += share * unknowns[i];
    }
    for (int s = 0; s < net.stores.size(); s++) {
      advance(s, half, stage);
    }
  }

  private void addRow(int row, double factor, int store) {
    if (row < 0) {
      return;
    }
    int to = row * count;
    int from = store * count;
    for (int c = 0; c < count; c++) {
      unknowns[to + c] += factor * history[from + c];
    }
  }

  private void advance(int s, int half, double stage) {
    Stores.Store store = net.stores.get(s);
    int a = store.isChoke() ? store.branch() : store.a();
    int b = store.isChoke() ? -1 : store.b();
    int at = s * count;
    for (int c = 0; c < count; c++) {
      double present =
          (a < 0 ? 0 : unknowns[a * count + c]) - (b < 0 ? 0 : unknowns[b * count + c]);
      if (half == 0) {
        rate[at + c] = (present - history[at + c]) / stage;
      } else {
        state[at + c] = present;
      }
    }
  }

  private void addSource(CycleColumn by, int c, double sine, double[] x, double[] pathAmps) {
    if (by instanceof CycleColumn.Drawn drawn) {
      add(drawn.node(), c, -1);
    } else if (by instanceof CycleColumn.WindingVolts winding) {
      for (Windings.Emf emf : net.emfs) {
        if (emf.winding() != null && emf.winding().name().equals(winding.winding().name())) {
          add(emf.branch(), c, emf.peakVolts() * sine);
        }
      }
    } else if (by instanceof CycleColumn.PartOhms part) {
      if (part.branch() >= 0) {
        add(part.branch(), c, part.ohms() * x[part.branch()]);
      } else {
        double amps = (DcNetwork.at(x, part.a()) - DcNetwork.at(x, part.b())) / part.ohms();
        add(part.a(), c, amps);
        add(part.b(), c, -amps);
      }
    } else if (by instanceof CycleColumn.Emission emission) {
      for (int p = 0; p < pathAmps.length; p++) {
        CycleNetwork.Path path = net.paths.get(p);
        if (path.element().equals(emission.element())) {
          add(path.anode(), c, -pathAmps[p]);
          add(path.cathode(), c, pathAmps[p]);
        }
      }
    }
  }

  private void add(int row, int column, double amount) {
    if (row >= 0) {
      unknowns[row * count + column] += amount;
    }
  }

  /** Returns, by column, what it does to the states at the period's end. */
  double[][] endByColumn() {
    return split(state, net.stores.size());
  }

  /** Returns, by column, what it does to the mean of every unknown. */
  double[][] meansByColumn() {
    return split(means, net.size);
  }

  private double[][] split(double[] block, int rows) {
    double[][] byColumn = new double[count][rows];
    for (int c = 0; c < count; c++) {
      for (int r = 0; r < rows; r++) {
        byColumn[c][r] = block[r * count + c];
      }
    }
    return byColumn;
  }
}
