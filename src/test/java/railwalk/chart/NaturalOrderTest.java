package railwalk.chart;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class NaturalOrderTest {
  @Test
  void countsAsPeopleDo() {
    List<String> mixed = List.of("V10", "VR1", "V2", "v1", "V1B", "V1A", "V1");
    assertThat(mixed.stream().sorted(NaturalOrder.INSTANCE))
        .containsExactly("V1", "v1", "V1A", "V1B", "V2", "V10", "VR1");
  }

  @Test
  void mindsNoLength() {
    assertThat(NaturalOrder.INSTANCE.compare("R99999999999999999998", "R99999999999999999999"))
        .isNegative();
  }
}
