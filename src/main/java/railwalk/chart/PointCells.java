package railwalk.chart;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Meter;
import railwalk.circuit.Node;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/** What the tables say of one node in one column of the chart. */
final class PointCells {
  /** Loading below this share is not worth a word: a meter's own error is larger. */
  private static final double NOTABLE_LOADING = 0.01;

  /** Ripple below this is less than any reading at the bench shows. */
  private static final double LEAST_RIPPLE_VOLTS = 10e-6;

  private final Column column;
  private final Map<String, Figures.Point> byNode = new HashMap<>();
  private final Map<Node, List<Element>> partsByNode;
  private final WindingVolts windingVolts;

  PointCells(Column column, Figures figures) {
    this.column = column;
    this.partsByNode = column.circuit().elementsByNode();
    this.windingVolts = new WindingVolts(column.circuit(), column.map());
    figures.points().forEach(point -> byNode.put(point.node(), point));
  }

  /** Returns the expected volts, without unit. */
  String volts(Node node) {
    return Quantity.plainVolts(column.point().volts(node));
  }

  /**
   * Returns the band, without unit: "297–328", "−52.1 to −46.3"; empty when there is none. A
   * zero-width space marks where it may be broken.
   */
  String band(Node node) {
    Figures.Point point = byNode.get(node.name());
    if (point == null || Double.isNaN(point.lowVolts())) {
      return "";
    }
    String low = Quantity.plainVolts(point.lowVolts());
    String high = Quantity.plainVolts(point.highVolts());
    if (low.equals(high)) {
      return low;
    }
    boolean negative = point.lowVolts() < 0 || point.highVolts() < 0;
    return low + (negative ? " to \u200B" : "–") + high;
  }

  /** Returns what the meter reads where it differs by more than one per cent; else empty. */
  String meter(Node node) {
    return loadsNotably(node) ? Quantity.plainVolts(meterVolts(node)) : "";
  }

  /** Returns whether the meter's loading shows at {@code node}. */
  boolean loadsNotably(Node node) {
    double volts = column.point().volts(node);
    double read = meterVolts(node);
    return Math.abs(read - volts) > NOTABLE_LOADING * Math.abs(volts)
        && !Quantity.plainVolts(read).equals(Quantity.plainVolts(volts));
  }

  /** Returns the ripple rms with its unit: "3.18 V"; empty where it is not told. */
  String ripple(Node node) {
    double volts = column.point().rippleVoltsRms(node).orElse(Double.NaN);
    if (Double.isNaN(volts)) {
      return "";
    }
    return volts < LEAST_RIPPLE_VOLTS
        ? "<" + Quantity.of(LEAST_RIPPLE_VOLTS, "V")
        : Quantity.of(volts, "V");
  }

  /**
   * Returns the name of the supply node that {@code node} hangs from; empty when none or itself.
   */
  String supply(Node node) {
    return column.map().supplyOf(node).filter(s -> !s.equals(node)).map(Node::name).orElse("");
  }

  /** Returns the remarks that hold for the node whatever stands on it. */
  List<String> remarks(Node node) {
    List<String> remarks = new ArrayList<>();
    double volts = column.point().volts(node);
    windingVolts.at(node).ifPresent(remarks::add);
    if (Double.isNaN(volts)) {
      remarks.add("not predictable at DC");
      return remarks;
    }
    if (loadsNotably(node)) {
      boolean low = Math.abs(meterVolts(node)) < Math.abs(volts);
      remarks.add("reads " + (low ? "low" : "high") + " on a " + meterInUse(volts));
    }
    if (hangsOnUnknownResistance(node)) {
      remarks.add("resistance not given");
    }
    return remarks;
  }

  /** Returns whether the node carries AC that its DC volts don't tell of. */
  boolean carriesAc(Node node) {
    return windingVolts.at(node).isPresent();
  }

  private double meterVolts(Node node) {
    Figures.Point point = byNode.get(node.name());
    return point == null ? 0 : point.meterVolts();
  }

  private String meterInUse(double volts) {
    Meter meter = column.circuit().meter();
    if (Double.isNaN(meter.ohmsPerVolt())) {
      return Quantity.ohms(meter.ohms()) + " meter";
    }
    return Quantity.ohms(meter.ohmsPerVolt())
        + "/V meter, "
        + Quantity.plainVolts(meter.rangeFor(volts))
        + " V range";
  }

  /** Returns whether the node's volts lack the drop of a winding whose resistance is not given. */
  private boolean hangsOnUnknownResistance(Node node) {
    if (column.point().volts(node) == 0) {
      return false;
    }
    return column
        .map()
        .supplyNode(node)
        .map(SupplyNode::droppers)
        .orElseGet(() -> partsByNode.getOrDefault(node, List.of()))
        .stream()
        .anyMatch(e -> e instanceof Inductor winding && Double.isNaN(winding.dcOhms()));
  }
}
