package railwalk.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.TubeType;
import railwalk.solve.OperatingPoint;
import railwalk.walk.SupplyNode;

/** Finds the types whose pins agree with what a socket is wired to. */
public final class SocketSearch {
  private static final double RULED_OUT = 2.5;
  private static final int LEAST_AGREEING = 2;

  private static final List<Table.Column> PIN_COLUMNS =
      List.of(
          new Table.Column("Pin", Table.Use.FIGURES),
          new Table.Column("Node", Table.Use.WORDS),
          new Table.Column("Its wires", Table.Use.WORDS));
  private static final List<Table.Column> TYPE_COLUMNS =
      List.of(
          new Table.Column("Type", Table.Use.WORDS),
          new Table.Column("What it is", Table.Use.WORDS),
          new Table.Column("Signs", Table.Use.FIGURES),
          new Table.Column("Would idle at", Table.Use.WORDS),
          new Table.Column("Against it", Table.Use.WORDS));

  private final SocketWiring wiring;

  /**
   * @param solved the amplifier without the tube
   * @param pins the node at each wired pin, 0 for a top cap
   */
  public SocketSearch(OperatingPoint solved, SortedMap<Integer, Node> pins) {
    this(
        solved.circuit(),
        pins,
        solved.map().supplyNodes().stream().map(SupplyNode::node).toList(),
        Set.copyOf(
            solved.map().supplyNodes().stream()
                .map(SupplyNode::node)
                .filter(node -> solved.volts(node) < 0)
                .toList()));
  }

  private SocketSearch(
      Circuit circuit, SortedMap<Integer, Node> pins, List<Node> supplies, Set<Node> negative) {
    this.wiring = new SocketWiring(circuit, pins, supplies, negative);
  }

  /** Returns the types that nothing rules out, best first. */
  public List<SocketMatch> among(List<TubeType> types) {
    List<SocketMatch> found = new ArrayList<>();
    for (TubeType type : types) {
      if (!type.pins().isEmpty()) {
        SocketMatch match = SocketMatch.of(type, wiring);
        if (match.against() < RULED_OUT && match.agreeing() >= LEAST_AGREEING) {
          found.add(match);
        }
      }
    }
    return sorted(found);
  }

  /** Returns {@code matches}, best first. */
  public static List<SocketMatch> sorted(List<SocketMatch> matches) {
    return matches.stream()
        .sorted(
            Comparator.comparingDouble(SocketMatch::against)
                .thenComparing(Comparator.comparingInt(SocketMatch::agreeing).reversed())
                .thenComparing(match -> match.type().name(), NaturalOrder.INSTANCE))
        .toList();
  }

  /** Returns the page that says what the wires tell and which types go with them. */
  public Page page(String title, List<SocketMatch> matches) {
    List<Table.Row> pins =
        wiring.pins().entrySet().stream()
            .map(
                pin ->
                    new Table.Row(
                        pin.getKey() == 0 ? "cap" : Integer.toString(pin.getKey()),
                        pin.getValue().name(),
                        wiring.look(pin.getKey()).words()))
            .toList();
    List<Block> blocks = new ArrayList<>();
    blocks.add(Table.of("What the wires tell", PIN_COLUMNS, pins));
    if (matches.isEmpty()) {
      blocks.add(new Paragraph("No type of the catalogue goes with these wires."));
    } else {
      blocks.add(Table.of("Types whose pins agree, best first", TYPE_COLUMNS, rows(matches)));
      blocks.add(
          new Paragraph(
              "The pins alone do not tell like types apart. Look for a marking on the chassis, the"
                  + " bottle or the drawing before you fit one."));
    }
    return new Page(title, blocks);
  }

  private static List<Table.Row> rows(List<SocketMatch> matches) {
    return matches.stream()
        .map(
            match ->
                new Table.Row(
                    match.type().name(),
                    match.type().summary(),
                    Integer.toString(match.agreeing()),
                    match.idle(),
                    String.join("; ", match.doubts())))
        .toList();
  }
}
