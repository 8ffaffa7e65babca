package railwalk.walk;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Winding;
import railwalk.device.Electrode;

/**
 * The supply nodes of a circuit in feeding order, picked out of the {@link Ladder}.
 *
 * <p>A node of the ladder is a supply node when
 *
 * <ul>
 *   <li>it is a root that something hangs on, or a rectifier's output;
 *   <li>a filter holds it steady (see {@link Filters}) and it feeds something, or nothing leads
 *       from it to ground;
 *   <li>it has no filter but feeds several tubes or further supply nodes, or it is the wiper of a
 *       control that sets a bias.
 * </ul>
 *
 * A plate, grid or cathode is one only if plates or screens of other tubes are fed from it. A
 * screen with its own resistor and bypass capacitor, which feeds that screen and nothing else, is
 * none: it is charted with its tube. Nor is a tap of an output transformer, known by the winding
 * that feeds it and by feeding no more than plates through windings or stoppers, and screens.
 */
final class SupplyTree {
  /** Below this a resistor beyond an output transformer is a stopper, not a load. */
  private static final double STOPPER_OHMS = 1000;

  private final Ladder ladder;
  private final Electrodes electrodes;
  private final Filters filters;
  private final Grounds grounds;
  private final Charge charge;
  private final Map<Node, List<Element>> elementsByNode;
  private final Set<Element> grouped = new HashSet<>();
  private final Set<Node> feedsTubes = new HashSet<>();
  private final Map<Node, Set<Object>> consumers = new HashMap<>();
  private final Set<Node> supplies = new HashSet<>();

  private SupplyTree(
      Circuit circuit,
      Ladder ladder,
      Electrodes electrodes,
      Filters filters,
      Grounds grounds,
      List<RippleGroup> groups,
      Charge charge) {
    this.ladder = ladder;
    this.electrodes = electrodes;
    this.filters = filters;
    this.grounds = grounds;
    this.charge = charge;
    this.elementsByNode = circuit.elementsByNode();
    groups.forEach(group -> grouped.addAll(group.elements()));
  }

  /** Returns the supply nodes: each tree's main chain first, then its side branches. */
  static List<SupplyNode> of(
      Circuit circuit,
      Ladder ladder,
      Electrodes electrodes,
      Filters filters,
      Grounds grounds,
      List<RippleGroup> groups,
      Charge charge) {
    SupplyTree tree = new SupplyTree(circuit, ladder, electrodes, filters, grounds, groups, charge);
    ladder.roots().forEach(root -> tree.markFeeding(root.node()));
    ladder.roots().forEach(root -> tree.judge(root.node()));
    List<SupplyNode> ordered = new ArrayList<>();
    for (Root root : ladder.roots()) {
      if (tree.supplies.contains(root.node())) {
        tree.emit(root.node(), null, root, 0, ordered);
      }
    }
    return ordered;
  }

  /** Marks the nodes below which a plate or screen is fed; returns whether one is at or below. */
  private boolean markFeeding(Node node) {
    boolean below = false;
    for (Node child : ladder.children(node)) {
      below |= markFeeding(child);
    }
    if (below) {
      feedsTubes.add(node);
    }
    return below || electrodes.fedAt(node);
  }

  /** Returns the nodes fed from {@code node} on, none beyond a tube's signal. */
  private List<Node> below(Node node) {
    boolean ends = electrodes.signalAt(node) && !feedsTubes.contains(node) && !ladder.isRoot(node);
    return ends ? List.of() : ladder.children(node);
  }

  /** Judges what is below {@code node}, then the node; fills its consumers. */
  private void judge(Node node) {
    Set<Object> fed = new LinkedHashSet<>(electrodes.at(node));
    for (Node child : below(node)) {
      judge(child);
      if (supplies.contains(child)) {
        fed.add(child);
      } else {
        fed.addAll(consumers.getOrDefault(child, Set.of()));
      }
    }
    elementsByNode.getOrDefault(node, List.of()).stream()
        .filter(element -> element instanceof Winding && !grouped.contains(element))
        .forEach(fed::add);
    consumers.put(node, fed);
    Root root = ladder.roots().stream().filter(r -> r.node().equals(node)).findFirst().orElse(null);
    if (root == null ? isSupply(node, fed) : root.always() || !fed.isEmpty()) {
      supplies.add(node);
    }
  }

