package railwalk.chart;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.chart.Table.Use;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/** The points that neither a tube's pin nor the supply table shows. */
final class OtherPoints {
  /** Below this a point counts as standing at zero. */
  private static final double ZERO_VOLTS = 1e-3;

  private final Column column;
  private final PointCells cells;

  OtherPoints(Column column, PointCells cells) {
    this.column = column;
    this.cells = cells;
  }

  List<Block> blocks() {
    List<Node> others = others();
    List<Node> live = new ArrayList<>();
    List<String> atZero = new ArrayList<>();
    List<String> undefined = new ArrayList<>();
    for (Node node : others) {
      double volts = column.point().volts(node);
      if (Double.isNaN(volts)) {
        undefined.add(node.name());
      } else if (Math.abs(volts) < ZERO_VOLTS && !cells.carriesAc(node)) {
        atZero.add(node.name());
      } else {
        live.add(node);
      }
    }
    List<Block> blocks = new ArrayList<>();
    if (!live.isEmpty()) {
      blocks.add(table(live));
    }
    if (!atZero.isEmpty()) {
      blocks.add(
          new Paragraph(
              "At 0 V against "
                  + column.circuit().reference().name()
                  + ": "
                  + String.join(", ", atZero)
                  + "."));
    }
    if (!undefined.isEmpty()) {
      blocks.add(new Paragraph("Not predictable at DC: " + String.join(", ", undefined) + "."));
    }
    return blocks;
  }

  private List<Node> others() {
    Circuit circuit = column.circuit();
    Set<Node> shown = new HashSet<>();
    shown.add(circuit.reference());
    column.map().supplyNodes().forEach(s -> shown.add(s.node()));
    Socket.in(circuit).forEach(s -> s.pins().forEach(p -> shown.add(p.node())));
    shown.addAll(InsideBottle.nodes(circuit));
    return circuit.nodes().stream().filter(node -> !shown.contains(node)).toList();
  }

  private Table table(List<Node> nodes) {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Node", Use.WORDS),
            new Table.Column("Parts there", Use.WORDS),
            new Table.Column("Expected V", Use.KEY_FIGURES),
            new Table.Column("Low–high V", Use.FIGURES),
            new Table.Column("Reading V", Use.WRITING),
            new Table.Column("From", Use.WORDS));
    Map<Node, List<Element>> parts = column.circuit().elementsByNode();
    List<Table.Row> rows =
        nodes.stream()
            .map(
                node ->
                    new Table.Row(
                        List.of(
                            node.name(),
                            parts.getOrDefault(node, List.of()).stream()
                                .map(Element::name)
                                .collect(Collectors.joining(" ")),
                            cells.volts(node),
                            cells.band(node),
                            "",
                            cells.supply(node)),
                        String.join("; ", cells.remarks(node))))
            .toList();
    return Table.of("Other points", columns, rows);
  }
}
