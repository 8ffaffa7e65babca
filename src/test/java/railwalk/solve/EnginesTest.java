package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.walk.Walk;

/** The averaged engine against time stepping, which assumes nothing of what it does. */
class EnginesTest {
  /** Of a node's volts, and the least that counts. */
  private static final double AGREED_SHARE = 0.002;

  private static final double AGREED_VOLTS = 0.05;

  @Test
  void enginesAgreeOnEveryNetlist() throws IOException {
    double worst = 0;
    int count = 0;
    for (Path file : netlists()) {
      Circuit circuit = NetlistReader.read(file, Catalogue.standard()).circuit().orElseThrow();
      OperatingPoint averaged =
          ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, Walk.of(circuit))).point();
      long start = System.nanoTime();
      CycleOutcome outcome = TimeStepping.of(averaged);
      double ms = (System.nanoTime() - start) / 1e6;
      if (outcome instanceof CycleOutcome.NotSettled not) {
        System.out.printf("%-40s %s: %s%n", file.getFileName(), not.node(), not.reason());
        worst = Double.POSITIVE_INFINITY;
        continue;
      }
      LineCycle cycle = ((CycleOutcome.Settled) outcome).cycle();
      double most = 0;
      String where = "";
      for (Node node : circuit.nodes()) {
        double mean = cycle.meanVolts(node);
        double volts = averaged.volts(node);
        if (Double.isNaN(mean) || Double.isNaN(volts)) {
          continue;
        }
        double limit = Math.max(AGREED_VOLTS, AGREED_SHARE * Math.abs(mean));
        double error = Math.abs(volts - mean) / limit;
        if (error > most) {
          most = error;
          where = String.format("%s %.4f against %.4f V", node.name(), volts, mean);
        }
      }
      System.out.printf(
          "%-40s %2d periods, %4.0f ms, worst %.2f of the limit: %s%n",
          file.getFileName(), cycle.periods(), ms, most, where);
      worst = Math.max(worst, most);
      count++;
    }
    System.out.printf("%d netlists, worst %.2f of the limit%n", count, worst);
    assertThat(worst).isLessThanOrEqualTo(1);
  }

  static List<Path> netlists() throws IOException {
    return Stream.of("amps", "supplies")
        .map(Path.of("test-netlists")::resolve)
        .filter(Files::isDirectory)
        .flatMap(EnginesTest::netlists)
        .sorted()
        .toList();
  }

  private static Stream<Path> netlists(Path folder) {
    try (Stream<Path> files = Files.list(folder)) {
      return files.filter(f -> f.toString().endsWith(".cir")).toList().stream();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
