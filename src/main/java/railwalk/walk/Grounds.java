package railwalk.walk;

import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.jgrapht.Graph;
import org.jgrapht.alg.connectivity.ConnectivityInspector;
import org.jgrapht.graph.DefaultEdge;
import org.jgrapht.graph.SimpleGraph;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;

/**
 * Where the supplies of a circuit return to.
 *
 * @param nodes the reference with all that plain metal joins to it, and a chassis apart from it
 * @param returns by ripple group: the ends of windings and bridges that the supply current comes
 *     back to (a centre tap, the far end of a half-wave winding) where they stand off the reference
 * @param feet the negative outputs of groups that have a positive one too: the reservoir's other
 *     end, where a resistor lifts it off the reference
 */
record Grounds(Set<Node> nodes, List<Set<Node>> returns, Set<Node> feet) {
  private static final String CHASSIS = "chassis";

  /** Returns the grounds of a circuit. */
  static Grounds of(Circuit circuit, List<DcBranch> branches, List<RippleGroup> groups) {
    Graph<Node, DefaultEdge> metal = new SimpleGraph<>(DefaultEdge.class);
    circuit.nodes().forEach(metal::addVertex);
    branches.stream()
        .filter(Grounds::plainMetal)
        .forEach(branch -> metal.addEdge(branch.a(), branch.b()));
    Set<Node> nodes =
        new HashSet<>(new ConnectivityInspector<>(metal).connectedSetOf(circuit.reference()));
    circuit.node(CHASSIS).ifPresent(nodes::add);
    List<Set<Node>> returns =
        groups.stream().map(group -> returns(group, branches, nodes)).toList();
    Set<Node> feet = new HashSet<>();
    for (RippleGroup group : groups) {
      Set<Node> low = new HashSet<>(group.outputs());
      low.removeIf(output -> !Root.negative(group, output));
      if (low.size() < group.outputs().size()) {
        feet.addAll(low);
      }
    }
    return new Grounds(nodes, returns, feet);
  }

  /** Returns whether {@code node} is a ground or the return of any group. */
  boolean common(Node node) {
    return nodes.contains(node) || returns.stream().anyMatch(set -> set.contains(node));
  }

  /** Returns whether no volts can stand across the branch: wire, closed contact, ammeter. */
  private static boolean plainMetal(DcBranch branch) {
    boolean ammeter =
        branch.element() instanceof VoltageSource source
            && source.volts() == 0
            && branch.ohms() == 0;
    return ammeter || (branch.way() == DcBranch.Way.CONDUCTOR && branch.ohms() == 0);
  }

  /**
   * Returns the nodes of a group that are neither fed by a rectifier nor alternating: what a
   * winding has joined to no rectifier, or a rectifier to no winding, the resistors and contacts
   * between them counted in.
   */
  private static Set<Node> returns(RippleGroup group, List<DcBranch> branches, Set<Node> grounds) {
    Graph<Node, DefaultEdge> leads = new SimpleGraph<>(DefaultEdge.class);
    group.nodes().forEach(leads::addVertex);
    Set<Element> inside = new HashSet<>(group.elements());
    branches.stream()
        .filter(branch -> branch.way() == DcBranch.Way.CONDUCTOR)
        .filter(branch -> inside.contains(branch.element()))
        .filter(branch -> !grounds.contains(branch.a()) && !grounds.contains(branch.b()))
        .forEach(branch -> leads.addEdge(branch.a(), branch.b()));
    ConnectivityInspector<Node, DefaultEdge> joined = new ConnectivityInspector<>(leads);
    Set<Node> winding = nodesOf(group, Winding.class);
    Set<Node> rectifier = nodesOf(group, RectifierSection.class);
    rectifier.addAll(nodesOf(group, Diode.class));
    Set<Node> returns = new HashSet<>();
    for (Set<Node> lead : joined.connectedSets()) {
      boolean touchesWinding = lead.stream().anyMatch(winding::contains);
      boolean touchesRectifier = lead.stream().anyMatch(rectifier::contains);
      boolean output = lead.stream().anyMatch(group.outputs()::contains);
      if (touchesWinding != touchesRectifier && !output) {
        lead.stream()
            .filter(node -> winding.contains(node) || rectifier.contains(node))
            .forEach(returns::add);
      }
    }
    returns.removeAll(grounds);
    return returns;
  }

  private static Set<Node> nodesOf(RippleGroup group, Class<? extends Element> kind) {
    Set<Node> nodes = new HashSet<>();
    group.elements().stream()
        .filter(kind::isInstance)
        .forEach(element -> nodes.addAll(element.nodes()));
    return nodes;
  }

  /** Returns whether the capacitor's other end, seen from {@code node}, is a ground or return. */
  boolean bypasses(Capacitor capacitor, Node node) {
    Node foot = capacitor.a().equals(node) ? capacitor.b() : capacitor.a();
    return common(foot) || feet.contains(foot);
  }
}
