package railwalk.solve;

import java.util.Arrays;
import java.util.List;
import railwalk.circuit.Node;

/**
 * How the linear parts of a {@link CycleNetwork} answer, in one stage of a sweep, to what drives
 * them. The equations of all stages of a sweep have the same linear parts, so that each answer is
 * found once; a stage is then left with the few equations of its rectifying paths.
 *
 * <p>Inputs, in this order: what each store holds from before; the line's sine; the constant
 * sources and currents drawn; for each path the current beyond {@link #PATH_SIEMENS} times its
 * volts; a current drawn at each port. The path's conductance stands in the linear parts so that a
 * floating winding is tied while nothing conducts.
 */
final class StageResponse {
  /** Conductance that each path has among the linear parts: between one that is on and one off. */
  static final double PATH_SIEMENS = 1e-4;

  private final CycleNetwork net;
  private final double[] base;
  private final double[] baseBefore;
  private final double[] sources;
  private double scaleBefore = Double.NaN;
  final int states;
  final int paths;
  final int ports;
  final int sine;
  final int constant;
  final int firstPath;
  final int firstPort;

  /** Unknowns by input. */
  final double[][] unknowns;

  /** By store: its state by input. */
  final double[][] stateBy;

  /** By path: its volts by input. */
  final double[][] pathVoltsBy;

  StageResponse(CycleNetwork net) {
    this.net = net;
    base = net.matrix.newValues();
    baseBefore = net.matrix.newValues();
    sources = new double[net.size];
    states = net.stores.size();
    paths = net.paths.size();
    ports = net.group.ports().size();
    sine = states;
    constant = states + 1;
    firstPath = states + 2;
    firstPort = firstPath + paths;
    int inputs = firstPort + ports;
    unknowns = new double[inputs][net.size];
    stateBy = new double[states][inputs];
    pathVoltsBy = new double[paths][inputs];
  }

  /** Forgets the answers, since the parts may have other values. */
  void forget() {
    scaleBefore = Double.NaN;
  }

  /** Finds the answers; false when the linear parts have none. */
  boolean prepare(double[] drawnAmps, double[][] drawnSiemens, double perStage) {
    fillBase(drawnSiemens, perStage);
    if (perStage != scaleBefore || !Arrays.equals(base, baseBefore)) {
      scaleBefore = Double.NaN;
      if (!net.matrix.lu().factor(base)) {
        return false;
      }
      answerAll(perStage);
      System.arraycopy(base, 0, baseBefore, 0, base.length);
      scaleBefore = perStage;
    }
    double[] steady = unknowns[constant];
    System.arraycopy(sources, 0, steady, 0, steady.length);
    List<Node> portNodes = net.group.ports();
    for (int r = 0; r < ports; r++) {
      double amps = drawnAmps[net.at(portNodes.get(r))];
      for (int n = 0; n < steady.length; n++) {
        steady[n] += amps * unknowns[firstPort + r][n];
      }
    }
    read(constant);
    return true;
  }

  private void fillBase(double[][] drawnSiemens, double perStage) {
    linear(drawnSiemens, perStage, base);
    for (CycleNetwork.Path path : net.paths) {
      path.add(PATH_SIEMENS, base);
    }
  }

  /** Writes the linear parts alone, without any path. */
  void linear(double[][] drawnSiemens, double perStage, double[] values) {
    System.arraycopy(net.constant, 0, values, 0, values.length);
    for (int n = 0; n < net.nodeCount; n++) {
      values[net.diagonal[n]] += drawnSiemens[n][n];
    }
    for (CycleNetwork.Slope slope : net.slopes) {
      values[slope.place()] += drawnSiemens[slope.drawn()][slope.by()];
    }
    for (Stores.Store store : net.stores) {
      store.addCompanion(perStage, values);
    }
  }

  private void answerAll(double perStage) {
    for (double[] right : unknowns) {
      Arrays.fill(right, 0);
    }
    for (int s = 0; s < states; s++) {
      net.stores.get(s).addHistory(1, perStage, unknowns[s]);
    }
    for (Windings.Emf emf : net.emfs) {
      unknowns[sine][emf.branch()] += emf.peakVolts();
    }
    for (int p = 0; p < paths; p++) {
      CycleNetwork.Path path = net.paths.get(p);
      add(unknowns[firstPath + p], path.anode(), -1);
      add(unknowns[firstPath + p], path.cathode(), 1);
    }
    List<Node> portNodes = net.group.ports();
    for (int r = 0; r < ports; r++) {
      add(unknowns[firstPort + r], net.at(portNodes.get(r)), -1);
    }
    for (int i = 0; i < unknowns.length; i++) {
      if (i != constant) {
        net.matrix.lu().solve(unknowns[i], unknowns[i]);
        read(i);
      }
    }
    net.matrix.lu().solve(net.source, sources);
  }

  /** Reads states and path volts out of the answer to an input. */
  private void read(int input) {
    double[] x = unknowns[input];
    for (int s = 0; s < states; s++) {
      stateBy[s][input] = net.stores.get(s).state(x);
    }
    for (int p = 0; p < paths; p++) {
      CycleNetwork.Path path = net.paths.get(p);
      pathVoltsBy[p][input] = DcNetwork.at(x, path.anode()) - DcNetwork.at(x, path.cathode());
    }
  }

  private static void add(double[] target, int index, double amount) {
    if (index >= 0) {
      target[index] += amount;
    }
  }

  /** Puts the unknowns that answer to {@code inputs} into {@code x}; ports draw nothing more. */
  void expand(double[] inputs, double[] x) {
    Arrays.fill(x, 0);
    for (int i = 0; i < firstPort; i++) {
      double amount = inputs[i];
      double[] answer = unknowns[i];
      for (int n = 0; n < x.length; n++) {
        x[n] += amount * answer[n];
      }
    }
  }
}
