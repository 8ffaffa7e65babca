package railwalk.walk;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.Deque;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Coupling;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;
import railwalk.device.SectionKind;

/**
 * Finds from the topology which parts carry ripple, and cuts them out as {@link RippleGroup}s for
 * the solver. Nothing is declared in the netlist: a group grows from a winding.
 *
 * <p>From a winding's ends the flood runs through all passive parts and rectifiers. A node that
 * holds a large capacitor (a reservoir's hot end) is taken in, but from there it goes on only
 * through rectifiers, windings and other large capacitors. It never passes a tube that amplifies,
 * nor the reference. Floods that meet, or whose windings share a transformer's primary, are one
 * group; a group without a rectifier is none. Then each reservoir takes in the filter stages behind
 * it, one by one, until what is left of the ripple can do no harm.
 */
public final class RippleGroups {
  /** A capacitor from this size up holds its node through a line period. */
  private static final double HOLDING_FARADS = 0.5e-6;

  /** Growth stops where a stage's ripple is this small a part of the reservoir's. */
  private static final double RIPPLE_LEFT = 0.02;

  /** A smaller capacitor ends a stage when it takes at least this much of the ripple away. */
  private static final double SMOOTHING = 0.7;

  /** Usual inductance of a filter choke where the netlist gives none (common practice). */
  public static final double USUAL_CHOKE_HENRIES = 5;

  private final Circuit circuit;
  private final Map<Node, List<Element>> at;
  private final Set<Node> held = new HashSet<>();
  private final Set<Node> amplifying = new HashSet<>();
  private final Set<Node> windingNodes = new HashSet<>();

  private RippleGroups(Circuit circuit) {
    this.circuit = circuit;
    this.at = circuit.elementsByNode();
    for (Capacitor capacitor : circuit.elements(Capacitor.class)) {
      if (capacitor.farads() >= HOLDING_FARADS) {
        held.addAll(capacitor.nodes());
      }
    }
    circuit.elements(AmplifierSection.class).forEach(s -> amplifying.addAll(s.nodes()));
    circuit.elements(Winding.class).forEach(w -> windingNodes.addAll(w.nodes()));
    held.remove(circuit.reference());
  }

  /** Returns the groups of {@code circuit}, in netlist order of their first part. */
  public static List<RippleGroup> of(Circuit circuit) {
    return new RippleGroups(circuit).find();
  }

  private List<RippleGroup> find() {
    List<Set<Node>> floods = new ArrayList<>();
    List<Set<String>> transformers = new ArrayList<>();
    for (Winding winding : circuit.elements(Winding.class)) {
      Set<Node> flood = flood(winding);
      if (!hasRectifier(flood)) {
        continue;
      }
      Set<String> names = new HashSet<>();
      if (!winding.transformer().isEmpty()) {
        names.add(winding.transformer());
      }
      for (int i = floods.size() - 1; i >= 0; i--) {
        if (meet(floods.get(i), flood) || meet(transformers.get(i), names)) {
          flood.addAll(floods.remove(i));
          names.addAll(transformers.remove(i));
        }
      }
      floods.add(flood);
      transformers.add(names);
    }
    return floods.stream()
        .map(this::group)
        .sorted(Comparator.comparingInt(g -> circuit.elements().indexOf(g.elements().get(0))))
        .toList();
  }

  private static <T> boolean meet(Set<T> a, Set<T> b) {
    return a.stream().anyMatch(b::contains);
  }

  /** Returns the nodes that {@code winding} drives, the reference left out. */
  private Set<Node> flood(Winding winding) {
    Set<Node> reached = new LinkedHashSet<>();
    Deque<Node> open = new ArrayDeque<>();
    winding.nodes().forEach(n -> reach(n, reached, open));
    while (!open.isEmpty()) {
      Node node = open.remove();
      for (Element element : at.getOrDefault(node, List.of())) {
        if (!held.contains(node) || passesReservoir(element)) {
          Conduction.across(element, node)
              .filter(n -> held.contains(n) || !amplifying.contains(n))
              .forEach(n -> reach(n, reached, open));
        }
      }
    }
    return reached;
  }

  private void reach(Node node, Set<Node> reached, Deque<Node> open) {
    if (!node.equals(circuit.reference()) && reached.add(node)) {
      open.add(node);
    }
  }

