package railwalk.source;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class NearNamesTest {
  @Test
  void nearNamesAreThoseAMistakeAway() {
    assertThat(NearNames.near("rlaek", List.of("rleak", "rload", "zz"))).containsExactly("rleak");
    assertThat(NearNames.distance("12AX8", "12AX7")).isEqualTo(1);
    assertThat(NearNames.distance("ab", "ba")).isEqualTo(1);
    assertThat(NearNames.distance("", "abc")).isEqualTo(3);
    assertThat(NearNames.hint("x", List.of())).isEmpty();
  }
}
