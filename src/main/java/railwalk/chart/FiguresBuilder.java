package railwalk.chart;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Meter;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.StandIn;
import railwalk.circuit.Winding;
import railwalk.device.Electrode;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.solve.AcLoads;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;
import railwalk.spread.Band;
import railwalk.walk.SupplyNode;

/** Gathers the {@link Figures} of one column. */
final class FiguresBuilder {
  private final Column column;
  private final Circuit circuit;
  private final OperatingPoint point;
  private final Circuit whole;

  /**
   * @param whole the amplifier with all its tubes in
   */
  FiguresBuilder(Column column, Circuit whole) {
    this.column = column;
    this.circuit = column.circuit();
    this.point = column.point();
    this.whole = whole;
  }

  /** Returns the figures, with {@code findings} of the file called {@code fileName}. */
  Figures build(List<Diagnostic> findings, String fileName) {
    return new Figures(
        new Figures.Conditions(
            circuit.line().volts(),
            circuit.line().hertz(),
            spec(circuit.meter()),
            column.state(),
            circuit.reference().name()),
        points(),
        alternating(),
        tubes(),
        point.supplies().stream()
            .map(
                s ->
                    new Figures.Supply(
                        s.node().name(), s.dcAmps(), s.peakAmps(), s.rippleVoltsRms()))
            .toList(),
        findings.stream().map(d -> finding(d, fileName)).toList());
  }

  private List<Figures.Point> points() {
    Set<Node> unreachable = InsideBottle.nodes(circuit);
    Map<Node, List<String>> pinsByNode = new HashMap<>();
    for (Socket socket : Socket.in(circuit, whole)) {
      for (Socket.Pin pin : socket.pins()) {
        pinsByNode.computeIfAbsent(pin.node(), n -> new ArrayList<>()).add(socket.nameOf(pin));
      }
    }
    return circuit.nodes().stream()
        .filter(node -> !node.equals(circuit.reference()))
        .filter(node -> !unreachable.contains(node))
        .map(node -> figures(node, pinsByNode.getOrDefault(node, List.of())))
        .toList();
  }

  private Figures.Point figures(Node node, List<String> pins) {
    double volts = point.volts(node);
    Band band = column.bands().byNode().get(node);
    return new Figures.Point(
        node.name(),
        volts,
        band == null ? Double.NaN : band.lowVolts(),
        band == null ? Double.NaN : band.highVolts(),
        Double.isNaN(volts) ? Double.NaN : point.meterVolts(node, circuit.meter().inputOhms(volts)),
        pins);
  }

  private List<Figures.Alternating> alternating() {
    List<Figures.Alternating> found = new ArrayList<>();
    AcLoads loads = point.acLoads();
    for (Winding winding : circuit.elements(Winding.class)) {
      found.add(new Figures.Alternating(winding.name(), "ac", loads.rmsVolts(winding)));
    }
    for (SupplyNode supply : column.map().supplyNodes()) {
      double rms = point.rippleVoltsRms(supply.node()).orElse(Double.NaN);
      found.add(new Figures.Alternating(supply.node().name(), "ripple", rms));
    }
    return found;
  }

  private List<Figures.Tube> tubes() {
    return circuit.elements().stream()
        .flatMap(this::tube)
        .sorted(
            Comparator.comparing(Figures.Tube::tube, NaturalOrder.INSTANCE)
                .thenComparing(Figures.Tube::section))
        .toList();
  }

  private Stream<Figures.Tube> tube(Element element) {
    if (element instanceof AmplifierSection tube) {
      return Stream.of(row(tube.bottle(), tube.section(), tube.type(), point.at(tube)));
    }
    if (element instanceof RectifierSection tube) {
      return Stream.of(row(tube.bottle(), tube.section(), tube.type(), point.at(tube)));
    }
    if (element instanceof RegulatorSection tube) {
      return Stream.of(row(tube.bottle(), tube.section(), tube.type(), point.at(tube)));
    }
    return element instanceof StandIn standIn ? Stream.of(row(standIn)) : Stream.empty();
  }

  /**
   * Returns one section's row. A rectifier has no watts here: its plate's heat is the mean of a
   * product over the period, which the product of two means is not.
   */
  private Figures.Tube row(String bottle, String section, SectionType type, SectionPoint at) {
    boolean rectifier = type.kind() == SectionKind.RECTIFIER;
    return new Figures.Tube(
        bottle,
        section,
        circuit.bottle(bottle).map(b -> b.type().name()).orElse(""),
        at.plateVolts(),
        at.screenVolts(),
        at.gridVolts(),
        at.plateAmps(),
        at.screenAmps(),
        at.gridAmps(),
        rectifier ? Double.NaN : at.plateWatts(),
        rectifier ? Double.NaN : at.screenWatts(),
        type.ratings().plateWattsMax());
  }

  private Figures.Tube row(StandIn standIn) {
    double plateVolts = voltsToCathode(standIn, Electrode.PLATE);
    double screenVolts = voltsToCathode(standIn, Electrode.SCREEN);
    double plateAmps = standIn.draws().getOrDefault(Electrode.PLATE, Double.NaN);
    double screenAmps = standIn.draws().getOrDefault(Electrode.SCREEN, Double.NaN);
    return new Figures.Tube(
        standIn.name(),
        "",
        "unknown",
        plateVolts,
        screenVolts,
        voltsToCathode(standIn, Electrode.GRID),
        plateAmps,
        screenAmps,
        standIn.draws().getOrDefault(Electrode.GRID, Double.NaN),
        plateVolts * plateAmps,
        screenVolts * screenAmps,
        Double.NaN);
  }

  private double voltsToCathode(StandIn standIn, Electrode electrode) {
    return volts(standIn.electrodes().get(electrode))
        - volts(standIn.electrodes().get(Electrode.CATHODE));
  }

  private double volts(@Nullable Node node) {
    return node == null ? Double.NaN : point.volts(node);
  }

  private static Figures.Finding finding(Diagnostic diagnostic, String fileName) {
    SourceSpan span = diagnostic.span();
    return new Figures.Finding(
        diagnostic.severity().word(),
        diagnostic.code(),
        diagnostic.message(),
        span == null ? fileName : span.text().fileName(),
        span == null ? 0 : span.line());
  }

  /** Returns the meter as {@code .meter} takes it. */
  private static String spec(Meter meter) {
    if (Double.isNaN(meter.ohmsPerVolt())) {
      return shortOhms(meter.ohms());
    }
    String ranges =
        meter.rangesVolts().stream().map(range -> " " + plain(range)).collect(Collectors.joining());
    return shortOhms(meter.ohmsPerVolt()) + "/V" + ranges;
  }

  private static String shortOhms(double ohms) {
    if (ohms >= 1e6) {
      return plain(ohms / 1e6) + "M";
    }
    return ohms >= 1e3 ? plain(ohms / 1e3) + "k" : plain(ohms);
  }

  private static String plain(double value) {
    return BigDecimal.valueOf(value).stripTrailingZeros().toPlainString();
  }
}
