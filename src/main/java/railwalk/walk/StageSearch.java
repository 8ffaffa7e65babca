package railwalk.walk;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Wire;

/**
 * Finds the filter stages behind a node that ripples: what lies between it and the next nodes that
 * hold their volts through a line period, by whatever series parts, however they branch. Parts that
 * remember nothing (resistors, tubes) and lead to no such node are left out, for a load without
 * memory is seen truly as a current and its slope.
 */
final class StageSearch {
  /** A capacitor from this size up holds its node through a line period. */
  static final double HOLDING_FARADS = 0.5e-6;

  /** Ripple (rms over mean volts) that may be left where a group ends. */
  static final double RIPPLE_LIMIT = 0.003;

  /** A smaller capacitor ends a stage when it takes at least this much of the ripple away. */
  private static final double SMOOTHING = 0.7;

  private final Circuit circuit;
  private final Map<Node, List<Element>> at;
  private final Set<Node> amplifying;

  /** The nodes found so far, those the search started with among them. */
  private final Set<Node> inside;

  /** Nodes of other groups, which stay there. */
  private final Set<Node> elsewhere;

  private final boolean onceAPeriod;

  /** Whether a coil of known inductance is taken in even where no capacitor follows. */
  private final boolean coilsToo;

  /** A node that was reached, and what lies between the start and it. */
  private record Step(Node node, @Nullable Step before, double ohms, double henries) {}

  /** Where a stage ends, and how much of the ripple is left there. */
  private record End(Node node, double ripple) {}

  StageSearch(
      Circuit circuit,
      Map<Node, List<Element>> at,
      Set<Node> amplifying,
      Set<Node> inside,
      Set<Node> elsewhere,
      boolean onceAPeriod,
      boolean coilsToo) {
    this.circuit = circuit;
    this.at = at;
    this.amplifying = amplifying;
    this.inside = inside;
    this.elsewhere = elsewhere;
    this.onceAPeriod = onceAPeriod;
    this.coilsToo = coilsToo;
  }

  /** Takes in the stages behind {@code start}, until what is left of {@code ripple} is allowed. */
  void takeInBehind(Node start, double ripple) {
    Deque<End> ends = new ArrayDeque<>();
    ends.add(new End(start, ripple));
    while (!ends.isEmpty()) {
      End from = ends.remove();
      for (End end : stages(from)) {
        if (end.ripple > RIPPLE_LIMIT) {
          ends.add(end);
        }
      }
    }
  }

  private List<End> stages(End from) {
    List<End> ends = new ArrayList<>();
    Set<Node> seen = new HashSet<>();
    Deque<Step> open = new ArrayDeque<>();
    open.add(new Step(from.node, null, 0, 0));
    while (!open.isEmpty()) {
      Step step = open.remove();
      for (Element part : at.getOrDefault(step.node, List.of())) {
        Node node = isSeriesPart(part) ? otherEnd(part, step.node) : null;
        if (node == null || isTaken(node) || !seen.add(node)) {
          continue;
        }
        double henries = part instanceof Inductor l ? usualHenries(l) : 0;
        Step next = new Step(node, step, step.ohms + seriesOhms(part), step.henries + henries);
        double passes = ripplePassed(next);
        if (holds(node) || passes < SMOOTHING) {
          take(next);
          ends.add(new End(node, from.ripple * passes));
          continue;
        }
        if (coilsToo && part instanceof Inductor l && !Double.isNaN(l.henries())) {
          take(next);
        }
        if (!amplifying.contains(node)) {
          open.add(next);
        }
      }
    }
    return ends;
  }

  private boolean isTaken(Node node) {
    return node.equals(circuit.reference()) || inside.contains(node) || elsewhere.contains(node);
  }

  private boolean holds(Node node) {
    for (Element element : at.getOrDefault(node, List.of())) {
      if (isHolding(element)) {
        return true;
      }
    }
    return false;
  }

  static boolean isHolding(Element element) {
    return element instanceof Capacitor c && c.farads() >= HOLDING_FARADS;
  }

  /** Takes in the way to a step, and the far ends of large capacitors on it. */
  private void take(Step last) {
    for (Step step = last; step != null; step = step.before) {
      inside.add(step.node);
    }
    for (Element element : at.getOrDefault(last.node, List.of())) {
      if (isHolding(element)) {
        for (Node node : element.nodes()) {
          if (!isTaken(node)) {
            inside.add(node);
          }
        }
      }
    }
  }

  private static @Nullable Node otherEnd(Element part, Node node) {
    for (Conduction.Pair pair : Conduction.pairs(part)) {
      if (pair.a().equals(node)) {
        return pair.b();
      }
      if (pair.b().equals(node)) {
        return pair.a();
      }
    }
    return null;
  }

  private static boolean isSeriesPart(Element element) {
    return element instanceof Resistor
        || element instanceof Inductor
        || element instanceof Switch
        || element instanceof Fuse
        || element instanceof Lamp
        || element instanceof Wire;
  }

  private static double seriesOhms(Element element) {
    if (element instanceof Resistor r) {
      return r.ohms();
    }
    if (element instanceof Inductor l && !Double.isNaN(l.dcOhms())) {
      return l.dcOhms();
    }
    return element instanceof Lamp lamp ? lamp.ratedVolts() / lamp.ratedAmps() : 0;
  }

  private static double usualHenries(Inductor inductor) {
    return Double.isNaN(inductor.henries()) ? RippleGroups.USUAL_CHOKE_HENRIES : inductor.henries();
  }

  /**
   * Returns how much of the ripple comes through to a step by the capacitors there that end at the
   * reference or inside. A choke may resonate at the line's own frequency, which is in the ripple
   * of a reservoir that is charged once a period.
   */
  private double ripplePassed(Step step) {
    double farads = 0;
    for (Element element : at.getOrDefault(step.node, List.of())) {
      if (element instanceof Capacitor c) {
        Node far = c.a().equals(step.node) ? c.b() : c.a();
        farads += far.equals(circuit.reference()) || inside.contains(far) ? c.farads() : 0;
      }
    }
    double passes = stageFactor(step.ohms, step.henries, farads, 2);
    return onceAPeriod && step.henries > 0
        ? Math.max(passes, stageFactor(step.ohms, step.henries, farads, 1))
        : passes;
  }

  /**
   * Returns how much of the ripple at a multiple of the line's frequency passes a stage: one over
   * the magnitude of 1 + jωRC − ω²LC, at most 1.
   */
  private double stageFactor(double ohms, double henries, double farads, int multiple) {
    double omega = multiple * 2 * Math.PI * circuit.line().hertz();
    double real = 1 - omega * omega * henries * farads;
    double imaginary = omega * ohms * farads;
    return Math.min(1, 1 / Math.hypot(real, imaginary));
  }
}
