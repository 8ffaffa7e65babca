package railwalk.readings;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.StandIn;
import railwalk.circuit.Transformer;
import railwalk.circuit.Winding;
import railwalk.source.NearNames;

/**
 * Finds what a sheet's point names, in any case: a part before a node of the same name; the X of an
 * X line may be left away or not.
 */
final class PointFinder {
  private static final Pattern NODE =
      Pattern.compile("node\\s*:\\s*(.*)", Pattern.CASE_INSENSITIVE);
  private static final List<String> ZERO = List.of("0", "gnd");
  private static final List<String> CHASSIS = List.of("chassis", "ground", "earth");
  private static final Pattern TUBE_AND_PIN =
      Pattern.compile("(X?V\\w*)[\\s:/_-]+(?:pin\\s*)?(\\w+)", Pattern.CASE_INSENSITIVE);
  private static final Pattern OTHER_SEPARATOR = Pattern.compile("[,;\\t]");

  private final Circuit circuit;
  private final TubePoints tubes;

  PointFinder(Circuit circuit) {
    this.circuit = circuit;
    this.tubes = new TubePoints(circuit);
  }

  /** Returns {@code name} and, where it has an X in front, the name without it. */
  static List<String> spellings(String name) {
    return name.toUpperCase(Locale.ROOT).startsWith("X")
        ? List.of(name, name.substring(1))
        : List.of(name);
  }

  /** Returns the part called {@code name}, in any case, with or without the X of its line. */
  static Optional<Element> part(Circuit circuit, String name) {
    for (String spelling : spellings(name)) {
      Optional<Element> part = circuit.element(spelling);
      if (part.isPresent()) {
        return part;
      }
    }
    return Optional.empty();
  }

  /** Returns whether {@code element} is a section of a tube. */
  static boolean isTubeSection(Element element) {
    return element instanceof AmplifierSection
        || element instanceof RectifierSection
        || element instanceof RegulatorSection;
  }

  /** Returns what the text of {@code cell} names. */
  Point find(Cell cell) throws RowRefused {
    String name = cell.text();
    Matcher node = NODE.matcher(name);
    if (node.matches()) {
      return new Point.OfNode(node(node.group(1), cell));
    }
    Optional<Element> part = part(circuit, name);
    Optional<Bottle> bottle = bottle(name, part);
    if (bottle.isPresent()) {
      String example = tubes.example(bottle.get());
      boolean isNode = circuit.node(name).isPresent();
      throw new RowRefused(
          SheetProblem.TUBE_ALONE,
          cell.span(),
          name,
          isNode ? example + "; node:" + name + " for the node of that name" : example);
    }
    if (part.isPresent() && part.get() instanceof StandIn standIn) {
      String electrode = standIn.electrodes().keySet().iterator().next().word();
      throw new RowRefused(
          SheetProblem.TUBE_ALONE, cell.span(), name, standIn.name() + "." + electrode);
    }
    if (part.isPresent()) {
      return new Point.OfPart(part.get());
    }
    Optional<Node> plain = known(name);
    if (plain.isPresent()) {
      return new Point.OfNode(plain.get());
    }
    int period = name.lastIndexOf('.');
    if (period > 0 && period < name.length() - 1) {
      String tube = Cell.strip(name.substring(0, period));
      return tubes.find(tube, Cell.strip(name.substring(period + 1)), cell);
    }
    Optional<Transformer> transformer = circuit.transformer(name);
    if (transformer.isPresent()) {
      throw new RowRefused(
          SheetProblem.TRANSFORMER_ALONE, cell.span(), name, windings(transformer.get().name()));
    }
    throw new RowRefused(SheetProblem.POINT_UNKNOWN, cell.span(), name, hint(name));
  }

  private Optional<Bottle> bottle(String name, Optional<Element> part) {
    if (part.isPresent() && isTubeSection(part.get())) {
      return circuit.bottle(part.get().bottle());
    }
    for (String spelling : spellings(name)) {
      Optional<Bottle> bottle = circuit.bottle(spelling);
      if (bottle.isPresent()) {
        return bottle;
      }
    }
    return Optional.empty();
  }

  private Node node(String name, Cell cell) throws RowRefused {
    Optional<Node> node = known(name);
    if (node.isEmpty()) {
      List<String> names = circuit.nodes().stream().map(Node::name).toList();
      String near = NearNames.hint(name, names);
      throw new RowRefused(
          SheetProblem.NODE_UNKNOWN,
          cell.span(),
          name,
          near.isEmpty() ? "a node as the netlist names it" : near);
    }
    return node.get();
  }

  /** Returns the node called {@code name}; 0 and gnd are one, and the chassis may be it too. */
  private Optional<Node> known(String name) {
    Optional<Node> node = circuit.node(name);
    String lower = name.toLowerCase(Locale.ROOT);
    if (node.isPresent() || !(ZERO.contains(lower) || CHASSIS.contains(lower))) {
      return node;
    }
    Optional<Node> zero = circuit.node(ZERO.get(0)).or(() -> circuit.node(ZERO.get(1)));
    if (ZERO.contains(lower)) {
      return zero;
    }
    Optional<Node> chassis = circuit.node(CHASSIS.get(0));
    return chassis.isPresent() ? chassis : zero;
  }

  private String windings(String transformer) {
    List<String> names =
        circuit.elements(Winding.class).stream()
            .filter(winding -> winding.transformer().equalsIgnoreCase(transformer))
            .map(Winding::name)
            .toList();
    return names.isEmpty() ? "" : "one of " + String.join(", ", names);
  }

  private String hint(String name) {
    Matcher tube = TUBE_AND_PIN.matcher(name);
    if (tube.matches()) {
      return "a period stands between tube and pin: " + tube.group(1) + "." + tube.group(2);
    }
    if (OTHER_SEPARATOR.matcher(name).find()) {
      return "the cells of this row are parted by another sign than those of the sheet";
    }
    List<String> names = new ArrayList<>();
    circuit.elements().forEach(element -> names.add(element.name()));
    circuit.bottles().forEach(bottle -> names.add(bottle.name()));
    circuit.nodes().forEach(node -> names.add(node.name()));
    String near = NearNames.hint(name, names);
    return near.isEmpty()
        ? "a pin (V1.6), an electrode (V1A.plate), a part (R5) or a node of the netlist"
        : near;
  }
}
