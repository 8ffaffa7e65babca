package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import railwalk.circuit.Diode;
import railwalk.circuit.Line;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Winding;
import railwalk.units.Quantity;
import railwalk.walk.RippleGroup;

/** Names and figures of what stands in a rectifier group. */
final class GroupWords {
  private GroupWords() {}

  /** Returns the names of its rectifier tubes. */
  static List<String> rectifierTubes(RippleGroup group) {
    return group.elements().stream()
        .filter(RectifierSection.class::isInstance)
        .map(e -> ((RectifierSection) e).bottle())
        .distinct()
        .toList();
  }

  /** Returns the names of its rectifiers, tubes first. */
  static List<String> rectifiers(RippleGroup group) {
    List<String> names = new ArrayList<>(rectifierTubes(group));
    group.elements().stream()
        .filter(Diode.class::isInstance)
        .forEach(diode -> names.add(diode.name()));
    return names;
  }

  /** Returns a winding's volts on {@code line} at no load: "325-0-325 V rms". */
  static String windingVolts(Winding winding, Line line) {
    double scale = line.scale(winding.atLineVolts());
    List<String> sections =
        winding.sections().stream()
            .map(s -> Quantity.plainVolts(s.openRmsVolts() * scale))
            .toList();
    String text =
        sections.size() == 2
            ? sections.get(0) + "-0-" + sections.get(1)
            : sections.stream().collect(Collectors.joining(" + "));
    return text + " V rms";
  }
}
