package railwalk.walk;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Predicate;
import java.util.stream.Collectors;
import org.jgrapht.Graph;
import org.jgrapht.alg.connectivity.BiconnectivityInspector;
import org.jgrapht.alg.connectivity.ConnectivityInspector;
import org.jgrapht.graph.DefaultDirectedGraph;
import org.jgrapht.graph.DefaultEdge;
import org.jgrapht.graph.Multigraph;
import org.jgrapht.traverse.BreadthFirstIterator;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/**
 * Which nodes direct current ties to the reference, and which amplifying sections no direct current
 * can flow through.
 *
 * <p>A way through a tube is dead when the current out of the cathode has no way on to the
 * reference, or when it is the only link between two parts of the circuit (a bridge of the graph),
 * so that nothing can circle through it: the plate or the cathode leads nowhere. A section whose
 * ways are all dead is idle. A vacuum rectifier that is a bridge ties nothing down either, since
 * without current it is no resistance at all. Whatever has no way to the reference but through
 * these is undefined.
 *
 * <p>The parts of a ripple group join all their nodes, capacitors included: over a line period the
 * charge on the reservoir settles their means.
 *
 * @param undefined nodes with no DC path to the reference
 * @param idleSections names of sections without current
 */
record DcReach(Set<Node> undefined, Set<String> idleSections) {

  /** Returns the reach of {@code branches}, the DC branches of {@code circuit}. */
  static DcReach of(Circuit circuit, List<DcBranch> branches, List<RippleGroup> groups) {
    List<Joint> joints = new ArrayList<>();
    branches.forEach(branch -> joints.add(new Joint(branch, branch.a(), branch.b())));
    groups.forEach(group -> group.elements().forEach(element -> join(element, joints)));

    List<Joint> drained = keep(joints, new Drain(circuit, joints)::takes);
    Set<Joint> bridges = new BiconnectivityInspector<>(graph(circuit, drained)).getBridges();
    List<Joint> alive = keep(drained, joint -> !(bridges.contains(joint) && joint.needsCircle()));

    Set<Node> undefined = new HashSet<>(circuit.nodes());
    undefined.removeAll(
        new ConnectivityInspector<>(graph(circuit, alive)).connectedSetOf(circuit.reference()));
    Set<String> idle = throughTubes(joints);
    idle.removeAll(throughTubes(alive));
    return new DcReach(undefined, idle);
  }

  /** Joins all nodes of a group's part, the capacitors' too. */
  private static void join(Element element, List<Joint> joints) {
    List<Node> nodes = element.nodes().stream().distinct().toList();
    for (int i = 1; i < nodes.size(); i++) {
      joints.add(new Joint(null, nodes.get(i - 1), nodes.get(i)));
    }
  }

  private static List<Joint> keep(List<Joint> joints, Predicate<Joint> wanted) {
    return joints.stream().filter(wanted).toList();
  }

  private static Set<String> throughTubes(List<Joint> joints) {
    return joints.stream()
        .map(Joint::branch)
        .filter(branch -> branch != null && branch.throughTube())
        .map(branch -> branch.element().name())
        .collect(Collectors.toCollection(TreeSet::new));
  }

  private static Graph<Node, Joint> graph(Circuit circuit, List<Joint> joints) {
    Graph<Node, Joint> graph = new Multigraph<>(Joint.class);
    circuit.nodes().forEach(graph::addVertex);
    joints.forEach(joint -> graph.addEdge(joint.a, joint.b, joint));
    return graph;
  }

  /** Two nodes that a DC branch, or a part of a ripple group, ties together; one object each. */
  private static final class Joint {
    final @Nullable DcBranch branch;
    final Node a;
    final Node b;

    Joint(@Nullable DcBranch branch, Node a, Node b) {
      this.branch = branch;
      this.a = a;
      this.b = b;
    }

    @Nullable DcBranch branch() {
      return branch;
    }

    boolean oneWay() {
      return branch != null && branch.oneWay();
    }

    boolean needsCircle() {
      return branch != null && (branch.throughTube() || branch.way() == DcBranch.Way.RECTIFIER);
    }
  }

  /** The nodes from which current can flow on to the reference. */
  private static final class Drain {
    private final Set<Node> nodes = new HashSet<>();

    Drain(Circuit circuit, List<Joint> joints) {
      // edges run against the current, so that the search can start from the reference
      Graph<Node, DefaultEdge> upstream = new DefaultDirectedGraph<>(DefaultEdge.class);
      circuit.nodes().forEach(upstream::addVertex);
      for (Joint joint : joints) {
        upstream.addEdge(joint.b, joint.a);
        if (!joint.oneWay()) {
          upstream.addEdge(joint.a, joint.b);
        }
      }
      new BreadthFirstIterator<>(upstream, circuit.reference()).forEachRemaining(nodes::add);
    }

    /** Returns whether current can flow through {@code joint}: no cathode that leads nowhere. */
    boolean takes(Joint joint) {
      DcBranch branch = joint.branch;
      return branch == null || !branch.throughTube() || nodes.contains(branch.b());
    }
  }
}
