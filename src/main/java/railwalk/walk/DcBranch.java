package railwalk.walk;

import railwalk.circuit.Element;
import railwalk.circuit.Node;

/**
 * One way from node to node that direct current can take through a part. A part has as many as it
 * has pairs of ends that conduct; {@link DcBranches} lists them.
 *
 * @param serial tells apart the branches of one circuit, in netlist order
 * @param a where current enters if it flows one way only
 * @param ohms a measure for "the shortest way": the resistance of a resistor, choke or contact, a
 *     nominal figure for anything else
 */
record DcBranch(int serial, Element element, Node a, Node b, Way way, double ohms) {

  /** What kind of way it is. */
  enum Way {
    /** Resistor, choke, fuse, lamp, wire, closed contact, half of a control, filament. */
    CONDUCTOR,
    /** A fixed or controlled voltage source. */
    SOURCE,
    /** A section of a winding. */
    WINDING,
    /** A silicon or selenium diode, anode to cathode. */
    DIODE,
    /** A zener diode, which conducts both ways. */
    ZENER,
    /** A vacuum rectifier or detector diode, plate to cathode. */
    RECTIFIER,
    /** Plate to cathode of an amplifying section. */
    PLATE,
    /** Screen to cathode of an amplifying section. */
    SCREEN,
    /** A glow-discharge regulator. */
    REGULATOR,
    /** The leak of a capacitor. */
    LEAK
  }

  /** Returns whether current flows from {@code a} to {@code b} only. */
  boolean oneWay() {
    return switch (way) {
      case DIODE, RECTIFIER, PLATE, SCREEN -> true;
      default -> false;
    };
  }

  /** Returns whether it is a section of an amplifying tube. */
  boolean throughTube() {
    return way == Way.PLATE || way == Way.SCREEN;
  }

  /** Returns the end that is not {@code node}. */
  Node other(Node node) {
    return a.equals(node) ? b : a;
  }
}
