package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import railwalk.source.SourceText;

/** Cathodes on their way up. */
class WarmUpLawTest {
  /**
   * The closed form against a radiating body at constant power, dθ/dt = (1 − θ⁴) / τ (Stefan and
   * Boltzmann's law), stepped by a general-purpose integrator: equal shares of current are reached
   * at equal temperatures, those that Richardson's equation asks for.
   */
  @Test
  void followsARadiatingBody() {
    WarmUpLaw law = new WarmUpLaw(11);
    for (double share : new double[] {0.01, 0.1, 0.5, 0.8}) {
      double expected = 11 * timeTo(share) / timeTo(0.9);
      System.out.printf(
          "share %.2f after %.3f s against %.3f s%n", share, law.secondsTo(share), expected);
      assertThat(law.secondsTo(share)).isCloseTo(expected, within(0.01));
      assertThat(law.emission(expected)).isCloseTo(share, within(0.005));
    }
  }

  /** Integrates with τ = 1 s until the cathode gives {@code share} of its hot current. */
  private static double timeTo(double share) {
    OrdinaryDifferentialEquation body =
        new OrdinaryDifferentialEquation() {
          @Override
          public int getDimension() {
            return 1;
          }

          @Override
          public double[] computeDerivatives(double t, double[] y) {
            return new double[] {1 - Math.pow(y[0], 4)};
          }
        };
    double low = 0;
    double high = 5;
    for (int i = 0; i < 40; i++) {
      double middle = (low + high) / 2;
      double theta =
          new DormandPrince853Integrator(1e-6, 0.5, 1e-10, 1e-10)
              .integrate(body, new ODEState(0, new double[] {293.0 / 1050}), middle)
              .getPrimaryState()[0];
      double saturation = 10 * theta * theta * Math.exp(-1 / (8.617e-5 * 1050) * (1 / theta - 1));
      if (saturation / (1 + saturation) * 11 / 10 < share) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return low;
  }

  @Test
  void risesFromNothingToAll() {
    WarmUpLaw law = new WarmUpLaw(15);
    double before = law.emission(0);
    assertThat(before).isZero();
    for (double t = 0.1; t < 130; t += 0.1) {
      double now = law.emission(t);
      assertThat(now).isGreaterThanOrEqualTo(before).isLessThanOrEqualTo(1);
      before = now;
    }
    assertThat(law.emission(15)).isCloseTo(0.9, within(1e-6));
    assertThat(law.emission(119.9)).isCloseTo(1, within(1e-9));
    assertThat(new WarmUpLaw(0).emission(0)).isEqualTo(1);
  }

  /**
   * 11 s: the heater warm-up time (average) on RCA's sheets of types for series strings, 6SN7-GTB
   * and 12BH7-A among them (from memory). The order of the kinds and their ranges are common
   * practice: filaments 2 to 4 s, rectifiers with heaters 10 to 20 s, dampers 25 to 30 s.
   */
  @Test
  void timesAreThoseOfTheKind() {
    WarmUpTimes times = WarmUpTimes.standard();
    assertThat(times.seconds(CathodeKind.INDIRECT)).isEqualTo(11);
    assertThat(times.seconds(CathodeKind.FILAMENT)).isBetween(2.0, 4.0);
    assertThat(times.seconds(CathodeKind.RECTIFIER)).isBetween(10.0, 20.0);
    assertThat(times.seconds(CathodeKind.SLOW_RECTIFIER)).isBetween(25.0, 30.0);
    assertThat(kind("5U4GB")).isEqualTo(CathodeKind.FILAMENT);
    assertThat(kind("300B")).isEqualTo(CathodeKind.FILAMENT);
    assertThat(kind("GZ34")).isEqualTo(CathodeKind.RECTIFIER);
    assertThat(kind("12AX7")).isEqualTo(CathodeKind.INDIRECT);
    assertThat(kind("0A2")).isEqualTo(CathodeKind.COLD);
    for (CathodeKind kind : CathodeKind.values()) {
      assertThat(times.source(kind).isEmpty()).isEqualTo(kind == CathodeKind.COLD);
    }
  }

  private static CathodeKind kind(String name) {
    TubeType type = Catalogue.standard().find(name).orElseThrow();
    return CathodeKind.of(type, type.sections().get(0).kind());
  }

  @Test
  void aTypesFileCanSayOtherwise() {
    assertThat(law("6.3V 1.2A slow")).isEqualTo(new WarmUpLaw(28));
    assertThat(law("6.3V 1.2A slow warmup=24")).isEqualTo(new WarmUpLaw(24));
    assertThat(law("6.3V 1.2A")).isEqualTo(new WarmUpLaw(15));
    assertThat(law("6.3V 1.2A direct")).isEqualTo(new WarmUpLaw(3));
    assertThatThrownBy(() -> law("6.3V 1.2A warmup=0")).hasMessageContaining("warmup");
  }

  private static WarmUpLaw law(String heater) {
    SourceText text =
        new SourceText(
            "damper.tube",
            List.of(
                "type    DAMPER",
                "summary damper",
                "base    4CG octal",
                "heater  " + heater,
                "section rectifier",
                "pins    none",
                "fit     rectifier perveance=0.0014"));
    TubeType type =
        DataFile.read(
                text,
                name -> {
                  throw new AssertionError(name);
                })
            .type();
    return WarmUpTimes.standard().law(type, SectionKind.RECTIFIER);
  }
}
