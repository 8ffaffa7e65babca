package railwalk.fit;

import java.util.ArrayList;
import java.util.List;
import railwalk.device.AmplifierLaw;
import railwalk.device.PublishedPoint;
import railwalk.device.SectionCurrents;

/**
 * Sets a law against published points, figure by figure, with the tolerance each figure deserves.
 * What {@link LeastSquaresFit} makes small and {@link TypeSheet} shows.
 */
final class Comparer {
  /** Points under this share of the greatest current are near cut-off: bias is compared. */
  private static final double CUT_OFF_SHARE = 0.05;

  private static final double CURRENT = 0.02;
  private static final double CATHODE_CURRENT = 0.008;
  private static final double SCREEN_CURRENT = 0.08;
  private static final double BIAS = 0.05;
  private static final double SLOPE = 0.08;
  private static final double SCREEN_MU = 0.15;
  private static final double PENTODE_RESISTANCE = 0.3;

  private final List<PublishedPoint> points;
  private final double cutOffAmps;

  Comparer(List<PublishedPoint> points) {
    this.points = points;
    this.cutOffAmps =
        CUT_OFF_SHARE
            * points.stream()
                .mapToDouble(p -> p.published().plateAmps())
                .filter(a -> !Double.isNaN(a))
                .max()
                .orElse(0);
  }

  /** Returns every figure of every point beside {@code law}, in file order. */
  List<Comparison> compare(AmplifierLaw law) {
    List<Comparison> all = new ArrayList<>();
    points.forEach(point -> compare(law, point, all));
    return all;
  }

  private void compare(AmplifierLaw law, PublishedPoint point, List<Comparison> all) {
    if (point.published().plateAmps() < cutOffAmps) {
      double bias = CutOff.gridVolts(law, point);
      add(all, point, FigureKind.BIAS, point.setup().gridVolts(), bias, BIAS);
      return;
    }
    Standing at = Standing.of(law, point);
    SectionCurrents is = at.currents();
    double plate = is.plateAmps + (point.setup().triodeConnected() ? is.screenAmps : 0);
    add(all, point, FigureKind.PLATE_CURRENT, point.published().plateAmps(), plate, CURRENT);
    add(
        all,
        point,
        FigureKind.CATHODE_CURRENT,
        point.published().cathodeAmps(),
        is.plateAmps + is.screenAmps,
        CATHODE_CURRENT);
    add(
        all,
        point,
        FigureKind.SCREEN_CURRENT,
        point.published().screenAmps(),
        is.screenAmps,
        SCREEN_CURRENT);
    if (point.setup().loadOhms() > 0) {
      double published =
          point.setup().plateVolts() - point.setup().loadOhms() * point.published().plateAmps();
      add(
          all,
          point,
          FigureKind.PLATE_VOLTS,
          published,
          at.plateVoltsToFoot(),
          Double.POSITIVE_INFINITY);
    }
    slopes(point, is, all);
  }

  private static void slopes(PublishedPoint point, SectionCurrents is, List<Comparison> all) {
    boolean joined = point.setup().triodeConnected();
    double byGrid = is.plateByGridSiemens + (joined ? is.screenByGridSiemens : 0);
    double byPlate =
        is.plateByPlateSiemens
            + (joined
                ? is.plateByScreenSiemens + is.screenByPlateSiemens + is.screenByScreenSiemens
                : 0);
    boolean triode = joined || Double.isNaN(point.setup().screenVolts());
    add(all, point, FigureKind.MUTUAL_CONDUCTANCE, point.published().gmSiemens(), byGrid, SLOPE);
    add(all, point, FigureKind.AMPLIFICATION, point.published().mu(), byGrid / byPlate, SLOPE);
    add(
        all,
        point,
        FigureKind.SCREEN_AMPLIFICATION,
        point.published().screenMu(),
        byGrid / is.plateByScreenSiemens,
        SCREEN_MU);
    add(
        all,
        point,
        FigureKind.PLATE_RESISTANCE,
        point.published().plateOhms(),
        1 / byPlate,
        triode ? SLOPE : PENTODE_RESISTANCE);
  }

  private static void add(
      List<Comparison> all,
      PublishedPoint point,
      FigureKind measure,
      double published,
      double law,
      double share) {
    if (!Double.isNaN(published)) {
      all.add(new Comparison(point, measure, published, law, share / weight(point)));
    }
  }

  /** Returns how much a point counts: a sheet at hand most, memory less, medium confidence half. */
  static double weight(PublishedPoint point) {
    double confidence = point.credit().confidence().equals("high") ? 1 : 0.5;
    double provenance =
        switch (point.credit().provenance()) {
          case "transcription" -> 1;
          case "mixed" -> 0.85;
          default -> 0.7;
        };
    return confidence * provenance * point.credit().weight();
  }
}
