package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Plot.Spot;
import railwalk.circuit.Node;
import railwalk.solve.WarmUpCourse;
import railwalk.walk.SupplyMap;
import railwalk.walk.SupplyNode;

/**
 * Volts of supply nodes against the time since switch-on, the rating of their capacitors drawn in.
 * Nodes that stay together share a plot.
 */
final class WarmUpCurves {
  private static final int TICKS = 6;
  private static final double SECONDS_STEP = 5;

  /** Nodes whose volts never differ by more than this share are one to the eye. */
  private static final double TOGETHER = 0.005;

  /** Of a plot's span, left free above the highest. */
  private static final double MARGIN = 1.02;

  private final WarmUpCourse course;
  private final double[] seconds;

  WarmUpCurves(WarmUpCourse course) {
    this.course = course;
    this.seconds = course.seconds();
  }

  List<Block> plots(SupplyMap map) {
    List<Node> left = new ArrayList<>();
    for (SupplyNode supply : map.supplyNodes()) {
      left.add(supply.node());
    }
    List<Block> plots = new ArrayList<>();
    while (!left.isEmpty()) {
      Node first = left.get(0);
      List<Node> together = left.stream().filter(n -> together(first, n)).toList();
      left.remove(first);
      left.removeAll(together);
      double[] volts = course.volts(first);
      if (!Double.isNaN(volts[volts.length - 1])) {
        plots.add(plot(together, volts));
      }
    }
    return plots;
  }

  private boolean together(Node first, Node other) {
    double[] a = course.volts(first);
    double[] b = course.volts(other);
    double reach = 0;
    double apart = 0;
    for (int i = 0; i < a.length; i++) {
      reach = Math.max(reach, Math.abs(a[i]));
      apart = Math.max(apart, Math.abs(a[i] - b[i]));
    }
    return apart <= TOGETHER * reach;
  }

  private Plot plot(List<Node> nodes, double[] volts) {
    NodeRating rating = weakest(nodes);
    double low = 0;
    double high = 0;
    List<Spot> spots = new ArrayList<>();
    for (int i = 0; i < seconds.length; i++) {
      spots.add(new Spot(seconds[i], volts[i]));
      low = Math.min(low, volts[i]);
      high = Math.max(high, volts[i]);
    }
    double sign = high >= -low ? 1 : -1;
    List<Plot.Curve> curves = new ArrayList<>();
    curves.add(new Plot.Curve("", Plot.Line.PLAIN, spots));
    double end = seconds[seconds.length - 1];
    if (rating.isKnown()) {
      double line = sign * rating.volts();
      low = Math.min(low, line);
      high = Math.max(high, line);
      curves.add(
          new Plot.Curve(
              rating.words(), Plot.Line.DASHED, List.of(new Spot(0, line), new Spot(end, line))));
    }
    String title =
        (nodes.size() > 1 ? "Nodes " : "Node ")
            + String.join(", ", nodes.stream().map(Node::name).toList());
    Plot.Axis axis =
        low == high
            ? Ticks.axis("volts", 1, TICKS)
            : Ticks.around("volts", MARGIN * low, MARGIN * high, TICKS);
    return new Plot(
        title,
        new Plot.Axis("seconds after switch-on", 0, end, SECONDS_STEP),
        axis,
        curves,
        List.of());
  }

  private NodeRating weakest(List<Node> nodes) {
    NodeRating weakest = NodeRating.of(course.circuit(), nodes.get(0));
    for (Node node : nodes) {
      NodeRating rating = NodeRating.of(course.circuit(), node);
      if (rating.isKnown() && !(weakest.volts() <= rating.volts())) {
        weakest = rating;
      }
    }
    return weakest;
  }
}
