package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * What every amplifier law of the catalogue must hold for any volts that a solver may try: finite,
 * never negative, rising with plate and grid, no corners, and derivatives that agree with central
 * differences (Richardson extrapolation: L. F. Richardson, Phil. Trans. A 210, 1911).
 */
class AmplifierLawTest {
  private static final int TRIALS = 4000;

  private record Volts(double plate, double screen, double grid) {}

  record Named(String name, AmplifierLaw law) {
    @Override
    public String toString() {
      return name;
    }
  }

  static Stream<Named> laws() {
    return Catalogue.standard().types().stream()
        .flatMap(
            t ->
                t.sections().stream()
                    .limit(1)
                    .filter(s -> s.law() instanceof AmplifierLaw)
                    .map(s -> new Named(t.name(), (AmplifierLaw) s.law())));
  }

  @ParameterizedTest
  @MethodSource("laws")
  void derivativesAgreeWithCentralDifferences(Named named) {
    Random random = new Random(20_260_101);
    SectionCurrents at = new SectionCurrents();
    double worst = 0;
    for (int i = 0; i < TRIALS; i++) {
      Volts v = volts(random);
      named.law.evaluate(v.plate, v.screen, v.grid, at);
      double scale = at.plateAmps + at.screenAmps + at.gridAmps;
      List<double[]> pairs =
          List.of(
              slopes(named.law, v, at.plateByPlateSiemens, c -> c.plateAmps, 0),
              slopes(named.law, v, at.plateByScreenSiemens, c -> c.plateAmps, 1),
              slopes(named.law, v, at.plateByGridSiemens, c -> c.plateAmps, 2),
              slopes(named.law, v, at.screenByPlateSiemens, c -> c.screenAmps, 0),
              slopes(named.law, v, at.screenByScreenSiemens, c -> c.screenAmps, 1),
              slopes(named.law, v, at.screenByGridSiemens, c -> c.screenAmps, 2),
              slopes(named.law, v, at.gridByPlateSiemens, c -> c.gridAmps, 0),
              slopes(named.law, v, at.gridByScreenSiemens, c -> c.gridAmps, 1),
              slopes(named.law, v, at.gridByGridSiemens, c -> c.gridAmps, 2));
      for (double[] pair : pairs) {
        double error = Math.abs(pair[0] - pair[1]) / (1e-12 + 0.01 * scale + Math.abs(pair[0]));
        worst = Math.max(worst, error);
        assertThat(error).as("%s at %s", named.name, v).isLessThan(1e-6);
      }
    }
    System.out.printf("%-7s derivatives: worst %.1e of the slope%n", named.name, worst);
  }

  @ParameterizedTest
  @MethodSource("laws")
  void currentsAreFiniteNeverNegativeAndRiseWithPlateAndGrid(Named named) {
    Random random = new Random(4711);
    SectionCurrents at = new SectionCurrents();
    SectionCurrents next = new SectionCurrents();
    for (int i = 0; i < TRIALS * 5; i++) {
      Volts v = volts(random);
      named.law.evaluate(v.plate, v.screen, v.grid, at);
      assertThat(List.of(at.plateAmps, at.screenAmps, at.gridAmps))
          .as("%s at %s", named.name, v)
          .allMatch(a -> a >= 0 && a < 5);
      double step = Math.pow(10, -3 * random.nextDouble());
      named.law.evaluate(v.plate + step, v.screen, v.grid, next);
      assertThat(next.plateAmps).as("plate, %s", v).isGreaterThanOrEqualTo(at.plateAmps);
      named.law.evaluate(v.plate, v.screen, v.grid + step, next);
      assertThat(next.plateAmps).as("grid, %s", v).isGreaterThanOrEqualTo(at.plateAmps);
      assertThat(next.gridAmps).as("grid, %s", v).isGreaterThanOrEqualTo(at.gridAmps);
    }
    named.law.evaluate(-0.5, 200, 0, at);
    assertThat(at.plateAmps).isZero();
  }

  @ParameterizedTest
  @MethodSource("laws")
  void slopesHaveNoStepWhereBranchesMeet(Named named) {
    for (double screen : new double[] {-20, 0, 100, 300}) {
      for (double grid : new double[] {-30, -5, -0.5, 0, 5}) {
        smooth(named, v -> v, v -> screen, v -> grid, 0);
        smooth(named, v -> 250, v -> v, v -> grid, 0);
        smooth(named, v -> v, v -> v, v -> grid, 0);
        smooth(named, v -> 100, v -> screen, v -> v, -5.65);
      }
    }
  }

