package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.solve.WarmUpCourse;
import railwalk.solve.WarmUpPeak;
import railwalk.units.Quantity;

/** Capacitors against their ratings between switch-on and the end of the warm-up. */
public final class WarmUpLoads {
  private static final String HINT =
      "fit a higher rating, or a rectifier that warms up slower than the {tubes}; a surge rating, if"
          + " the can has one, is for half a minute now and then";

  private WarmUpLoads() {}

  /** A capacitor's worst case. */
  private record Worst(String occasion, WarmUpPeak peak, double secondsAbove) {}

  /**
   * Returns a finding for each capacitor that stands above its rating on any occasion, told of the
   * worst.
   *
   * @param courses by the occasion in words, such as "a cold switch-on"; of one amplifier
   */
  public static List<Finding> of(Map<String, WarmUpCourse> courses) {
    List<Finding> findings = new ArrayList<>();
    if (courses.isEmpty()) {
      return findings;
    }
    Circuit circuit = courses.values().iterator().next().circuit();
    for (Capacitor capacitor : circuit.elements(Capacitor.class)) {
      Worst worst = worst(capacitor, courses);
      if (Math.abs(worst.peak.volts()) > capacitor.ratedVolts()) {
        findings.add(
            FindingCode.CAPACITOR_VOLTS.of(
                circuit.words(), capacitor.name(), message(capacitor, worst), HINT));
      }
    }
    return findings;
  }

  private static Worst worst(Capacitor capacitor, Map<String, WarmUpCourse> courses) {
    Worst worst = new Worst("", new WarmUpPeak(0, 0, 0), 0);
    for (Map.Entry<String, WarmUpCourse> entry : courses.entrySet()) {
      WarmUpCourse course = entry.getValue();
      double[] across = course.across(capacitor);
      WarmUpPeak peak = WarmUpPeak.of(course.seconds(), across);
      if (Math.abs(peak.volts()) > 1.001 * Math.abs(worst.peak.volts())) {
        double above = WarmUpPeak.secondsAbove(course.seconds(), across, capacitor.ratedVolts());
        worst = new Worst(entry.getKey(), peak, above);
      }
    }
    return worst;
  }

  private static String message(Capacitor capacitor, Worst worst) {
    boolean stays = Math.abs(worst.peak.endVolts()) > capacitor.ratedVolts();
    return capacitor.name()
        + " has "
        + Quantity.volts(Math.abs(worst.peak.volts()))
        + " DC across it "
        + Quantity.of(worst.peak.seconds(), "s")
        + " after "
        + worst.occasion
        + " and is rated "
        + Quantity.volts(capacitor.ratedVolts())
        + (stays ? "; it stays above" : "; above for " + Quantity.of(worst.secondsAbove, "s"));
  }
}
