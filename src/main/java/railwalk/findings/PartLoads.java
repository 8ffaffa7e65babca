package railwalk.findings;

import java.util.stream.Stream;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Fuse;
import railwalk.circuit.Line;
import railwalk.circuit.Resistor;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;

/** Capacitors, resistors and fuses against their ratings. */
final class PartLoads {
  /** A fuse that carries more than this share of its rating is near it (common practice). */
  private static final double FUSE_SHARE = 0.75;

  private PartLoads() {}

  static Stream<Finding> check(Solved solved) {
    return Stream.of(capacitors(solved), unloaded(solved), resistors(solved), fuses(solved))
        .flatMap(f -> f);
  }

  private static Stream<Finding> capacitors(Solved solved) {
    Scene scene = solved.scene();
    return scene.circuit().elements(Capacitor.class).stream()
        .filter(capacitor -> volts(solved, capacitor) > capacitor.ratedVolts())
        .map(
            capacitor ->
                FindingCode.CAPACITOR_VOLTS.of(
                    scene.words(),
                    capacitor.name(),
                    capacitor.name()
                        + " has "
                        + Quantity.volts(volts(solved, capacitor))
                        + " DC across it and is rated "
                        + Quantity.volts(capacitor.ratedVolts())));
  }

  private static Stream<Finding> unloaded(Solved solved) {
    OperatingPoint unloaded = solved.unloaded();
    if (unloaded == null) {
      return Stream.empty();
    }
    Line line = unloaded.circuit().line();
    Scene scene = solved.scene();
    String where =
        scene.circuit().line().stated()
            ? ", the {line} at " + Quantity.volts(line.volts()) + ","
            : ", the {line} 10 % high,";
    return CapacitorDuty.of(solved.point(), unloaded).stream()
        .filter(duty -> duty.isOverUnloaded() && !duty.isOverRunning())
        .map(
            duty ->
                FindingCode.CAPACITOR_UNLOADED.of(
                    scene.words(),
                    duty.capacitor().name(),
                    duty.capacitor().name()
                        + " rises to "
                        + Quantity.volts(duty.unloadedVolts())
                        + " before the {tubes} warm up"
                        + where
                        + " and is rated "
                        + Quantity.volts(duty.capacitor().ratedVolts())));
  }

  private static double volts(Solved solved, Capacitor capacitor) {
    return Math.abs(solved.point().volts(capacitor.a()) - solved.point().volts(capacitor.b()));
  }

  private static Stream<Finding> resistors(Solved solved) {
    Scene scene = solved.scene();
    return scene.circuit().elements(Resistor.class).stream()
        .filter(resistor -> solved.point().watts(resistor) > resistor.ratedWatts())
        .map(
            resistor ->
                FindingCode.RESISTOR_WATTS.of(
                    scene.words(),
                    resistor.name(),
                    resistor.name()
                        + " turns "
                        + Quantity.watts(solved.point().watts(resistor))
                        + " to heat and is rated "
                        + Quantity.watts(resistor.ratedWatts())));
  }

  private static Stream<Finding> fuses(Solved solved) {
    Scene scene = solved.scene();
    return scene.circuit().elements(Fuse.class).stream()
        .filter(fuse -> Math.abs(solved.point().amps(fuse)) > FUSE_SHARE * fuse.ratedAmps())
        .map(
            fuse ->
                FindingCode.FUSE_CURRENT.of(
                    scene.words(),
                    fuse.name(),
                    fuse.name()
                        + " carries "
                        + Quantity.amps(Math.abs(solved.point().amps(fuse)))
                        + " DC at rest of its "
                        + Quantity.amps(fuse.ratedAmps())));
  }
}
