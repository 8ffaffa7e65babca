package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.walk.RippleGroups;
import railwalk.walk.SupplyMap;

/**
 * Capacitor-input supplies against the limits of an ideal diode: {@code tan φ − φ = π · Rs /
 * (n·R)}, {@code Vdc / Vpeak = cos φ} for a reservoir without ripple (exact, derived from the
 * conduction angle), and a table for finite reservoirs from an independent time-step integration.
 * Quantities as in O. H. Schade, "Analysis of rectifier operation", Proc. IRE 31 (1943): omega is
 * the line's, R the load, Rs the resistance of one conducting path.
 *
 * <p>The ideal diode is a silicon one under ten thousand volts, where its drop is nothing.
 */
class CapacitorInputTest {
  private static final double PEAK_VOLTS = 10_000;
  private static final double LOAD_OHMS = 1_000;
  private static final double ENDLESS = 20_000;

  private record Row(
      String id,
      String kind,
      boolean fullWave,
      double omegaCr,
      double rsOverR,
      double vdcOverPeak,
      double ripplePercent) {}

  @Test
  void meetsTheTableOfConductionAngles() throws IOException {
    double worstLimit = 0;
    double worstFinite = 0;
    double worstRipple = 0;
    int count = 0;
    for (Row row : rows()) {
      OperatingPoint point = solve(row);
      double volts = point.volts(point.circuit().node("b1").orElseThrow()) / PEAK_VOLTS;
      double ripple = 100 * point.supplies().get(0).rippleVoltsRms() / (volts * PEAK_VOLTS);
      double error = volts / row.vdcOverPeak - 1;
      System.out.printf(
          "%s %-9s %s wCR %-7.4g Rs/R %-6.4g Vdc/Vp %.4f (%+.2f %%) ripple %.2f %% (%.2f %%)%n",
          row.id,
          row.kind,
          row.fullWave ? "full" : "half",
          row.omegaCr,
          row.rsOverR,
          volts,
          100 * error,
          ripple,
          row.ripplePercent);
      if (row.kind.equals("asymptote")) {
        worstLimit = Math.max(worstLimit, Math.abs(error));
      } else {
        worstFinite = Math.max(worstFinite, Math.abs(error));
        worstRipple = Math.max(worstRipple, Math.abs(ripple / row.ripplePercent - 1));
      }
      count++;
    }
    System.out.printf(
        "%d rows; worst: limit %.3f %%, finite %.3f %%, ripple %.2f %%%n",
        count, 100 * worstLimit, 100 * worstFinite, 100 * worstRipple);
    assertThat(count).isGreaterThanOrEqualTo(90);
    assertThat(worstLimit).isLessThan(0.003);
    assertThat(worstFinite).isLessThan(0.01);
    assertThat(worstRipple).isLessThan(0.05);
  }

  private static OperatingPoint solve(Row row) {
    double omega = 2 * Math.PI * 60;
    double omegaCr = Double.isInfinite(row.omegaCr) ? ENDLESS : row.omegaCr;
    double seriesOhms = row.rsOverR * LOAD_OHMS;
    double rms = PEAK_VOLTS / Math.sqrt(2);
    CircuitBuilder builder =
        row.fullWave
            ? new CircuitBuilder()
                .winding("VHT", new double[] {rms, rms}, seriesOhms, "h1", "0", "h2")
                .diode("D1", "h1", "b1")
                .diode("D2", "h2", "b1")
            : new CircuitBuilder()
                .winding("VHT", "h1", "0", rms, seriesOhms)
                .diode("D1", "h1", "b1");
    Circuit circuit =
        builder
            .c("C1", "b1", "0", omegaCr / (omega * LOAD_OHMS))
            .r("RL", "b1", "0", LOAD_OHMS)
            .line(120, 60)
            .build();
    SupplyMap map =
        new SupplyMap(RippleGroups.of(circuit), List.of(), Set.of(), Set.of(), Map.of());
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, map);
    assertThat(outcome).as(row.id + outcome).isInstanceOf(SolveOutcome.Solved.class);
    return ((SolveOutcome.Solved) outcome).point();
  }

  private static List<Row> rows() throws IOException {
    try (InputStream in =
        Objects.requireNonNull(
            CapacitorInputTest.class.getResourceAsStream("capacitor-input.csv"))) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8)
          .lines()
          .skip(1)
          .map(line -> line.split(",", -1))
          .map(
              f ->
                  new Row(
                      f[0],
                      f[1],
                      f[2].equals("full-wave"),
                      f[3].equals("inf") ? Double.POSITIVE_INFINITY : Double.parseDouble(f[3]),
                      Double.parseDouble(f[4]),
                      Double.parseDouble(f[5]),
                      Double.parseDouble(f[6])))
          .toList();
    }
  }
}
