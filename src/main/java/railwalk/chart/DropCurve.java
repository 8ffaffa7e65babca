package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Plot.Spot;
import railwalk.device.PublishedPoint;
import railwalk.device.SectionType;
import railwalk.device.TwoPoleLaw;

/** The current of one rectifier plate over the volts across it, with the published drops. */
final class DropCurve {
  private static final double PAST_POINTS = 1.5;
  private static final double USUAL_AMPS = 0.1;
  private static final double HEADROOM = 1.02;

  private DropCurve() {}

  static Plot of(SectionType section, List<NumberedPoint> points) {
    TwoPoleLaw law = (TwoPoleLaw) section.law();
    double published =
        points.stream().mapToDouble(p -> p.point().published().plateAmps()).max().orElse(0);
    double rated = section.rectifierRatings().dcAmpsMax();
    double amps = PAST_POINTS * Math.max(Double.isNaN(rated) ? 0 : rated, published);
    Plot.Axis y =
        Ticks.axis("current, mA", 1000 * (amps > 0 ? amps : USUAL_AMPS), CurveField.TICKS);
    double reach = HEADROOM * PlateDrop.volts(law, y.to() / 1000);
    Plot.Axis x = Ticks.axis("volts across one plate", reach, CurveField.TICKS);
    List<Spot> spots = new ArrayList<>();
    for (int i = 0; i <= CurveField.STEPS; i++) {
      double milliamps = y.to() * i / CurveField.STEPS;
      spots.add(new Spot(i == 0 ? 0 : PlateDrop.volts(law, milliamps / 1000), milliamps));
    }
    List<Plot.Mark> marks = new ArrayList<>();
    for (NumberedPoint numbered : points) {
      PublishedPoint point = numbered.point();
      double volts = point.setup().plateVolts();
      double milliamps = 1000 * point.published().plateAmps();
      if (volts <= x.to() && milliamps <= y.to()) {
        marks.add(new Plot.Mark(Integer.toString(numbered.number()), new Spot(volts, milliamps)));
      }
    }
    return new Plot(
        "Drop of one plate", x, y, List.of(new Plot.Curve("", Plot.Line.PLAIN, spots)), marks);
  }
}
