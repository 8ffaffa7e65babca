package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Plot.Spot;
import railwalk.units.Quantity;

/** Plate current over plate volts, a curve for each of some grid volts, and the watts limit. */
final class PlateCurves {
  private static final double SAME_SCREEN_SHARE = 0.03;
  private static final int MOST_CURVES = 11;

  private final CurveField field;

  private PlateCurves(CurveField field) {
    this.field = field;
  }

  /**
   * @param of which section is meant, for the title: ", triode", or nothing
   */
  static Plot of(CurveField field, String of) {
    return new PlateCurves(field).plot(of);
  }

  private Plot plot(String of) {
    List<Plot.Curve> curves = new ArrayList<>();
    if (!Double.isNaN(field.plateWattsMax())) {
      curves.add(wattsLimit(field.plateWattsMax()));
    }
    double cutOffVolts = field.cutOffVolts(feed(field.plateVoltsAxis().to()));
    double step = Ticks.step(-cutOffVolts, MOST_CURVES);
    for (int i = 0; -i * step > cutOffVolts; i++) {
      curve(-i * step, step, curves);
    }
    List<Plot.Mark> marks = new ArrayList<>();
    for (PointPlace place : field.places()) {
      if (isOnThese(place)) {
        field.addMark(marks, place, place.plateVolts(), field.plateVoltsAxis());
      }
    }
    String screen = field.hasScreen() ? ", screen " + Quantity.volts(field.screenVolts()) : "";
    return new Plot(
        "Plate curves by grid volts" + of + screen,
        field.plateVoltsAxis(),
        field.currentAxis(),
        curves,
        marks);
  }

  private CurveField.Feed feed(double plateVolts) {
    return new CurveField.Feed(plateVolts, field.screenVolts(), false);
  }

  private boolean isOnThese(PointPlace place) {
    double off = place.screenVolts() / field.screenVolts() - 1;
    return !field.hasScreen() || (!place.joined() && Math.abs(off) < SAME_SCREEN_SHARE);
  }

  private void curve(double gridVolts, double step, List<Plot.Curve> curves) {
    List<Spot> spots = new ArrayList<>();
    for (int i = 0; i <= CurveField.STEPS; i++) {
      double share = i / (double) CurveField.STEPS;
      double volts = field.plateVoltsAxis().to() * share * share;
      if (!field.add(spots, volts, field.milliamps(feed(volts), gridVolts))) {
        break;
      }
    }
    field.addCurve(curves, Ticks.word(gridVolts, step) + " V", spots);
  }

  /** Returns where the plate's watts are at their limit, from the right to the top. */
  private Plot.Curve wattsLimit(double watts) {
    double right = field.plateVoltsAxis().to();
    double topVolts = 1000 * watts / field.currentAxis().to();
    List<Spot> spots = new ArrayList<>();
    for (int i = 0; i <= CurveField.STEPS && topVolts < right; i++) {
      double volts = right * Math.pow(topVolts / right, i / (double) CurveField.STEPS);
      spots.add(new Spot(volts, 1000 * watts / volts));
    }
    return new Plot.Curve(Quantity.watts(watts), Plot.Line.DASHED, spots);
  }
}