  /** Checks slopes just left and right of {@code joint} on the line the three functions draw. */
  private static void smooth(
      Named named,
      DoubleUnaryOperator plate,
      DoubleUnaryOperator screen,
      DoubleUnaryOperator grid,
      double joint) {
    SectionCurrents left = new SectionCurrents();
    SectionCurrents right = new SectionCurrents();
    for (double step = 1e-2; step > 1e-13; step /= 10) {
      double a = joint - step;
      double b = joint + step;
      named.law.evaluate(
          plate.applyAsDouble(a), screen.applyAsDouble(a), grid.applyAsDouble(a), left);
      named.law.evaluate(
          plate.applyAsDouble(b), screen.applyAsDouble(b), grid.applyAsDouble(b), right);
    }
    // The currents grow like v^1.2 and faster from v = 0 on, so 1e-12 V away slopes of at most
    // 1e-2 siemens per volt^0.2 have shrunk below 1e-4.
    assertThat(left.plateByPlateSiemens).isCloseTo(right.plateByPlateSiemens, within());
    assertThat(left.plateByScreenSiemens).isCloseTo(right.plateByScreenSiemens, within());
    assertThat(left.plateByGridSiemens).isCloseTo(right.plateByGridSiemens, within());
    assertThat(left.screenByPlateSiemens).isCloseTo(right.screenByPlateSiemens, within());
    assertThat(left.screenByScreenSiemens).isCloseTo(right.screenByScreenSiemens, within());
    assertThat(left.screenByGridSiemens).isCloseTo(right.screenByGridSiemens, within());
    assertThat(left.gridByGridSiemens).isCloseTo(right.gridByGridSiemens, within());
  }

  private static Offset<Double> within() {
    return Offset.offset(1e-6);
  }

  @Test
  void theScreenTakesOverAsThePlateFalls() {
    for (Named named : laws().filter(n -> n.law instanceof PentodeLaw).toList()) {
      SectionCurrents at = new SectionCurrents();
      named.law.evaluate(250, 100, 0, at);
      double above = at.screenAmps;
      double total = at.plateAmps + at.screenAmps;
      double last = above;
      for (double plate = 50; plate >= 0; plate -= 5) {
        named.law.evaluate(plate, 100, 0, at);
        assertThat(at.screenAmps).as("%s at %g V", named.name, plate).isGreaterThan(last);
        last = at.screenAmps;
      }
      assertThat(last / total).as(named.name).isBetween(0.5, 0.75);
      System.out.printf(
          "%-7s screen at 100 V, grid 0: %.2f mA with 250 V on the plate, %.2f mA with none%n",
          named.name, 1e3 * above, 1e3 * last);
    }
  }

  @ParameterizedTest
  @MethodSource("laws")
  void emissionScalesEveryCurrent(Named named) {
    SectionCurrents full = new SectionCurrents();
    SectionCurrents tired = new SectionCurrents();
    named.law.evaluate(180, 120, 0.3, full);
    named.law.withEmission(0.7).evaluate(180, 120, 0.3, tired);
    assertThat(tired.plateAmps / full.plateAmps).isCloseTo(0.7, exactly());
    assertThat(tired.gridAmps / full.gridAmps).isCloseTo(0.7, exactly());
    assertThat(tired.plateByGridSiemens / full.plateByGridSiemens).isCloseTo(0.7, exactly());
  }

  private static Offset<Double> exactly() {
    return Offset.offset(1e-12);
  }

  /** A third of the trials near the working range, the rest anywhere a solver may stray. */
  private static Volts volts(Random random) {
    if (random.nextInt(3) == 0) {
      return new Volts(
          500 * random.nextDouble(), 400 * random.nextDouble(), -25 + 27 * random.nextDouble());
    }
    return new Volts(
        -600 + 1800 * random.nextDouble(),
        -600 + 1300 * random.nextDouble(),
        -200 + 220 * random.nextDouble());
  }

  private interface Current {
    double of(SectionCurrents currents);
  }

  private static double[] slopes(
      AmplifierLaw law, Volts v, double analytic, Current current, int electrode) {
    double coarse = difference(law, v, current, electrode, 2e-3);
    double fine = difference(law, v, current, electrode, 1e-3);
    return new double[] {analytic, (4 * fine - coarse) / 3};
  }

  private static double difference(
      AmplifierLaw law, Volts v, Current current, int electrode, double step) {
    SectionCurrents out = new SectionCurrents();
    law.evaluate(
        v.plate + (electrode == 0 ? step : 0),
        v.screen + (electrode == 1 ? step : 0),
        v.grid + (electrode == 2 ? step : 0),
        out);
    double up = current.of(out);
    law.evaluate(
        v.plate - (electrode == 0 ? step : 0),
        v.screen - (electrode == 1 ? step : 0),
        v.grid - (electrode == 2 ? step : 0),
        out);
    return (up - current.of(out)) / (2 * step);
  }
}