  private boolean isSupply(Node node, Set<Object> fed) {
    if (electrodes.signalAt(node) && !feedsTubes.contains(node)) {
      return false;
    }
    if (filters.at(node)) {
      return electrodes.fedAt(node) ? fed.size() > 1 : !fed.isEmpty() || spare(node);
    }
    if (isBiasWiper(node)) {
      return !fed.isEmpty();
    }
    return fed.size() > 1 && !isTap(node);
  }

  /**
   * Returns whether a filter that feeds nothing is a rail all the same, its tubes pulled or its
   * line ended: no part leads from it to ground, as from the middle of two capacitors in series.
   */
  private boolean spare(Node node) {
    return ladder.conductorsAt(node).stream()
        .noneMatch(branch -> grounds.common(branch.other(node)));
  }

  private boolean isBiasWiper(Node node) {
    return elementsByNode.getOrDefault(node, List.of()).stream()
            .anyMatch(e -> e instanceof Potentiometer pot && pot.wiper().equals(node))
        && ladder.children(node).stream().noneMatch(electrodes::fedAt);
  }

  /** Returns whether {@code node} is a tap or an end of an output transformer. */
  private boolean isTap(Node node) {
    if (!behindWinding(node)) {
      return false;
    }
    int plateWindings = 0;
    for (Node child : ladder.children(node)) {
      DcBranch branch = ladder.feed(child);
      boolean winding = branch != null && branch.element() instanceof Inductor;
      boolean load = branch != null && !winding && branch.ohms() >= STOPPER_OHMS;
      if (supplies.contains(child) || (load && plateAtOrBelow(child))) {
        return false;
      }
      if (winding) {
        plateWindings++;
      }
    }
    return plateWindings < 2;
  }

  private boolean behindWinding(Node node) {
    Node at = node;
    DcBranch feed = ladder.feed(at);
    while (feed != null && !filters.at(at)) {
      if (feed.element() instanceof Inductor) {
        return true;
      }
      at = feed.other(at);
      feed = ladder.feed(at);
    }
    return false;
  }

  private boolean plateAtOrBelow(Node node) {
    return electrodes.at(node).stream().anyMatch(tap -> tap.electrode() == Electrode.PLATE)
        || ladder.children(node).stream().anyMatch(this::plateAtOrBelow);
  }

  private void emit(
      Node node, @Nullable Node parent, Root root, int depth, List<SupplyNode> ordered) {
    List<Node> chain = new ArrayList<>();
    List<List<Node>> sides = new ArrayList<>();
    Node at = node;
    Node above = parent;
    while (true) {
      chain.add(at);
      List<Element> droppers = above == null ? firstDroppers(root) : droppers(above, at);
      ordered.add(new SupplyNode(at, above, droppers, root.group(), depth + chain.size() - 1));
      List<Node> next = new ArrayList<>(suppliesBelow(at));
      next.sort(Comparator.comparingInt(this::height).reversed());
      if (next.isEmpty()) {
        break;
      }
      sides.add(next.subList(1, next.size()));
      above = at;
      at = next.get(0);
    }
    for (int k = 0; k < sides.size(); k++) {
      for (Node side : sides.get(k)) {
        emit(side, chain.get(k), root, depth + k + 1, ordered);
      }
    }
  }

  private List<Element> firstDroppers(Root root) {
    return root.group() < 0 ? List.of() : charge.behindRectifier(root.node());
  }

  /** Returns the nearest supply nodes below {@code node}. */
  private List<Node> suppliesBelow(Node node) {
    List<Node> found = new ArrayList<>();
    for (Node child : below(node)) {
      if (supplies.contains(child)) {
        found.add(child);
      } else {
        found.addAll(suppliesBelow(child));
      }
    }
    return found;
  }

  /** Returns how many supply nodes hang below {@code node} in a row. */
  private int height(Node node) {
    return suppliesBelow(node).stream().mapToInt(n -> 1 + height(n)).max().orElse(0);
  }

  /** Returns the parts between {@code parent} and {@code node}, those side by side together. */
  private List<Element> droppers(Node parent, Node node) {
    List<List<Element>> rungs = new ArrayList<>();
    Node at = node;
    while (!at.equals(parent)) {
      List<DcBranch> side = ladder.feedsSideBySide(at);
      rungs.add(side.stream().map(DcBranch::element).toList());
      at = side.get(0).other(at);
    }
    Collections.reverse(rungs);
    return rungs.stream().flatMap(List::stream).distinct().toList();
  }
}
