package railwalk.chart;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.SortedMap;
import java.util.TreeMap;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Line;
import railwalk.circuit.Meter;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.Spread;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.circuit.Words;
import railwalk.device.Catalogue;
import railwalk.device.Electrode;
import railwalk.device.PinUse;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;
import railwalk.solve.OperatingPoint;
import railwalk.source.Diagnostic;
import railwalk.source.Severity;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;
import railwalk.spread.Band;
import railwalk.spread.Bands;
import railwalk.walk.Walk;

/**
 * Amplifiers made up by number, with volts set by hand: as many tubes, supply nodes and states as
 * asked for. They would not play, but their charts have everything in them.
 */
public final class SampleAmp {
  private static final Catalogue CATALOGUE = Catalogue.standard();

  private final Map<String, Node> nodes = new LinkedHashMap<>();
  private final List<Element> elements = new ArrayList<>();
  private final List<Bottle> bottles = new ArrayList<>();
  private final Map<String, Double> volts = new HashMap<>();
  private final String prefix;

  private SampleAmp(String prefix) {
    this.prefix = prefix;
  }

  /** What is asked for. */
  public record Order(
      String title, String prefix, int tubes, int supplyNodes, int states, Words words) {

    /** Returns an order for a plain amplifier. */
    public static Order of(int tubes, int supplyNodes, int states) {
      return new Order("Sample", "", tubes, supplyNodes, states, Words.AMERICAN);
    }
  }

  /** Returns the input of a chart. */
  public static ChartInput input(Order order) {
    return new SampleAmp(order.prefix()).build(order);
  }

  private ChartInput build(Order order) {
    supply(order.supplyNodes());
    for (int i = 0; i < order.tubes(); i++) {
      String supply = "b" + i % order.supplyNodes();
      if (i % 3 == 2) {
        beamTube(i + 1, supply);
      } else {
        twinTriode(i + 1, supply);
      }
    }
    List<State> states = new ArrayList<>();
    for (int i = 0; i < order.states(); i++) {
      states.add(
          new State(
              "state" + (i + 1),
              List.of(
                  new StateChange.LineVolts(110 + i), new StateChange.SwitchPosition("S1", 0))));
    }
    Circuit circuit =
        new Circuit(
            order.title(),
            new ArrayList<>(nodes.values()),
            node("0"),
            elements,
            bottles,
            List.of(),
            new Line(122, 60, 117),
            new Meter(Double.NaN, 20_000, Meter.USUAL_RANGES_VOLTS),
            Spread.USUAL,
            states,
            order.words());
    List<Column> columns = new ArrayList<>();
    columns.add(column("", circuit, 1));
    for (State state : states) {
      columns.add(column(state.name(), circuit, 1.02 + 0.01 * columns.size()));
    }
    return new ChartInput(prefix + "sample.cir", columns, diagnostics());
  }

  private Column column(String state, Circuit circuit, double factor) {
    Map<String, Double> scaled = new HashMap<>();
    volts.forEach((name, value) -> scaled.put(name, value * factor));
    OperatingPoint point = new FakePoint(circuit, Walk.of(circuit), scaled, 9_000);
    Map<Node, Band> bands = new HashMap<>();
    for (Node node : circuit.nodes()) {
      double at = point.volts(node);
      if (!Double.isNaN(at) && !node.equals(circuit.reference())) {
        double half = 0.06 * Math.abs(at);
        bands.put(node, new Band(at - half, at + half));
      }
    }
    return new Column(state, point, new Bands(bands), List.of());
  }

  private List<Diagnostic> diagnostics() {
    SourceText text = SourceText.of(prefix + "sample.cir", "title\nR1 a b 1k\n");
    SourceSpan span = new SourceSpan(text, 2, 1, 2);
    return List.of(
        new Diagnostic(Severity.NOTE, "assumed", "V1 pin 3 is taken as open", "", span),
        new Diagnostic(
            Severity.WARNING, "over-rating", "C1 stands 512 V of its 450 V", "fit 600 V", span),
        new Diagnostic(Severity.NOTE, "whole-file", "three lines were passed over", "", null));
  }

  private void supply(int count) {
    set("0", 0);
    elements.add(
        new Winding(
            "VHT",
            List.of(
                new Winding.Section(node("ht1"), node("0"), 325, 95),
                new Winding.Section(node("0"), node("ht2"), 325, 101)),
            Double.NaN,
            "",
            false));
    TubeType rectifier = type("5Y3GT");
    SortedMap<Integer, Node> pins = new TreeMap<>();
    pins.put(2, node("b0"));
    pins.put(4, node("ht1"));
    pins.put(6, node("ht2"));
    pins.put(8, node("b0"));
    String name = prefix + "V100";
    bottles.add(new Bottle(name, rectifier, pins, Bottle.Wiring.BY_PIN));
    SectionType section =
        rectifier.sections().stream()
            .filter(s -> s.kind() == SectionKind.RECTIFIER)
            .findFirst()
            .orElseThrow();
    elements.add(
        new RectifierSection(
            name, name, section.id(), section, List.of(node("ht1"), node("ht2")), node("b0")));
    set("ht1", 0);
    set("ht2", 0);
    set("b0", 384);
    capacitor("CB0", "b0");
    elements.add(new Switch("S1", node("b0"), List.of(node("0x")), 0));
    set("0x", Double.NaN);
    for (int i = 1; i < count; i++) {
      String from = "b" + (i % 4 == 3 ? i - 2 : i - 1);
      if (i == 1) {
        elements.add(new Inductor("L1", node(from), node("b1"), 8, 120));
      } else {
        resistor("RB" + i, from, "b" + i, 2200 + 100 * i);
      }
      set("b" + i, voltsOf(from) - 3.7);
      capacitor("CB" + i, "b" + i);
    }
    elements.add(new Potentiometer("P1", node("b0"), node("w"), node("0"), 1e6, 0.4));
    set("w", 153.6);
  }

