package railwalk.render.csv;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import railwalk.chart.Chart;
import railwalk.chart.ChartBuilder;
import railwalk.chart.Figures;
import railwalk.chart.SampleAmp;
import railwalk.chart.SampleAmp.Order;

class CsvRendererTest {
  private static final CsvRenderer RENDERER = new CsvRenderer();

  @Test
  void hasARowForEachNode() {
    Chart chart = new ChartBuilder().build(SampleAmp.input(Order.of(2, 2, 0)));
    List<String> lines = List.of(RENDERER.render(chart).split("\r\n"));
    assertThat(lines.get(0)).isEqualTo("node,pins,volts,low_volts,high_volts,meter_volts");
    assertThat(lines).hasSize(1 + chart.figures().get(0).points().size());
    assertThat(lines)
        .contains("b0,V100.2 V100.8,384.0,360.96,407.04," + 384.0 * 10e6 / 10_009_000)
        .contains("0x,,,,,");
  }

  @Test
  void saysTheStateFirst() {
    Chart chart = new ChartBuilder().build(SampleAmp.input(Order.of(1, 2, 2)));
    List<String> lines = List.of(RENDERER.render(chart).split("\r\n"));
    assertThat(lines.get(0)).startsWith("state,node,pins,");
    int nodes = chart.figures().get(0).points().size();
    assertThat(lines).hasSize(1 + 3 * nodes);
    assertThat(lines.subList(1, 1 + nodes)).allMatch(line -> line.startsWith(","));
    assertThat(lines.subList(1 + nodes, 1 + 2 * nodes)).allMatch(l -> l.startsWith("state1,"));
  }

  /** RFC 4180 sections 2.5 to 2.7: fields with commas, quotes or line ends are quoted. */
  @Test
  void quotesWhatNeedsIt() {
    Figures.Conditions conditions = new Figures.Conditions(Double.NaN, 60, "10M", "", "0");
    Figures.Point point =
        new Figures.Point("a,\"b\"", -0.0, Double.NaN, 1e-7, 2, List.of("V1.1", "V2.cap"));
    Figures figures =
        new Figures(conditions, List.of(point), List.of(), List.of(), List.of(), List.of());
    Chart chart = new Chart("t", "f", "", "", List.of(), List.of(figures));
    assertThat(RENDERER.render(chart).split("\r\n"))
        .containsExactly(
            "node,pins,volts,low_volts,high_volts,meter_volts",
            "\"a,\"\"b\"\"\",V1.1 V2.cap,0.0,,1.0E-7,2.0");
  }
}
