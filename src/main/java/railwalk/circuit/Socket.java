package railwalk.circuit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;
import railwalk.device.Electrode;
import railwalk.device.PinUse;
import railwalk.device.TubeType;

/**
 * Puts a tube into its socket: from a type and the nodes at its pins (or at its electrodes, where
 * the netlist names those) to sections, heater parts and inner connections. The netlist reader and
 * the states of a chart both build tubes here.
 */
public final class Socket {
  /** Contacts of the usual sockets: a type's sheet need not list the pins it leaves out. */
  private static final Map<String, Integer> PINS_OF_FAMILY =
      Map.of("octal", 8, "loctal", 8, "noval", 9, "miniature-7", 7, "rimlock", 8);

  private final String name;
  private final TubeType type;
  private final NodeMaker nodes;
  private final Map<Key, List<Contact>> contacts = new LinkedHashMap<>();
  private final List<Element> elements = new ArrayList<>();
  private final List<Fitting.Remark> remarks = new ArrayList<>();

  /** Makes the nodes that a tube has inside: a filament's middle, an electrode left open. */
  @FunctionalInterface
  public interface NodeMaker {
    /** Returns a new node called {@code name}. */
    Node inside(String name);
  }

  /** Finds the node that an electrode is on. */
  @FunctionalInterface
  interface Lookup {
    /** Returns the node of {@code electrode} of the section; null when it is open. */
    @Nullable Node node(String section, Electrode electrode);
  }

  private record Key(String section, Electrode electrode) {}

  /** Where an electrode is reached; pin −1 when it is named without one. */
  private record Contact(int pin, Node node) {}

  private Socket(String name, TubeType type, NodeMaker nodes) {
    this.name = name;
    this.type = type;
    this.nodes = nodes;
  }

  /** Returns the tube wired by socket pin; 0 is the top cap. */
  public static Fitting byPins(
      String name, TubeType type, SortedMap<Integer, Node> pins, NodeMaker nodes) {
    Socket socket = new Socket(name, type, nodes);
    Map<String, Contact> jumpers = new LinkedHashMap<>();
    pins.forEach((pin, node) -> socket.wire(pin, node, jumpers));
    socket.build();
    return socket.fitting(pins, Bottle.Wiring.BY_PIN);
  }

  /**
   * Returns the tube wired by electrode or position. Its pins are those that the type gives the
   * electrodes: of several that are joined inside the lowest, of a filament both ends.
   */
  public static Fitting byLeads(
      String name, TubeType type, Bottle.Wiring wiring, List<Lead> leads, NodeMaker nodes) {
    Socket socket = new Socket(name, type, nodes);
    SortedMap<Integer, Node> pins = new TreeMap<>();
    for (Lead lead : leads) {
      socket.contact(lead.section(), lead.electrode(), new Contact(-1, lead.node()));
      socket.usualPins(lead).forEach(pin -> pins.putIfAbsent(pin, lead.node()));
    }
    socket.build();
    return socket.fitting(pins, wiring);
  }

  /** Returns whether the socket of {@code type} has that pin; 0 asks for a top cap. */
  public static boolean hasPin(TubeType type, int pin) {
    return type.pins().containsKey(pin) || (pin > 0 && pin <= pinCount(type));
  }

  /** Returns the pins that a socket of {@code type} has, in words: "1 to 9". */
  public static String pinsInWords(TubeType type) {
    return "1 to " + pinCount(type) + (type.pins().containsKey(0) ? " and cap" : "");
  }

  private static int pinCount(TubeType type) {
    int listed = type.pins().isEmpty() ? 0 : type.pins().lastKey();
    return Math.max(listed, PINS_OF_FAMILY.getOrDefault(type.family(), 0));
  }

  private void wire(int pin, Node node, Map<String, Contact> jumpers) {
    PinUse use = type.pins().get(pin);
    if (use == null || use.role() == PinUse.Role.EMPTY) {
      return;
    }
    Electrode electrode = use.electrode();
    if (electrode != null) {
      contact(use.section(), electrode, new Contact(pin, node));
    } else if (use.role() == PinUse.Role.INTERNAL && !use.section().isEmpty()) {
      Contact other = jumpers.putIfAbsent(use.section(), new Contact(pin, node));
      if (other != null) {
        join(other, new Contact(pin, node), null);
      }
    } else {
      remarks.add(new Fitting.Remark(Fitting.Kind.TIE_POINT_IN_USE, name, null, List.of(pin)));
    }
  }

  private void contact(String section, Electrode electrode, Contact contact) {
    String owner = isShared(electrode) ? "" : section;
    contacts.computeIfAbsent(new Key(owner, electrode), key -> new ArrayList<>()).add(contact);
  }

  /** Returns whether all sections have one pin for {@code electrode}, as a common cathode. */
  private boolean isShared(Electrode electrode) {
    return type.pins().values().stream()
        .anyMatch(use -> use.electrode() == electrode && use.section().isEmpty());
  }

  private List<Integer> usualPins(Lead lead) {
    List<Integer> pins = type.pinsOf(lead.section(), lead.electrode());
    if (pins.isEmpty() && lead.electrode() == Electrode.CATHODE) {
      List<Integer> filament = new ArrayList<>(type.pinsOf("", Electrode.HEATER1));
      filament.addAll(type.pinsOf("", Electrode.HEATER2));
      boolean joined = type.heater().directlyHeated() || type.heater().cathodeJoined();
      return joined ? filament : List.of();
    }
    return pins.stream().limit(1).toList();
  }

  private void build() {
    contacts.forEach(this::joinContacts);
    HeaterWiring heater = new HeaterWiring(name, type.heater(), this::node, nodes);
    SectionWiring wiring = new SectionWiring(name, type, this::node, heater, nodes, remarks);
    List<Element> sections =
        type.sections().stream().flatMap(section -> wiring.build(section).stream()).toList();
    if (sections.isEmpty()) {
      remarks.add(new Fitting.Remark(Fitting.Kind.NO_SECTION, name, null, List.of()));
    }
    elements.addAll(0, sections);
    elements.addAll(heater.filaments());
  }

  private void joinContacts(Key key, List<Contact> reached) {
    for (Contact contact : reached.subList(1, reached.size())) {
      join(reached.get(0), contact, key.electrode());
    }
  }

  private void join(Contact one, Contact other, @Nullable Electrode electrode) {
    if (one.node().equals(other.node())) {
      return;
    }
    String pins = one.pin() + "-" + other.pin();
    elements.add(new Wire(name + ":PIN" + pins, one.node(), other.node(), name));
    List<Integer> both = List.of(one.pin(), other.pin());
    remarks.add(new Fitting.Remark(Fitting.Kind.PINS_JOINED, name, electrode, both));
  }

  private @Nullable Node node(String section, Electrode electrode) {
    List<Contact> reached = contacts.get(new Key(section, electrode));
    if (reached == null && isShared(electrode)) {
      reached = contacts.get(new Key("", electrode));
    }
    return reached == null ? null : reached.get(0).node();
  }

  private Fitting fitting(SortedMap<Integer, Node> pins, Bottle.Wiring wiring) {
    return new Fitting(new Bottle(name, type, pins, wiring), elements, remarks);
  }
}
