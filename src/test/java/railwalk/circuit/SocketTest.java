package railwalk.circuit;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import railwalk.device.Catalogue;
import railwalk.device.Electrode;
import railwalk.device.Heater;
import railwalk.device.PinUse;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

class SocketTest {
  private final List<Node> nodes = new ArrayList<>();

  private Node node(String name) {
    for (Node node : nodes) {
      if (node.name().equals(name)) {
        return node;
      }
    }
    Node made = new Node(nodes.size(), name);
    nodes.add(made);
    return made;
  }

  private Fitting byPins(TubeType type, Object... pinsAndNodes) {
    SortedMap<Integer, Node> pins = new TreeMap<>();
    for (int i = 0; i < pinsAndNodes.length; i += 2) {
      pins.put((Integer) pinsAndNodes[i], node((String) pinsAndNodes[i + 1]));
    }
    return Socket.byPins("V1", type, pins, this::node);
  }

  private static TubeType type(String name) {
    return Catalogue.standard().find(name).orElseThrow();
  }

  private static PinUse pin(String section, Electrode electrode) {
    return new PinUse(PinUse.Role.ELECTRODE, section, electrode);
  }

  private static TubeType twin(SortedMap<Integer, PinUse> pins) {
    TubeType like = type("6SL7GT");
    return new TubeType("TWIN", List.of(), "", "8S", "octal", like.heater(), like.sections(), pins);
  }

  /** As the 6SC7: two triodes on one cathode pin. */
  @Test
  void sectionsMayShareACathodePin() {
    SortedMap<Integer, PinUse> pins = new TreeMap<>();
    pins.put(2, pin("A", Electrode.PLATE));
    pins.put(3, pin("A", Electrode.GRID));
    pins.put(4, pin("B", Electrode.GRID));
    pins.put(5, pin("B", Electrode.PLATE));
    pins.put(6, pin("", Electrode.CATHODE));
    TubeType type = twin(pins);
    Fitting fitting = byPins(type, 2, "p", 3, "g", 4, "h", 5, "q", 6, "k");
    assertThat(fitting.elements()).hasSize(2);
    assertThat(fitting.elements())
        .allMatch(e -> ((AmplifierSection) e).cathode().equals(node("k")));
    Fitting half = byPins(type, 2, "p", 3, "g", 6, "k");
    assertThat(half.elements()).hasSize(1);
  }

  /** As the 0D3: pins 3 and 7 are a jumper inside, apart from the discharge. */
  @Test
  void aJumperJoinsItsTwoPins() {
    SectionType section = type("0A2").sections().get(0);
    SortedMap<Integer, PinUse> pins = new TreeMap<>();
    pins.put(2, pin("", Electrode.CATHODE));
    pins.put(3, new PinUse(PinUse.Role.INTERNAL, "jumper", null));
    pins.put(5, pin("", Electrode.PLATE));
    pins.put(7, new PinUse(PinUse.Role.INTERNAL, "jumper", null));
    Heater none = new Heater(List.of(), false, false);
    TubeType type =
        new TubeType("JUMPER", List.of(), "", "4AJ", "octal", none, List.of(section), pins);
    Fitting fitting = byPins(type, 2, "0", 3, "in", 5, "a", 7, "out");
    Wire wire = (Wire) fitting.elements().get(1);
    assertThat(wire.nodes()).containsExactly(node("in"), node("out"));
    assertThat(fitting.remarks())
        .extracting(Fitting.Remark::kind)
        .containsExactly(Fitting.Kind.PINS_JOINED);
    assertThat(byPins(type, 2, "0", 5, "a", 3, "x").remarks()).isEmpty();
  }

  @Test
  void aSocketHasThePinsOfItsFamily() {
    TubeType octal = type("6V6GT");
    assertThat(Socket.hasPin(octal, 8)).isTrue();
    assertThat(Socket.hasPin(octal, 9)).isFalse();
    assertThat(Socket.hasPin(octal, 0)).isFalse();
    assertThat(Socket.pinsInWords(type("12AX7"))).isEqualTo("1 to 9");
  }

  @Test
  void everyTypeOfTheCatalogueFitsItsOwnSocketWithoutARemark() {
    for (TubeType type : Catalogue.standard().types()) {
      if (type.pins().isEmpty()) {
        continue;
      }
      SortedMap<Integer, Node> pins = new TreeMap<>();
      type.pins()
          .forEach(
              (pin, use) -> {
                if (use.electrode() != null) {
                  pins.put(pin, node(type.name() + use.section() + use.electrode()));
                }
              });
      Fitting fitting = Socket.byPins("V1", type, pins, this::node);
      assertThat(fitting.remarks()).as(type.name()).isEmpty();
      assertThat(fitting.elements().stream().filter(e -> !(e instanceof Filament)))
          .as(type.name())
          .hasSize(type.sections().size());
    }
  }
}