  private static boolean passesReservoir(Element element) {
    return element instanceof Winding
        || isRectifier(element)
        || element instanceof Filament
        || element instanceof Wire
        || (element instanceof Capacitor c && c.farads() >= HOLDING_FARADS);
  }

  private static boolean isRectifier(Element element) {
    return element instanceof Diode
        || (element instanceof RectifierSection section
            && section.type().kind() == SectionKind.RECTIFIER);
  }

  private boolean hasRectifier(Set<Node> flood) {
    return flood.stream()
        .flatMap(n -> at.getOrDefault(n, List.of()).stream())
        .anyMatch(RippleGroups::isRectifier);
  }

  private RippleGroup group(Set<Node> flood) {
    Set<Node> inside = new LinkedHashSet<>(flood);
    List<Element> alternating = elementsWithin(inside);
    List<Node> outputs = outputs(flood, alternating);
    Set<Node> frontier = new LinkedHashSet<>(flood);
    frontier.retainAll(held);
    List<String> arrangements = Arrangement.of(circuit, alternating, outputs);
    for (Node node : frontier) {
      int output = outputs.indexOf(node);
      boolean onceAPeriod = output >= 0 && Arrangement.chargesOnce(arrangements.get(output));
      grow(node, 1, inside, onceAPeriod);
    }
    List<Element> elements = elementsWithin(inside);
    Set<Element> taken = new HashSet<>(elements);
    Set<Node> touched = new HashSet<>();
    elements.forEach(e -> touched.addAll(e.nodes()));
    List<Node> nodes = circuit.nodes().stream().filter(touched::contains).toList();
    List<Node> ports =
        nodes.stream()
            .filter(n -> !n.equals(circuit.reference()))
            .filter(n -> at.getOrDefault(n, List.of()).stream().anyMatch(e -> loads(e, taken)))
            .toList();
    List<Element> feeders = alternating.stream().filter(e -> feeds(e, outputs)).toList();
    return new RippleGroup(arrangements, elements, nodes, ports, outputs, feeders);
  }

  private List<Element> elementsWithin(Set<Node> inside) {
    return circuit.elements().stream()
        .filter(e -> !Conduction.pairs(e).isEmpty())
        .filter(e -> e.nodes().stream().anyMatch(inside::contains))
        .filter(
            e ->
                e.nodes().stream()
                    .allMatch(n -> inside.contains(n) || n.equals(circuit.reference())))
        .toList();
  }

  private static boolean loads(Element element, Set<Element> taken) {
    return !taken.contains(element)
        && !(element instanceof Coupling)
        && !(element instanceof Capacitor c && Double.isInfinite(c.leakOhms()));
  }

  /**
   * Returns the held nodes that rectified current comes to: next to a rectifier, or behind a part
   * that leads from an unheld node which is.
   */
  private List<Node> outputs(Set<Node> flood, List<Element> alternating) {
    Set<Node> plates = new HashSet<>();
    for (Element element : alternating) {
      if (element instanceof Winding winding && drivesRectifier(winding, alternating)) {
        plates.addAll(winding.nodes());
      }
    }
    return circuit.nodes().stream()
        .filter(flood::contains)
        .filter(held::contains)
        .filter(n -> !plates.contains(n))
        .filter(n -> alternating.stream().anyMatch(e -> brings(e, List.of(n))))
        .toList();
  }

  /**
   * Returns whether a winding's end goes to a rectifier by itself, not as its filament's supply.
   */
  private boolean drivesRectifier(Winding winding, List<Element> alternating) {
    List<Node> ends = winding.nodes();
    return alternating.stream()
        .anyMatch(
            e ->
                (e instanceof Diode d
                        && (ends.contains(d.anode()) || ends.contains(d.cathode()))
                        && ends.stream().noneMatch(this::isFilamentEnd))
                    || (e instanceof RectifierSection s
                        && s.plates().stream().anyMatch(ends::contains)));
  }

  private boolean isFilamentEnd(Node node) {
    return at.getOrDefault(node, List.of()).stream().anyMatch(Filament.class::isInstance);
  }

