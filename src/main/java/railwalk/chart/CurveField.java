package railwalk.chart;

import java.util.List;
import railwalk.chart.Plot.Spot;
import railwalk.device.AmplifierLaw;
import railwalk.device.SectionCurrents;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;

/**
 * What the curves of one amplifying section share: its law, the published points, the axes chosen
 * for them, and how a curve ends at the edge of the plot.
 */
final class CurveField {
  /** Pieces of one curve. */
  static final int STEPS = 160;

  /** Ticks along an axis, at most. */
  static final int TICKS = 7;

  private static final double USUAL_PLATE_VOLTS = 300;
  private static final double USUAL_SCREEN_VOLTS = 250;

  /** How far the axes reach past the plate rating and the greatest published current. */
  private static final double PAST_RATING = 1.1;

  private static final double PAST_POINTS = 1.7;

  /** A rating far above all published points, as for a push-pull pair, would crowd the curves. */
  private static final double PLATE_PAST_POINTS = 1.6;

  /** Plate volts, as a share of the rated ones, where the watts limit is still on the plot. */
  private static final double WATTS_LIMIT_AT = 0.66;

  /** How many times the greatest published current a pentode's plot shows at most. */
  private static final double MOST_PAST_POINTS = 4;

  /** Below this share of the plot's height a curve lies on the axis. */
  private static final double ON_THE_AXIS = 0.015;

  private static final double LOWEST_GRID_VOLTS = -400;
  private static final int HALVINGS = 50;

  private final SectionType section;
  private final AmplifierLaw law;
  private final List<PointPlace> places;
  private final Plot.Axis plateVoltsAxis;
  private final Plot.Axis currentAxis;
  private final SectionCurrents currents = new SectionCurrents();

  /**
   * @param places of the published points, electrode volts
   */
  CurveField(SectionType section, List<PointPlace> places) {
    this.section = section;
    this.law = (AmplifierLaw) section.law();
    this.places = places;
    this.plateVoltsAxis = Ticks.axis("plate volts", plateReach(), TICKS);
    this.currentAxis = Ticks.axis("plate current, mA", 1000 * currentReach(), TICKS);
  }

  /**
   * Volts against the cathode that a curve is drawn for.
   *
   * @param screenVolts 0 in a triode
   * @param joined whether screen and plate are joined: the current is then the sum
   */
  record Feed(double plateVolts, double screenVolts, boolean joined) {}

  List<PointPlace> places() {
    return places;
  }

  Plot.Axis plateVoltsAxis() {
    return plateVoltsAxis;
  }

  Plot.Axis currentAxis() {
    return currentAxis;
  }

  boolean hasScreen() {
    return section.kind() == SectionKind.PENTODE;
  }

  double plateWattsMax() {
    return section.ratings().plateWattsMax();
  }

  /** Returns the screen volts that the plate curves are drawn for; 0 in a triode. */
  double screenVolts() {
    return !hasScreen()
        ? 0
        : places.stream()
            .filter(place -> !place.joined())
            .mapToDouble(PointPlace::screenVolts)
            .findFirst()
            .orElse(USUAL_SCREEN_VOLTS);
  }

  double milliamps(Feed feed, double gridVolts) {
    law.evaluate(feed.plateVolts(), feed.screenVolts(), gridVolts, currents);
    return 1000 * (currents.plateAmps + (feed.joined() ? currents.screenAmps : 0));
  }

  /** Returns the grid volts at which hardly any current is left. */
  double cutOffVolts(Feed feed) {
    double low = LOWEST_GRID_VOLTS;
    double high = 0;
    for (int i = 0; i < HALVINGS; i++) {
      double middle = (low + high) / 2;
      if (milliamps(feed, middle) > ON_THE_AXIS * currentAxis.to()) {
        high = middle;
      } else {
        low = middle;
      }
    }
    return low;
  }

  /** Adds a spot, or where the curve leaves the plot; returns whether it is still inside. */
  boolean add(List<Spot> spots, double x, double milliamps) {
    double top = currentAxis.to();
    if (milliamps <= top) {
      spots.add(new Spot(x, milliamps));
      return true;
    }
    if (!spots.isEmpty()) {
      Spot last = spots.get(spots.size() - 1);
      double share = (top - last.y()) / (milliamps - last.y());
      spots.add(new Spot(last.x() + share * (x - last.x()), top));
    }
    return false;
  }

  /** Adds the curve through {@code spots} unless it hardly leaves the axis. */
  void addCurve(List<Plot.Curve> curves, String label, List<Spot> spots) {
    boolean rises = spots.stream().anyMatch(s -> s.y() > ON_THE_AXIS * currentAxis.to());
    if (rises && spots.size() > 1) {
      curves.add(new Plot.Curve(label, Plot.Line.PLAIN, spots));
    }
  }

  /** Adds the mark of {@code place}, {@code x} along the axis, where it is on the plot. */
  void addMark(List<Plot.Mark> marks, PointPlace place, double x, Plot.Axis axis) {
    double milliamps = 1000 * place.amps();
    if (x >= axis.from() && x <= axis.to() && milliamps <= currentAxis.to()) {
      marks.add(new Plot.Mark(Integer.toString(place.number()), new Spot(x, milliamps)));
    }
  }

  private double plateReach() {
    double rated = section.ratings().plateVoltsMax();
    double published = places.stream().mapToDouble(PointPlace::plateVolts).max().orElse(0);
    if (!(published > 0)) {
      return Double.isNaN(rated) ? USUAL_PLATE_VOLTS : PAST_RATING * rated;
    }
    double fromRating = Double.isNaN(rated) ? 0 : PAST_RATING * rated;
    double usual = Math.max(PLATE_PAST_POINTS * published, PAST_RATING * USUAL_PLATE_VOLTS);
    return Math.max(PAST_RATING * published, Math.min(fromRating, usual));
  }

  private double currentReach() {
    double published = places.stream().mapToDouble(PointPlace::amps).max().orElse(0);
    Feed end = new Feed(plateVoltsAxis.to(), screenVolts(), false);
    if (hasScreen()) {
      double atZero = milliamps(end, 0) / 1000;
      return published > 0 ? Math.min(atZero, MOST_PAST_POINTS * published) : atZero;
    }
    double limit = plateWattsMax() / (WATTS_LIMIT_AT * section.ratings().plateVoltsMax());
    double reach = Math.max(Double.isNaN(limit) ? 0 : limit, PAST_POINTS * published);
    return reach > 0 ? reach : milliamps(end, 0) / 2000;
  }
}
