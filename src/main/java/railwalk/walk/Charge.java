package railwalk.walk;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jgrapht.Graph;
import org.jgrapht.GraphPath;
import org.jgrapht.alg.shortestpath.DijkstraShortestPath;
import org.jgrapht.graph.DefaultWeightedEdge;
import org.jgrapht.graph.WeightedMultigraph;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;

/** The way by which a reservoir is charged: winding, rectifier, output. */
final class Charge {
  private final Circuit circuit;
  private final List<RippleGroup> groups;
  private final List<DcBranch> branches;
  private final Grounds grounds;

  Charge(Circuit circuit, List<RippleGroup> groups, List<DcBranch> branches, Grounds grounds) {
    this.circuit = circuit;
    this.groups = groups;
    this.branches = branches;
    this.grounds = grounds;
  }

  /**
   * Returns the steps from the return end of a winding through it and its rectifier to a node of a
   * ripple group, or through the fixed source to its hot end; empty when there are none.
   */
  List<DcStep> pathTo(Node node) {
    for (RippleGroup group : groups) {
      if (group.nodes().contains(node)) {
        return through(group, node, true);
      }
    }
    for (VoltageSource source : circuit.elements(VoltageSource.class)) {
      if (Root.begins(source, grounds) && source.nodes().contains(node)) {
        Node other = source.a().equals(node) ? source.b() : source.a();
        return List.of(new DcStep(other, source, node));
      }
    }
    return List.of();
  }

  /**
   * Returns the steps through a winding, and leads without a rectifier, to a node on the
   * alternating side of a ripple group; empty for any other node.
   */
  List<DcStep> alternatingPathTo(Node node) {
    for (RippleGroup group : groups) {
      if (group.nodes().contains(node) && !grounds.common(node)) {
        return through(group, node, false);
      }
    }
    return List.of();
  }

  /** Returns the parts between the rectifier and {@code node}, such as the choke of its input. */
  List<Element> behindRectifier(Node node) {
    List<Element> parts = new ArrayList<>();
    for (DcStep step : pathTo(node)) {
      boolean rectifier =
          step.element() instanceof RectifierSection || step.element() instanceof Diode;
      if (rectifier || step.element() instanceof Winding) {
        parts.clear();
      } else {
        parts.add(step.element());
      }
    }
    return parts;
  }

  private List<DcStep> through(RippleGroup group, Node node, boolean rectified) {
    if (grounds.common(node)) {
      return List.of();
    }
    Set<Element> inside = new HashSet<>(group.elements());
    Graph<Node, DefaultWeightedEdge> graph = new WeightedMultigraph<>(DefaultWeightedEdge.class);
    Map<DefaultWeightedEdge, DcBranch> parts = new HashMap<>();
    group.nodes().forEach(graph::addVertex);
    for (DcBranch branch : branches) {
      boolean lead =
          branch.way() == DcBranch.Way.CONDUCTOR
              || (rectified && branch.way() == DcBranch.Way.RECTIFIER)
              || (rectified && branch.way() == DcBranch.Way.DIODE);
      if (lead
          && inside.contains(branch.element())
          && !grounds.common(branch.a())
          && !grounds.common(branch.b())) {
        DefaultWeightedEdge edge = graph.addEdge(branch.a(), branch.b());
        graph.setEdgeWeight(edge, branch.ohms());
        parts.put(edge, branch);
      }
    }
    DijkstraShortestPath<Node, DefaultWeightedEdge> dijkstra = new DijkstraShortestPath<>(graph);
    List<DcStep> best = List.of();
    double bestOhms = Double.POSITIVE_INFINITY;
    for (Element element : group.elements()) {
      if (!(element instanceof Winding winding)) {
        continue;
      }
      for (Node end : winding.nodes()) {
        GraphPath<Node, DefaultWeightedEdge> path =
            grounds.common(end) ? null : dijkstra.getPath(end, node);
        if (path != null && path.getWeight() < bestOhms && rectifies(path, parts) == rectified) {
          bestOhms = path.getWeight();
          best = new ArrayList<>(turns(winding, end));
          best.addAll(steps(path, parts));
        }
      }
    }
    return best;
  }

  private static boolean rectifies(
      GraphPath<Node, DefaultWeightedEdge> path, Map<DefaultWeightedEdge, DcBranch> parts) {
    return path.getEdgeList().stream()
        .map(parts::get)
        .anyMatch(branch -> branch != null && branch.oneWay());
  }

  private static List<DcStep> steps(
      GraphPath<Node, DefaultWeightedEdge> path, Map<DefaultWeightedEdge, DcBranch> parts) {
    List<DcStep> steps = new ArrayList<>();
    Node at = path.getStartVertex();
    for (DefaultWeightedEdge edge : path.getEdgeList()) {
      DcBranch branch = parts.get(edge);
      if (branch != null) {
        steps.add(new DcStep(at, branch.element(), branch.other(at)));
        at = branch.other(at);
      }
    }
    return withoutFilaments(steps);
  }

  /** Lets a rectifier whose filament is its cathode reach straight to the filament's pin. */
  private static List<DcStep> withoutFilaments(List<DcStep> steps) {
    List<DcStep> joined = new ArrayList<>();
    for (DcStep step : steps) {
      DcStep last = joined.isEmpty() ? null : joined.get(joined.size() - 1);
      if (step.element() instanceof Filament filament
          && last != null
          && last.element() instanceof RectifierSection section
          && section.bottle().equals(filament.bottle())) {
        joined.set(joined.size() - 1, new DcStep(last.from(), section, step.to()));
      } else {
        joined.add(step);
      }
    }
    return joined;
  }

  /** Returns the steps along a winding to {@code end} from its tap on ground, or its far end. */
  private List<DcStep> turns(Winding winding, Node end) {
    List<DcStep> down = turns(winding, end, -1);
    List<DcStep> up = turns(winding, end, 1);
    boolean downHome = !down.isEmpty() && grounds.common(down.get(0).from());
    boolean upHome = !up.isEmpty() && grounds.common(up.get(0).from());
    if (downHome == upHome) {
      return downHome == (down.size() < up.size()) ? down : up;
    }
    return downHome ? down : up;
  }

  private List<DcStep> turns(Winding winding, Node end, int direction) {
    List<Node> ends = winding.nodes();
    List<DcStep> run = new ArrayList<>();
    int at = ends.indexOf(end);
    boolean home = false;
    while (!home && at + direction >= 0 && at + direction < ends.size()) {
      Node next = ends.get(at + direction);
      run.add(new DcStep(next, winding, ends.get(at)));
      at += direction;
      home = grounds.common(next);
    }
    Collections.reverse(run);
    return run;
  }
}
