package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.Filament;
import railwalk.circuit.Node;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.walk.SupplyNode;
import railwalk.walk.Walk;

/** Windings, heaters and rectifiers of the averaged engine against time stepping. */
class AcLoadsTest {
  private static final double AGREED_SHARE = 0.005;

  /**
   * Least mean for which peaks are compared: a bias supply behind a coupling capacitor has a spike
   * where the main rectifier switches, shorter than a step.
   */
  private static final double SPIKED_AMPS = 5e-3;

  /** A steep pulse of silicon over 72 steps. */
  private static final double AGREED_AMPS_SHARE = 0.008;

  private double worstVolts;
  private double worstAmps;
  private double worstMean;
  private double worstPeak;
  private double worstInverse;
  private double worstRipple;
  private double worstHeater;
  private int windings;
  private int ripples;

  @Test
  void agreesWithTimeStepping() throws IOException {
    for (Path file : netlists()) {
      Circuit circuit = NetlistReader.read(file, Catalogue.standard()).circuit().orElseThrow();
      OperatingPoint averaged =
          ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, Walk.of(circuit))).point();
      LineCycle cycle = ((CycleOutcome.Settled) TimeStepping.of(averaged)).cycle();
      compareWindings(file, averaged.acLoads().windings(), cycle.windings());
      compareRectifiers(file, averaged.acLoads().rectifiers(), cycle.rectifiers());
      compareHeaters(file, averaged, cycle);
      compareRipple(file, averaged, cycle);
    }
    System.out.printf(
        "%d sections: volts %.2f %%, amperes %.2f %%; rectifiers: mean %.2f %%, peak %.2f %%,"
            + " inverse %.2f %%; heaters %.2f %%; ripple at %d nodes %.1f %%%n",
        windings,
        100 * worstVolts,
        100 * worstAmps,
        100 * worstMean,
        100 * worstPeak,
        100 * worstInverse,
        100 * worstHeater,
        ripples,
        100 * worstRipple);
    assertThat(windings).isGreaterThan(60);
    assertThat(worstVolts).isLessThan(AGREED_SHARE);
    assertThat(worstAmps).isLessThan(AGREED_AMPS_SHARE);
    assertThat(worstHeater).isLessThan(AGREED_SHARE);
    assertThat(worstMean).isLessThan(AGREED_SHARE);
    assertThat(worstInverse).isLessThan(AGREED_SHARE);
    assertThat(worstPeak).isLessThan(0.02);
    assertThat(ripples).isGreaterThan(50);
    assertThat(worstRipple).isLessThan(0.15);
  }

  private void compareWindings(Path file, List<WindingLoad> here, List<WindingLoad> there) {
    assertThat(here).hasSameSizeAs(there);
    for (int w = 0; w < here.size(); w++) {
      WindingLoad a = here.get(w);
      WindingLoad b = there.get(w);
      assertThat(a.winding()).isEqualTo(b.winding());
      assertThat(a.section()).isEqualTo(b.section());
      double volts = Math.abs(a.rmsVolts() / b.rmsVolts() - 1);
      double amps = b.rmsAmps() < 1e-4 ? 0 : Math.abs(a.rmsAmps() / b.rmsAmps() - 1);
      if (Math.max(volts, amps) > 0.002) {
        System.out.printf(
            "%-28s %s.%d %.4f V against %.4f V, %.5f A against %.5f A%n",
            file.getFileName(),
            a.winding().name(),
            a.section(),
            a.rmsVolts(),
            b.rmsVolts(),
            a.rmsAmps(),
            b.rmsAmps());
      }
      worstVolts = Math.max(worstVolts, volts);
      worstAmps = Math.max(worstAmps, amps);
      windings++;
    }
  }

  private void compareRectifiers(Path file, List<RectifierLoad> here, List<RectifierLoad> there) {
    for (RectifierLoad a : here) {
      RectifierLoad b =
          there.stream()
              .filter(r -> r.rectifier().equals(a.rectifier()) && r.plate() == a.plate())
              .findFirst()
              .orElseThrow();
      double mean = Math.abs(a.meanAmps() - b.meanAmps()) / Math.max(1e-5, b.meanAmps());
      double peak = b.meanAmps() < SPIKED_AMPS ? 0 : Math.abs(a.peakAmps() / b.peakAmps() - 1);
      double inverse = Math.abs(a.inverseVolts() - b.inverseVolts()) / (b.inverseVolts() + 1);
      if (peak > 0.01 || mean > 0.002 || inverse > 0.002) {
        System.out.printf(
            "%-28s %s.%d mean %.5f against %.5f A, peak %.5f against %.5f A, inverse %.2f against"
                + " %.2f V%n",
            file.getFileName(),
            a.rectifier().name(),
            a.plate(),
            a.meanAmps(),
            b.meanAmps(),
            a.peakAmps(),
            b.peakAmps(),
            a.inverseVolts(),
            b.inverseVolts());
      }
      worstMean = Math.max(worstMean, mean);
      worstPeak = Math.max(worstPeak, peak);
      worstInverse = Math.max(worstInverse, inverse);
    }
  }

  private void compareHeaters(Path file, OperatingPoint averaged, LineCycle cycle) {
    averaged
        .acLoads()
        .heaterRmsVolts()
        .forEach(
            (filament, volts) -> {
              double expected = rmsAcross(cycle, filament);
              double error = Math.abs(volts / expected - 1);
              if (error > 0.002) {
                System.out.printf(
                    "%-28s %s %.4f V against %.4f V%n",
                    file.getFileName(), filament.name(), volts, expected);
              }
              worstHeater = Math.max(worstHeater, error);
            });
  }

  /** By the trapezoidal rule. */
  private static double rmsAcross(LineCycle cycle, Filament filament) {
    double[] seconds = cycle.seconds();
    double[] a = cycle.volts(filament.a());
    double[] b = cycle.volts(filament.b());
    double before = a[a.length - 1] - b[b.length - 1];
    double from = 0;
    double sum = 0;
    for (int k = 0; k < a.length; k++) {
      double volts = a[k] - b[k];
      sum += (seconds[k] - from) * (before * before + volts * volts) / 2;
      before = volts;
      from = seconds[k];
    }
    return Math.sqrt(sum / from);
  }

  private void compareRipple(Path file, OperatingPoint averaged, LineCycle cycle) {
    for (SupplyNode supply : averaged.map().supplyNodes()) {
      Node node = supply.node();
      double there = cycle.rippleVoltsRms(node);
      if (supply.group() < 0 || there < 1e-4 || averaged.rippleVoltsRms(node).isEmpty()) {
        continue;
      }
      double here = averaged.rippleVoltsRms(node).orElseThrow();
      ripples++;
      double error = Math.abs(here / there - 1);
      if (!(error < 0.05)) {
        System.out.printf(
            "%-28s ripple at %s %.5f V against %.5f V%n",
            file.getFileName(), node.name(), here, there);
      }
      worstRipple = Math.max(worstRipple, error);
    }
  }

  private static List<Path> netlists() throws IOException {
    Stream<Path> files = Stream.empty();
    for (String folder : List.of("amps", "supplies")) {
      try (Stream<Path> listed = Files.list(Path.of("test-netlists", folder))) {
        files =
            Stream.concat(
                files, listed.filter(f -> f.toString().endsWith(".cir")).toList().stream());
      }
    }
    return files.sorted().toList();
  }
}
