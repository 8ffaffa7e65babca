package railwalk.spread;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hipparchus.random.Well19937c;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.solve.BuildSolver;
import railwalk.solve.NearbySolver;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.walk.Walk;

/**
 * Sampled bands against fresh builds, which a general-purpose generator (Hipparchus Well19937c)
 * draws, and against what is published of Sobol sequences.
 */
class SampledBandsTest {
  /** Bands narrower than that are not judged. */
  private static final double NARROW_VOLTS = 0.01;

  private static OperatingPoint solve(Circuit circuit) {
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, Walk.of(circuit));
    return ((SolveOutcome.Solved) outcome).point();
  }

  private static Circuit demo(String name) throws IOException {
    return NetlistReader.read(Path.of("test-netlists/amps", name + ".cir"), Catalogue.standard())
        .circuit()
        .orElseThrow();
  }

  /** Nine builds in ten lie within the band of every node. */
  @ParameterizedTest
  @ValueSource(strings = {"first", "towpath", "weirside", "lockgate", "millrace"})
  void coverage(String name) throws IOException {
    covers(name, 2000, 0.86, 0.94);
  }

  /** The same with ten times the builds. */
  @Tag("slow")
  @ParameterizedTest
  @ValueSource(strings = {"first", "towpath", "weirside", "lockgate", "millrace"})
  void longCoverage(String name) throws IOException {
    covers(name, 20000, 0.88, 0.92);
  }

  private static void covers(String name, int builds, double least, double most)
      throws IOException {
    Circuit circuit = demo(name);
    OperatingPoint point = solve(circuit);
    Bands bands = SampledBands.of(point);
    List<Node> wide = new ArrayList<>();
    for (Node node : circuit.nodes()) {
      Band band = bands.byNode().get(node);
      if (band != null && band.highVolts() - band.lowVolts() > NARROW_VOLTS) {
        wide.add(node);
      }
    }
    assertThat(wide).isNotEmpty();
    Well19937c random = new Well19937c(1960);
    BuildSolver solver = new BuildSolver(point);
    int[] inside = new int[wide.size()];
    int settled = 0;
    for (int build = 0; build < builds; build++) {
      Optional<OperatingPoint> built =
          solver.solve(RandomBuild.of(circuit, () -> Math.max(1e-12, random.nextDouble())));
      if (built.isEmpty()) {
        continue;
      }
      settled++;
      for (int n = 0; n < inside.length; n++) {
        double volts = built.get().volts(wide.get(n));
        Band band = Objects.requireNonNull(bands.byNode().get(wide.get(n)));
        inside[n] += volts >= band.lowVolts() && volts <= band.highVolts() ? 1 : 0;
      }
    }
    int low = 0;
    int high = 0;
    for (int n = 0; n < inside.length; n++) {
      low = inside[n] < inside[low] ? n : low;
      high = inside[n] > inside[high] ? n : high;
    }
    System.out.printf(
        "%-9s %2d nodes, %d builds, %d unsettled: %.1f %% inside at %s to %.1f %% at %s%n",
        name,
        inside.length,
        builds,
        builds - settled,
        100.0 * inside[low] / settled,
        wide.get(low).name(),
        100.0 * inside[high] / settled,
        wide.get(high).name());
    assertThat(settled).isGreaterThan(builds * 99 / 100);
    assertThat((double) inside[low] / settled).isGreaterThan(least);
    assertThat((double) inside[high] / settled).isLessThan(most);
  }

  /** Builds solved on one set of equations against each solved on its own. */
  @ParameterizedTest
  @ValueSource(strings = {"towpath", "millrace"})
  void buildsComeOutAsOneByOne(String name) throws IOException {
    Circuit circuit = demo(name);
    OperatingPoint point = solve(circuit);
    SobolBuilds drawn = new SobolBuilds(circuit, 7);
    BuildSolver solver = new BuildSolver(point);
    double worst = 0;
    for (int build = 0; build < 100; build++) {
      Circuit built = drawn.next();
      OperatingPoint fast = solver.solve(built).orElseThrow();
      OperatingPoint alone = new NearbySolver(point).solve(built).orElseThrow();
      for (Node node : circuit.nodes()) {
        double difference = Math.abs(fast.volts(node) - alone.volts(node));
        worst = Math.max(worst, Double.isNaN(difference) ? 0 : difference);
      }
    }
    System.out.printf("%s, 100 builds on one set of equations: %.2g V off at most%n", name, worst);
    assertThat(worst).isLessThan(0.02);
  }

  /** The same seed gives the same bands, another seed others that are hardly different. */
  @Test
  void seeded() throws IOException {
    OperatingPoint point = solve(demo("towpath"));
    Bands bands = SampledBands.of(point);
    assertThat(SampledBands.of(point)).isEqualTo(bands);
    Bands other = SampledBands.of(point, SampledBands.BUILDS, 2);
    assertThat(other.byNode()).isNotEqualTo(bands.byNode());
  }

  /**
   * The first 2^k points of a Sobol sequence have, in every coordinate, exactly one in each of 2^k
   * equal intervals (I. M. Sobol 1967, property A' in one dimension); the shift keeps that.
   */
  @Test
  void pointsFillEveryCoordinateEvenly() throws IOException {
    SobolBuilds builds = new SobolBuilds(demo("millrace"), 3);
    int draws = RandomBuild.draws(demo("millrace"));
    boolean[][] taken = new boolean[draws][SampledBands.BUILDS];
    for (int build = 0; build < SampledBands.BUILDS; build++) {
      double[] point = builds.nextPoint();
      assertThat(point).hasSize(draws);
      for (int d = 0; d < draws; d++) {
        int interval = (int) (point[d] * SampledBands.BUILDS);
        assertThat(taken[d][interval]).as("coordinate %d", d).isFalse();
        taken[d][interval] = true;
      }
    }
  }

  /** A divider is nearly straight: first order and builds agree, drifted carbons included. */
  @ParameterizedTest
  @ValueSource(strings = {"", ".spread resistors=carbon"})
  void agreesWithFirstOrderWhereTheCircuitIsStraight(String spread) {
    String text =
        """
        * divider
        %s
        V1 b 0 300
        R1 b m 100k
        R2 m n 47k
        R3 n 0 68k
        """;
    Circuit circuit =
        NetlistReader.readText("d.cir", text.formatted(spread), Catalogue.standard())
            .circuit()
            .orElseThrow();
    OperatingPoint point = solve(circuit);
    for (String name : List.of("m", "n")) {
      Node node = circuit.node(name).orElseThrow();
      Band straight = Objects.requireNonNull(FirstOrderBands.of(point).byNode().get(node));
      Band sampled = Objects.requireNonNull(SampledBands.of(point).byNode().get(node));
      double width = straight.highVolts() - straight.lowVolts();
      System.out.printf(
          "divider %-26s %s: first order %.2f to %.2f V, sampled %.2f to %.2f V%n",
          spread,
          name,
          straight.lowVolts(),
          straight.highVolts(),
          sampled.lowVolts(),
          sampled.highVolts());
      assertThat(Math.abs(straight.lowVolts() - sampled.lowVolts())).isLessThan(0.05 * width);
      assertThat(Math.abs(straight.highVolts() - sampled.highVolts())).isLessThan(0.05 * width);
    }
  }
}
