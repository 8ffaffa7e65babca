package railwalk.findings;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.device.Electrode;
import railwalk.device.Ratings;
import railwalk.solve.SectionPoint;
import railwalk.units.Quantity;
import railwalk.walk.DcPath;
import railwalk.walk.DcStep;

/** Grids that stand positive, and grid circuits of more ohms than the sheet allows. */
final class GridLoads {
  /** Above this a grid draws current that no healthy stage at rest does. */
  private static final double POSITIVE_VOLTS = 0.3;

  /** Up to this a resistor in a cathode lead is there to measure, not to bias. */
  private static final double SENSE_OHMS = 20;

  private static final double PART_TOLERANCE = 1.05;

  private GridLoads() {}

  static Stream<Finding> check(Solved solved) {
    return solved.scene().circuit().elements(AmplifierSection.class).stream()
        .filter(section -> !solved.scene().map().idleSections().contains(section.name()))
        .filter(section -> solved.scene().predictable(section.grid()))
        .flatMap(
            section ->
                Stream.concat(positive(solved, section).stream(), leak(solved, section).stream()));
  }

  private static Optional<Finding> positive(Solved solved, AmplifierSection section) {
    SectionPoint point = solved.point().at(section);
    if (!(point.gridVolts() > POSITIVE_VOLTS)) {
      return Optional.empty();
    }
    return Optional.of(
        FindingCode.POSITIVE_GRID.of(
            solved.scene().words(),
            section.name(),
            "the grid of "
                + solved.scene().named(section.name(), section.bottle())
                + " stands "
                + Quantity.volts(point.gridVolts())
                + " above its cathode and draws "
                + Quantity.amps(point.gridAmps())));
  }

  private static Optional<Finding> leak(Solved solved, AmplifierSection section) {
    Ratings limits = section.type().ratings();
    boolean fixed = fixedBias(solved, section);
    double limit = fixed ? limits.gridLeakFixedBiasOhmsMax() : limits.gridLeakCathodeBiasOhmsMax();
    OptionalDouble ohms = Double.isNaN(limit) ? OptionalDouble.empty() : leakOhms(solved, section);
    if (ohms.isEmpty() || ohms.getAsDouble() <= limit * PART_TOLERANCE) {
      return Optional.empty();
    }
    return Optional.of(
        FindingCode.GRID_LEAK.of(
            solved.scene().words(),
            section.name(),
            "the grid circuit of "
                + solved.scene().named(section.name(), section.bottle())
                + " has "
                + Quantity.ohms(ohms.getAsDouble())
                + ", its sheet allows "
                + Quantity.ohms(limit)
                + (fixed ? " with fixed bias" : " with cathode bias")));
  }

  /** Returns whether nothing but a sense resistor lets the cathode follow its own current. */
  private static boolean fixedBias(Solved solved, AmplifierSection section) {
    DcPath path = solved.scene().paths().to(section, Electrode.CATHODE);
    Node reference = solved.scene().circuit().reference();
    double ohms = 0;
    for (DcStep step : path.back()) {
      if (step.from().equals(reference)) {
        break;
      }
      ohms += step.element() instanceof Resistor resistor ? resistor.ohms() : 0;
    }
    return ohms <= SENSE_OHMS;
  }

  /** Returns the ohms from the grid to what sets its volts; none when a tube does. */
  private static OptionalDouble leakOhms(Solved solved, AmplifierSection section) {
    DcPath path = solved.scene().paths().to(section, Electrode.GRID);
    List<DcStep> there = path.there();
    int from = 0;
    for (int k = 0; k < there.size(); k++) {
      if (there.get(k).to().equals(path.supply())) {
        from = k + 1;
      }
    }
    double ohms = 0;
    for (DcStep step : there.subList(from, there.size())) {
      Element element = step.element();
      if (element instanceof AmplifierSection || passesPlate(solved, step)) {
        return OptionalDouble.empty();
      }
      if (element instanceof Resistor resistor) {
        ohms += resistor.ohms();
      } else if (element instanceof Potentiometer pot) {
        boolean upper = step.from().equals(pot.a()) || step.to().equals(pot.a());
        ohms += pot.ohms() * (upper ? 1 - pot.share() : pot.share());
      }
    }
    return OptionalDouble.of(ohms);
  }

  private static boolean passesPlate(Solved solved, DcStep step) {
    return solved.scene().circuit().elements(AmplifierSection.class).stream()
        .anyMatch(section -> section.plate().equals(step.from()));
  }
}
