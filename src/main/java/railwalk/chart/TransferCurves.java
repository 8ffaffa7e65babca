package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.CurveField.Feed;
import railwalk.chart.Plot.Spot;
import railwalk.units.Quantity;

/**
 * Plate current over grid volts: a triode's for round plate volts; a pentode's for the screen volts
 * of its published points, joined to the plate where a point is, and for round ones between.
 */
final class TransferCurves {
  private static final double SAME_SHARE = 0.03;
  private static final double NEAR_SHARE = 0.15;
  private static final int MOST_CURVES = 7;
  private static final int ROUND_SCREENS = 3;

  private final CurveField field;

  private TransferCurves(CurveField field) {
    this.field = field;
  }

  /**
   * @param of which section is meant, for the title: ", triode", or nothing
   */
  static Plot of(CurveField field, String of) {
    return new TransferCurves(field).plot(of);
  }

  private Plot plot(String of) {
    List<Feed> feeds = field.hasScreen() ? screens() : plates();
    double least = field.places().stream().mapToDouble(PointPlace::gridVolts).min().orElse(0);
    for (Feed feed : feeds) {
      least = Math.min(least, field.cutOffVolts(feed));
    }
    Plot.Axis axis = Ticks.axis("grid volts", least, CurveField.TICKS);
    List<Plot.Curve> curves = new ArrayList<>();
    feeds.forEach(feed -> curve(axis, feed, curves));
    List<Plot.Mark> marks = new ArrayList<>();
    for (PointPlace place : field.places()) {
      field.addMark(marks, place, place.gridVolts(), axis);
    }
    String by = field.hasScreen() ? "screen volts" : "plate volts";
    return new Plot("Transfer curves by " + by + of, axis, field.currentAxis(), curves, marks);
  }

  private void curve(Plot.Axis axis, Feed feed, List<Plot.Curve> curves) {
    List<Spot> spots = new ArrayList<>();
    for (int i = 0; i <= CurveField.STEPS; i++) {
      double gridVolts = axis.from() * (1 - i / (double) CurveField.STEPS);
      if (!field.add(spots, gridVolts, field.milliamps(feed, gridVolts))) {
        break;
      }
    }
    String volts = Quantity.volts(field.hasScreen() ? feed.screenVolts() : feed.plateVolts());
    field.addCurve(curves, feed.joined() ? "triode " + volts : volts, spots);
  }

  private List<Feed> plates() {
    double most = field.plateVoltsAxis().to();
    double step = Ticks.step(most, MOST_CURVES);
    return Ticks.between(step, most, step).stream()
        .map(volts -> new Feed(volts, 0, false))
        .toList();
  }

  private List<Feed> screens() {
    List<Feed> feeds = new ArrayList<>();
    double most = field.screenVolts();
    for (PointPlace place : field.places()) {
      double screen = place.joined() ? place.plateVolts() : place.screenVolts();
      Feed feed = new Feed(place.plateVolts(), screen, place.joined());
      if (feeds.size() < MOST_CURVES && !isThere(feeds, feed, SAME_SHARE)) {
        feeds.add(feed);
        most = Math.max(most, screen);
      }
    }
    double step = Ticks.step(most, ROUND_SCREENS);
    for (double screen : Ticks.between(step, most, step)) {
      Feed feed = new Feed(Math.max(screen, field.plateVoltsAxis().to() / 2), screen, false);
      if (feeds.size() < MOST_CURVES && !isThere(feeds, feed, NEAR_SHARE)) {
        feeds.add(feed);
      }
    }
    return feeds;
  }

  private static boolean isThere(List<Feed> feeds, Feed feed, double share) {
    return feeds.stream()
        .filter(other -> other.joined() == feed.joined())
        .anyMatch(other -> Math.abs(other.screenVolts() / feed.screenVolts() - 1) < share);
  }
}
