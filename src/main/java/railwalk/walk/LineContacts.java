package railwalk.walk;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.jgrapht.Graph;
import org.jgrapht.GraphPath;
import org.jgrapht.alg.shortestpath.DijkstraShortestPath;
import org.jgrapht.graph.DefaultWeightedEdge;
import org.jgrapht.graph.WeightedMultigraph;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;

/**
 * Finds what of an amplifier the wall outlet reaches without isolation: through wires, contacts,
 * fuses, lamps, heaters, coils, resistors and rectifiers, but not through tubes that amplify.
 */
public final class LineContacts {
  private static final String CHASSIS = "chassis";
  private static final double CONTACT_OHMS = 1e-6;

  /** Makes a way through a diode count less than metal, more than any heater string. */
  private static final double RECTIFIER_OHMS = 1e-3;

  private final Graph<Node, DefaultWeightedEdge> graph =
      new WeightedMultigraph<>(DefaultWeightedEdge.class);
  private final Map<DefaultWeightedEdge, DcBranch> parts = new HashMap<>();

  private LineContacts(Circuit circuit, boolean switchesAsSet) {
    circuit.nodes().forEach(graph::addVertex);
    for (DcBranch branch : DcBranches.of(circuit)) {
      boolean open = branch.element() instanceof Switch && !switchesAsSet;
      double ohms = ohms(branch);
      if (!open && !Double.isNaN(ohms)) {
        DefaultWeightedEdge edge = graph.addEdge(branch.a(), branch.b());
        graph.setEdgeWeight(edge, ohms);
        parts.put(edge, branch);
      }
    }
  }

  private static double ohms(DcBranch branch) {
    return switch (branch.way()) {
      case CONDUCTOR -> branch.ohms() + CONTACT_OHMS;
      case DIODE, ZENER, RECTIFIER -> RECTIFIER_OHMS;
      case SOURCE, WINDING, PLATE, SCREEN, REGULATOR, LEAK -> Double.NaN;
    };
  }

  /**
   * Returns the shortest way to the chassis, where it has a node of its own, and to the reference;
   * none for what the line does not reach.
   */
  public static List<LineContact> of(Circuit circuit) {
    Set<Node> wires =
        circuit.elements(Winding.class).stream()
            .filter(Winding::wall)
            .flatMap(winding -> winding.nodes().stream())
            .collect(Collectors.toCollection(LinkedHashSet::new));
    if (wires.isEmpty()) {
      return List.of();
    }
    LineContacts asSet = new LineContacts(circuit, true);
    LineContacts open = new LineContacts(circuit, false);
    Set<Node> targets = new LinkedHashSet<>();
    circuit.node(CHASSIS).ifPresent(targets::add);
    targets.add(circuit.reference());
    List<LineContact> contacts = new ArrayList<>();
    for (Node target : targets) {
      asSet
          .shortest(wires, target)
          .map(steps -> asSet.contact(target, steps, open.shortest(wires, target).isPresent()))
          .ifPresent(contacts::add);
    }
    return contacts;
  }

  private LineContact contact(Node target, List<DcStep> steps, boolean switchedOff) {
    double ohms =
        steps.stream()
            .filter(step -> step.element() instanceof Resistor)
            .mapToDouble(step -> ((Resistor) step.element()).ohms())
            .sum();
    return new LineContact(target, steps, ohms, switchedOff);
  }

  private Optional<List<DcStep>> shortest(Set<Node> wires, Node target) {
    DijkstraShortestPath<Node, DefaultWeightedEdge> dijkstra = new DijkstraShortestPath<>(graph);
    double bestOhms = Double.POSITIVE_INFINITY;
    List<DcStep> best = null;
    for (Node wire : wires) {
      GraphPath<Node, DefaultWeightedEdge> path = dijkstra.getPath(wire, target);
      if (path != null && path.getWeight() < bestOhms) {
        bestOhms = path.getWeight();
        best = steps(path);
      }
    }
    return Optional.ofNullable(best);
  }

  private List<DcStep> steps(GraphPath<Node, DefaultWeightedEdge> path) {
    List<DcStep> steps = new ArrayList<>();
    Node at = path.getStartVertex();
    for (DefaultWeightedEdge edge : path.getEdgeList()) {
      DcBranch branch = Optional.ofNullable(parts.get(edge)).orElseThrow();
      steps.add(new DcStep(at, branch.element(), branch.other(at)));
      at = branch.other(at);
    }
    return steps;
  }
}
