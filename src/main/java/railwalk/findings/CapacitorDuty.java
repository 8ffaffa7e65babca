package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Capacitor;
import railwalk.solve.OperatingPoint;

/**
 * The DC volts across a capacitor that holds a supply or a bias: as the amplifier runs, and on a
 * high line before the tubes warm up.
 *
 * @param runningVolts NaN when not predictable
 * @param unloadedVolts NaN when not known
 */
public record CapacitorDuty(Capacitor capacitor, double runningVolts, double unloadedVolts) {
  /**
   * From this size up capacitors are electrolytics as a rule, which stand little more than their
   * rating. Paper and film ones are tested at half as much again or more (common practice), so that
   * half a minute of cold tubes does them no harm.
   */
  private static final double ELECTROLYTIC_FARADS = 0.5e-6;

  /** An excess too small to be told from the rating as printed. */
  private static final double NOTHING = 1.005;

  /** Returns the duty of every capacitor from the size of an electrolytic up, in netlist order. */
  public static List<CapacitorDuty> of(OperatingPoint point, @Nullable OperatingPoint unloaded) {
    List<CapacitorDuty> duties = new ArrayList<>();
    for (Capacitor capacitor : point.circuit().elements(Capacitor.class)) {
      if (capacitor.farads() >= ELECTROLYTIC_FARADS) {
        duties.add(
            new CapacitorDuty(
                capacitor,
                volts(point, capacitor),
                unloaded == null ? Double.NaN : volts(unloaded, capacitor)));
      }
    }
    return duties;
  }

  private static double volts(OperatingPoint point, Capacitor capacitor) {
    return Math.abs(point.volts(capacitor.a()) - point.volts(capacitor.b()));
  }

  /** Returns whether the volts stand above the rating while the amplifier runs. */
  public boolean isOverRunning() {
    return runningVolts > capacitor.ratedVolts();
  }

  /** Returns whether the volts rise above the rating before the tubes warm up. */
  public boolean isOverUnloaded() {
    return unloadedVolts > NOTHING * capacitor.ratedVolts();
  }
}
