package railwalk.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.StandIn;
import railwalk.device.Electrode;
import railwalk.device.PinUse;

/**
 * One tube's socket as the technician meets it: its wired pins, tie points included, each with the
 * node it carries. A tube whose pins are not known shows its electrodes instead.
 *
 * @param bottle the tube; null for a stand-in of unknown type
 * @param pins rising, the top cap last
 */
record Socket(String name, @Nullable Bottle bottle, List<Pin> pins) {
  Socket {
    pins = List.copyOf(pins);
  }

  /** Number of a pin that is not known. */
  private static final int UNKNOWN = -1;

  private static final int TOP_CAP = 0;

  /**
   * One wired pin.
   *
   * @param number of the pin, 0 for the top cap, −1 when it is not known
   * @param section letter of the section it belongs to; empty when shared or the only one
   * @param electrode null on a tie point
   * @param role what the pin leads to inside
   */
  record Pin(
      int number, String section, @Nullable Electrode electrode, PinUse.Role role, Node node) {

    /** Returns the pin as charts print it. */
    String label() {
      return switch (number) {
        case UNKNOWN -> "–";
        case TOP_CAP -> "cap";
        default -> Integer.toString(number);
      };
    }

    /** Returns whether nothing but wire is on the pin: what it carries does not enter the tube. */
    boolean isTiePoint() {
      return electrode == null;
    }
  }

  /** Returns the pin's name beyond the tube: "V1.6", "V3.cap", "V9A.plate". */
  String nameOf(Pin pin) {
    if (pin.number() == UNKNOWN && pin.electrode() != null) {
      return name + pin.section() + "." + pin.electrode().word();
    }
    return name + "." + pin.label();
  }

  /** Returns the type's name; "unknown" for a stand-in. */
  String typeName() {
    return bottle == null ? "unknown" : bottle.type().name();
  }

  /** Returns the sockets of {@code circuit} in V order. */
  static List<Socket> in(Circuit circuit) {
    Stream<Socket> tubes = circuit.bottles().stream().map(b -> of(b, circuit));
    Stream<Socket> standIns =
        circuit.elements(StandIn.class).stream()
            .filter(s -> circuit.bottle(s.name()).isEmpty())
            .map(Socket::of);
    return Stream.concat(tubes, standIns)
        .sorted(Comparator.comparing(Socket::name, NaturalOrder.INSTANCE))
        .toList();
  }

  /**
   * Returns the sockets of {@code circuit} in V order, those whose tubes {@code whole} has and
   * {@code circuit} has not among them: an empty socket's contacts still carry volts.
   */
  static List<Socket> in(Circuit circuit, Circuit whole) {
    List<Socket> fitted = in(circuit);
    Stream<Socket> empty =
        in(whole).stream()
            .filter(s -> fitted.stream().noneMatch(f -> f.name().equalsIgnoreCase(s.name())))
            .map(s -> s.movedTo(circuit));
    return Stream.concat(fitted.stream(), empty)
        .sorted(Comparator.comparing(Socket::name, NaturalOrder.INSTANCE))
        .toList();
  }

  private Socket movedTo(Circuit circuit) {
    List<Pin> there =
        pins.stream()
            .flatMap(
                p ->
                    circuit.node(p.node().name()).stream()
                        .map(n -> new Pin(p.number(), p.section(), p.electrode(), p.role(), n)))
            .toList();
    return new Socket(name, bottle, there);
  }

  private static Socket of(Bottle bottle, Circuit circuit) {
    List<Pin> pins = new ArrayList<>();
    bottle.pins().forEach((number, node) -> pins.add(pin(bottle, number, node)));
    if (pins.isEmpty()) {
      circuit.elements().stream()
          .flatMap(element -> electrodes(element, bottle.name()))
          .forEach(pins::add);
    } else if (pins.get(0).number() == TOP_CAP) {
      pins.add(pins.remove(0));
    }
    return new Socket(bottle.name(), bottle, pins);
  }

  private static Pin pin(Bottle bottle, int number, Node node) {
    PinUse use =
        Optional.ofNullable(bottle.type().pins().get(number))
            .orElse(new PinUse(PinUse.Role.EMPTY, "", null));
    return new Pin(number, use.section(), use.electrode(), use.role(), node);
  }

  private static Socket of(StandIn standIn) {
    List<Pin> pins =
        standIn.electrodes().entrySet().stream()
            .map(e -> electrode("", e.getKey(), e.getValue()))
            .toList();
    return new Socket(standIn.name(), null, pins);
  }

  private static Stream<Pin> electrodes(Element element, String bottle) {
    Map<Electrode, Node> found = new TreeMap<>();
    String owner = "";
    String section = "";
    if (element instanceof AmplifierSection tube) {
      owner = tube.bottle();
      section = tube.section();
      found.put(Electrode.PLATE, tube.plate());
      putIfThere(found, Electrode.SCREEN, tube.screen());
      putIfThere(found, Electrode.SUPPRESSOR, tube.suppressor());
      found.put(Electrode.GRID, tube.grid());
      found.put(Electrode.CATHODE, tube.cathode());
    } else if (element instanceof RectifierSection rectifier) {
      owner = rectifier.bottle();
      section = rectifier.section();
      List<Node> plates = rectifier.plates();
      found.put(plates.size() > 1 ? Electrode.PLATE1 : Electrode.PLATE, plates.get(0));
      putIfThere(found, Electrode.PLATE2, plates.size() > 1 ? plates.get(1) : null);
      found.put(Electrode.CATHODE, rectifier.cathode());
    } else if (element instanceof RegulatorSection regulator) {
      owner = regulator.bottle();
      section = regulator.section();
      found.put(Electrode.PLATE, regulator.anode());
      found.put(Electrode.CATHODE, regulator.cathode());
    }
    if (!owner.equals(bottle)) {
      return Stream.empty();
    }
    String letter = section;
    return found.entrySet().stream().map(e -> electrode(letter, e.getKey(), e.getValue()));
  }

  private static void putIfThere(
      Map<Electrode, Node> found, Electrode electrode, @Nullable Node node) {
    if (node != null) {
      found.put(electrode, node);
    }
  }

  private static Pin electrode(String section, Electrode electrode, Node node) {
    return new Pin(UNKNOWN, section, electrode, PinUse.Role.ELECTRODE, node);
  }
}
