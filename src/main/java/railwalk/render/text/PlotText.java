package railwalk.render.text;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import railwalk.chart.Plot;
import railwalk.chart.Table;
import railwalk.units.Quantity;

/** A plot as a table: a row for each tick along x, a column for each curve. */
final class PlotText {
  private static final int MOST_CURVES = 8;

  private PlotText() {}

  static void print(Plot plot, Consumer<Table> printer) {
    List<Plot.Curve> curves = plot.curves().subList(0, Math.min(MOST_CURVES, plot.curves().size()));
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column(plot.x().title(), Table.Use.FIGURES));
    for (Plot.Curve curve : curves) {
      String head = curve.label().isEmpty() ? plot.y().title() : curve.label();
      columns.add(new Table.Column(head, Table.Use.FIGURES));
    }
    List<Table.Row> rows = new ArrayList<>();
    for (double tick : plot.x().ticks()) {
      List<String> cells = new ArrayList<>();
      cells.add(plot.x().word(tick));
      for (Plot.Curve curve : curves) {
        double y = at(curve, tick);
        cells.add(Double.isNaN(y) ? "" : Quantity.plainVolts(y));
      }
      rows.add(new Table.Row(cells, ""));
    }
    printer.accept(Table.of(plot.title() + ": " + plot.y().title(), columns, rows));
  }

  /** Returns the curve's height at {@code x}; NaN where it does not reach. */
  private static double at(Plot.Curve curve, double x) {
    for (int i = 1; i < curve.spots().size(); i++) {
      Plot.Spot a = curve.spots().get(i - 1);
      Plot.Spot b = curve.spots().get(i);
      double share = a.x() == b.x() ? 0 : (x - a.x()) / (b.x() - a.x());
      if (share >= -1e-9 && share <= 1 + 1e-9) {
        return a.y() + share * (b.y() - a.y());
      }
    }
    return Double.NaN;
  }
}
