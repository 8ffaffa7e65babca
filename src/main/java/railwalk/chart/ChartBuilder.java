package railwalk.chart;

/** The door: results in, chart out. Stateless. */
public final class ChartBuilder {
  /** Returns the chart of {@code input}. */
  public Chart build(ChartInput input) {
    return new ChartComposition(input).chart();
  }
}
