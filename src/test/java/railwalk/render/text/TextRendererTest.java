package railwalk.render.text;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.chart.Chart;
import railwalk.chart.ChartBuilder;
import railwalk.chart.Page;
import railwalk.chart.SampleAmp;
import railwalk.chart.SampleAmp.Order;
import railwalk.chart.Table;

class TextRendererTest {
  private static final TextRenderer RENDERER = new TextRenderer();

  static Stream<Order> orders() {
    return SampleAmp.orders().stream();
  }

  @ParameterizedTest
  @MethodSource("orders")
  void noLineIsWiderThanEightyColumns(Order order) {
    String text = RENDERER.render(new ChartBuilder().build(SampleAmp.input(order)));
    int widest = text.lines().mapToInt(TextWidth::of).max().orElse(0);
    System.out.printf("%d tubes: %d lines%n", order.tubes(), text.lines().count());
    assertThat(widest).isEqualTo(80);
    assertThat(text).endsWith("\n").doesNotContain(" \n", "\n\n\n", "\t", "\r");
  }

  @ParameterizedTest
  @MethodSource("orders")
  void everyFigureIsThere(Order order) {
    Chart chart = new ChartBuilder().build(SampleAmp.input(order));
    String text = RENDERER.render(chart);
    List<Table> tables =
        chart.pages().stream()
            .map(Page::blocks)
            .flatMap(List::stream)
            .filter(Table.class::isInstance)
            .map(Table.class::cast)
            .toList();
    assertThat(tables).hasSizeGreaterThan(3);
    for (Table table : tables) {
      for (Table.Group group : table.groups()) {
        for (Table.Row row : group.rows()) {
          for (int i = 0; i < row.cells().size(); i++) {
            Table.Use use = table.columns().get(i).use();
            if (use == Table.Use.FIGURES || use == Table.Use.KEY_FIGURES) {
              assertThat(text).contains(row.cells().get(i));
            }
          }
        }
      }
    }
  }

  @Test
  void wideSignsCountTwo() {
    assertThat(TextWidth.of("aΩ–")).isEqualTo(3);
    assertThat(TextWidth.of("増幅")).isEqualTo(4);
    assertThat(TextWidth.of("e\u0301")).isEqualTo(1);
  }

  @Test
  void theReferenceStandsOut() {
    String text = RENDERER.render(new ChartBuilder().build(SampleAmp.input(Order.of(1, 1, 0))));
    assertThat(text).contains("Black lead on  ** 0 **");
  }
}
