package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.device.RectifierRatings;
import railwalk.solve.SupplyPoint;
import railwalk.walk.RippleGroup;

/** Rectifier tubes against the limits of their sheets. */
final class RectifierLoads {
  private RectifierLoads() {}

  static Stream<Finding> check(Solved solved) {
    List<Finding> findings = new ArrayList<>();
    for (RippleGroup group : solved.scene().map().groups()) {
      Swing swing = RectifierPath.swing(solved.scene(), group);
      for (RectifierSection section : solved.scene().circuit().elements(RectifierSection.class)) {
        if (group.elements().contains(section)) {
          findings.addAll(check(solved, section, swing));
        }
      }
    }
    return findings.stream();
  }

  private static List<Finding> check(Solved solved, RectifierSection section, Swing swing) {
    RectifierRatings limits = section.type().rectifierRatings();
    String system = section.type().ratings().system();
    List<Finding> findings = new ArrayList<>();
    double dcAmps = Math.abs(solved.point().amps(section));
    add(
        findings,
        solved,
        section,
        FindingCode.RECTIFIER_DC,
        ": DC ",
        new Excess(dcAmps, limits.dcAmpsMax(), "A", system));
    Reservoir reservoir = Reservoir.at(solved.scene(), section.cathode());
    double peakAmps =
        solved.point().supplies().stream()
            .filter(supply -> reservoir.nodes().contains(supply.node()))
            .mapToDouble(SupplyPoint::peakAmps)
            .max()
            .orElse(0);
    add(
        findings,
        solved,
        section,
        FindingCode.RECTIFIER_PEAK,
        ": charging peaks ",
        new Excess(peakAmps, limits.peakPlateAmpsMax(), "A", system));
    add(
        findings,
        solved,
        section,
        FindingCode.RECTIFIER_INVERSE,
        ": inverse peak ",
        new Excess(
            inverseVolts(solved, section, swing), limits.peakInverseVoltsMax(), "V", system));
    return findings;
  }

  /** Returns the reservoir's volts plus the peak of the plate's own swing. */
  private static double inverseVolts(Solved solved, RectifierSection section, Swing swing) {
    double peak = 0;
    for (Node plate : section.plates()) {
      peak = Math.max(peak, Math.sqrt(2) * Math.abs(swing.rmsVolts().getOrDefault(plate, 0.0)));
    }
    return peak == 0 ? 0 : peak + Math.abs(solved.point().volts(section.cathode()));
  }

  private static void add(
      List<Finding> findings,
      Solved solved,
      RectifierSection section,
      FindingCode code,
      String verb,
      Excess excess) {
    if (excess.is()) {
      String name = solved.scene().named(section.name(), section.bottle());
      findings.add(code.of(solved.scene().words(), section.name(), name + verb + excess.words()));
    }
  }
}
