package railwalk.readings;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.device.Electrode;
import railwalk.device.SectionKind;

/** On which node an electrode of a tube can be read. */
final class TubeNodes {
  private TubeNodes() {}

  /**
   * Returns the node at which {@code electrode} of a section is reached from outside; null when the
   * section has none or nothing is wired to it. A filament is read at its second end.
   */
  static @Nullable Node node(Bottle bottle, Element section, Electrode electrode) {
    Node node = inside(bottle, section, electrode);
    boolean outside = bottle.pins().isEmpty() || bottle.pins().containsValue(node);
    if (node == null || (outside && !isMadeInside(bottle, section, electrode, node))) {
      return node;
    }
    return electrode == Electrode.CATHODE ? filamentEnd(bottle) : null;
  }

  /** Returns the node of the first wired pin that leads to {@code electrode}; null without one. */
  static @Nullable Node pinNode(Bottle bottle, String section, Electrode electrode) {
    for (int pin : bottle.type().pinsOf(section, electrode)) {
      Node node = bottle.pins().get(pin);
      if (node != null) {
        return node;
      }
    }
    return null;
  }

  private static @Nullable Node inside(Bottle bottle, Element element, Electrode electrode) {
    if (element instanceof AmplifierSection section) {
      return amplifier(section, electrode);
    }
    if (element instanceof RegulatorSection section) {
      return switch (electrode) {
        case PLATE -> section.anode();
        case CATHODE -> section.cathode();
        default -> null;
      };
    }
    if (!(element instanceof RectifierSection section)) {
      return null;
    }
    List<Node> plates = section.plates();
    return switch (electrode) {
      case CATHODE -> section.cathode();
      case PLATE -> plates.size() == 1 ? plates.get(0) : null;
      case PLATE1, PLATE2, DIODE1, DIODE2 -> plate(bottle, section, electrode);
      default -> null;
    };
  }

  private static @Nullable Node amplifier(AmplifierSection section, Electrode electrode) {
    return switch (electrode) {
      case PLATE -> section.plate();
      case SCREEN -> section.screen();
      case GRID -> section.grid();
      case CATHODE -> section.cathode();
      case SUPPRESSOR -> {
        boolean pentode = section.type().kind() == SectionKind.PENTODE;
        Node apart = section.suppressor();
        yield apart == null && pentode ? section.cathode() : apart;
      }
      default -> null;
    };
  }

  /** Returns the node of a numbered plate, by its pin or, where pins are not known, its place. */
  private static @Nullable Node plate(
      Bottle bottle, RectifierSection section, Electrode electrode) {
    if (!bottle.type().pins().isEmpty()) {
      return pinNode(bottle, section.section(), electrode);
    }
    boolean detector = section.type().kind() == SectionKind.DIODE;
    boolean ofDetector = electrode == Electrode.DIODE1 || electrode == Electrode.DIODE2;
    boolean second = electrode == Electrode.PLATE2 || electrode == Electrode.DIODE2;
    int index = second ? 1 : 0;
    return detector == ofDetector && index < section.plates().size()
        ? section.plates().get(index)
        : null;
  }

  /** Returns whether the node was made for an electrode that nothing is wired to. */
  private static boolean isMadeInside(
      Bottle bottle, Element section, Electrode electrode, Node node) {
    return node.name().equals(section.name() + ":" + electrode.word())
        || node.name().equals(bottle.name() + ":filament");
  }

  private static @Nullable Node filamentEnd(Bottle bottle) {
    Node second = pinNode(bottle, "", Electrode.HEATER2);
    return second == null ? pinNode(bottle, "", Electrode.HEATER1) : second;
  }
}
