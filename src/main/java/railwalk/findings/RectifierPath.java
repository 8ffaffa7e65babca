package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.walk.DcPath;
import railwalk.walk.RippleGroup;

/**
 * One plate or diode of a rectifier.
 *
 * @param plate its end on the winding's side
 * @param output its end on the reservoir's side
 */
record RectifierPath(Element rectifier, Node plate, Node output) {

  /** Returns the paths of a ripple group, a diode's winding side being where the winding is. */
  static List<RectifierPath> of(RippleGroup group, Set<Node> driven) {
    List<RectifierPath> paths = new ArrayList<>();
    for (Element element : group.elements()) {
      if (element instanceof RectifierSection section) {
        section.plates().stream()
            .distinct()
            .forEach(plate -> paths.add(new RectifierPath(section, plate, section.cathode())));
      } else if (element instanceof Diode diode) {
        if (driven.contains(diode.anode())) {
          paths.add(new RectifierPath(diode, diode.anode(), diode.cathode()));
        }
        if (driven.contains(diode.cathode())) {
          paths.add(new RectifierPath(diode, diode.cathode(), diode.anode()));
        }
      }
    }
    return paths;
  }

  /** Returns the swing seen from where the current of a group's first output comes home. */
  static Swing swing(Scene scene, RippleGroup group) {
    for (Node output : group.outputs()) {
      DcPath path = scene.paths().to(output);
      if (!path.there().isEmpty()) {
        Node home = path.there().get(0).from();
        return Swing.from(scene.circuit(), scene.elementsByNode(), home);
      }
    }
    return new Swing(Map.of(), Map.of());
  }
}
