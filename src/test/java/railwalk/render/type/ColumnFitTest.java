package railwalk.render.type;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class ColumnFitTest {
  @Test
  void leavesWidthsThatFit() {
    assertThat(ColumnFit.widths(new double[] {3, 4}, new double[] {1, 1}, 7)).containsExactly(3, 4);
  }

  @Test
  void shortensTheWidestOnly() {
    assertThat(ColumnFit.widths(new double[] {3, 30, 20}, new double[] {1, 1, 15}, 33))
        .containsExactly(new double[] {3, 15, 15}, within(1e-6));
  }

  @Test
  void keepsWithinTheRoomWhateverIsAsked() {
    Random random = new Random(5);
    for (int round = 0; round < 500; round++) {
      int count = 1 + random.nextInt(9);
      double[] natural = new double[count];
      double[] least = new double[count];
      for (int i = 0; i < count; i++) {
        natural[i] = random.nextDouble() * 100;
        least[i] = natural[i] * random.nextDouble();
      }
      double room = 10 + random.nextDouble() * 300;
      double[] widths = ColumnFit.widths(natural, least, room);
      assertThat(Arrays.stream(widths).sum()).isLessThanOrEqualTo(room + 1e-6);
      boolean roomForTheLeast = Arrays.stream(least).sum() <= room;
      for (int i = 0; i < count; i++) {
        assertThat(widths[i]).isLessThanOrEqualTo(natural[i]);
        if (roomForTheLeast) {
          assertThat(widths[i]).isGreaterThanOrEqualTo(least[i] - 1e-9);
        }
      }
    }
  }
}
