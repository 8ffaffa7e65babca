package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import railwalk.circuit.Diode;
import railwalk.circuit.RectifierSection;

/** Rectifiers against the limits of their sheets. */
final class RectifierLoads {
  private static final String SILICON_HINT =
      "two in series, each with its own resistor across it, or a type that stands more";

  private RectifierLoads() {}

  static Stream<Finding> check(Solved solved) {
    List<Finding> findings = new ArrayList<>();
    for (RectifierDuty duty : RectifierDuty.of(solved.point(), solved.unloaded())) {
      if (duty.rectifier() instanceof RectifierSection section) {
        check(solved, section, duty, findings);
      } else {
        check(solved, (Diode) duty.rectifier(), duty, findings);
      }
    }
    return findings.stream();
  }

  private static void check(
      Solved solved, RectifierSection section, RectifierDuty duty, List<Finding> findings) {
    String name = solved.scene().named(section.name(), section.bottle());
    String system = section.type().ratings().system();
    Excess mean = new Excess(duty.meanAmps(), duty.meanAmpsMax(), "A", system);
    Excess peak = new Excess(duty.peakAmps(), duty.peakAmpsMax(), "A", system);
    Excess inverse = new Excess(duty.inverseVolts(), duty.inverseVoltsMax(), "V", system);
    if (mean.is()) {
      findings.add(of(solved, FindingCode.RECTIFIER_DC, duty, name + ": DC " + mean.words()));
    }
    if (peak.is()) {
      findings.add(
          of(solved, FindingCode.RECTIFIER_PEAK, duty, name + ": charging peaks " + peak.words()));
    }
    if (inverse.is()) {
      findings.add(
          of(
              solved,
              FindingCode.RECTIFIER_INVERSE,
              duty,
              name + ": inverse peak " + inverse.words()));
    }
  }

  private static void check(
      Solved solved, Diode diode, RectifierDuty duty, List<Finding> findings) {
    String name = diode.name() + " (" + diode.typeName() + ")";
    Excess mean = new Excess(duty.meanAmps(), duty.meanAmpsMax(), "A", "absolute");
    Excess inverse = new Excess(duty.inverseVolts(), duty.inverseVoltsMax(), "V", "absolute");
    if (mean.is()) {
      findings.add(of(solved, FindingCode.RECTIFIER_DC, duty, name + ": DC " + mean.words()));
    }
    if (inverse.is()) {
      String when =
          duty.unloaded() ? ": inverse peak at no load on a high line " : ": inverse peak ";
      findings.add(
          FindingCode.RECTIFIER_INVERSE.of(
              solved.scene().words(), diode.name(), name + when + inverse.words(), SILICON_HINT));
    }
  }

  private static Finding of(Solved solved, FindingCode code, RectifierDuty duty, String message) {
    return code.of(solved.scene().words(), duty.rectifier().name(), message);
  }
}
