package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Capacitor;
import railwalk.circuit.RectifierSection;
import railwalk.solve.OperatingPoint;
import railwalk.walk.DcPaths;
import railwalk.walk.RippleGroup;

/**
 * What a rectifier tube charges directly, against the usual limit of its sheet. The limit holds for
 * the series resistance that the sheet names: more resistance allows more capacitance.
 *
 * @param capacitors that nothing but metal parts from the cathode
 * @param farads of them together
 * @param faradsMax NaN where the sheet gives none
 */
public record FirstCapacitor(
    RectifierSection section, List<Capacitor> capacitors, double farads, double faradsMax) {
  /** An excess too small to be told from the limit as printed. */
  private static final double NOTHING = 1.001;

  public FirstCapacitor {
    capacitors = List.copyOf(capacitors);
  }

  /** Returns the first capacitors of every rectifier tube of a solved amplifier. */
  public static List<FirstCapacitor> of(OperatingPoint point) {
    Scene scene =
        new Scene(
            point.circuit(),
            point.map(),
            point,
            point.circuit().elementsByNode(),
            new DcPaths(point.map(), point.circuit()));
    List<FirstCapacitor> found = new ArrayList<>();
    point.map().groups().forEach(group -> found.addAll(of(scene, group)));
    return found;
  }

  static List<FirstCapacitor> of(Scene scene, RippleGroup group) {
    List<FirstCapacitor> found = new ArrayList<>();
    for (RectifierSection section : scene.circuit().elements(RectifierSection.class)) {
      if (group.elements().contains(section)) {
        Reservoir reservoir = Reservoir.at(scene, section.cathode());
        found.add(
            new FirstCapacitor(
                section,
                reservoir.capacitors(),
                reservoir.farads(scene),
                section.type().rectifierRatings().firstCapacitorFaradsMax()));
      }
    }
    return found;
  }

  /** Returns whether they are more than the limit. */
  public boolean isOver() {
    return farads > faradsMax * NOTHING;
  }
}