  private void twinTriode(int number, String supply) {
    TubeType type = type("12AX7");
    String v = prefix + "V" + number;
    SortedMap<Integer, Node> pins = new TreeMap<>();
    for (String letter : List.of("A", "B")) {
      String id = number + letter.toLowerCase(java.util.Locale.ROOT);
      resistor("RP" + id, supply, "p" + id, 100_000);
      resistor("RK" + id, "k" + id, "0", 1_500);
      resistor("RG" + id, "g" + id, "0", 1_000_000);
      set("p" + id, voltsOf(supply) - 110 - number);
      set("k" + id, 1.31 + 0.01 * number);
      set("g" + id, 0);
      elements.add(
          new AmplifierSection(
              v + letter,
              v,
              letter,
              type.section(letter).orElseThrow(),
              node("p" + id),
              null,
              node("g" + id),
              node("k" + id),
              null));
      wire(pins, type, letter, Electrode.PLATE, "p" + id);
      wire(pins, type, letter, Electrode.GRID, "g" + id);
      wire(pins, type, letter, Electrode.CATHODE, "k" + id);
    }
    bottles.add(new Bottle(v, type, pins, Bottle.Wiring.BY_PIN));
  }

  private void beamTube(int number, String supply) {
    TubeType type = type("6V6GT");
    String v = prefix + "V" + number;
    elements.add(new Inductor("LO" + number, node(supply), node("p" + number), Double.NaN, 180));
    resistor("RK" + number, "k" + number, "0", 470);
    resistor("RG" + number, "g" + number, "0", 220_000);
    set("p" + number, voltsOf(supply) - 7);
    set("k" + number, 17.5);
    set("g" + number, 0);
    elements.add(
        new AmplifierSection(
            v,
            v,
            "",
            type.sections().get(0),
            node("p" + number),
            node(supply),
            node("g" + number),
            node("k" + number),
            null));
    SortedMap<Integer, Node> pins = new TreeMap<>();
    wire(pins, type, "", Electrode.PLATE, "p" + number);
    wire(pins, type, "", Electrode.SCREEN, supply);
    wire(pins, type, "", Electrode.GRID, "g" + number);
    wire(pins, type, "", Electrode.CATHODE, "k" + number);
    pins.put(6, node(supply));
    bottles.add(new Bottle(v, type, pins, Bottle.Wiring.BY_PIN));
  }

  private void wire(
      SortedMap<Integer, Node> pins,
      TubeType type,
      String section,
      Electrode electrode,
      String node) {
    type.pins()
        .forEach(
            (pin, use) -> {
              boolean here = use.section().equals(section) || use.section().isEmpty();
              if (use.role() == PinUse.Role.ELECTRODE && use.electrode() == electrode && here) {
                pins.put(pin, node(node));
              }
            });
  }

  private void resistor(String name, String a, String b, double ohms) {
    elements.add(new Resistor(name, node(a), node(b), ohms, 0.5, Double.NaN));
  }

  private void capacitor(String name, String a) {
    elements.add(
        new Capacitor(name, node(a), node("0"), 22e-6, 450, Double.POSITIVE_INFINITY, false));
  }

  private void set(String node, double value) {
    node(node);
    volts.put(name(node), value);
  }

  private double voltsOf(String node) {
    return volts.getOrDefault(name(node), Double.NaN);
  }

  private Node node(String name) {
    return nodes.computeIfAbsent(name(name), key -> new Node(nodes.size(), key));
  }

  private String name(String node) {
    return prefix + node;
  }

  private static TubeType type(String name) {
    return CATALOGUE.find(name).orElseThrow();
  }

  /** Returns orders of every size, some with long names or in other alphabets. */
  public static List<Order> orders() {
    List<Order> orders = new ArrayList<>();
    Random random = new Random(17);
    List<String> prefixes =
        List.of("", "ein_sehr_langer_Knotenname_", "усилитель_", "増幅器", "Ω\u0301é", "😀");
    for (int tubes : new int[] {1, 2, 4, 7, 12, 30}) {
      String prefix = prefixes.get(orders.size() % prefixes.size());
      orders.add(
          new Order(
              "Sample " + prefix.repeat(3),
              prefix,
              tubes,
              1 + random.nextInt(12),
              random.nextInt(4),
              tubes % 2 == 0 ? Words.AMERICAN : Words.BRITISH));
    }
    return orders;
  }
}
