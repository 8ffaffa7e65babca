package railwalk.chart;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Resistor;
import railwalk.device.SectionCurrents;
import railwalk.solve.AcLoads;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;
import railwalk.solve.SupplyPoint;
import railwalk.walk.SupplyMap;

/**
 * An operating point with volts set by hand, so that a chart's cells are known beforehand. Currents
 * through resistors and windings follow from the volts, those of tubes from their laws.
 */
public record FakePoint(
    Circuit circuit, SupplyMap map, Map<String, Double> voltsByNode, double sourceOhmsEverywhere)
    implements OperatingPoint {

  @Override
  public double volts(Node node) {
    return node.equals(circuit.reference()) ? 0 : voltsByNode.getOrDefault(node.name(), Double.NaN);
  }

  @Override
  public double amps(Element element) {
    if (element instanceof Resistor r) {
      return (volts(r.a()) - volts(r.b())) / r.ohms();
    }
    if (element instanceof Inductor l && l.dcOhms() > 0) {
      return (volts(l.a()) - volts(l.b())) / l.dcOhms();
    }
    return 0.02;
  }

  @Override
  public double watts(Element element) {
    double across = volts(element.nodes().get(0)) - volts(element.nodes().get(1));
    return Math.abs(across * amps(element));
  }

  @Override
  public SectionPoint at(AmplifierSection section) {
    double cathode = volts(section.cathode());
    double plate = volts(section.plate()) - cathode;
    Node screenNode = section.screen();
    double screen = screenNode == null ? Double.NaN : volts(screenNode) - cathode;
    double grid = volts(section.grid()) - cathode;
    SectionCurrents currents = new SectionCurrents();
    section.law().evaluate(plate, Double.isNaN(screen) ? 0 : screen, grid, currents);
    return new SectionPoint(
        plate,
        screen,
        grid,
        currents.plateAmps,
        screenNode == null ? Double.NaN : currents.screenAmps,
        currents.gridAmps);
  }

  @Override
  public SectionPoint at(RectifierSection section) {
    return new SectionPoint(-40, Double.NaN, Double.NaN, 0.08, Double.NaN, Double.NaN);
  }

  @Override
  public SectionPoint at(RegulatorSection section) {
    double across = volts(section.anode()) - volts(section.cathode());
    return new SectionPoint(across, Double.NaN, Double.NaN, 0.012, Double.NaN, Double.NaN);
  }

  @Override
  public boolean lit(String elementName) {
    return true;
  }

  @Override
  public List<SupplyPoint> supplies() {
    return map.groups().stream()
        .flatMap(g -> g.outputs().stream())
        .map(n -> new SupplyPoint(n, volts(n) < 0 ? -0.001 : 0.0812, 0.31, 4.7))
        .toList();
  }

  @Override
  public Optional<Double> rippleVoltsRms(Node node) {
    return map.groups().stream().anyMatch(g -> g.outputs().contains(node))
        ? Optional.of(4.7)
        : Optional.empty();
  }

  @Override
  public AcLoads acLoads() {
    return AcLoads.NONE;
  }

  @Override
  public AcLoads.Range range(Node node) {
    return new AcLoads.Range(volts(node), volts(node));
  }

  @Override
  public double sourceOhms(Node a, Node b) {
    return Math.abs(sourceOhms(a) - sourceOhms(b));
  }

  @Override
  public double sourceOhms(Node node) {
    return sourceOhmsEverywhere;
  }

  @Override
  public double meterVolts(Node node, double meterOhms) {
    return volts(node) * meterOhms / (meterOhms + sourceOhmsEverywhere);
  }

  @Override
  public List<String> trace() {
    return List.of();
  }
}
