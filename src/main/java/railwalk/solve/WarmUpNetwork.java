package railwalk.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.device.WarmUpTimes;
import railwalk.walk.SupplyMap;

/**
 * The averaged engine as one step in time after another uses it: two solvers, the one at rest at
 * the last instant and the one that is brought to the next.
 *
 * <p>States are the volts of capacitors outside the ripple groups, then the groups' own capacitor
 * volts and choke currents at the start of a line period. The former have dV/dt in the equations;
 * the latter gain over a period what the slow course asks for (envelope following: the period map
 * takes the place of the derivative; L. R. Petzold, "An efficient numerical method for highly
 * oscillatory ordinary differential equations", SIAM J. Numer. Anal. 18 (1981)). Either way a step
 * says: rate = lead · state − carried.
 */
final class WarmUpNetwork {
  /** Steps of the period in which the first charge is looked at. */
  private static final int FIRST_STEPS = 288;

  private final Circuit circuit;
  private final WarmUpParts parts;
  private final double periodSeconds;
  private final int size;
  private final int outside;
  private CoupledSolver last;
  private CoupledSolver next;

  WarmUpNetwork(OperatingPoint running, WarmUpTimes times, boolean hot) {
    circuit = running.circuit();
    SupplyMap map = running instanceof SolvedPoint p ? p.solver().map() : running.map();
    parts = new WarmUpParts(running, map.groups(), times, hot);
    periodSeconds = 1 / circuit.line().hertz();
    Circuit layout = parts.layout();
    last = new CoupledSolver(layout, map, false);
    next = new CoupledSolver(layout, map, false);
    outside = parts.stores().size();
    int count = outside;
    for (Supply supply : last.supplies) {
      count += supply.net.stores.size();
    }
    size = count;
  }

  double periodSeconds() {
    return periodSeconds;
  }

  /** Returns how many states there are. */
  int size() {
    return size;
  }

  /** Starts from the volts and choke currents that another circuit of like parts was left at. */
  void startFrom(Map<String, Double> states, Map<Node, Double> volts) {
    for (Map.Entry<Node, Integer> unknown : last.dc.unknowns.entrySet()) {
      if (unknown.getValue() >= 0) {
        last.x[unknown.getValue()] = volts.getOrDefault(unknown.getKey(), 0.0);
      }
    }
    for (Supply supply : last.supplies) {
      double[] started = new double[supply.net.stores.size()];
      for (int s = 0; s < started.length; s++) {
        Element part = supply.net.stores.get(s).part();
        started[s] = part == null ? 0 : states.getOrDefault(part.name(), 0.0);
      }
      supply.startAt(started);
    }
  }

  /** Returns the states by the names of their parts: a capacitor's volts, a choke's current. */
  Map<String, Double> statesByPart() {
    Map<String, Double> states = new HashMap<>();
    for (WarmUpParts.Store store : parts.stores()) {
      states.put(store.capacitor().name(), across(last, store.capacitor()));
    }
    for (Supply supply : last.supplies) {
      for (int s = 0; s < supply.net.stores.size(); s++) {
        Element part = supply.net.stores.get(s).part();
        if (part != null) {
          states.put(part.name(), supply.startState(s));
        }
      }
    }
    return states;
  }

  /** Returns the states by number. */
  double[] states() {
    return states(last);
  }

  private double[] states(CoupledSolver solver) {
    double[] states = new double[size];
    int at = 0;
    for (WarmUpParts.Store store : parts.stores()) {
      states[at++] = across(solver, store.capacitor());
    }
    for (Supply supply : solver.supplies) {
      for (int s = 0; s < supply.net.stores.size(); s++) {
        states[at++] = supply.startState(s);
      }
    }
    return states;
  }

  private static double across(CoupledSolver solver, Capacitor capacitor) {
    return volts(solver, capacitor.a()) - volts(solver, capacitor.b());
  }

  private static double volts(CoupledSolver solver, Node node) {
    Integer unknown = solver.dc.unknowns.get(node);
    return unknown == null ? 0 : DcNetwork.at(solver.x, unknown);
  }

