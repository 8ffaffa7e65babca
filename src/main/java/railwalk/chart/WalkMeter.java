package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Meter;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;

/** What meters read at a point, and why. */
final class WalkMeter {
  /** Below this an old meter's loading is not worth telling. */
  private static final double NOTABLE = 0.03;

  /** Below this there is nothing but wire and contacts. */
  private static final double METAL_OHMS = 1e-3;

  private static final Meter GOOD_NEEDLE = new Meter(Double.NaN, 20e3, Meter.USUAL_RANGES_VOLTS);
  private static final Meter OLD_NEEDLE = new Meter(Double.NaN, 1e3, Meter.USUAL_RANGES_VOLTS);

  private final OperatingPoint point;

  WalkMeter(OperatingPoint point) {
    this.point = point;
  }

  /** Returns the sentence for one node. */
  String line(Node node) {
    double volts = point.volts(node);
    if (point.sourceOhms(node) < METAL_OHMS) {
      return "Meter: plain metal to the reference, any meter reads " + Quantity.volts(volts) + ".";
    }
    String source =
        "Meter: the source is about " + Quantity.ohms(twoDigits(point.sourceOhms(node)));
    if (Quantity.plainVolts(volts).equals("0")) {
      return source + ", but at 0 V there is nothing to load.";
    }
    List<Meter> meters = new ArrayList<>(List.of(Meter.TEN_MEGOHM, GOOD_NEEDLE, OLD_NEEDLE));
    Meter own = point.circuit().meter();
    if (!meters.contains(own)) {
      meters.add(0, own);
    }
    List<String> readings = new ArrayList<>();
    for (Meter meter : meters) {
      readings.add(name(meter, volts) + " reads " + Quantity.volts(read(node, meter)));
    }
    double old = read(node, OLD_NEEDLE);
    boolean notable = Math.abs(old - volts) > NOTABLE * Math.abs(volts);
    return source
        + "; "
        + String.join(", ", readings)
        + (notable ? ": so an old chart may say " + Quantity.volts(old) + "." : ".");
  }

  private double read(Node node, Meter meter) {
    return point.meterVolts(node, meter.inputOhms(point.volts(node)));
  }

  private static String name(Meter meter, double volts) {
    if (!Double.isNaN(meter.ohms())) {
      return Quantity.ohms(meter.ohms());
    }
    return Quantity.ohms(meter.ohmsPerVolt()).replace("Ω", "Ω/V")
        + " on its "
        + Quantity.volts(meter.rangeFor(volts))
        + " range";
  }

  private static double twoDigits(double ohms) {
    if (!(ohms > 0)) {
      return ohms;
    }
    double step = Math.pow(10, Math.floor(Math.log10(ohms)) - 1);
    return Math.rint(ohms / step) * step;
  }
}
