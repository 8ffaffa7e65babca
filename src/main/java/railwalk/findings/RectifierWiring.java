package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import railwalk.circuit.Capacitor;
import railwalk.circuit.RectifierSection;
import railwalk.units.Quantity;
import railwalk.walk.RippleGroup;

/** Rectifiers wired in phase, and reservoirs too large for their tube. */
final class RectifierWiring {
  private RectifierWiring() {}

  static Stream<Finding> check(Scene scene) {
    return scene.map().groups().stream()
        .flatMap(group -> Stream.concat(inPhase(scene, group), firstCapacitors(scene, group)));
  }

  private static Stream<Finding> inPhase(Scene scene, RippleGroup group) {
    Swing swing = RectifierPath.swing(scene, group);
    List<RectifierPath> paths = RectifierPath.of(group, swing.rmsVolts().keySet());
    List<Finding> findings = new ArrayList<>();
    for (int k = 0; k < paths.size(); k++) {
      for (RectifierPath other : paths.subList(k + 1, paths.size())) {
        RectifierPath path = paths.get(k);
        boolean sameWay =
            path.output().equals(other.output())
                && path.rectifier().getClass().equals(other.rectifier().getClass());
        if (sameWay && swing.together(path.plate(), other.plate())) {
          findings.add(inPhase(scene, path, other));
        }
      }
    }
    return findings.stream();
  }

  private static Finding inPhase(Scene scene, RectifierPath path, RectifierPath other) {
    String subject =
        path.rectifier() instanceof RectifierSection section && other.rectifier() == section
            ? "both {plates} of " + scene.named(section.name(), section.bottle())
            : path.rectifier().name() + " and " + other.rectifier().name();
    return FindingCode.RECTIFIER_IN_PHASE.of(
        scene.words(),
        path.rectifier().name(),
        subject
            + " swing together: "
            + path.plate().name()
            + " and "
            + other.plate().name()
            + " are in phase, so it is a half-wave rectifier");
  }

  private static Stream<Finding> firstCapacitors(Scene scene, RippleGroup group) {
    List<Finding> findings = new ArrayList<>();
    for (FirstCapacitor first : FirstCapacitor.of(scene, group)) {
      if (first.isOver()) {
        RectifierSection section = first.section();
        String names =
            first.capacitors().stream().map(Capacitor::name).collect(Collectors.joining(" + "));
        findings.add(
            FindingCode.FIRST_CAPACITOR.of(
                scene.words(),
                first.capacitors().get(0).name(),
                names
                    + " put "
                    + Quantity.of(first.farads(), "F")
                    + " straight on the rectifier "
                    + scene.named(section.name(), section.bottle())
                    + ", usual limit "
                    + Quantity.of(first.faradsMax(), "F")));
      }
    }
    return findings.stream();
  }
}
