package railwalk.circuit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import railwalk.device.SectionType;
import railwalk.device.SiliconLaw;
import railwalk.device.TubeType;
import railwalk.device.ZenerLaw;

/**
 * A circuit by hand, line by line like a netlist: nodes come into being where they are named. The
 * reference is node "0".
 */
public final class CircuitBuilder {
  private final Map<String, Node> nodes = new LinkedHashMap<>();
  private final List<Element> elements = new ArrayList<>();
  private final Map<String, Bottle> bottles = new LinkedHashMap<>();
  private final List<Transformer> transformers = new ArrayList<>();
  private Line line = Line.NOT_STATED;
  private String reference = "0";

  /** Returns the node of that name. */
  public Node node(String name) {
    return nodes.computeIfAbsent(name, key -> new Node(nodes.size(), key));
  }

  /** Adds any part. */
  public CircuitBuilder add(Element element) {
    elements.add(element);
    return this;
  }

  public CircuitBuilder r(String name, String a, String b, double ohms) {
    return r(name, a, b, ohms, Double.NaN);
  }

  public CircuitBuilder r(String name, String a, String b, double ohms, double watts) {
    return add(new Resistor(name, node(a), node(b), ohms, watts, Double.NaN));
  }

  public CircuitBuilder c(String name, String a, String b, double farads) {
    return c(name, a, b, farads, Double.NaN);
  }

  public CircuitBuilder c(String name, String a, String b, double farads, double ratedVolts) {
    return add(
        new Capacitor(name, node(a), node(b), farads, ratedVolts, Double.POSITIVE_INFINITY, false));
  }

  public CircuitBuilder l(String name, String a, String b, double henries, double dcOhms) {
    return add(new Inductor(name, node(a), node(b), henries, dcOhms));
  }

  public CircuitBuilder v(String name, String a, String b, double volts) {
    return add(new VoltageSource(name, node(a), node(b), volts, 0));
  }

  public CircuitBuilder i(String name, String a, String b, double amps) {
    return add(new CurrentSource(name, node(a), node(b), amps));
  }

  public CircuitBuilder wire(String name, String a, String b) {
    return add(new Wire(name, node(a), node(b), ""));
  }

  public CircuitBuilder diode(String name, String anode, String cathode) {
    return add(new Diode(name, node(anode), node(cathode), "silicon", SiliconLaw.generic()));
  }

  public CircuitBuilder zener(String name, String anode, String cathode, double volts) {
    return add(new Diode(name, node(anode), node(cathode), "zener", new ZenerLaw(volts, 10)));
  }

  public CircuitBuilder pot(
      String name, String a, String wiper, String b, double ohms, double share) {
    return add(new Potentiometer(name, node(a), node(wiper), node(b), ohms, share));
  }

  public CircuitBuilder contact(String name, String a, String b, boolean closed) {
    return add(new Switch(name, node(a), List.of(node(b)), closed ? 1 : 0));
  }

  public CircuitBuilder fuse(String name, String a, String b, double ratedAmps) {
    return add(new Fuse(name, node(a), node(b), ratedAmps));
  }

  /** Adds an untapped winding of {@code rms} volts. */
  public CircuitBuilder winding(String name, String a, String b, double rms, double ohms) {
    return winding(name, new double[] {rms}, ohms, a, b);
  }

  /** Adds a winding with taps; {@code sectionRms} between neighbouring ends. */
  public CircuitBuilder winding(
      String name, double[] sectionRms, double sectionOhms, String... ends) {
    List<Winding.Section> sections = new ArrayList<>();
    for (int k = 0; k < sectionRms.length; k++) {
      sections.add(
          new Winding.Section(node(ends[k]), node(ends[k + 1]), sectionRms[k], sectionOhms));
    }
    return add(new Winding(name, sections, Double.NaN, "", false));
  }

  /** Adds the wall outlet. */
  public CircuitBuilder wall(String name, String a, String b, double rms) {
    List<Winding.Section> sections = List.of(new Winding.Section(node(a), node(b), rms, 1));
    return add(new Winding(name, sections, Double.NaN, "", true));
  }

  /** Adds section {@code letter} of the twin triode {@code bottle}: "V1", "A". */
  public CircuitBuilder triode(
      String bottle, String letter, String plate, String grid, String cathode) {
    return triode(TestTubes.twinTriode(), bottle, letter, plate, grid, cathode);
  }

  /** Adds a triode section of a type. */
  public CircuitBuilder triode(
      TubeType type, String bottle, String letter, String plate, String grid, String cathode) {
    bottle(bottle, type);
    SectionType section = type.section(letter).orElseThrow();
    return add(
        new AmplifierSection(
            bottle + letter,
            bottle,
            letter,
            section,
            node(plate),
            null,
            node(grid),
            node(cathode),
            null));
  }

  /** Adds a beam tube. */
  public CircuitBuilder beam(
      String bottle, String plate, String screen, String grid, String cathode) {
    return pentode(TestTubes.beam(), bottle, plate, screen, grid, cathode);
  }

  /** Adds a pentode or beam tube of a type. */
  public CircuitBuilder pentode(
      TubeType type, String bottle, String plate, String screen, String grid, String cathode) {
    bottle(bottle, type);
    return add(
        new AmplifierSection(
            bottle,
            bottle,
            "",
            type.sections().get(0),
            node(plate),
            node(screen),
            node(grid),
            node(cathode),
            null));
  }

  /** Adds a tube rectifier: its plates, then its cathode. */
  public CircuitBuilder rectifier(String bottle, String... platesThenCathode) {
    return rectifier(TestTubes.rectifier(), bottle, platesThenCathode);
  }

  /** Adds a tube rectifier of a type. */
  public CircuitBuilder rectifier(TubeType type, String bottle, String... platesThenCathode) {
    bottle(bottle, type);
    int last = platesThenCathode.length - 1;
    List<Node> plates = new ArrayList<>();
    for (int k = 0; k < last; k++) {
      plates.add(node(platesThenCathode[k]));
    }
    return add(
        new RectifierSection(
            bottle, bottle, "", type.sections().get(0), plates, node(platesThenCathode[last])));
  }

  /** Adds a 150 V regulator tube. */
  public CircuitBuilder regulator(String bottle, String anode, String cathode) {
    TubeType type = TestTubes.regulator();
    bottle(bottle, type);
    return add(
        new RegulatorSection(
            bottle, bottle, "", type.sections().get(0), node(anode), node(cathode)));
  }

  /** Adds a supply transformer. */
  public CircuitBuilder transformer(String name, double primaryVolts, double primaryOhms) {
    transformers.add(new Transformer(name, primaryVolts, primaryOhms));
    return this;
  }

  /** Sets the line. */
  public CircuitBuilder line(double volts, double hertz) {
    line = new Line(volts, hertz, volts);
    return this;
  }

  /** Moves the reference. */
  public CircuitBuilder reference(String node) {
    reference = node;
    return this;
  }

  /** Returns the circuit. */
  public Circuit build() {
    Node black = node(reference);
    return new Circuit(
        "built by hand",
        new ArrayList<>(nodes.values()),
        black,
        elements,
        new ArrayList<>(bottles.values()),
        transformers,
        line,
        Meter.TEN_MEGOHM,
        Spread.USUAL,
        List.of(),
        Words.AMERICAN);
  }

  private void bottle(String name, TubeType type) {
    bottles.putIfAbsent(name, new Bottle(name, type, new TreeMap<>(), Bottle.Wiring.BY_POSITION));
  }
}