  /**
   * Brings the next instant to rest.
   *
   * @param seconds since switch-on, at that instant
   * @param leadPerSecond and {@code carried}: each state's rate there is lead · state − carried
   * @return whether it settled
   */
  boolean step(double seconds, double leadPerSecond, double[] carried) {
    prepare(seconds, leadPerSecond, carried);
    next.startFrom(last);
    if (next.settle()) {
      return true;
    }
    next.reset();
    return next.startCold() && next.settle();
  }

  private void prepare(double seconds, double leadPerSecond, double[] carried) {
    next.dc.load(parts.at(seconds, leadPerSecond, Arrays.copyOf(carried, outside)));
    int at = outside;
    for (Supply supply : next.supplies) {
      parts.heat(supply.net, seconds);
      int count = supply.net.stores.size();
      double[] lead = new double[count];
      double[] share = new double[count];
      for (int s = 0; s < count; s++) {
        // A core's magnetising current belongs to the period, not to the slow course.
        if (supply.net.stores.get(s).part() != null) {
          lead[s] = leadPerSecond * periodSeconds;
          share[s] = carried[at + s] * periodSeconds;
        }
      }
      at += count;
      supply.runOn(lead, share);
    }
  }

  /** Returns the states at the next instant. */
  double[] nextStates() {
    return states(next);
  }

  /** Returns the volts at the next instant, by node index; NaN where they are not predictable. */
  double[] nextVolts() {
    double[] volts = new double[circuit.nodes().size()];
    for (Node node : circuit.nodes()) {
      volts[node.index()] = nextVolts(node);
    }
    return volts;
  }

  private double nextVolts(Node node) {
    if (node.equals(circuit.reference())) {
      return 0;
    }
    if (next.map().undefined().contains(node)) {
      return Double.NaN;
    }
    Integer unknown = next.dc.unknowns.get(node);
    if (unknown != null) {
      return next.x[unknown];
    }
    @Nullable Supply supply = next.supplyOf(node);
    return supply == null ? Double.NaN : supply.meanVolts(node);
  }

  /** Returns whether a gas tube lights or goes out on the way to the next instant. */
  boolean glowChanges() {
    for (int i = 0; i < last.dc.devices.twoPoles.size(); i++) {
      if (last.dc.devices.glow(i) != next.dc.devices.glow(i)) {
        return true;
      }
    }
    return false;
  }

  /** Takes the next instant for the last. */
  void accept() {
    CoupledSolver swap = last;
    last = next;
    next = swap;
  }

  String failedNode() {
    return next.failedNode();
  }

  String failure() {
    return next.failure();
  }

  /** Returns what each rectifying path carries at most in the first period, all stores empty. */
  List<WarmUpCourse.FirstCharge> firstCharges() {
    List<WarmUpCourse.FirstCharge> charges = new ArrayList<>();
    for (Supply supply : next.supplies) {
      CycleNetwork net = supply.net;
      parts.heat(net, 0);
      double[] peaks = new double[net.paths.size()];
      CycleSweep sweep = new CycleSweep(net, FIRST_STEPS);
      double[] none = new double[net.nodeCount];
      boolean settled =
          sweep.look(
              new double[net.stores.size()],
              none,
              new double[net.nodeCount][net.nodeCount],
              List.of(),
              (share, unknowns, pathAmps, pathVolts) -> {
                for (int p = 0; p < peaks.length; p++) {
                  peaks[p] = Math.max(peaks[p], pathAmps[p]);
                }
              });
      Map<Element, Integer> plates = new HashMap<>();
      for (int p = 0; p < peaks.length; p++) {
        Element rectifier = net.paths.get(p).element();
        int plate = plates.merge(rectifier, 1, Integer::sum) - 1;
        charges.add(
            new WarmUpCourse.FirstCharge(rectifier, plate, settled ? peaks[p] : Double.NaN));
      }
    }
    return charges;
  }
}
