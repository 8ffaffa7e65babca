package railwalk.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import railwalk.circuit.Node;
import railwalk.circuit.VoltageSource;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/** Lays the supply trees out as a {@link Ladder}. */
final class LadderBuilder {
  /** Below this a node is but a place where the rail passes through. */
  private static final double NOTABLE_AMPS = 1e-6;

  private final Column column;
  private final PointCells cells;
  private final SupplyFlow flow;

  LadderBuilder(Column column, PointCells cells) {
    this.column = column;
    this.cells = cells;
    this.flow = new SupplyFlow(column);
  }

  Ladder ladder() {
    return new Ladder(
        column.map().supplyNodes().stream()
            .filter(s -> s.parent() == null)
            .map(this::feed)
            .toList());
  }

  private Ladder.Feed feed(SupplyNode first) {
    Ladder.Span rail = span(first);
    boolean negative = column.point().volts(first.node()) < 0;
    if (first.group() < 0) {
      List<VoltageSource> sources =
          column.circuit().elements(VoltageSource.class).stream()
              .filter(v -> v.nodes().contains(first.node()))
              .toList();
      String name = sources.stream().map(VoltageSource::name).collect(Collectors.joining(" "));
      return new Ladder.Feed(
          Ladder.Source.FIXED_SOURCE, negative, name.isEmpty() ? "source" : name, List.of(), rail);
    }
    RectifierFeed rectifier =
        RectifierFeed.of(column.circuit(), column.map().groups().get(first.group()), first.node());
    List<String> lines = new ArrayList<>();
    if (!rectifier.types().isEmpty()) {
      lines.add(rectifier.types());
    }
    lines.addAll(rectifier.windingVolts());
    lines.add(rectifier.arrangement());
    return new Ladder.Feed(
        rectifier.tubes().isEmpty() ? Ladder.Source.DIODE_RECTIFIER : Ladder.Source.TUBE_RECTIFIER,
        negative,
        rectifier.names(),
        lines,
        rail);
  }

  private Ladder.Span span(SupplyNode supply) {
    List<Ladder.Part> parts =
        Rung.to(supply).stream()
            .map(
                rung ->
                    new Ladder.Part(
                        rung.symbol(), rung.names(), rung.values(), rung.load(column.point())))
            .toList();
    return new Ladder.Span(parts, stop(supply));
  }

  private Ladder.Stop stop(SupplyNode supply) {
    Node node = supply.node();
    List<Ladder.Span> spans =
        column.map().supplyNodes().stream()
            .filter(child -> Objects.equals(child.parent(), node))
            .map(this::span)
            .sorted(Comparator.comparingInt(span -> -span.to().depth()))
            .toList();
    List<String> lines =
        Stream.of(
                cells.band(node).isEmpty() ? "" : cells.band(node).replace("\u200B", "") + " V",
                flow.usedHere(supply)
                    .filter(amps -> Math.abs(amps) > NOTABLE_AMPS)
                    .map(amps -> Quantity.amps(amps) + " used here")
                    .orElse(""),
                cells.ripple(node).isEmpty() ? "" : "ripple " + cells.ripple(node) + " rms")
            .filter(line -> !line.isEmpty())
            .toList();
    return new Ladder.Stop(node.name(), Quantity.volts(column.point().volts(node)), lines, spans);
  }
}
