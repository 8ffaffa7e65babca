package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.Winding;
import railwalk.device.SectionKind;

/**
 * What one last look over the settled period of a ripple group shows: means, ripple, peaks, heat,
 * and how all node volts follow the currents drawn and the parts inside.
 *
 * @param meanUnknowns by unknown: node volts, then branch currents
 * @param rippleRmsVolts by node unknown
 * @param meanAmps mean current by part, from its first node to its second (a rectifier: the sum of
 *     its plates)
 * @param watts heat by part, ripple included
 * @param rmsAmps by part
 * @param loads what windings, rectifiers and filaments stand
 * @param outputPeakAmps by output: greatest current that came to it at any instant
 * @param outputMeanAmps by output: its mean
 * @param voltsByDrawn by node unknown and node unknown: volts over ampere drawn (negative ohms)
 * @param voltsByShare for each part whose value has a spread: node volts over its relative change,
 *     the currents drawn held
 */
record CycleReport(
    CycleNetwork net,
    double[] meanUnknowns,
    double[] rippleRmsVolts,
    Map<Element, Double> meanAmps,
    Map<Element, Double> watts,
    Map<Element, Double> rmsAmps,
    CycleLoads loads,
    double[] outputPeakAmps,
    double[] outputMeanAmps,
    double[][] voltsByDrawn,
    Map<Element, double[]> voltsByShare) {

  static CycleReport of(
      CycleNetwork net,
      CycleSweep sweep,
      double[] states,
      double[] drawnAmps,
      double[][] drawnSiemens) {
    int storeCount = states.length;
    List<CycleColumn> columns = new ArrayList<>();
    for (int s = 0; s < storeCount; s++) {
      columns.add(new CycleColumn.StartState(s));
    }
    for (int n = 0; n < net.nodeCount; n++) {
      columns.add(new CycleColumn.Drawn(n));
    }
    List<Element> spreadParts = new ArrayList<>();
    for (Element element : net.group.elements()) {
      CycleColumn column = columnOf(net, element);
      if (column != null) {
        columns.add(column);
        spreadParts.add(element);
      }
    }
    Observation seen = new Observation(net);
    if (!sweep.look(states, drawnAmps, drawnSiemens, columns, seen)) {
      throw new IllegalStateException("a settled period did not run again");
    }
    double[][] free = closedLoop(sweep, storeCount, columns.size());
    double[][] byDrawn = new double[net.nodeCount][net.nodeCount];
    double[][] left = new double[net.nodeCount][net.nodeCount];
    for (int r = 0; r < net.nodeCount; r++) {
      for (int c = 0; c < net.nodeCount; c++) {
        byDrawn[r][c] = free[c][r];
        left[r][c] = r == c ? 1 : 0;
        for (int k = 0; k < net.nodeCount; k++) {
          left[r][c] += free[k][r] * drawnSiemens[k][c];
        }
      }
    }
    DenseLu lu = DenseLu.of(left);
    if (lu == null) {
      throw new IllegalStateException("a supply's nodes are tied to each other");
    }
    double[][] voltsByDrawn = new double[net.nodeCount][net.nodeCount];
    for (int c = 0; c < net.nodeCount; c++) {
      double[] column = lu.solve(columnOf(byDrawn, c));
      for (int r = 0; r < net.nodeCount; r++) {
        voltsByDrawn[r][c] = column[r];
      }
    }
    Map<Element, double[]> voltsByShare = new HashMap<>();
    for (int i = 0; i < spreadParts.size(); i++) {
      double[] column = new double[net.nodeCount];
      System.arraycopy(free[net.nodeCount + i], 0, column, 0, net.nodeCount);
      voltsByShare.put(spreadParts.get(i), lu.solve(column));
    }
    return seen.report(sweep.means.clone(), voltsByDrawn, voltsByShare);
  }

  private static double[] columnOf(double[][] matrix, int column) {
    double[] values = new double[matrix.length];
    for (int r = 0; r < values.length; r++) {
      values[r] = matrix[r][column];
    }
    return values;
  }

  /**
   * Returns, for each column beyond the states, the derivative of the means with the period closed
   * again: the start states follow by (1 − M)⁻¹ of what the column does to the end states.
   */
  private static double[][] closedLoop(CycleSweep sweep, int states, int columns) {
    double[][] shooting = new double[states][states];
    for (int i = 0; i < states; i++) {
      for (int j = 0; j < states; j++) {
        shooting[i][j] = (i == j ? 1 : 0) - sweep.endByColumn[j][i];
      }
    }
    DenseLu lu = DenseLu.of(shooting);
    if (lu == null) {
      throw new IllegalStateException("a settled period has no unique start");
    }
    double[][] free = new double[columns - states][];
    for (int c = states; c < columns; c++) {
      double[] start = lu.solve(sweep.endByColumn[c]);
      double[] means = sweep.meansByColumn[c].clone();
      for (int s = 0; s < states; s++) {
        for (int n = 0; n < means.length; n++) {
          means[n] += sweep.meansByColumn[s][n] * start[s];
        }
      }
      free[c - states] = means;
    }
    return free;
  }

  private static @Nullable CycleColumn columnOf(CycleNetwork net, Element element) {
    if (element instanceof Resistor r) {
      return new CycleColumn.PartOhms(
          r, net.at(r.a()), net.at(r.b()), net.branches.getOrDefault(r, -1), r.ohms());
    }
    if (element instanceof Winding w) {
      return new CycleColumn.WindingVolts(w);
    }
    if (element instanceof RectifierSection s && s.type().kind() == SectionKind.RECTIFIER) {
      return new CycleColumn.Emission(s);
    }
    return null;
  }

  double meanVolts(Node node) {
    int unknown = net.at(node);
    return unknown < 0 ? 0 : meanUnknowns[unknown];
  }

  /** Collects means, squares and peaks stage by stage. */
  private static final class Observation implements CycleSweep.Observer {
    private final CycleNetwork net;
    private final double[] squares;
    private final double[] pathMeans;
    private final double[] pathSquares;
    private final double[] pathWatts;
    private final Map<Resistor, double[]> resistorSquares = new HashMap<>();
    private final double[] outputPeaks;
    private final CycleLoads loads;

    Observation(CycleNetwork net) {
      this.net = net;
      squares = new double[net.size];
      pathMeans = new double[net.paths.size()];
      pathSquares = new double[net.paths.size()];
      pathWatts = new double[net.paths.size()];
      outputPeaks = new double[net.group.outputs().size()];
      loads = new CycleLoads(net);
      for (Element e : net.group.elements()) {
        if (e instanceof Resistor r) {
          resistorSquares.put(r, new double[1]);
        }
      }
    }

    @Override
    public void stage(double share, double[] x, double[] pathAmps, double[] pathVolts) {
      loads.stage(share, x, pathAmps, pathVolts);
      for (int n = 0; n < x.length; n++) {
        squares[n] += share * x[n] * x[n];
      }
      for (int p = 0; p < pathAmps.length; p++) {
        double amps = pathAmps[p] + CycleNetwork.LEAK_SIEMENS * pathVolts[p];
        pathMeans[p] += share * amps;
        pathSquares[p] += share * amps * amps;
        pathWatts[p] += share * amps * pathVolts[p];
      }
      resistorSquares.forEach(
          (r, sum) -> {
            double volts = DcNetwork.at(x, net.at(r.a())) - DcNetwork.at(x, net.at(r.b()));
            sum[0] += share * volts * volts;
          });
      for (int o = 0; o < outputPeaks.length; o++) {
        double amps = 0;
        Node output = net.group.outputs().get(o);
        for (Element feeder : net.group.feeders()) {
          amps += ampsInto(feeder, output, x, pathAmps);
        }
        outputPeaks[o] = Math.max(outputPeaks[o], Math.abs(amps));
      }
    }

    private double ampsInto(Element part, Node node, double[] x, double[] pathAmps) {
      int unknown = net.at(node);
      double amps = 0;
      boolean rectifies = false;
      for (int p = 0; p < pathAmps.length; p++) {
        CycleNetwork.Path path = net.paths.get(p);
        if (path.element().equals(part)) {
          rectifies = true;
          amps += path.cathode() == unknown ? pathAmps[p] : 0;
          amps -= path.anode() == unknown ? pathAmps[p] : 0;
        }
      }
      if (rectifies) {
        return amps;
      }
      if (part instanceof Winding winding) {
        for (Winding.Section section : winding.sections()) {
          double through = x[net.sectionBranch(section)];
          amps += section.b().equals(node) ? through : 0;
          amps -= section.a().equals(node) ? through : 0;
        }
        return amps;
      }
      if (!part.nodes().contains(node)) {
        return 0;
      }
      double through = TwoTerminal.amps(part, net.branches, net.unknowns, x);
      return part.nodes().get(0).equals(node) ? -through : through;
    }

    CycleReport report(
        double[] means, double[][] voltsByDrawn, Map<Element, double[]> voltsByShare) {
      double[] ripple = new double[net.nodeCount];
      for (int n = 0; n < net.nodeCount; n++) {
        ripple[n] = Math.sqrt(Math.max(0, squares[n] - means[n] * means[n]));
      }
      Map<Element, Double> meanAmps = new HashMap<>();
      Map<Element, Double> watts = new HashMap<>();
      Map<Element, Double> rmsAmps = new HashMap<>();
      for (int p = 0; p < pathMeans.length; p++) {
        Element element = net.paths.get(p).element();
        meanAmps.merge(element, pathMeans[p], Double::sum);
        watts.merge(element, pathWatts[p], Double::sum);
        rmsAmps.merge(element, Math.sqrt(pathSquares[p]), Math::max);
      }
      resistorSquares.forEach(
          (r, sum) -> {
            watts.put(r, sum[0] / r.ohms());
            rmsAmps.put(r, Math.sqrt(sum[0]) / r.ohms());
          });
      for (Element element : net.group.elements()) {
        Integer branch = net.branches.get(element);
        if (branch != null) {
          meanAmps.put(element, means[branch]);
          rmsAmps.put(element, Math.sqrt(squares[branch]));
        } else if (!meanAmps.containsKey(element)) {
          meanAmps.put(element, TwoTerminal.amps(element, net.branches, net.unknowns, means));
        }
      }
      double[] outputMeans = new double[outputPeaks.length];
      for (int o = 0; o < outputPeaks.length; o++) {
        for (Element feeder : net.group.feeders()) {
          outputMeans[o] += ampsInto(feeder, net.group.outputs().get(o), means, pathMeans);
        }
      }
      return new CycleReport(
          net,
          means,
          ripple,
          meanAmps,
          watts,
          rmsAmps,
          loads,
          outputPeaks,
          outputMeans,
          voltsByDrawn,
          voltsByShare);
    }
  }
}
