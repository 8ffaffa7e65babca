package railwalk.findings;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.device.Electrode;
import railwalk.units.Quantity;
import railwalk.walk.DcPath;
import railwalk.walk.DcStep;

/** Amplifying tubes with an electrode that leads nowhere, or on a node meant for another. */
final class TubeWiring {
  /** Windings of output transformers stay well below this (common practice). */
  private static final double WINDING_OHMS = 1000;

  /** A supply for plates and screens is above this. */
  private static final double HIGH_VOLTS = 30;

  private TubeWiring() {}

  static Stream<Finding> check(Scene scene) {
    List<Finding> findings = new ArrayList<>();
    Set<Node> floatingGrids = new HashSet<>();
    for (AmplifierSection section : scene.circuit().elements(AmplifierSection.class)) {
      if (!scene.predictable(section.grid()) && floatingGrids.add(section.grid())) {
        findings.add(
            finding(
                scene,
                FindingCode.GRID_NO_LEAK,
                section,
                "the grid of "
                    + named(scene, section)
                    + " has no leak: node "
                    + section.grid().name()
                    + " has no DC path"));
      }
      nowhere(scene, section).ifPresent(findings::add);
      exchanged(scene, section).ifPresent(findings::add);
    }
    return Stream.concat(findings.stream(), reflectedLoads(scene));
  }

  private static String named(Scene scene, AmplifierSection section) {
    return scene.named(section.name(), section.bottle());
  }

  private static Finding finding(
      Scene scene, FindingCode code, AmplifierSection section, String message) {
    return code.of(scene.words(), section.name(), message);
  }

  /** Tells which electrode of a section leads nowhere. */
  private static Optional<Finding> nowhere(Scene scene, AmplifierSection section) {
    Node screen = section.screen();
    boolean idle = scene.map().idleSections().contains(section.name());
    String electrode = null;
    Node node = section.cathode();
    if (!scene.predictable(section.cathode())) {
      electrode = "cathode";
    } else if (!scene.predictable(section.plate())) {
      electrode = "{plate}";
      node = section.plate();
    } else if (screen != null && !scene.predictable(screen)) {
      electrode = "screen";
      node = screen;
    } else if (idle) {
      electrode = "{plate} circuit";
      node = section.plate();
    }
    if (electrode == null) {
      return Optional.empty();
    }
    return Optional.of(
        finding(
            scene,
            FindingCode.NO_CURRENT,
            section,
            "the "
                + electrode
                + " of "
                + named(scene, section)
                + " goes nowhere: no DC path from node "
                + node.name()
                + (idle ? ", so no current flows in it" : "")));
  }

  private static Optional<Finding> exchanged(Scene scene, AmplifierSection section) {
    Node screen = section.screen();
    if (screen == null || !scene.predictable(screen) || screen.equals(section.plate())) {
      return Optional.empty();
    }
    if (high(scene, section.grid()) && low(scene, screen)) {
      return Optional.of(
          finding(
              scene,
              FindingCode.SCREEN_GRID_EXCHANGED,
              section,
              named(scene, section)
                  + " has its grid on the supply (node "
                  + section.grid().name()
                  + ") and its screen at no volts (node "
                  + screen.name()
                  + "): exchanged?"));
    }
    boolean exchanged =
        throughWinding(scene, section, Electrode.SCREEN)
            && !throughWinding(scene, section, Electrode.PLATE);
    return exchanged
        ? Optional.of(
            finding(
                scene,
                FindingCode.PLATE_SCREEN_EXCHANGED,
                section,
                named(scene, section)
                    + " has its screen on the transformer (node "
                    + screen.name()
                    + ") and its {plate} on the supply (node "
                    + section.plate().name()
                    + "): exchanged?"))
        : Optional.empty();
  }

  private static boolean high(Scene scene, Node node) {
    Optional<Node> supply = scene.map().supplyOf(node);
    return supply.isPresent()
        && (scene.point() == null || scene.point().volts(supply.get()) > HIGH_VOLTS);
  }

  private static boolean low(Scene scene, Node node) {
    Optional<Node> supply = scene.map().supplyOf(node);
    return supply.isEmpty()
        || (scene.point() != null && scene.point().volts(supply.get()) < HIGH_VOLTS);
  }

  /** Returns whether a coil stands between the electrode and its supply node. */
  private static boolean throughWinding(
      Scene scene, AmplifierSection section, Electrode electrode) {
    DcPath path = scene.paths().to(section, electrode);
    List<DcStep> there = path.there();
    int from = 0;
    for (int k = 0; k < there.size(); k++) {
      if (there.get(k).to().equals(path.supply())) {
        from = k + 1;
      }
    }
    return there.subList(from, there.size()).stream()
        .anyMatch(step -> step.element() instanceof Inductor);
  }

  private static Stream<Finding> reflectedLoads(Scene scene) {
    Set<Node> plates = new HashSet<>();
    scene.circuit().elements(AmplifierSection.class).forEach(s -> plates.add(s.plate()));
    return scene.circuit().elements(Inductor.class).stream()
        .filter(inductor -> inductor.dcOhms() > WINDING_OHMS)
        .filter(inductor -> inductor.nodes().stream().anyMatch(plates::contains))
        .map(
            inductor ->
                FindingCode.REFLECTED_LOAD.of(
                    scene.words(),
                    inductor.name(),
                    inductor.name()
                        + " has "
                        + Quantity.ohms(inductor.dcOhms())
                        + " on a {plate}: is that the reflected load?"));
  }
}
