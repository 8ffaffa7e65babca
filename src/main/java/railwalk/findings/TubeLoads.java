package railwalk.findings;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.device.Electrode;
import railwalk.device.PinUse;
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
    Stream<Finding> rectifiers =
        solved.scene().circuit().elements(RectifierSection.class).stream()
            .flatMap(
                s ->
                    heater(solved, s.name(), s.bottle(), s.cathode(), s.type().ratings()).stream());
    return Stream.concat(amplifiers, rectifiers);
  }

  private static Stream<Finding> limits(Solved solved, AmplifierSection section) {
    Ratings limits = section.type().ratings();
    SectionPoint point = solved.point().at(section);
    String system = limits.system();
    Stream<Finding> over =
        Stream.of(
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
    return Stream.concat(
        over, heater(solved, section.name(), section.bottle(), section.cathode(), limits).stream());
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
  private static Optional<Finding> heater(
      Solved solved, String section, String bottleName, Node cathode, Ratings limits) {
    double limit = limits.heaterCathodeVoltsMax();
    Optional<Bottle> bottle = solved.scene().circuit().bottle(bottleName);
    if (Double.isNaN(limit)
        || bottle.isEmpty()
        || bottle.get().type().heater().directlyHeated()
        || bottle.get().type().heater().cathodeJoined()) {
      return Optional.empty();
    }
    List<Node> heater = heaterNodes(bottle.get());
    double heaterVolts = heater.stream().mapToDouble(solved.point()::volts).average().orElse(0);
    double volts = solved.point().volts(cathode) - heaterVolts;
    if (!(Math.abs(volts) > limit)) {
      return Optional.empty();
    }
    return Optional.of(
        FindingCode.HEATER_CATHODE.of(
            solved.scene().words(),
            section,
            solved.scene().named(section, bottleName)
                + " has "
                + Quantity.volts(Math.abs(volts))
                + " between cathode and heater"
                + (heater.isEmpty() ? " (heater taken as at the reference)" : "")
                + ", limit "
                + Quantity.volts(limit)));
  }

  private static List<Node> heaterNodes(Bottle bottle) {
    return bottle.pins().entrySet().stream()
        .filter(pin -> isHeater(bottle.type().pins().get(pin.getKey())))
        .map(Map.Entry::getValue)
        .toList();
  }

  private static boolean isHeater(@Nullable PinUse use) {
    Electrode electrode = use == null ? null : use.electrode();
    return electrode != null && electrode.isHeater();
  }
}
