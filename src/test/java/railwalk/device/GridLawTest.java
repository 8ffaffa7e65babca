package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Grid current where a technician meets it. The windows are common practice. */
class GridLawTest {
  /** A stage biased by its own grid current: 10 megohm to the cathode, plate from 250 V. */
  @ParameterizedTest
  @CsvSource({
    "12AX7,220e3",
    "12AX7,470e3",
    "6AV6,220e3",
    "6AV6,470e3",
    "12AV6,220e3",
    "6SL7GT,220e3"
  })
  void aGridLeakStageSettlesBelowItsCathode(String type, double loadOhms) {
    AmplifierLaw law = law(type);
    double gridVolts = settle(law, 0, 10e6);
    SectionCurrents out = new SectionCurrents();
    double low = 0;
    double high = 250;
    while (high - low > 1e-6) {
      double plate = (low + high) / 2;
      law.evaluate(plate, 80, gridVolts, out);
      if (250 - loadOhms * out.plateAmps > plate) {
        low = plate;
      } else {
        high = plate;
      }
    }
    System.out.printf(
        "%-7s grid leak 10 Mohm, %.0f kohm from 250 V: grid %.2f V, plate %.0f V%n",
        type, loadOhms / 1e3, gridVolts, low);
    assertThat(gridVolts).isBetween(-1.1, -0.4);
    assertThat(low).isBetween(15.0, 200.0);
  }

  /** A leaky coupling capacitor's case: the grid holds the volts near the cathode's. */
  @ParameterizedTest
  @ValueSource(strings = {"12AX7", "12AU7", "6V6GT", "EL84", "EL34", "KT88", "50C5", "EF86"})
  void aGridFedThroughAMegohmStaysNearItsCathode(String type) {
    assertThat(settle(law(type), 100, 1e6)).isBetween(0.0, 2.0);
  }

  /**
   * A shorted coupling capacitor: 200 V behind the 100 kilohm of the stage before. The grid takes
   * the current and stays a few volts above its cathode, whatever the type.
   */
  @Test
  void aShortedCouplingCapacitorLeavesAnyGridNearItsCathode() {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = 0;
    int count = 0;
    for (TubeType type : Catalogue.standard().types()) {
      for (SectionType section : type.sections()) {
        if (section.law() instanceof AmplifierLaw law) {
          double volts = settle(law, 200, 100e3);
          assertThat(volts).as(type.name()).isBetween(0.2, 6.0);
          lowest = Math.min(lowest, volts);
          highest = Math.max(highest, volts);
          count++;
        }
      }
    }
    System.out.printf(
        "%d sections fed with 200 V through 100 kohm: grid %.2f to %.2f V%n",
        count, lowest, highest);
    assertThat(count).isGreaterThan(150);
  }

  private static AmplifierLaw law(String type) {
    return (AmplifierLaw) Catalogue.standard().find(type).orElseThrow().sections().get(0).law();
  }

  /** Returns the grid volts with {@code ohms} from {@code volts}, by halving. */
  private static double settle(AmplifierLaw law, double volts, double ohms) {
    SectionCurrents out = new SectionCurrents();
    double low = -50;
    double high = volts;
    while (high - low > 1e-9) {
      double grid = (low + high) / 2;
      law.evaluate(100, 80, grid, out);
      if (volts - ohms * out.gridAmps > grid) {
        low = grid;
      } else {
        high = grid;
      }
    }
    return low;
  }
}
