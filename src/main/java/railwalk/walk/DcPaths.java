package railwalk.walk;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jgrapht.Graph;
import org.jgrapht.GraphPath;
import org.jgrapht.alg.shortestpath.DijkstraShortestPath;
import org.jgrapht.graph.DefaultWeightedEdge;
import org.jgrapht.graph.DirectedWeightedMultigraph;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Electrode;

/**
 * Finds the way of the direct current: from the winding through rectifier, reservoir and droppers
 * to a point of the amplifier, and through the tube and its cathode circuit back to the winding.
 */
public final class DcPaths {
  /** Current through a screen is not the way sought while there is one through the plate. */
  private static final double SCREEN_FACTOR = 10;

  private static final double CONTACT_OHMS = 1e-3;

  private final SupplyMap map;
  private final Circuit circuit;
  private final Ladder ladder;
  private final Grounds grounds;
  private final Charge charge;
  private final Graph<Node, DefaultWeightedEdge> flow =
      new DirectedWeightedMultigraph<>(DefaultWeightedEdge.class);

  /** The same without what touches ground: no way down to a point leads through ground. */
  private final Graph<Node, DefaultWeightedEdge> aloft =
      new DirectedWeightedMultigraph<>(DefaultWeightedEdge.class);

  private final Map<DefaultWeightedEdge, DcStep> steps = new HashMap<>();

  /** Lays out the ways of {@code circuit}, whose walk found {@code map}. */
  public DcPaths(SupplyMap map, Circuit circuit) {
    this.map = map;
    this.circuit = circuit;
    List<DcBranch> branches = DcBranches.of(circuit);
    this.grounds = Grounds.of(circuit, branches, map.groups());
    this.ladder =
        Ladder.of(
            circuit, branches, map.groups(), grounds, Root.of(circuit, map.groups(), grounds));
    this.charge = new Charge(circuit, map.groups(), branches, grounds);
    circuit.nodes().forEach(flow::addVertex);
    circuit.nodes().forEach(aloft::addVertex);
    branches.stream().filter(branch -> branch.way() != DcBranch.Way.LEAK).forEach(this::addFlow);
  }

  private void addFlow(DcBranch branch) {
    addFlow(branch, branch.a(), branch.b());
    if (!branch.oneWay()) {
      addFlow(branch, branch.b(), branch.a());
    }
  }

  private void addFlow(DcBranch branch, Node from, Node to) {
    addFlow(flow, branch, from, to);
    if (!grounds.common(from) && !grounds.common(to)) {
      addFlow(aloft, branch, from, to);
    }
  }

  private void addFlow(
      Graph<Node, DefaultWeightedEdge> graph, DcBranch branch, Node from, Node to) {
    DefaultWeightedEdge edge = graph.addEdge(from, to);
    double factor = branch.way() == DcBranch.Way.SCREEN ? SCREEN_FACTOR : 1;
    graph.setEdgeWeight(edge, branch.ohms() * factor + CONTACT_OHMS);
    steps.put(edge, new DcStep(from, branch.element(), to));
  }

