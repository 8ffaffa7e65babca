package railwalk.render.json;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.jr.ob.JSON;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.chart.Chart;
import railwalk.chart.ChartBuilder;
import railwalk.chart.Figures;
import railwalk.chart.SampleAmp;
import railwalk.chart.SampleAmp.Order;

/** The published form, read back by a JSON library. */
class JsonRendererTest {
  private static final List<String> POINT =
      List.of("node", "kind", "volts", "low_volts", "high_volts", "meter_volts", "pins");
  private static final List<String> TUBE =
      List.of(
          "tube",
          "section",
          "type",
          "plate_volts",
          "screen_volts",
          "grid_volts",
          "plate_amps",
          "screen_amps",
          "grid_amps",
          "plate_watts",
          "screen_watts",
          "plate_watts_max");
  private static final List<String> SUPPLY =
      List.of("node", "dc_amps", "peak_amps", "ripple_volts_rms");
  private static final List<String> FINDING =
      List.of("severity", "code", "message", "file", "line");

  static Stream<Order> orders() {
    return SampleAmp.orders().stream();
  }

  @ParameterizedTest
  @MethodSource("orders")
  void hasEveryMemberInItsPlace(Order order) throws IOException {
    Chart chart = new ChartBuilder().build(SampleAmp.input(order));
    Map<String, Object> json = JSON.std.mapFrom(new JsonRenderer().render(chart));
    assertThat(json.keySet())
        .containsExactly(
            "title", "conditions", "points", "tubes", "supplies", "findings", "states");
    assertThat(json).containsEntry("title", order.title());
    checkMembers(json, chart.figures().get(0));
    List<Map<String, Object>> states = list(json, "states");
    assertThat(states).hasSize(order.states());
    for (int i = 0; i < states.size(); i++) {
      assertThat(states.get(i).keySet())
          .containsExactly("name", "conditions", "points", "tubes", "supplies", "findings");
      assertThat(states.get(i)).containsEntry("name", "state" + (i + 1));
      checkMembers(states.get(i), chart.figures().get(i + 1));
    }
  }

  private static void checkMembers(Map<String, Object> json, Figures figures) {
    Map<String, Object> conditions = map(json, "conditions");
    assertThat(conditions.keySet())
        .containsExactly("line_volts", "line_hertz", "meter", "state", "reference");
    assertThat(conditions)
        .containsEntry("line_volts", 122.0)
        .containsEntry("line_hertz", 60.0)
        .containsEntry("meter", "20k/V 10 50 250 500 1000")
        .containsEntry("reference", figures.conditions().reference());
    String state = figures.conditions().state();
    assertThat(conditions.get("state")).isEqualTo(state.isEmpty() ? null : state);
    checkPoints(list(json, "points"), figures);
    checkTubes(list(json, "tubes"), figures);
    assertThat(list(json, "supplies"))
        .hasSize(figures.supplies().size())
        .allSatisfy(supply -> assertThat(supply.keySet()).containsExactlyElementsOf(SUPPLY));
    assertThat(list(json, "findings"))
        .hasSize(figures.findings().size())
        .allSatisfy(finding -> assertThat(finding.keySet()).containsExactlyElementsOf(FINDING));
  }

  private static void checkPoints(List<Map<String, Object>> points, Figures figures) {
    int dc = figures.points().size();
    assertThat(points).hasSize(dc + figures.alternating().size());
    for (int i = dc; i < points.size(); i++) {
      Figures.Alternating expected = figures.alternating().get(i - dc);
      assertThat(points.get(i).keySet()).containsExactlyElementsOf(POINT);
      assertThat(points.get(i))
          .containsEntry("node", expected.node())
          .containsEntry("kind", expected.kind())
          .containsEntry("volts", Double.isNaN(expected.rmsVolts()) ? null : expected.rmsVolts())
          .containsEntry("low_volts", null)
          .containsEntry("pins", List.of());
    }
    for (int i = 0; i < dc; i++) {
      Figures.Point expected = figures.points().get(i);
      Map<String, Object> point = points.get(i);
      assertThat(point.keySet()).containsExactlyElementsOf(POINT);
      assertThat(point)
          .containsEntry("node", expected.node())
          .containsEntry("kind", "dc")
          .containsEntry("pins", expected.pins());
      assertThat(point.get("volts"))
          .isEqualTo(Double.isNaN(expected.volts()) ? null : expected.volts());
      assertThat(point.get("meter_volts"))
          .isEqualTo(Double.isNaN(expected.volts()) ? null : expected.meterVolts());
    }
  }

  private static void checkTubes(List<Map<String, Object>> tubes, Figures figures) {
    assertThat(tubes).hasSize(figures.tubes().size());
    for (int i = 0; i < tubes.size(); i++) {
      Figures.Tube expected = figures.tubes().get(i);
      Map<String, Object> tube = tubes.get(i);
      assertThat(tube.keySet()).containsExactlyElementsOf(TUBE);
      assertThat(tube)
          .containsEntry("tube", expected.tube())
          .containsEntry("type", expected.type())
          .containsEntry("plate_amps", expected.plateAmps());
      switch (expected.type()) {
        case "12AX7" -> {
          assertThat(tube.get("section")).isIn("A", "B");
          assertThat(tube.get("screen_volts")).isNull();
          assertThat(tube).containsEntry("plate_watts_max", 1.0);
        }
        case "6V6GT" -> {
          assertThat(tube.get("section")).isNull();
          assertThat(tube.get("screen_watts")).isNotNull();
        }
        case "5Y3GT" -> {
          assertThat(tube.get("grid_amps")).isNull();
          assertThat(tube.get("plate_watts")).isNull();
        }
        default -> throw new AssertionError("no such tube in the sample: " + tube);
      }
    }
  }

  @SuppressWarnings("unchecked")
  private static Map<String, Object> map(Map<String, Object> json, String name) {
    return (Map<String, Object>) Objects.requireNonNull(json.get(name), name);
  }

  @SuppressWarnings("unchecked")
  private static List<Map<String, Object>> list(Map<String, Object> json, String name) {
    return (List<Map<String, Object>>) Objects.requireNonNull(json.get(name), name);
  }
}
