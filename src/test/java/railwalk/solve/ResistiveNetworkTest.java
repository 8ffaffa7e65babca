package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.circuit.Resistor;
import railwalk.walk.Walk;

/**
 * Purely resistive networks of 200 random nodes, values over six decades, against a dense solution
 * by EJML (a general-purpose matrix library) whose answer is refined once with residuals taken in
 * 40-digit decimal arithmetic.
 */
class ResistiveNetworkTest {
  private static final int NODES = 200;

  @Test
  void agreesWithARefinedDenseSolution() {
    double worst = 0;
    for (int seed = 1; seed <= 5; seed++) {
      worst = Math.max(worst, worstError(new Random(seed)));
    }
    System.out.printf("five networks of %d nodes: worst relative error %.2e%n", NODES, worst);
    assertThat(worst).isLessThan(1e-9);
  }

  private static double worstError(Random random) {
    CircuitBuilder builder = new CircuitBuilder();
    builder.node("0");
    double[][] siemens = new double[NODES][NODES];
    double[] amps = new double[NODES];
    int number = 0;
    for (int n = 0; n < NODES; n++) {
      int links = n == 0 ? 1 : 1 + random.nextInt(3);
      for (int k = 0; k < links; k++) {
        int other = n == 0 ? -1 : random.nextInt(n + 1) - 1;
        double ohms = Math.pow(10, 1 + 6 * random.nextDouble());
        builder.r("R" + ++number, name(n), name(other), ohms);
        stamp(siemens, n, other, 1 / ohms);
      }
    }
    for (int k = 0; k < 10; k++) {
      int into = random.nextInt(NODES);
      double source = 0.1 * random.nextDouble();
      builder.i("I" + k, "0", name(into), source);
      amps[into] += source;
    }
    Circuit circuit = builder.build();
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, Walk.of(circuit));
    OperatingPoint point = ((SolveOutcome.Solved) outcome).point();
    double[] expected = refined(siemens, amps);
    double worst = 0;
    for (int n = 0; n < NODES; n++) {
      double volts = point.volts(circuit.node(name(n)).orElseThrow());
      worst = Math.max(worst, Math.abs(volts / expected[n] - 1));
    }
    assertThat(circuit.elements(Resistor.class)).hasSizeGreaterThan(NODES);
    return worst;
  }

  private static String name(int n) {
    return n < 0 ? "0" : "n" + n;
  }

  private static void stamp(double[][] matrix, int a, int b, double value) {
    matrix[a][a] += value;
    if (b >= 0) {
      matrix[b][b] += value;
      matrix[a][b] -= value;
      matrix[b][a] -= value;
    }
  }

  private static double[] refined(double[][] siemens, double[] amps) {
    double[] x = dense(siemens, amps);
    double[] rest = new double[NODES];
    for (int r = 0; r < NODES; r++) {
      BigDecimal sum = new BigDecimal(amps[r]);
      for (int c = 0; c < NODES; c++) {
        if (siemens[r][c] != 0) {
          sum =
              sum.subtract(
                  new BigDecimal(siemens[r][c])
                      .multiply(new BigDecimal(x[c]), new MathContext(40)));
        }
      }
      rest[r] = sum.doubleValue();
    }
    double[] correction = dense(siemens, rest);
    for (int n = 0; n < NODES; n++) {
      x[n] += correction[n];
    }
    return x;
  }

  private static double[] dense(double[][] siemens, double[] right) {
    DMatrixRMaj x = new DMatrixRMaj(NODES, 1);
    assertThat(
            CommonOps_DDRM.solve(
                new DMatrixRMaj(siemens), new DMatrixRMaj(NODES, 1, true, right), x))
        .isTrue();
    return x.getData().clone();
  }
}
