package railwalk.findings;

import java.util.Optional;
import java.util.stream.Stream;
import railwalk.circuit.RegulatorSection;
import railwalk.device.GasLaw;
import railwalk.solve.SectionPoint;
import railwalk.units.Quantity;

/** Regulator tubes that stay dark, or run outside the current for which their volts hold. */
final class GasTubes {
  private GasTubes() {}

  static Stream<Finding> check(Solved solved) {
    return solved.scene().circuit().elements(RegulatorSection.class).stream()
        .flatMap(section -> check(solved, section).stream());
  }

  private static Optional<Finding> check(Solved solved, RegulatorSection section) {
    GasLaw law = section.law();
    SectionPoint point = solved.point().at(section);
    String name = solved.scene().named(section.name(), section.bottle());
    if (!solved.point().lit(section.name())) {
      return Optional.of(
          FindingCode.REGULATOR_DARK.of(
              solved.scene().words(),
              section.name(),
              name
                  + " stays dark: "
                  + Quantity.volts(point.plateVolts())
                  + " across it, it strikes at "
                  + Quantity.volts(law.strikeVolts())));
    }
    double amps = point.plateAmps();
    if (amps >= law.minimumAmps() && amps <= law.maximumAmps()) {
      return Optional.empty();
    }
    boolean over = amps > law.maximumAmps();
    return Optional.of(
        FindingCode.REGULATOR_CURRENT.of(
            solved.scene().words(),
            section.name(),
            name
                + " passes "
                + Quantity.amps(amps)
                + (over
                    ? ", over its " + Quantity.amps(law.maximumAmps())
                    : ", below the "
                        + Quantity.amps(law.minimumAmps())
                        + " from which it regulates"),
            over ? "more resistance before it" : "less resistance before it, or less load"));
  }
}
