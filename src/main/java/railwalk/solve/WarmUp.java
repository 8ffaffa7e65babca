package railwalk.solve;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Node;
import railwalk.device.WarmUpTimes;
import railwalk.walk.SupplyNode;

/**
 * Follows an amplifier from switch-on over many line periods, each averaged: cathodes warm up,
 * capacitors charge, loads begin to draw.
 *
 * <p>Steps in time by the second-order backward differentiation formula with variable steps (first
 * order for the first step and after every switching). The step is chosen so that the straight line
 * through the two instants before misses the next by a small part of a node's volts only, and is
 * never less than a line period.
 */
public final class WarmUp {
  /** How far the straight line may miss, as a share of a supply node's volts. */
  private static final double MISS_SHARE = 0.004;

  /** A miss of this many times the allowed one has the step taken again, shorter. */
  private static final double REFUSED = 2;

  private static final double LONGEST_SECONDS = 2;
  private static final double LEAST_SCALE_VOLTS = 1;

  /** A stretch of time in which nothing is switched. */
  public record Stretch(OperatingPoint running, double untilSeconds) {}

  private final WarmUpCourse course;
  private double now;
  private double[] voltsNow;
  private final double[] scaleVolts;
  private final int[] watched;

  private WarmUp(WarmUpCourse course, OperatingPoint running) {
    this.course = course;
    List<SupplyNode> nodes = running.map().supplyNodes();
    watched = nodes.stream().mapToInt(s -> s.node().index()).toArray();
    scaleVolts = new double[watched.length];
    for (int w = 0; w < watched.length; w++) {
      double volts = running.volts(nodes.get(w).node());
      scaleVolts[w] = Math.max(LEAST_SCALE_VOLTS, Double.isNaN(volts) ? 0 : Math.abs(volts));
    }
    voltsNow = new double[running.circuit().nodes().size()];
    course.add(0, voltsNow);
  }

  /**
   * Follows an amplifier from switch-on, capacitors empty.
   *
   * @param stretches in their order, of circuits that differ in switches only, each with the
   *     operating point it would come to
   * @param hot whether all cathodes are hot at switch-on, as after a short interruption
   */
  public static WarmUpOutcome of(List<Stretch> stretches, boolean hot) {
    WarmUpTimes times = WarmUpTimes.standard();
    OperatingPoint end = stretches.get(stretches.size() - 1).running();
    @Nullable WarmUp run = null;
    @Nullable WarmUpNetwork before = null;
    for (Stretch stretch : stretches) {
      WarmUpNetwork net = new WarmUpNetwork(stretch.running(), times, hot);
      if (run == null) {
        run = new WarmUp(new WarmUpCourse(end.circuit(), net.firstCharges()), end);
      } else if (before != null) {
        net.startFrom(before.statesByPart(), run.voltsByNode(end));
      }
      if (!run.follow(net, stretch.untilSeconds())) {
        return new WarmUpOutcome.Lost(run.now, net.failedNode(), net.failure());
      }
      before = net;
    }
    if (run == null) {
      throw new IllegalArgumentException("nothing to follow");
    }
    return new WarmUpOutcome.Followed(run.course);
  }

  private Map<Node, Double> voltsByNode(OperatingPoint of) {
    Map<Node, Double> volts = new HashMap<>();
    for (Node node : of.circuit().nodes()) {
      double here = voltsNow[node.index()];
      volts.put(node, Double.isNaN(here) ? 0 : here);
    }
    return volts;
  }

  private boolean follow(WarmUpNetwork net, double untilSeconds) {
    double shortest = net.periodSeconds();
    double step = shortest;
    double[] states = net.states();
    double[] statesBefore = states;
    double[] voltsBefore = voltsNow;
    double stepBefore = 0;
    while (now < untilSeconds - 1e-6) {
      double rest = untilSeconds - now;
      step = rest < step * 1.5 ? Math.min(rest, 2 * step) : step;
      double ratio = stepBefore == 0 ? 0 : step / stepBefore;
      double lead = (1 + 2 * ratio) / ((1 + ratio) * step);
      double[] carried = new double[net.size()];
      for (int s = 0; s < carried.length; s++) {
        carried[s] =
            ((1 + ratio) * states[s] - ratio * ratio / (1 + ratio) * statesBefore[s]) / step;
      }
      boolean canShorten = step > 1.01 * shortest;
      if (!net.step(now + step, lead, carried)) {
        if (!canShorten) {
          return false;
        }
        step = Math.max(shortest, step / 4);
        continue;
      }
      double[] volts = net.nextVolts();
      boolean lights = net.glowChanges();
      double miss = stepBefore == 0 ? 1 : miss(volts, voltsBefore, ratio) / MISS_SHARE;
      if (canShorten && (miss > REFUSED || (lights && step > 4 * shortest))) {
        step = Math.max(shortest, step * Math.min(0.5, 0.9 / Math.sqrt(miss)));
        continue;
      }
      statesBefore = states;
      states = net.nextStates();
      voltsBefore = voltsNow;
      voltsNow = volts;
      net.accept();
      now += step;
      course.add(now, volts);
      stepBefore = lights ? 0 : step;
      double factor = Math.max(0.4, Math.min(2, 0.9 / Math.sqrt(miss)));
      step = lights ? shortest : Math.min(LONGEST_SECONDS, Math.max(shortest, step * factor));
    }
    return true;
  }

  /** Returns by how much a straight line through the last two instants misses {@code volts}. */
  private double miss(double[] volts, double[] before, double ratio) {
    double greatest = 1e-6;
    for (int w = 0; w < watched.length; w++) {
      int n = watched[w];
      double line = voltsNow[n] + ratio * (voltsNow[n] - before[n]);
      double miss = Math.abs(volts[n] - line) / scaleVolts[w];
      if (miss > greatest) {
        greatest = miss;
      }
    }
    return greatest;
  }
}
