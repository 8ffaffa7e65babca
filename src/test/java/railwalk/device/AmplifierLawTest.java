package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
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

  /** Every law of the catalogue once: unlike sections each, like ones and borrowed laws once. */
  static Stream<Named> laws() {
    Map<AmplifierLaw, Named> laws = new LinkedHashMap<>();
    for (TubeType type : Catalogue.standard().types()) {
      for (SectionType section : type.sections()) {
        if (section.law() instanceof AmplifierLaw law) {
          laws.putIfAbsent(law, new Named((type.name() + " " + section.id()).strip(), law));
        }
      }
    }
    return laws.values().stream();
  }

  /** 1e-5 of the slope or 1e-10 S, whichever is larger; 1e-3 within 1 mV of no plate volts. */
  @ParameterizedTest
  @MethodSource("laws")
  void derivativesAgreeWithCentralDifferences(Named named) {
    Random random = new Random(20_260_101);
    SectionCurrents at = new SectionCurrents();
    double worst = 0;
    String where = "";
    for (int i = 0; i < TRIALS; i++) {
      Volts v = volts(random);
      if (i % 50 == 0) {
        v = new Volts(4e-3 * (random.nextDouble() - 0.5), v.screen, v.grid);
      }
      boolean nearCorner = Math.abs(v.plate) <= 1e-3;
      named.law.evaluate(v.plate, v.screen, v.grid, at);
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
        double allowed = Math.max((nearCorner ? 1e-3 : 1e-5) * Math.abs(pair[0]), 1e-10);
        double error = Math.abs(pair[0] - pair[1]) / allowed;
        if (!(error <= worst)) {
          worst = error;
          where = v + ": " + pair[0] + " against " + pair[1];
        }
      }
    }
    System.out.printf("%-9s derivatives: worst %.2g of what is allowed%n", named.name, worst);
    assertThat(worst).as("%s at %s", named.name, where).isLessThanOrEqualTo(1);
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
      require(isCurrent(at.plateAmps), named, "plate current", v);
      require(isCurrent(at.screenAmps), named, "screen current", v);
      require(isCurrent(at.gridAmps), named, "grid current", v);
      double step = Math.pow(10, -3 * random.nextDouble());
      named.law.evaluate(v.plate + step, v.screen, v.grid, next);
      require(next.plateAmps >= at.plateAmps, named, "rising with the plate", v);
      named.law.evaluate(v.plate, v.screen, v.grid + step, next);
      require(next.plateAmps >= at.plateAmps, named, "rising with the grid", v);
      require(next.gridAmps >= at.gridAmps, named, "grid current rising", v);
    }
    named.law.evaluate(-0.5, 200, 0, at);
    assertThat(at.plateAmps).isZero();
  }

  /** Finite, not negative, and not out of this world: a 6AS7G at 1,200 V passes tens of amperes. */
  private static boolean isCurrent(double amps) {
    return amps >= 0 && amps < 100;
  }

  private static void require(boolean holds, Named named, String what, Volts at) {
    if (!holds) {
      fail("%s: %s at %s", named.name, what, at);
    }
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
    // The currents grow like v^1.13 and faster from v = 0 on, so 1e-13 V away slopes of 1e-3 to
    // 1e-2 siemens have shrunk to a few 1e-6.
    assertThat(left.plateByPlateSiemens).isCloseTo(right.plateByPlateSiemens, within());
    assertThat(left.plateByScreenSiemens).isCloseTo(right.plateByScreenSiemens, within());
    assertThat(left.plateByGridSiemens).isCloseTo(right.plateByGridSiemens, within());
    assertThat(left.screenByPlateSiemens).isCloseTo(right.screenByPlateSiemens, within());
    assertThat(left.screenByScreenSiemens).isCloseTo(right.screenByScreenSiemens, within());
    assertThat(left.screenByGridSiemens).isCloseTo(right.screenByGridSiemens, within());
    assertThat(left.gridByGridSiemens).isCloseTo(right.gridByGridSiemens, within());
  }

  private static Offset<Double> within() {
    return Offset.offset(1e-5);
  }

  @Test
  void theScreenTakesOverAsThePlateFalls() {
    for (Named named : laws().filter(n -> n.law instanceof PentodeLaw).toList()) {
      SectionCurrents at = new SectionCurrents();
      named.law.evaluate(250, 100, 0, at);
      double above = at.screenAmps;
      double total = at.plateAmps + at.screenAmps;
      named.law.evaluate(50, 100, 0, at);
      double last = at.screenAmps;
      for (double plate = 45; plate >= 0; plate -= 5) {
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
    // Steps that do not reach across the corner of the formula at no plate volts.
    double near = Math.abs(v.plate) < 1e-2 ? 0.1 * Math.abs(v.plate) : 1e-3;
    double coarse = difference(law, v, current, electrode, 2 * near);
    double fine = difference(law, v, current, electrode, near);
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
