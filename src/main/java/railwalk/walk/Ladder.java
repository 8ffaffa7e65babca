package railwalk.walk;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.jgrapht.Graph;
import org.jgrapht.GraphPath;
import org.jgrapht.alg.interfaces.ShortestPathAlgorithm.SingleSourcePaths;
import org.jgrapht.alg.shortestpath.DijkstraShortestPath;
import org.jgrapht.graph.DefaultWeightedEdge;
import org.jgrapht.graph.WeightedMultigraph;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.VoltageSource;

/**
 * The parts that carry supply current away from the roots, as a tree: every node is reached from
 * the nearest root by the way of least resistance, and no way leads through ground. {@link
 * SupplyTree} picks the supply nodes out of it.
 */
final class Ladder {
  /** Keeps a way through one contact shorter than a way through two. */
  private static final double CONTACT_OHMS = 1e-3;

  /** Stands before all roots; no node of a circuit has this index. */
  private static final Node SOURCE = new Node(-1, "");

  private final Map<Node, Root> roots = new LinkedHashMap<>();
  private final Map<Node, DcBranch> feeds = new HashMap<>();
  private final Map<Node, List<Node>> children = new HashMap<>();
  private final Map<Node, List<DcBranch>> conductors = new HashMap<>();

  private Ladder() {}

  /** Returns the ladder of a circuit whose ripple groups are known. */
  static Ladder of(Circuit circuit, List<RippleGroup> groups) {
    List<DcBranch> branches = DcBranches.of(circuit);
    Grounds grounds = Grounds.of(circuit, branches, groups);
    return of(circuit, branches, groups, grounds, Root.of(circuit, groups, grounds));
  }

  /** Returns the ladder of a circuit with its roots. */
  static Ladder of(
      Circuit circuit,
      List<DcBranch> branches,
      List<RippleGroup> groups,
      Grounds grounds,
      List<Root> roots) {
    Ladder ladder = new Ladder();
    roots.forEach(root -> ladder.roots.put(root.node(), root));
    Set<Element> inside = new HashSet<>();
    groups.forEach(group -> inside.addAll(group.elements()));
    branches.stream().filter(branch -> carries(branch, inside, grounds)).forEach(ladder::add);
    ladder.grow(circuit, branches, grounds);
    PassTubes passTubes = new PassTubes(circuit, branches, grounds);
    Optional<DcBranch> pass = passTubes.next(ladder);
    while (pass.isPresent()) {
      ladder.add(pass.get());
      ladder.grow(circuit, branches, grounds);
      pass = passTubes.next(ladder);
    }
    return ladder;
  }

  private void add(DcBranch branch) {
    conductors.computeIfAbsent(branch.a(), n -> new ArrayList<>()).add(branch);
    conductors.computeIfAbsent(branch.b(), n -> new ArrayList<>()).add(branch);
  }

  /** Returns whether a supply goes on through the branch. */
  private static boolean carries(DcBranch branch, Set<Element> inside, Grounds grounds) {
    return switch (branch.way()) {
      case CONDUCTOR, REGULATOR -> true;
      case DIODE, ZENER -> !inside.contains(branch.element());
      case SOURCE ->
          !(branch.element() instanceof VoltageSource source && Root.begins(source, grounds));
      case WINDING, RECTIFIER, PLATE, SCREEN, LEAK -> false;
    };
  }

  private void grow(Circuit circuit, List<DcBranch> branches, Grounds grounds) {
    feeds.clear();
    children.clear();
    Graph<Node, DefaultWeightedEdge> graph = new WeightedMultigraph<>(DefaultWeightedEdge.class);
    Map<DefaultWeightedEdge, DcBranch> carried = new HashMap<>();
    graph.addVertex(SOURCE);
    circuit.nodes().forEach(graph::addVertex);
    roots.keySet().forEach(root -> weigh(graph, graph.addEdge(SOURCE, root), 0));
    for (DcBranch branch : branches) {
      if (conductorsAt(branch.a()).contains(branch)
          && passable(branch.a(), grounds)
          && passable(branch.b(), grounds)) {
        DefaultWeightedEdge edge = graph.addEdge(branch.a(), branch.b());
        weigh(graph, edge, branch.ohms() + CONTACT_OHMS);
        carried.put(edge, branch);
      }
    }
    SingleSourcePaths<Node, DefaultWeightedEdge> paths =
        new DijkstraShortestPath<>(graph).getPaths(SOURCE);
    for (Node node : circuit.nodes()) {
      GraphPath<Node, DefaultWeightedEdge> path = paths.getPath(node);
      if (path == null || path.getLength() < 2) {
        continue;
      }
      DcBranch last = carried.get(path.getEdgeList().get(path.getLength() - 1));
      if (last != null) {
        feeds.put(node, last);
        children.computeIfAbsent(last.other(node), n -> new ArrayList<>()).add(node);
      }
    }
  }

  private boolean passable(Node node, Grounds grounds) {
    return roots.containsKey(node) || !grounds.common(node);
  }

  private static void weigh(
      Graph<Node, DefaultWeightedEdge> graph, DefaultWeightedEdge edge, double ohms) {
    graph.setEdgeWeight(edge, ohms);
  }

  /** Returns the roots, in order. */
  List<Root> roots() {
    return List.copyOf(roots.values());
  }

  /** Returns whether {@code node} is a root. */
  boolean isRoot(Node node) {
    return roots.containsKey(node);
  }

  /** Returns whether supply current comes to {@code node}. */
  boolean reaches(Node node) {
    return isRoot(node) || feeds.containsKey(node);
  }

  /** Returns the branch by which {@code node} is fed; null for a root and for what is not fed. */
  @Nullable DcBranch feed(Node node) {
    return feeds.get(node);
  }

  /** Returns the nodes fed straight from {@code node}, in netlist order. */
  List<Node> children(Node node) {
    return children.getOrDefault(node, List.of());
  }

  /** Returns all branches at {@code node} that can carry supply current, ground's among them. */
  List<DcBranch> conductorsAt(Node node) {
    return conductors.getOrDefault(node, List.of());
  }

  /**
   * Returns the branches that feed {@code node} side by side: the one of the tree, and those in
   * parallel with it unless it is plain metal, which takes all the current.
   */
  List<DcBranch> feedsSideBySide(Node node) {
    DcBranch feed = feeds.get(node);
    if (feed == null) {
      return List.of();
    }
    if (feed.ohms() == 0) {
      return List.of(feed);
    }
    Node parent = feed.other(node);
    return conductorsAt(node).stream().filter(b -> b.other(node).equals(parent)).toList();
  }
}