  /**
   * Returns the path to a node. Of a node that several electrodes share, the first plate, screen or
   * cathode in netlist order counts.
   */
  public DcPath to(Node target) {
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      for (Electrode electrode : List.of(Electrode.PLATE, Electrode.SCREEN, Electrode.CATHODE)) {
        if (target.equals(nodeOf(section, electrode)) && map.supplyNode(target).isEmpty()) {
          return toElectrode(section, electrode, target);
        }
      }
    }
    List<DcStep> there = there(target);
    boolean throughTube =
        there.stream().anyMatch(step -> step.element() instanceof AmplifierSection);
    List<DcStep> back = throughTube ? home(target, there) : List.of();
    return new DcPath(target, supplyOf(target), there, back);
  }

  /**
   * Returns the path to an electrode of a section.
   *
   * @throws IllegalArgumentException when the section has no such electrode
   */
  public DcPath to(AmplifierSection section, Electrode electrode) {
    Node target = nodeOf(section, electrode);
    if (target == null) {
      throw new IllegalArgumentException(section.name() + " has no " + electrode.word());
    }
    return toElectrode(section, electrode, target);
  }

  /** Returns the steps by which current can leave {@code node} through resistors and the like. */
  public static List<DcStep> at(Circuit circuit, Node node) {
    return DcBranches.of(circuit).stream()
        .filter(branch -> branch.way() == DcBranch.Way.CONDUCTOR)
        .filter(branch -> branch.a().equals(node) || branch.b().equals(node))
        .map(branch -> new DcStep(node, branch.element(), branch.other(node)))
        .toList();
  }

  private static @Nullable Node nodeOf(AmplifierSection section, Electrode electrode) {
    return switch (electrode) {
      case PLATE -> section.plate();
      case SCREEN -> section.screen();
      case GRID -> section.grid();
      case CATHODE -> section.cathode();
      case SUPPRESSOR -> section.suppressor();
      default -> null;
    };
  }

  private DcPath toElectrode(AmplifierSection section, Electrode electrode, Node target) {
    if (electrode == Electrode.GRID || electrode == Electrode.SUPPRESSOR) {
      return new DcPath(target, supplyOf(target), there(target), List.of());
    }
    Node cathode = section.cathode();
    List<DcStep> there = new ArrayList<>();
    List<DcStep> back = new ArrayList<>();
    if (electrode == Electrode.CATHODE) {
      there.addAll(there(section.plate()));
      there.add(new DcStep(section.plate(), section, cathode));
    } else {
      there.addAll(there(target));
      back.add(new DcStep(target, section, cathode));
    }
    if (!map.idleSections().contains(section.name())) {
      back.addAll(home(cathode, there));
    } else {
      back.clear();
    }
    Node hangsFrom = electrode == Electrode.CATHODE ? section.plate() : target;
    return new DcPath(target, supplyOf(hangsFrom), there, back);
  }

  private @Nullable Node supplyOf(Node node) {
    return map.supplyOf(node).orElse(null);
  }

  /** Returns the steps from the winding, or from the reference, to {@code node}. */
  private List<DcStep> there(Node node) {
    Optional<SupplyNode> supply = map.supplyOf(node).flatMap(map::supplyNode);
    if (supply.isEmpty()) {
      List<DcStep> inside = charge.alternatingPathTo(node);
      return inside.isEmpty() ? shortest(flow, circuit.reference(), node) : inside;
    }
    List<DcStep> there = new ArrayList<>(toSupply(supply.get().node()));
    List<DcStep> drop = down(supply.get().node(), node);
    there.addAll(drop.isEmpty() ? shortest(aloft, supply.get().node(), node) : drop);
    return there;
  }

  /** Returns the steps from the winding or fixed source to a supply node. */
  private List<DcStep> toSupply(Node supply) {
    Node root = supply;
    for (DcBranch feed = ladder.feed(root); feed != null; feed = ladder.feed(root)) {
      root = feed.other(root);
    }
    List<DcStep> steps = new ArrayList<>(charge.pathTo(root));
    steps.addAll(down(root, supply));
    return steps;
  }

  /** Returns the steps down the ladder; empty when {@code to} is not below {@code from}. */
  private List<DcStep> down(Node from, Node to) {
    List<DcStep> steps = new ArrayList<>();
    Node at = to;
    while (!at.equals(from)) {
      DcBranch feed = ladder.feed(at);
      if (feed == null) {
        return List.of();
      }
      Node above = feed.other(at);
      steps.add(new DcStep(above, feed.element(), at));
      at = above;
    }
    Collections.reverse(steps);
    return steps;
  }

  /** Returns the steps from a cathode through the reference to where {@code there} began. */
  private List<DcStep> home(Node cathode, List<DcStep> there) {
    if (there.isEmpty()) {
      return shortest(flow, cathode, circuit.reference());
    }
    Node start = there.get(0).from();
    List<DcStep> toGround = shortest(flow, cathode, circuit.reference());
    if (toGround.isEmpty() && !grounds.nodes().contains(cathode)) {
      return shortest(flow, cathode, start);
    }
    List<DcStep> home = new ArrayList<>(toGround);
    home.addAll(shortest(flow, circuit.reference(), start));
    return home;
  }

  private List<DcStep> shortest(Graph<Node, DefaultWeightedEdge> graph, Node from, Node to) {
    if (from.equals(to)) {
      return List.of();
    }
    GraphPath<Node, DefaultWeightedEdge> path = new DijkstraShortestPath<>(graph).getPath(from, to);
    if (path == null) {
      return List.of();
    }
    return path.getEdgeList().stream()
        .map(edge -> Optional.ofNullable(steps.get(edge)).orElseThrow())
        .toList();
  }
}
