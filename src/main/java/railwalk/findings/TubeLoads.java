package railwalk.findings;

import java.util.Optional;
import java.util.stream.Stream;
import railwalk.circuit.AmplifierSection;
import railwalk.device.Ratings;
import railwalk.solve.SectionPoint;
import railwalk.units.Quantity;

/** Amplifying tubes against the limits of their sheets. */
final class TubeLoads {
  private TubeLoads() {}

  static Stream<Finding> check(Solved solved) {
    Stream<Finding> amplifiers =
        solved.scene().circuit().elements(AmplifierSection.class).stream()
            .filter(s -> !solved.scene().map().idleSections().contains(s.name()))
            .flatMap(section -> limits(solved, section));
    Stream<Finding> heaters =
        HeaterDuty.of(solved.point()).stream().flatMap(duty -> heater(solved, duty).stream());
    return Stream.concat(amplifiers, heaters);
  }

  private static Stream<Finding> limits(Solved solved, AmplifierSection section) {
    Ratings limits = section.type().ratings();
    SectionPoint point = solved.point().at(section);
    String system = limits.system();
    return Stream.of(
            over(
                solved,
                section,
                FindingCode.PLATE_WATTS,
                ": {plate} ",
                new Excess(point.plateWatts(), limits.plateWattsMax(), "W", system)),
            over(
                solved,
                section,
                FindingCode.SCREEN_WATTS,
                ": screen ",
                new Excess(point.screenWatts(), limits.screenWattsMax(), "W", system)),
            over(
                solved,
                section,
                FindingCode.PLATE_VOLTS,
                ": {plate} to cathode ",
                new Excess(point.plateVolts(), limits.plateVoltsMax(), "V", system)),
            over(
                solved,
                section,
                FindingCode.SCREEN_VOLTS,
                ": screen to cathode ",
                new Excess(point.screenVolts(), limits.screenVoltsMax(), "V", system)),
            over(
                solved,
                section,
                FindingCode.CATHODE_CURRENT,
                ": cathode current ",
                new Excess(point.cathodeAmps(), limits.cathodeAmpsMax(), "A", system)))
        .flatMap(Optional::stream);
  }

  private static Optional<Finding> over(
      Solved solved, AmplifierSection section, FindingCode code, String verb, Excess excess) {
    if (!excess.is()) {
      return Optional.empty();
    }
    String name = solved.scene().named(section.name(), section.bottle());
    String words = code == FindingCode.CATHODE_CURRENT ? excess.words() : excess.wordsWithCustom();
    return Optional.of(code.of(solved.scene().words(), section.name(), name + verb + words));
  }

  /**
   * Compares the volts between heater and cathode with the limit. A heater whose pins the netlist
   * leaves out counts as at the reference, as most are.
   */
  private static Optional<Finding> heater(Solved solved, HeaterDuty duty) {
    if (!(duty.acrossVolts() > duty.acrossVoltsMax())) {
      return Optional.empty();
    }
    return Optional.of(
        FindingCode.HEATER_CATHODE.of(
            solved.scene().words(),
            duty.section(),
            solved.scene().named(duty.section(), duty.bottle().name())
                + " has "
                + Quantity.volts(duty.acrossVolts())
                + (duty.atPeak() ? " at the peak" : "")
                + " between cathode and heater"
                + (duty.isWired() ? "" : " (heater taken as at the reference)")
                + ", limit "
                + Quantity.volts(duty.acrossVoltsMax())));
  }
}
