package railwalk.units;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Preferred values of the E24 series (IEC 60063), and how a netlist writes ohms. */
class PreferredOhmsTest {
  @ParameterizedTest
  @CsvSource({
    "119e3, 120e3",
    "96e3, 100e3",
    "95e3, 91e3",
    "1000, 1000",
    "0.99, 1",
    "1.78e3, 1.8e3",
    "395, 390",
    "4.9e6, 5.1e6",
    "0.047, 0.047"
  })
  void nearestByRatio(double ohms, double preferred) {
    assertThat(PreferredOhms.nearest(ohms)).isEqualTo(preferred);
  }

  @ParameterizedTest
  @CsvSource({
    "98740, 98.7k",
    "1500000, 1.5Meg",
    "220, 220",
    "999.9, 1k",
    "999900, 1Meg",
    "0.0471, 0.0471",
    "4.7, 4.7",
    "1000, 1k",
    "100000, 100k"
  })
  void writtenWithThreeDigitsAndReadBack(double ohms, String written) {
    assertThat(PreferredOhms.written(ohms)).isEqualTo(written);
    ValueReading read = ValueReader.read(written, Measure.RESISTANCE);
    assertThat(read).isInstanceOf(ValueReading.Value.class);
    double amount = ((ValueReading.Value) read).amount();
    assertThat(Math.abs(amount / ohms - 1)).isLessThan(0.005);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, -1, Double.NaN, Double.POSITIVE_INFINITY})
  void refusesWhatIsNoResistance(double ohms) {
    assertThatThrownBy(() -> PreferredOhms.nearest(ohms))
        .isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void aPreferredValueIsItsOwnNearest() {
    for (double ohms : new double[] {10, 33e3, 82, 9.1e6}) {
      assertThat(PreferredOhms.nearest(ohms)).isEqualTo(ohms);
    }
  }
}
