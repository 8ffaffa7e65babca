package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.RectifierSection;
import railwalk.device.DiodeLimits;
import railwalk.device.RectifierRatings;
import railwalk.solve.OperatingPoint;
import railwalk.solve.RectifierLoad;

/**
 * What one rectifier stands against its limits, NaN where none is on file. A tube's limits are held
 * against the amplifier as it runs. Those of silicon are absolute: its inverse volts are told at no
 * load on the high line where that is known.
 *
 * @param rectifier a tube's section or a diode
 * @param meanAmps of all its plates together
 * @param peakAmps of one plate
 * @param inverseVolts greatest volts against its way
 * @param unloaded whether the inverse volts are those before the tubes warm up, on the high line
 */
public record RectifierDuty(
    Element rectifier,
    double meanAmps,
    double meanAmpsMax,
    double peakAmps,
    double peakAmpsMax,
    double inverseVolts,
    double inverseVoltsMax,
    boolean unloaded) {

  /** Returns the duty of every rectifier that feeds a supply, in netlist order. */
  public static List<RectifierDuty> of(OperatingPoint point, @Nullable OperatingPoint unloaded) {
    List<RectifierDuty> duties = new ArrayList<>();
    List<RectifierLoad> loads = point.acLoads().rectifiers();
    List<RectifierLoad> atNoLoad = unloaded == null ? List.of() : unloaded.acLoads().rectifiers();
    for (Element element : point.circuit().elements()) {
      if (element instanceof RectifierSection || element instanceof Diode) {
        List<RectifierLoad> own = of(element, loads);
        if (!own.isEmpty()) {
          duties.add(duty(element, own, of(element, atNoLoad)));
        }
      }
    }
    return duties;
  }

  private static List<RectifierLoad> of(Element element, List<RectifierLoad> loads) {
    List<RectifierLoad> own = new ArrayList<>();
    for (RectifierLoad load : loads) {
      if (load.rectifier().equals(element)) {
        own.add(load);
      }
    }
    return own;
  }

  private static RectifierDuty duty(
      Element element, List<RectifierLoad> loads, List<RectifierLoad> atNoLoad) {
    double mean = 0;
    double peak = 0;
    for (RectifierLoad load : loads) {
      mean += load.meanAmps();
      peak = Math.max(peak, load.peakAmps());
    }
    double inverse = inverse(loads);
    if (element instanceof RectifierSection section) {
      RectifierRatings limits = section.type().rectifierRatings();
      return new RectifierDuty(
          element,
          mean,
          limits.dcAmpsMax(),
          peak,
          limits.peakPlateAmpsMax(),
          inverse,
          limits.peakInverseVoltsMax(),
          false);
    }
    DiodeLimits limits = DiodeLimits.of(((Diode) element).typeName());
    boolean unloaded = !atNoLoad.isEmpty();
    return new RectifierDuty(
        element,
        mean,
        limits.dcAmpsMax(),
        peak,
        Double.NaN,
        unloaded ? Math.max(inverse, inverse(atNoLoad)) : inverse,
        limits.inverseVoltsMax(),
        unloaded);
  }

  private static double inverse(List<RectifierLoad> loads) {
    double inverse = 0;
    for (RectifierLoad load : loads) {
      inverse = Math.max(inverse, load.inverseVolts());
    }
    return inverse;
  }
}
