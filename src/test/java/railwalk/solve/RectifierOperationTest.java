package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;
import railwalk.walk.RippleGroups;
import railwalk.walk.SupplyMap;

/**
 * Makers' typical operation of rectifier tubes with capacitor input: volts rms a plate, series
 * resistance a plate, first capacitor and direct current give the volts at the filter input. The
 * sheets are named row by row in {@code rectifier-operation.csv}. Rows of high confidence are met
 * within 2.5 %; those of the 117 V half-wave types, which stand above what their own drop allows,
 * within 8 %; the other rows of medium confidence are printed alone.
 */
class RectifierOperationTest {
  @Test
  void meetsThePublishedOperation() throws IOException {
    double worst = 0;
    double worstOnLine = 0;
    int judged = 0;
    int onLine = 0;
    System.out.println("row    type     rms    Rs     C        DC        law    sheet  error");
    for (String[] f : rows()) {
      Optional<TubeType> type = Catalogue.standard().find(f[1]);
      if (type.isEmpty()) {
        continue;
      }
      double volts = filterInputVolts(type.get(), f);
      double published = Double.parseDouble(f[7]);
      double error = volts / published - 1;
      System.out.printf(
          "%-6s %-7s %4s V %4s ohm %3s uF %6s mA  %6.1f V %4s V  %+5.2f %%  %-6s  %s%n",
          f[0], f[1], f[2], f[3], f[4], f[6], volts, f[7], 100 * error, f[8], f[9]);
      if (f[8].equals("high")) {
        worst = Math.max(worst, Math.abs(error));
        judged++;
      } else if (f[2].equals("117")) {
        worstOnLine = Math.max(worstOnLine, Math.abs(error));
        onLine++;
      }
    }
    System.out.printf("%d rows of high confidence, worst %.2f %%%n", judged, 100 * worst);
    System.out.printf("%d rows at 117 V, worst %.2f %%%n", onLine, 100 * worstOnLine);
    assertThat(judged).isGreaterThanOrEqualTo(18);
    assertThat(worst).isLessThan(0.025);
    assertThat(onLine).isEqualTo(3);
    assertThat(worstOnLine).isLessThan(0.08);
  }

  private static double filterInputVolts(TubeType type, String[] f) {
    double rms = Double.parseDouble(f[2]);
    double ohms = Double.parseDouble(f[3]);
    boolean halfWave = type.pinsOf("", railwalk.device.Electrode.PLATE2).isEmpty();
    CircuitBuilder builder =
        halfWave
            ? new CircuitBuilder()
                .winding("VHT", "h1", "0", rms, ohms)
                .rectifier(type, "V1", "h1", "b1")
            : new CircuitBuilder()
                .winding("VHT", new double[] {rms, rms}, ohms, "h1", "0", "h2")
                .rectifier(type, "V1", "h1", "h2", "b1");
    Circuit circuit =
        builder
            .c("C1", "b1", "0", Double.parseDouble(f[4]) * 1e-6)
            .i("IL", "b1", "0", Double.parseDouble(f[6]) * 1e-3)
            .line(120, Double.parseDouble(f[5]))
            .build();
    SupplyMap map =
        new SupplyMap(RippleGroups.of(circuit), List.of(), Set.of(), Set.of(), Map.of());
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, map);
    assertThat(outcome).as(f[0]).isInstanceOf(SolveOutcome.Solved.class);
    OperatingPoint point = ((SolveOutcome.Solved) outcome).point();
    return point.volts(circuit.node("b1").orElseThrow());
  }

  private static List<String[]> rows() throws IOException {
    try (InputStream in =
        Objects.requireNonNull(
            RectifierOperationTest.class.getResourceAsStream("rectifier-operation.csv"))) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8)
          .lines()
          .skip(1)
          .map(line -> line.split(",", -1))
          .toList();
    }
  }
}