  /** Returns whether rectified current comes to one of {@code outputs} through {@code element}. */
  private boolean brings(Element element, List<Node> outputs) {
    boolean atOutput = element.nodes().stream().anyMatch(outputs::contains);
    boolean fromInside =
        element.nodes().stream()
            .anyMatch(n -> !outputs.contains(n) && !n.equals(circuit.reference()));
    return atOutput
        && (isRectifier(element)
            || (fromInside
                && !(element instanceof Capacitor || element instanceof Winding)
                && leadsFromRectifier(element)));
  }

  /** As {@link #brings}, the two ends of a filament that is the cathode included. */
  private boolean feeds(Element element, List<Node> outputs) {
    return brings(element, outputs)
        || ((element instanceof Winding || element instanceof Filament)
            && element.nodes().stream().anyMatch(outputs::contains));
  }

  private boolean leadsFromRectifier(Element element) {
    return element.nodes().stream()
        .filter(n -> !held.contains(n) && !n.equals(circuit.reference()))
        .anyMatch(
            n ->
                at.getOrDefault(n, List.of()).stream()
                    .anyMatch(e -> isRectifier(e) || e instanceof Filament));
  }

  /** Takes in the filter stages behind {@code node}, while {@code ripple} of it is still left. */
  private void grow(Node node, double ripple, Set<Node> inside, boolean onceAPeriod) {
    for (Element first : at.getOrDefault(node, List.of())) {
      stage(node, first, inside, onceAPeriod)
          .ifPresent(
              stage -> {
                inside.addAll(stage.nodes());
                double left = ripple * stage.ripplePassed();
                if (left > RIPPLE_LEFT) {
                  grow(stage.end(), left, inside, onceAPeriod);
                }
              });
    }
  }

  /** A chain of series parts from a held node to the next one. */
  private record Stage(List<Node> nodes, Node end, double ripplePassed) {}

  private Optional<Stage> stage(Node start, Element first, Set<Node> inside, boolean onceAPeriod) {
    List<Node> passed = new ArrayList<>();
    double ohms = 0;
    double henries = 0;
    Node here = start;
    Element part = first;
    while (true) {
      if (!isSeriesPart(part)) {
        return Optional.empty();
      }
      ohms += seriesOhms(part);
      henries += part instanceof Inductor l ? usualHenries(l) : 0;
      Optional<Node> next = Conduction.across(part, here).findFirst();
      if (next.isEmpty()
          || inside.contains(next.get())
          || passed.contains(next.get())
          || next.get().equals(circuit.reference())) {
        return Optional.empty();
      }
      here = next.get();
      passed.add(here);
      double farads = faradsToReference(here);
      double passes = stageFactor(ohms, henries, farads, 2);
      if (onceAPeriod && henries > 0) {
        passes = Math.max(passes, stageFactor(ohms, henries, farads, 1));
      }
      if (farads >= HOLDING_FARADS || passes < SMOOTHING) {
        return Optional.of(new Stage(passed, here, passes));
      }
      Element onward = onward(here, part);
      if (onward == null) {
        return Optional.empty();
      }
      part = onward;
    }
  }

  /** Returns the one other part at a node that two series parts meet at; null at any other node. */
  private @Nullable Element onward(Node node, Element from) {
    List<Element> others =
        at.getOrDefault(node, List.of()).stream()
            .filter(e -> e != from && !(e instanceof Capacitor))
            .toList();
    return others.size() == 1 ? others.get(0) : null;
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
    return Double.isNaN(inductor.henries()) ? USUAL_CHOKE_HENRIES : inductor.henries();
  }

  private double faradsToReference(Node node) {
    return at.getOrDefault(node, List.of()).stream()
        .map(e -> e instanceof Capacitor c ? c : null)
        .filter(Objects::nonNull)
        .filter(c -> c.nodes().contains(circuit.reference()))
        .mapToDouble(Capacitor::farads)
        .sum();
  }

  /**
   * Returns how much of the ripple at a multiple of the line's frequency passes a stage: one over
   * the magnitude of 1 + jωRC − ω²LC, at most 1. A choke may resonate at the line's own frequency,
   * which is in the ripple of a reservoir that is charged once a period.
   */
  private double stageFactor(double ohms, double henries, double farads, int multiple) {
    double omega = multiple * 2 * Math.PI * circuit.line().hertz();
    double real = 1 - omega * omega * henries * farads;
    double imaginary = omega * ohms * farads;
    return Math.min(1, 1 / Math.hypot(real, imaginary));
  }
}
