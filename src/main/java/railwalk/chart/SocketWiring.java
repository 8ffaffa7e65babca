package railwalk.chart;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.PriorityQueue;
import java.util.Set;
import java.util.SortedMap;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;

/**
 * What the wires of a socket tell of its pins, from the parts around it alone: which carry heater
 * volts, hang on a supply, come to chassis through few ohms or many.
 */
final class SocketWiring {
  /** AC volts from which a winding is one of high tension. */
  private static final double HIGH_AC_VOLTS = 60;

  /** A capacitor from this size and rating up is a supply's (common practice). */
  private static final double SUPPLY_FARADS = 4e-6;

  private static final double SUPPLY_CAPACITOR_VOLTS = 150;

  /** Up to here a cathode resistor, from there on a grid leak (common practice). */
  private static final double MOST_CATHODE_OHMS = 22e3;

  private static final double LEAST_GRID_LEAK_OHMS = 47e3;
  private static final double MOST_FEED_OHMS = 5e6;

  private final Circuit circuit;
  private final SortedMap<Integer, Node> pins;
  private final Map<Node, List<Way>> ways = new HashMap<>();
  private final Map<Node, List<Way>> turns = new HashMap<>();
  private final Set<Node> negative;
  private final Set<Node> supplies = new HashSet<>();
  private final Set<Node> wall = new HashSet<>();

  /** From a node to another: through ohms, or along a winding by volts. */
  private record Way(Node to, double amount) {}

  /** What a pin's wires look like. */
  enum Look {
    /** An end of a winding of high tension, or the line. */
    HIGH_AC("on high AC volts"),
    /** On a winding with another pin, a few volts apart. */
    HEATER("on the heater winding"),
    CHASSIS("on chassis"),
    /** Hangs on a supply of the high tension. */
    FED("fed from a supply"),
    /** Hangs on a negative supply. */
    NEGATIVE("on a negative supply"),
    /** To chassis through few ohms. */
    LOW("to chassis through few ohms"),
    /** To chassis through many ohms. */
    HIGH("to chassis through many ohms"),
    /** To chassis through what may be either. */
    BETWEEN("to chassis"),
    /** No way for direct current. */
    LOOSE("with no DC path");

    private final String words;

    Look(String words) {
      this.words = words;
    }

    /** Returns it in a few words that follow "is". */
    String words() {
      return words;
    }
  }

  /**
   * @param circuit without the tube
   * @param pins the node at each wired pin
   * @param supplyNodes that the walk finds without the tube
   * @param negative those of them that are below the reference
   */
  SocketWiring(
      Circuit circuit, SortedMap<Integer, Node> pins, List<Node> supplyNodes, Set<Node> negative) {
    this.circuit = circuit;
    this.pins = pins;
    this.negative = negative;
    circuit.elements().forEach(this::conductor);
    supplies.addAll(supplyNodes);
    for (Capacitor capacitor : circuit.elements(Capacitor.class)) {
      boolean large = capacitor.farads() >= SUPPLY_FARADS;
      if (large && capacitor.ratedVolts() >= SUPPLY_CAPACITOR_VOLTS) {
        supplies.add(capacitor.a());
        supplies.add(capacitor.b());
      }
    }
    supplies.remove(circuit.reference());
  }

  private void conductor(Element element) {
    if (element instanceof Resistor r) {
      join(r.a(), r.b(), r.ohms());
    } else if (element instanceof Inductor l) {
      join(l.a(), l.b(), l.dcOhms());
    } else if (element instanceof Potentiometer p) {
      join(p.a(), p.wiper(), p.ohms() * (1 - p.share()));
      join(p.wiper(), p.b(), p.ohms() * p.share());
    } else if (element instanceof Fuse f) {
      joinOutright(f.a(), f.b());
    } else if (element instanceof Wire w) {
      joinOutright(w.a(), w.b());
    } else if (element instanceof Switch s && s.position() > 0) {
      joinOutright(s.common(), s.poles().get(s.position() - 1));
    } else if (element instanceof Winding winding) {
      double scale = circuit.line().scale(winding.atLineVolts());
      for (Winding.Section section : winding.sections()) {
        double volts = scale * section.openRmsVolts();
        put(turns, section.a(), section.b(), -volts);
        put(turns, section.b(), section.a(), volts);
        if (winding.wall()) {
          wall.add(section.a());
          wall.add(section.b());
        } else {
          join(section.a(), section.b(), section.ohms());
        }
      }
    }
  }

  private void joinOutright(Node a, Node b) {
    join(a, b, 0);
    put(turns, a, b, 0);
    put(turns, b, a, 0);
  }

