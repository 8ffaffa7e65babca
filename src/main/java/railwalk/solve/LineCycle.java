package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;
import railwalk.walk.SupplyMap;

/**
 * One settled period of the line, stepped through in time: what a scope would show at every node.
 * Immutable to its readers.
 */
public final class LineCycle {
  private final TimeNetwork net;
  private final SupplyMap map;
  private final double[] means;
  private final double[] rms;
  private final TimeRecord shown;
  private final int periods;
  private final List<RectifierLoad> rectifiers = new ArrayList<>();

  LineCycle(
      TimeNetwork net,
      SupplyMap map,
      double[] means,
      double[] squares,
      TimeRecord shown,
      double[] rectifierMeans,
      int periods) {
    this.net = net;
    this.map = map;
    this.means = means;
    this.shown = shown;
    this.periods = periods;
    rms = new double[squares.length];
    for (int n = 0; n < rms.length; n++) {
      rms[n] = Math.sqrt(Math.max(0, squares[n]));
    }
    Map<Element, Integer> plates = new HashMap<>();
    int[] places = shown.rectifiers();
    for (int r = 0; r < places.length; r++) {
      Devices.TwoPole pole = net.devices.twoPoles.get(places[r]);
      double inverse = 0;
      for (double[] x : shown.unknowns) {
        double volts = DcNetwork.at(x, pole.cathode()) - DcNetwork.at(x, pole.anode());
        inverse = Math.max(inverse, volts);
      }
      int plate = plates.merge(pole.element(), 1, Integer::sum) - 1;
      rectifiers.add(
          new RectifierLoad(pole.element(), plate, rectifierMeans[r], shown.peakAmps(r), inverse));
    }
  }

  /** Returns the circuit. */
  public Circuit circuit() {
    return net.circuit;
  }

  /** Returns how many periods were run. */
  public int periods() {
    return periods;
  }

  /** Returns the mean volts of {@code node} against the reference; NaN without a DC path. */
  public double meanVolts(Node node) {
    return map.undefined().contains(node) ? Double.NaN : DcNetwork.at(means, net.at(node));
  }

  /** Returns what is left of the node's volts when the mean is taken off, rms. */
  public double rippleVoltsRms(Node node) {
    int unknown = net.at(node);
    if (unknown < 0) {
      return 0;
    }
    return Math.sqrt(Math.max(0, rms[unknown] * rms[unknown] - means[unknown] * means[unknown]));
  }

  /**
   * Returns the instants of the period, seconds from a rising zero of the line, the last its end.
   */
  public double[] seconds() {
    return shown.seconds.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** Returns the volts of {@code node} at each of the instants. */
  public double[] volts(Node node) {
    int unknown = net.at(node);
    return shown.unknowns.stream().mapToDouble(x -> DcNetwork.at(x, unknown)).toArray();
  }

  /** Returns the loads of all windings, sections in order. */
  public List<WindingLoad> windings() {
    List<WindingLoad> loads = new ArrayList<>();
    for (Winding winding : net.circuit.elements(Winding.class)) {
      for (int s = 0; s < winding.sections().size(); s++) {
        Winding.Section section = winding.sections().get(s);
        int branch = net.windings.branch(section);
        loads.add(
            new WindingLoad(winding, s, rmsVolts(section), rms[branch], greatestAmps(branch)));
      }
    }
    return loads;
  }

  private double greatestAmps(int branch) {
    double greatest = 0;
    for (double[] x : shown.unknowns) {
      greatest = Math.max(greatest, Math.abs(x[branch]));
    }
    return greatest;
  }

  /** By the trapezoidal rule, the period starting where it ends. */
  private double rmsVolts(Winding.Section section) {
    double[] a = volts(section.a());
    double[] b = volts(section.b());
    double before = a[a.length - 1] - b[b.length - 1];
    double from = 0;
    double sum = 0;
    for (int k = 0; k < a.length; k++) {
      double volts = a[k] - b[k];
      double second = shown.seconds.get(k);
      sum += (second - from) * (before * before + volts * volts) / 2;
      before = volts;
      from = second;
    }
    return Math.sqrt(sum * net.hertz);
  }

  /** Returns the loads of all rectifiers, plate by plate. */
  public List<RectifierLoad> rectifiers() {
    return List.copyOf(rectifiers);
  }
}
