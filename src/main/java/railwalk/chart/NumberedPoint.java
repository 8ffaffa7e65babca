package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import railwalk.device.PublishedPoint;
import railwalk.fit.Comparison;

/**
 * A published point with the number that stands for it on a type's page. Copies of one point, such
 * as several sheets print, are one.
 *
 * @param number from 1, in file order
 * @param credits of all sheets that print it
 * @param rows its figures beside the law's
 */
record NumberedPoint(
    int number, PublishedPoint point, List<PublishedPoint.Credit> credits, List<Comparison> rows) {
  NumberedPoint {
    credits = List.copyOf(credits);
    rows = List.copyOf(rows);
  }

  private record Same(
      String section, PublishedPoint.Setup setup, PublishedPoint.Figures published, String of) {
    static Same of(PublishedPoint point) {
      return new Same(point.section(), point.setup(), point.published(), point.credit().of());
    }
  }

  /** Returns the points that {@code rows} speak of. */
  static List<NumberedPoint> of(List<Comparison> rows) {
    Map<Same, Map<PublishedPoint, List<Comparison>>> byPoint = new LinkedHashMap<>();
    for (Comparison row : rows) {
      byPoint
          .computeIfAbsent(Same.of(row.point()), key -> new LinkedHashMap<>())
          .computeIfAbsent(row.point(), key -> new ArrayList<>())
          .add(row);
    }
    List<NumberedPoint> points = new ArrayList<>();
    for (Map<PublishedPoint, List<Comparison>> copies : byPoint.values()) {
      Map.Entry<PublishedPoint, List<Comparison>> first = copies.entrySet().iterator().next();
      List<PublishedPoint.Credit> credits =
          copies.keySet().stream().map(PublishedPoint::credit).toList();
      points.add(new NumberedPoint(points.size() + 1, first.getKey(), credits, first.getValue()));
    }
    return points;
  }
}
