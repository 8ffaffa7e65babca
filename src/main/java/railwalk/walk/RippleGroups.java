package railwalk.walk;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.Deque;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Coupling;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
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
 * it, one by one, until what is left of the ripple can do no harm by an estimate; once the ripple
 * is known, {@link #grown} takes in what the estimate missed.
 */
public final class RippleGroups {
  /**
   * Ripple of a reservoir (rms over mean volts) that groups are first laid out for; more is rare.
   */
  private static final double USUAL_RIPPLE = 0.15;

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
      if (StageSearch.isHolding(capacitor)) {
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

  /**
   * Returns {@code groups} with what must be inside by the ripple that was found at their ports:
   * behind each that ripples more than {@link StageSearch#RIPPLE_LIMIT}, the next filter stages and
   * the coils of known inductance; empty when there is nothing to take in.
   *
   * @param ripples by port: rms over mean volts
   */
  public static Optional<List<RippleGroup>> grown(
      Circuit circuit, List<RippleGroup> groups, Map<Node, Double> ripples) {
    return new RippleGroups(circuit).grow(groups, ripples);
  }

  private Optional<List<RippleGroup>> grow(List<RippleGroup> groups, Map<Node, Double> ripples) {
    List<RippleGroup> result = new ArrayList<>(groups);
    boolean anyGrown = false;
    for (int g = 0; g < result.size(); g++) {
      RippleGroup group = result.get(g);
      Set<Node> inside = new LinkedHashSet<>(group.nodes());
      inside.remove(circuit.reference());
      Set<Node> elsewhere = new HashSet<>();
      for (int other = 0; other < result.size(); other++) {
        if (other != g) {
          elsewhere.addAll(result.get(other).nodes());
        }
      }
      boolean onceAPeriod = group.arrangements().stream().anyMatch(Arrangement::chargesOnce);
      StageSearch search =
          new StageSearch(circuit, at, amplifying, inside, elsewhere, onceAPeriod, true);
      int before = inside.size();
      for (Node port : group.ports()) {
        double ripple = ripples.getOrDefault(port, 0.0);
        if (ripple > StageSearch.RIPPLE_LIMIT) {
          search.takeInBehind(port, ripple);
        }
      }
      if (inside.size() > before) {
        result.set(g, group(inside, group.arrangements(), group.outputs(), group.feeders()));
        anyGrown = true;
      }
    }
    return anyGrown ? Optional.of(result) : Optional.empty();
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
    List<RippleGroup> groups = new ArrayList<>();
    for (Cut cut : mergedCuts(floods)) {
      List<Element> feeders = cut.alternating.stream().filter(e -> feeds(e, cut.outputs)).toList();
      groups.add(group(cut.inside, cut.arrangements, cut.outputs, feeders));
    }
    groups.sort(Comparator.comparingInt(g -> circuit.elements().indexOf(g.elements().get(0))));
    return groups;
  }

  /** A flood and the nodes that it has grown to. */
  private record Cut(
      Set<Node> flood,
      Set<Node> inside,
      List<Element> alternating,
      List<Node> outputs,
      List<String> arrangements) {}

  /** Returns what the floods grow to; those that grow into each other become one. */
  private List<Cut> mergedCuts(List<Set<Node>> floods) {
    List<Cut> cuts = new ArrayList<>();
    for (Set<Node> flood : floods) {
      Cut cut = cut(flood);
      int i = cuts.size() - 1;
      while (i >= 0) {
        if (meet(cuts.get(i).inside, cut.inside)) {
          Set<Node> both = new LinkedHashSet<>(cuts.remove(i).flood);
          both.addAll(cut.flood);
          cut = cut(both);
          i = cuts.size();
        }
        i--;
      }
      cuts.add(cut);
    }
    return cuts;
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
        || StageSearch.isHolding(element);
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

  private Cut cut(Set<Node> flood) {
    Set<Node> inside = new LinkedHashSet<>(flood);
    List<Element> alternating = elementsWithin(inside);
    List<Node> outputs = outputs(flood, alternating);
    List<String> arrangements = Arrangement.of(circuit, alternating, outputs);
    for (Node node : flood) {
      if (held.contains(node)) {
        int output = outputs.indexOf(node);
        boolean onceAPeriod = output >= 0 && Arrangement.chargesOnce(arrangements.get(output));
        new StageSearch(circuit, at, amplifying, inside, Set.of(), onceAPeriod, false)
            .takeInBehind(node, USUAL_RIPPLE);
      }
    }
    return new Cut(flood, inside, alternating, outputs, arrangements);
  }

  private RippleGroup group(
      Set<Node> inside, List<String> arrangements, List<Node> outputs, List<Element> feeders) {
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
}