  private void join(Node a, Node b, double ohms) {
    double known = Double.isNaN(ohms) ? 0 : ohms;
    put(ways, a, b, known);
    put(ways, b, a, known);
  }

  private static void put(Map<Node, List<Way>> map, Node from, Node to, double amount) {
    map.computeIfAbsent(from, key -> new ArrayList<>()).add(new Way(to, amount));
  }

  /** Returns the wired pins with their nodes. */
  SortedMap<Integer, Node> pins() {
    return pins;
  }

  /** Returns the AC volts between two nodes along windings; NaN where none joins them. */
  double acVolts(Node a, Node b) {
    Map<Node, Double> volts = new HashMap<>();
    Deque<Node> next = new ArrayDeque<>();
    volts.put(a, 0.0);
    next.add(a);
    while (!next.isEmpty()) {
      Node at = next.removeFirst();
      double here = volts.getOrDefault(at, 0.0);
      for (Way way : turns.getOrDefault(at, List.of())) {
        if (volts.putIfAbsent(way.to(), here + way.amount()) == null) {
          next.add(way.to());
        }
      }
    }
    return Math.abs(volts.getOrDefault(b, Double.NaN));
  }

  /** Returns what the wires at {@code pin} look like. */
  Look look(int pin) {
    Node node = node(pin);
    Node reference = circuit.reference();
    boolean heater = false;
    boolean highAc = false;
    for (Node end : turns.keySet()) {
      highAc |= acVolts(node, end) >= HIGH_AC_VOLTS;
    }
    for (Node other : pins.values()) {
      double volts = acVolts(node, other);
      heater |= volts > 1 && volts < HIGH_AC_VOLTS;
    }
    if (node.equals(reference)) {
      return Look.CHASSIS;
    }
    if (heater) {
      return Look.HEATER;
    }
    return highAc ? Look.HIGH_AC : byOhms(node);
  }

  private Look byOhms(Node node) {
    Map<Node, Double> ohms = ohmsFrom(node);
    double toChassis = ohms.getOrDefault(circuit.reference(), Double.POSITIVE_INFINITY);
    double toWall = Double.POSITIVE_INFINITY;
    for (Node end : wall) {
      if (!end.equals(circuit.reference())) {
        toWall = Math.min(toWall, ohms.getOrDefault(end, Double.POSITIVE_INFINITY));
      }
    }
    if (toWall < toChassis && toWall < MOST_CATHODE_OHMS) {
      return Look.HIGH_AC;
    }
    double toSupply = Double.POSITIVE_INFINITY;
    boolean below = false;
    for (Node supply : supplies) {
      double way = ohms.getOrDefault(supply, Double.POSITIVE_INFINITY);
      if (way < toSupply) {
        toSupply = way;
        below = negative.contains(supply);
      }
    }
    if (below && toSupply < MOST_FEED_OHMS) {
      return Look.NEGATIVE;
    }
    boolean nearSupply = toSupply < MOST_FEED_OHMS && !(toChassis < MOST_CATHODE_OHMS);
    if (nearSupply && toSupply <= Math.max(LEAST_GRID_LEAK_OHMS, 2 * toChassis)) {
      return Look.FED;
    }
    if (toChassis <= MOST_CATHODE_OHMS) {
      return Look.LOW;
    }
    if (toChassis >= LEAST_GRID_LEAK_OHMS && Double.isFinite(toChassis)) {
      return Look.HIGH;
    }
    return Double.isFinite(toChassis) ? Look.BETWEEN : Look.LOOSE;
  }

  /** Returns the least ohms to each node, without a way through the reference or a supply. */
  private Map<Node, Double> ohmsFrom(Node start) {
    Map<Node, Double> least = new HashMap<>();
    PriorityQueue<Way> next = new PriorityQueue<>(Comparator.comparingDouble(Way::amount));
    next.add(new Way(start, 0));
    while (!next.isEmpty()) {
      Way nearest = next.remove();
      if (least.putIfAbsent(nearest.to(), nearest.amount()) != null) {
        continue;
      }
      boolean end =
          nearest.to().equals(circuit.reference())
              || (supplies.contains(nearest.to()) && !nearest.to().equals(start));
      if (!end) {
        for (Way way : ways.getOrDefault(nearest.to(), List.of())) {
          next.add(new Way(way.to(), nearest.amount() + way.amount()));
        }
      }
    }
    return least;
  }

  private Node node(int pin) {
    Node node = pins.get(pin);
    if (node == null) {
      throw new IllegalArgumentException("pin " + pin + " is not wired");
    }
    return node;
  }
}
