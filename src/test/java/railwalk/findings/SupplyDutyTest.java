package railwalk.findings;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.solve.CycleOutcome;
import railwalk.solve.LineCycle;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.solve.TimeStepping;
import railwalk.solve.Unloaded;
import railwalk.walk.Walk;

/** What parts of a supply stand, against what handbooks and Ohm's law say. */
class SupplyDutyTest {
  @TempDir private Path folder;

  private Circuit circuit(String... lines) throws IOException {
    Path file = folder.resolve("supply.cir");
    Files.writeString(file, "* supply\n" + String.join("\n", lines) + "\n", StandardCharsets.UTF_8);
    return NetlistReader.read(file, Catalogue.standard()).circuit().orElseThrow();
  }

  private static OperatingPoint solve(Circuit circuit) {
    return ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, Walk.of(circuit))).point();
  }

  private static RectifierDuty first(OperatingPoint point) {
    return RectifierDuty.of(point, null).get(0);
  }

  /**
   * Peak inverse volts of rectifiers into a capacitor with a light load: 2.83 of the winding's
   * volts rms a plate for a centre tap and for half-wave, 1.41 for a bridge (tables of rectifier
   * circuits in the RCA Receiving Tube Manual and in Terman's Radio Engineers' Handbook, from
   * memory; they neglect the drop of the rectifier).
   */
  @Test
  void inverseVoltsAreThoseOfTheHandbooks() throws IOException {
    String line = ".line 120 60";
    double centreTap =
        first(
                solve(
                    circuit(
                        line,
                        "VHT a 0 b RMS 300-0-300 rdc=20,20",
                        "D1 a o 1N4007",
                        "D2 b o 1N4007",
                        "C1 o 0 100u",
                        "R1 o 0 100k")))
            .inverseVolts();
    double halfWave =
        first(
                solve(
                    circuit(
                        line,
                        "VHT a 0 RMS 300 rdc=20",
                        "D1 a o 1N4007",
                        "C1 o 0 100u",
                        "R1 o 0 100k")))
            .inverseVolts();
    double bridge =
        first(
                solve(
                    circuit(
                        line,
                        "VHT a b RMS 300 rdc=20",
                        "D1 a o 1N4007",
                        "D2 b o 1N4007",
                        "D3 0 a 1N4007",
                        "D4 0 b 1N4007",
                        "C1 o 0 100u",
                        "R1 o 0 100k")))
            .inverseVolts();
    System.out.printf(
        "inverse over rms: centre tap %.3f, half-wave %.3f, bridge %.3f%n",
        centreTap / 300, halfWave / 300, bridge / 300);
    assertThat(centreTap / 300).isCloseTo(2 * Math.sqrt(2), within(0.01 * 2.83));
    assertThat(halfWave / 300).isCloseTo(2 * Math.sqrt(2), within(0.01 * 2.83));
    assertThat(bridge / 300).isCloseTo(Math.sqrt(2), within(0.01 * 1.41));
  }

  /** A tube's drop stands off the centre tap's two peaks: the plate's own peak, then the output. */
  @Test
  void aTubesDropComesOffItsInverseVolts() throws IOException {
    OperatingPoint point =
        solve(
            circuit(
                ".line 120 60",
                "VHT a 0 b RMS 300-0-300 rdc=50,50",
                "XV1 5Y3GT plate1=a plate2=b cathode=o",
                "C1 o 0 40u",
                "R1 o 0 5k"));
    RectifierDuty duty = first(point);
    double output = point.volts(point.circuit().node("o").orElseThrow());
    double peak = Math.sqrt(2) * 300;
    System.out.printf("5Y3GT: inverse %.1f V, output %.1f V%n", duty.inverseVolts(), output);
    assertThat(duty.inverseVolts()).isLessThan(2 * peak - 30);
    assertThat(duty.inverseVolts()).isCloseTo(peak + output, within(0.02 * peak));
    assertThat(duty.inverseVoltsMax()).isEqualTo(1400);
    assertThat(duty.meanAmps()).isCloseTo(output / 5000, within(1e-5));
  }

  /** √2 of the open volts on a line 10 % up, less a silicon diode's drop: nothing else is drawn. */
  @Test
  void coldVoltsAreThePeakOnTheHighLine() throws IOException {
    Circuit circuit =
        circuit(
            ".line 120 60 design=117",
            "VHT a 0 b RMS 250-0-250 rdc=60,60",
            "D1 a o 1N4007",
            "D2 b o 1N4007",
            "C1 o 0 47u 385V",
            "LOT o p rdc=200",
            "XV1 EL84 plate=p screen=o grid=g cathode=k",
            "R1 g 0 470k",
            "R2 k 0 150 2W");
    OperatingPoint unloaded = Unloaded.of(circuit).orElseThrow();
    CapacitorDuty duty = CapacitorDuty.of(solve(circuit), unloaded).get(0);
    double expected = 1.1 * 120 / 117 * Math.sqrt(2) * 250;
    System.out.printf(
        "cold: %.2f V against %.2f V, running %.2f V%n",
        duty.unloadedVolts(), expected, duty.runningVolts());
    assertThat(duty.unloadedVolts()).isCloseTo(expected, within(0.01 * expected));
    assertThat(duty.isOverUnloaded()).isTrue();
    assertThat(duty.isOverRunning()).isFalse();
  }

  /** Where no line is stated windings hold as written, at= or not: the high line is 10 % more. */
  @Test
  void coldVoltsWithoutALine() throws IOException {
    Circuit circuit =
        circuit(
            "VHT a 0 b RMS 250-0-250 rdc=60,60 at=110",
            "D1 a o 1N4007",
            "D2 b o 1N4007",
            "C1 o 0 47u 385V",
            "R1 o 0 470k");
    OperatingPoint unloaded = Unloaded.of(circuit).orElseThrow();
    double expected = 1.1 * Math.sqrt(2) * 250;
    assertThat(unloaded.volts(circuit.node("o").orElseThrow()))
        .isCloseTo(expected, within(0.01 * expected));
  }

  /**
   * Heaters in parallel ask for the sum of their currents (12AX7 0.3 A and 6V6GT 0.45 A at 6.3 V,
   * makers' sheets); what flows is the open volts over all resistance in the loop, the primary's
   * referred by turns (Ohm's law).
   */
  @Test
  void aHeaterWindingsBudgetIsTheSumOfItsHeaters() throws IOException {
    OperatingPoint point =
        solve(
            circuit(
                ".line 120 60",
                ".transformer T1 primary=120 rdc=8",
                "VH f1 0 RMS 6.6 rdc=0.2 on=T1 amps=0.6",
                "XV1 12AX7 1=b 2=0 3=0 4=f1 5=f1 6=b 7=0 8=0 9=0",
                "XV2 6V6GT 2=f1 3=b 4=b 5=0 7=0 8=k",
                "R1 k 0 1k",
                "VB b 0 DC 100"));
    WindingDuty duty = WindingDuty.of(point).get(0);
    double loop = 0.2 + 8 * (6.6 / 120) * (6.6 / 120) + 6.3 / 0.75;
    System.out.printf(
        "heaters: %.4f A at rated volts, %.4f A flow%n", duty.heaterAmps(), duty.rmsAmps());
    assertThat(duty.heaterAmps()).isCloseTo(0.75, within(1e-6));
    assertThat(duty.rmsAmps()).isCloseTo(6.6 / loop, within(1e-6));
    assertThat(duty.tubes()).containsExactly("V1", "V2");
    assertThat(duty.winding().ratedAmps()).isEqualTo(0.6);
    HeaterDuty heater = HeaterDuty.of(point).get(0);
    assertThat(heater.ratedVolts()).isEqualTo(6.3);
    assertThat(heater.rmsVolts()).isCloseTo(6.6 / loop * 6.3 / 0.75, within(1e-6));
  }

  /** Terman's Radio Engineers' Handbook gives the critical inductance as R/1130 at 60 cycles. */
  @Test
  void criticalCurrentIsTheHandbooks() {
    double peak = 400;
    double ohms = 5000;
    double henries = ohms / 1130;
    assertThat(ChokeInput.criticalAmps(peak, henries, 60))
        .isCloseTo(2 / Math.PI * peak / ohms, within(1e-3 * peak / ohms));
  }

  /**
   * Time stepping, which knows nothing of the formula: with a tenth more than the critical current
   * the choke's current never stops, with a tenth less it does. The formula counts the ripple's
   * second harmonic of the line alone, which is good to a few per cent.
   */
  @Test
  void theChokeRunsDryBelowItsCriticalCurrent() throws IOException {
    double[] least = new double[2];
    for (int i = 0; i < 2; i++) {
      double share = i == 0 ? 1.1 : 0.9;
      double ohms = 6 * Math.PI * 60 * 5 / share;
      OperatingPoint point =
          solve(
              circuit(
                  ".line 120 60",
                  "VHT a t b RMS 300-0-300 rdc=1,1",
                  "D1 a k 1N4007",
                  "D2 b k 1N4007",
                  "L1 k o 5 rdc=1",
                  "RS 0 t 1",
                  "C1 o 0 1000u",
                  "R1 o 0 " + ohms));
      List<ChokeInput> inputs = ChokeInput.of(point);
      LineCycle cycle = ((CycleOutcome.Settled) TimeStepping.of(point)).cycle();
      Node before = point.circuit().node("0").orElseThrow();
      Node after = point.circuit().node("t").orElseThrow();
      Node output = point.circuit().node("o").orElseThrow();
      double[] from = cycle.volts(before);
      double[] to = cycle.volts(after);
      least[i] = Double.POSITIVE_INFINITY;
      for (int k = 0; k < from.length; k++) {
        least[i] = Math.min(least[i], from[k] - to[k]);
      }
      System.out.printf(
          "%.1f of the critical current: %s, least current %.2f mA, output %.3f of the peak%n",
          share, inputs, 1000 * least[i], point.volts(output) / (300 * Math.sqrt(2)));
      assertThat(inputs).hasSize(1);
      assertThat(inputs.get(0).isBelow()).isEqualTo(i == 1);
    }
    assertThat(least[0]).isGreaterThan(1e-3);
    assertThat(least[1]).isLessThan(1e-3);
  }
}
