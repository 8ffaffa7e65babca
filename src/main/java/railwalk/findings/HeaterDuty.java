package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.device.Electrode;
import railwalk.device.PinUse;
import railwalk.device.Ratings;
import railwalk.solve.AcLoads;
import railwalk.solve.OperatingPoint;

/**
 * What a tube's heater gets, and what stands between it and the cathode.
 *
 * @param ratedVolts of the heater as it is wired; NaN when its pins are not
 * @param rmsVolts under load; NaN when not known
 * @param heaterVolts mean, against the reference; 0 when its pins are not wired: most heaters are
 *     at the reference
 * @param section the section whose cathode stands furthest from the heater; empty when the cathode
 *     is the filament or joined to it
 * @param cathodeVolts its mean; NaN when there is none
 * @param acrossVolts greatest volts between heater and cathode: of direct current, and where the
 *     heater is in a string across the line, at the peak; NaN when there is no such cathode
 * @param acrossVoltsMax limit; NaN when the sheet gives none
 */
public record HeaterDuty(
    Bottle bottle,
    double ratedVolts,
    double rmsVolts,
    double heaterVolts,
    String section,
    double cathodeVolts,
    double acrossVolts,
    double acrossVoltsMax) {

  /** Most that a heater's volts may be off their rating (common practice, and many sheets). */
  public static final double TOLERANCE = 0.10;

  /** Returns the duty of every tube that has a heater, in netlist order. */
  public static List<HeaterDuty> of(OperatingPoint point) {
    List<HeaterDuty> duties = new ArrayList<>();
    Circuit circuit = point.circuit();
    for (Bottle bottle : circuit.bottles()) {
      boolean out = true;
      for (Element element : circuit.elements()) {
        out &= !element.bottle().equals(bottle.name());
      }
      if (!out && !bottle.type().heater().connections().isEmpty()) {
        duties.add(of(point, bottle));
      }
    }
    return duties;
  }

  private static HeaterDuty of(OperatingPoint point, Bottle bottle) {
    List<Filament> filaments = new ArrayList<>();
    for (Element element : point.circuit().elements()) {
      if (element instanceof Filament filament && filament.bottle().equals(bottle.name())) {
        filaments.add(filament);
      }
    }
    List<Node> pins = heaterNodes(bottle);
    double heater = 0;
    for (Node pin : pins) {
      heater += point.volts(pin) / pins.size();
    }
    HeaterDuty duty =
        new HeaterDuty(
            bottle,
            ratedVolts(filaments),
            rmsVolts(point, filaments),
            heater,
            "",
            Double.NaN,
            Double.NaN,
            Double.NaN);
    boolean apart =
        !bottle.type().heater().directlyHeated() && !bottle.type().heater().cathodeJoined();
    for (Element element : point.circuit().elements()) {
      if (apart && element.bottle().equals(bottle.name())) {
        duty = duty.with(point, element, pins);
      }
    }
    return duty;
  }

  /** Returns the duty with the section's cathode if it stands further off than the one so far. */
  private HeaterDuty with(OperatingPoint point, Element element, List<Node> pins) {
    @Nullable Node cathode =
        element instanceof AmplifierSection a
            ? a.cathode()
            : element instanceof RectifierSection r ? r.cathode() : null;
    Ratings limits =
        element instanceof AmplifierSection a
            ? a.type().ratings()
            : element instanceof RectifierSection r ? r.type().ratings() : Ratings.NONE;
    boolean idle = point.map().idleSections().contains(element.name());
    if (cathode == null || idle || Double.isNaN(point.volts(cathode))) {
      return this;
    }
    double across = across(point, cathode, pins);
    if (!(Double.isNaN(acrossVolts) || across > acrossVolts)) {
      return this;
    }
    return new HeaterDuty(
        bottle,
        ratedVolts,
        rmsVolts,
        heaterVolts,
        element.name(),
        point.volts(cathode),
        across,
        limits.heaterCathodeVoltsMax());
  }

  /**
   * Returns the greatest volts between the heater and a cathode. Where the heater swings with the
   * line, its own extremes count, else the mean of its ends.
   */
  private double across(OperatingPoint point, Node cathode, List<Node> pins) {
    AcLoads.Range there = point.range(cathode);
    double greatest = Math.abs(point.volts(cathode) - heaterVolts);
    for (Node pin : pins) {
      AcLoads.Range here = point.range(pin);
      if (here.highestVolts() > here.lowestVolts()) {
        greatest = Math.max(greatest, Math.abs(here.highestVolts() - there.lowestVolts()));
        greatest = Math.max(greatest, Math.abs(there.highestVolts() - here.lowestVolts()));
      }
    }
    return greatest;
  }

  /** Returns whether the greatest volts between heater and cathode are those of an instant. */
  public boolean atPeak() {
    return acrossVolts > Math.abs(cathodeVolts - heaterVolts) + 1;
  }

  /** Returns whether the heater's pins are wired, so that its volts are known. */
  public boolean isWired() {
    return !heaterNodes(bottle).isEmpty();
  }

  /** Returns whether the heater gets more than its tolerance allows. */
  public boolean isOverheated() {
    return rmsVolts > (1 + TOLERANCE) * ratedVolts;
  }

  private static double ratedVolts(List<Filament> filaments) {
    double sum = 0;
    for (Filament filament : filaments) {
      if (abreast(filaments)) {
        return filament.ratedVolts();
      }
      sum += filament.ratedVolts();
    }
    return filaments.isEmpty() ? Double.NaN : sum;
  }

  private static double rmsVolts(OperatingPoint point, List<Filament> filaments) {
    Map<Filament, Double> known = point.acLoads().heaterRmsVolts();
    double sum = 0;
    for (Filament filament : filaments) {
      double volts = known.getOrDefault(filament, Double.NaN);
      if (abreast(filaments)) {
        return volts;
      }
      sum += volts;
    }
    return filaments.isEmpty() ? Double.NaN : sum;
  }

  /** Returns whether two halves are wired in parallel, not in series. */
  private static boolean abreast(List<Filament> filaments) {
    return filaments.size() == 2
        && filaments.get(0).nodes().stream().allMatch(filaments.get(1).nodes()::contains);
  }

  private static List<Node> heaterNodes(Bottle bottle) {
    List<Node> nodes = new ArrayList<>();
    for (Map.Entry<Integer, Node> pin : bottle.pins().entrySet()) {
      PinUse use = bottle.type().pins().get(pin.getKey());
      Electrode electrode = use == null ? null : use.electrode();
      if (electrode != null && electrode.isHeater()) {
        nodes.add(pin.getValue());
      }
    }
    return nodes;
  }
}
