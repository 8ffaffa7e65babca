package railwalk.app;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import railwalk.chart.SocketMatch;
import railwalk.chart.SocketSearch;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Fitting;
import railwalk.circuit.Node;
import railwalk.circuit.Socket;
import railwalk.circuit.StandIn;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;
import railwalk.render.text.TextRenderer;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SectionPoint;
import railwalk.solve.SolveOutcome;
import railwalk.units.Quantity;
import railwalk.walk.Walk;

/** Finds which types could stand in a socket whose tube is unknown, from the wires at its pins. */
public final class SocketJob {
  private static final Pattern PIN = Pattern.compile("(\\d{1,2}|cap)=(\\S+)");
  private static final int MOST = 12;
  private static final double OVER = 1.1;
  private static final double CUT_OFF_AMPS = 5e-6;

  private final Circuit circuit;
  private final Circuit without;
  private final String name;
  private final SortedMap<Integer, Node> pins;

  private SocketJob(Circuit circuit, String name, SortedMap<Integer, Node> pins) {
    this.circuit = circuit;
    this.name = name;
    this.pins = pins;
    List<Element> others = circuit.elements().stream().filter(e -> !isOfTheTube(e)).toList();
    this.without = circuit.withElements(others);
  }

  /**
   * Returns the types that go with a socket of {@code netlist} as text, best first.
   *
   * @param socket a tube that is wired by pin, whatever type was put down for it; or the wires
   *     themselves, such as 1=p1 2=g1 3=k1. A tube's socket is of the kind that its type needs
   * @param filter which types to try
   */
  public static String of(Path netlist, List<String> socket, TubeFilter filter) throws CannotDo {
    TracedAmplifier amplifier = TracedAmplifier.read(netlist).allKnown();
    if (socket.isEmpty()) {
      throw new CannotDo("--socket needs the tube (V2) or its wires (1=p1 2=g1 3=k1) after it");
    }
    Circuit circuit = amplifier.circuit();
    List<TubeType> types = filter.of(Catalogue.standard());
    if (socket.get(0).contains("=")) {
      SocketJob job = new SocketJob(circuit, "the socket", wires(circuit, socket));
      return job.text(amplifier.fileName(), types);
    }
    Bottle tube = tube(circuit, socket);
    String family = tube.type().family();
    List<TubeType> fitting = types.stream().filter(t -> t.family().equals(family)).toList();
    SocketJob job = new SocketJob(circuit, tube.name(), tube.pins());
    return job.text(amplifier.fileName(), fitting);
  }

  private static Bottle tube(Circuit circuit, List<String> socket) throws CannotDo {
    String name = socket.get(0);
    if (socket.size() > 1) {
      throw new CannotDo("--socket takes one tube at a time, or wires such as 1=p1 2=g1");
    }
    Optional<Bottle> bottle = circuit.bottle(name);
    if (bottle.isEmpty()) {
      String tubes = String.join(", ", circuit.bottles().stream().map(Bottle::name).toList());
      throw new CannotDo("no tube " + name + (tubes.isEmpty() ? "" : ": there are " + tubes));
    }
    if (bottle.get().wiring() != Bottle.Wiring.BY_PIN) {
      throw new CannotDo(
          bottle.get().name()
              + " is not wired by pin: give its wires instead, such as 1=p1 2=g1 3=k1");
    }
    return bottle.get();
  }

  private static SortedMap<Integer, Node> wires(Circuit circuit, List<String> words)
      throws CannotDo {
    SortedMap<Integer, Node> pins = new TreeMap<>();
    for (String word : words) {
      Matcher wire = PIN.matcher(word);
      if (!wire.matches()) {
        throw new CannotDo(word + ": expected a pin and its node, such as 1=p1 or cap=p1");
      }
      int pin = wire.group(1).equals("cap") ? 0 : Integer.parseInt(wire.group(1));
      Optional<Node> node = circuit.node(wire.group(2));
      if (node.isEmpty()) {
        throw new CannotDo(word + ": the netlist has no node " + wire.group(2));
      }
      if (pins.put(pin, node.get()) != null) {
        throw new CannotDo(word + ": pin " + wire.group(1) + " stands twice");
      }
    }
    return pins;
  }

  private boolean isOfTheTube(Element element) {
    String owner = element instanceof StandIn ? element.name() : element.bottle();
    return owner.equals(name);
  }

  private String text(String fileName, List<TubeType> types) throws CannotDo {
    SocketSearch search =
        new SocketSearch(SolvedColumns.solve("", without, Walk.of(without)), pins);
    List<SocketMatch> matches = search.among(types);
    List<SocketMatch> tried = new ArrayList<>();
    for (SocketMatch match : matches.subList(0, Math.min(MOST, matches.size()))) {
      tried.add(tried(match));
    }
    String title = "Types for " + name + " in " + fileName;
    return new TextRenderer().render(search.page(title, SocketSearch.sorted(tried)));
  }

  /** Returns the match with what speaks against it once it is fitted and the amplifier solved. */
  private SocketMatch tried(SocketMatch match) {
    Circuit fitted = fitted(match.type());
    SolveOutcome outcome = OperatingPointSolver.solve(fitted, Walk.of(fitted));
    if (!(outcome instanceof SolveOutcome.Solved solved)) {
      return match.doubting("the amplifier would not settle");
    }
    SocketMatch tried = match;
    List<Double> plateAmps = new ArrayList<>();
    for (AmplifierSection section : fitted.elements(AmplifierSection.class)) {
      if (!section.bottle().equals(name)) {
        continue;
      }
      SectionPoint at = solved.point().at(section);
      plateAmps.add(at.plateAmps());
      double limit = section.type().ratings().plateWattsMax();
      String which = section.section().isEmpty() ? "" : section.section() + ": ";
      if (at.plateWatts() > OVER * limit) {
        tried =
            tried.doubting(
                which
                    + "would idle at "
                    + Quantity.watts(at.plateWatts())
                    + " of "
                    + Quantity.watts(limit));
      } else if (at.plateAmps() < CUT_OFF_AMPS) {
        tried = tried.doubting(which + "would be cut off");
      }
    }
    return tried.idlingAt(plateAmps);
  }

  private Circuit fitted(TubeType type) {
    List<Node> nodes = new ArrayList<>(circuit.nodes());
    Fitting fitting = Socket.byPins(name, type, pins, inside -> made(nodes, inside));
    List<Element> elements = new ArrayList<>(without.elements());
    elements.addAll(fitting.elements());
    List<Bottle> bottles = new ArrayList<>(circuit.bottles());
    bottles.removeIf(bottle -> bottle.name().equals(name));
    bottles.add(fitting.bottle());
    return new Circuit(
        circuit.title(),
        nodes,
        circuit.reference(),
        elements,
        bottles,
        circuit.transformers(),
        circuit.line(),
        circuit.meter(),
        circuit.spread(),
        List.of(),
        circuit.words());
  }

  private static Node made(List<Node> nodes, String name) {
    Node node = new Node(nodes.size(), name);
    nodes.add(node);
    return node;
  }
}
