package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;

/**
 * Choke input and series heater strings against handbook rules. Choke input: above the critical
 * inductance R/(6πf) (RL/1130 at 60 Hz, RL/940 at 50 Hz) the output is 0.637 of the peak, 0.900 of
 * the rms volts (textbook formulas, as in J. Millman and C. Halkias, "Electronic Devices and
 * Circuits", and the Radiotron Designer's Handbook, 4th edition, chapters 30 and 31; given from
 * memory). Well below it the supply turns into one with capacitor input, and the volts rise.
 */
class HandbookSuppliesTest {
  /** So much that a silicon diode's drop is nothing. */
  private static final double PEAK_VOLTS = 10_000;

  private static final double LOAD_OHMS = 5000;

  @Test
  void aboveTheCriticalInductanceTheOutputIsTheMeanOfTheRectifiedSine() {
    for (double hertz : new double[] {50, 60}) {
      double criticalHenries = LOAD_OHMS / (hertz == 50 ? 940 : 1130);
      for (double times : new double[] {1.05, 1.5, 2, 5}) {
        double share = shareOfPeak(hertz, times * criticalHenries);
        System.out.printf(
            "%.0f Hz, %.2f of the critical inductance: %.4f of the peak (0.637)%n",
            hertz, times, share);
        assertThat(share).isCloseTo(0.637, within(0.01 * 0.637));
      }
    }
  }

  @Test
  void farBelowTheCriticalInductanceTheOutputRises() {
    for (double hertz : new double[] {50, 60}) {
      double before = 0.637;
      for (double times : new double[] {0.5, 0.25, 0.1}) {
        double share = shareOfPeak(hertz, times * LOAD_OHMS / (6 * Math.PI * hertz));
        System.out.printf(
            "%.0f Hz, %.2f of the critical inductance: %.4f of the peak%n", hertz, times, share);
        assertThat(share).isGreaterThan(before);
        before = share;
      }
      assertThat(before).isGreaterThan(0.75);
    }
  }

  /** Mean output over the winding's peak, losses and output ripple as good as none. */
  private static double shareOfPeak(double hertz, double henries) {
    double rms = PEAK_VOLTS / Math.sqrt(2);
    Circuit circuit =
        new CircuitBuilder()
            .line(120, hertz)
            .winding("VHT", new double[] {rms, rms}, 1e-3 * LOAD_OHMS, "h1", "0", "h2")
            .diode("D1", "h1", "k")
            .diode("D2", "h2", "k")
            .l("L1", "k", "b1", henries, 1e-4 * LOAD_OHMS)
            .c("C1", "b1", "0", 500e-6)
            .r("RL", "b1", "0", LOAD_OHMS)
            .build();
    OperatingPoint point = SampleAmps.solve(circuit);
    return point.volts(circuit.node("b1").orElseThrow()) / PEAK_VOLTS;
  }

  /**
   * A string of 150 mA heaters across a 117 V line: the heaters' volts add up to the line, each in
   * the ratio of its rated volts (35, 50, 12.6 and 12.6 V, makers' data; Ohm's law). Since all
   * heaters carry one current in phase, volts across one are the difference of its ends' volts.
   */
  @Test
  void heatersInSeriesShareTheLine() throws IOException {
    Circuit circuit =
        NetlistReader.read(
                Path.of("test-netlists/supplies/heater-string.cir"), Catalogue.standard())
            .circuit()
            .orElseThrow();
    OperatingPoint point = SampleAmps.solve(circuit);
    List<String> ends = List.of("hot", "h35", "h50", "h12");
    double[] rated = {35, 50, 12.6, 12.6};
    double ratedSum = 110.2;
    double sum = 0;
    for (int h = 0; h < rated.length; h++) {
      double below = h + 1 < ends.size() ? rmsVolts(point, ends.get(h + 1)) : 0;
      double volts = rmsVolts(point, ends.get(h)) - below;
      System.out.printf("heater of %.1f V: %.3f V%n", rated[h], volts);
      assertThat(volts).isCloseTo(117 * rated[h] / ratedSum, within(0.01 * rated[h]));
      sum += volts;
    }
    System.out.printf("heaters in series: %.3f V of a 117 V line%n", sum);
    assertThat(sum).isCloseTo(117, within(0.5));
  }

  private static double rmsVolts(OperatingPoint point, String name) {
    var node = point.circuit().node(name).orElseThrow();
    return Math.hypot(point.volts(node), point.rippleVoltsRms(node).orElseThrow());
  }
}
