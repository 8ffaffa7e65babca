package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import java.util.stream.Stream;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Rectifier plates, silicon and zener diodes: never falling, no corners, right at known points. */
class TwoPoleLawTest {
  static Stream<TwoPoleLaw> laws() {
    Stream<TwoPoleLaw> rectifiers =
        Catalogue.standard().types().stream()
            .flatMap(t -> t.sections().stream())
            .filter(s -> s.law() instanceof TwoPoleLaw)
            .map(s -> (TwoPoleLaw) s.law());
    return Stream.concat(
        rectifiers,
        Stream.of(SiliconLaw.generic(), new ZenerLaw(12, 5), new ZenerLaw(12, 5).withEmission(2)));
  }

  @ParameterizedTest
  @MethodSource("laws")
  void slopesAgreeWithCentralDifferencesAndCurrentNeverFalls(TwoPoleLaw law) {
    Random random = new Random(99);
    TwoPoleCurrent at = new TwoPoleCurrent();
    TwoPoleCurrent up = new TwoPoleCurrent();
    TwoPoleCurrent down = new TwoPoleCurrent();
    for (int i = 0; i < 4000; i++) {
      double volts =
          i % 2 == 0 ? -20 + 25 * random.nextDouble() : -1200 + 1400 * random.nextDouble();
      law.evaluate(volts, at);
      law.evaluate(volts + 1e-5, up);
      law.evaluate(volts - 1e-5, down);
      assertThat(at.amps).isFinite();
      assertThat(at.siemens).isGreaterThanOrEqualTo(0);
      assertThat(up.amps).isGreaterThanOrEqualTo(at.amps);
      double difference = (up.amps - down.amps) / 2e-5;
      double rounding = 1e-16 * Math.abs(at.amps) / 1e-5;
      assertThat(difference)
          .as("at %g V", volts)
          .isCloseTo(at.siemens, Offset.offset(1e-3 * at.siemens + 1e-4 + 10 * rounding));
    }
  }

  /** Typical forward curve of 1 A silicon rectifiers, 0.6 V at 1 mA and 0.87 V at 1 A: memory. */
  @Test
  void silicon() {
    SiliconLaw law = SiliconLaw.generic();
    TwoPoleCurrent out = new TwoPoleCurrent();
    law.evaluate(0.6, out);
    assertThat(out.amps).isBetween(0.0008, 0.0013);
    law.evaluate(0.87, out);
    assertThat(out.amps).isCloseTo(1, Offset.offset(1e-9));
    law.evaluate(-1000, out);
    assertThat(out.amps).isBetween(-1e-8, 0.0);
  }

  @Test
  void zener() {
    TwoPoleCurrent out = new TwoPoleCurrent();
    new ZenerLaw(12, 5).evaluate(-12.5, out);
    assertThat(out.amps).isCloseTo(-0.1, Offset.offset(1e-6));
    new ZenerLaw(12, 5).evaluate(-11, out);
    assertThat(out.amps).isCloseTo(0, Offset.offset(1e-6));
  }
}
