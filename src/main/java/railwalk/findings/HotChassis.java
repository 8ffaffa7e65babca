package railwalk.findings;

import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.units.Quantity;
import railwalk.walk.DcStep;
import railwalk.walk.LineContact;
import railwalk.walk.LineContacts;

/** A wire of the wall outlet that reaches the chassis or the common negative. */
final class HotChassis {
  private HotChassis() {}

  static Stream<Finding> check(Scene scene) {
    return LineContacts.of(scene.circuit()).stream()
        .map(
            contact ->
                FindingCode.HOT_CHASSIS.of(
                    scene.words(), part(scene, contact), message(scene, contact)));
  }

  private static String part(Scene scene, LineContact contact) {
    return contact.steps().isEmpty()
        ? wall(scene).name()
        : contact.steps().get(contact.steps().size() - 1).element().name();
  }

  private static Winding wall(Scene scene) {
    return scene.circuit().elements(Winding.class).stream()
        .filter(Winding::wall)
        .findFirst()
        .orElseThrow();
  }

  private static String message(Scene scene, LineContact contact) {
    String metal = metal(scene, contact.target());
    List<Element> parts = contact.steps().stream().map(DcStep::element).toList();
    String names = parts.stream().map(Element::name).collect(Collectors.joining(", "));
    boolean rectified =
        parts.stream().anyMatch(e -> e instanceof Diode || e instanceof RectifierSection);
    String said;
    if (contact.ohms() > 0) {
      double amps = volts(scene) / contact.ohms();
      said =
          metal
              + " hangs on the {line} through "
              + names
              + " ("
              + Quantity.ohms(contact.ohms())
              + "): up to "
              + Quantity.amps(amps)
              + " through whoever touches it";
    } else if (rectified) {
      said = "hot chassis: " + metal + " is on the {line} every other half-wave through " + names;
    } else {
      said = "hot chassis: " + metal + " is one wire of the {line}";
      said += parts.isEmpty() ? "" : " through " + names;
    }
    return said + offWords(parts, contact);
  }

  private static String offWords(List<Element> parts, LineContact contact) {
    List<String> switches =
        parts.stream().filter(Switch.class::isInstance).map(Element::name).toList();
    if (!contact.switchedOff()) {
      return "";
    }
    return switches.isEmpty()
        ? ", switched on or off"
        : "; live even when off: "
            + String.join(", ", switches)
            + " breaks only the negative side, and the other wire still reaches it through the set";
  }

  /** Returns what the target is called: the chassis, unless it has a node of its own elsewhere. */
  private static String metal(Scene scene, Node target) {
    boolean isChassis =
        target.name().equalsIgnoreCase("chassis")
            || (scene.circuit().node("chassis").isEmpty()
                && (target.name().equals("0") || target.name().equalsIgnoreCase("gnd")));
    return isChassis ? "the chassis" : "the common negative (" + target.name() + ")";
  }

  /** Returns the wall's volts rms on this line. */
  private static double volts(Scene scene) {
    Winding wall = wall(scene);
    double rms = wall.sections().stream().mapToDouble(Winding.Section::openRmsVolts).sum();
    return rms * scene.circuit().line().scale(wall.atLineVolts());
  }
}
