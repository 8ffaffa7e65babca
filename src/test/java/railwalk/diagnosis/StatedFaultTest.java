package railwalk.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.walk.Walk;

/** Faults in words against the same amplifier with the fault written into its netlist. */
class StatedFaultTest {
  private static final double NEAR_VOLTS = 0.01;

  private static String weirside() throws IOException {
    return Files.readString(Path.of("test-netlists/amps/weirside.cir"));
  }

  private static Circuit circuit(String text) {
    return NetlistReader.readText("test.cir", text, Catalogue.standard()).circuit().orElseThrow();
  }

  private static OperatingPoint solved(Circuit circuit) {
    return ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, Walk.of(circuit))).point();
  }

  private static Circuit with(String phrase) throws IOException, NotAFault {
    Circuit circuit = circuit(weirside());
    return StatedFault.all(
        StatedFault.read(phrase, circuit, Walk.of(circuit), Catalogue.standard().types()), circuit);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "R10 =150 | R10 k3 0 390 5W | R10 k3 0 150 5W",
        "r7 X3 | R7 sp k2 18k | R7 sp k2 54k",
        "C3 Leak = 1M | C3 p2 g3 22n 600V | RX p2 g3 1M",
        "C4 shorted | C4 k3 0 47u 50V | RX k3 0 0.1",
        "R3 open | R3 b3 p1 120k 1/2W | RX b3 p1 1G",
        "line=108 | .line 120 60 design=120 | .line 108 60 design=120",
        "V2 type=6l6gc | XV2 6V6GT | XV2 6L6GC",
        "V2 g2g1=100k | C4 k3 0 47u 50V | RX b2 g3s 100k",
        "VHT turns=80% | RMS 290-0-290 | RMS 232-0-232",
      })
  void sameAsWrittenIntoTheNetlist(String phrase, String line, String instead)
      throws IOException, NotAFault {
    assertThat(weirside()).contains(line);
    OperatingPoint expected = solved(circuit(weirside().replace(line, instead)));
    OperatingPoint found = solved(with(phrase));
    int compared = 0;
    for (Node node : expected.circuit().nodes()) {
      double volts = expected.volts(node);
      if (!Double.isNaN(volts)) {
        double there = found.volts(found.circuit().node(node.name()).orElseThrow());
        assertThat(there).as(node.name()).isCloseTo(volts, within(NEAR_VOLTS));
        compared++;
      }
    }
    System.out.println(phrase + ": " + compared + " nodes within 10 mV");
    assertThat(compared).isGreaterThan(10);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "V1 weak=0.5",
        "V1A dead",
        "V1 out",
        "V2 pulled",
        "V2 gas=20u",
        "V1B hk=10k",
        "V3 half ht1",
        "V3 silicon",
        "P1 wiper open",
        "LOT open",
        "VHT open ht1",
        "R5 shorted",
        "V3 weak=50 %",
        "V2 dead",
        "V2 dark"
      })
  void changesTheAmplifier(String phrase) throws IOException, NotAFault {
    assertThat(with(phrase).elements()).isNotEqualTo(circuit(weirside()).elements());
  }

  @Test
  void aTubeOfTwoSectionsIsWeakInBoth() throws IOException, NotAFault {
    Circuit circuit = circuit(weirside());
    assertThat(
            StatedFault.read(
                "V1 weak=0.5", circuit, Walk.of(circuit), Catalogue.standard().types()))
        .extracting(f -> f.fault().element())
        .containsExactly("V1A", "V1B");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "R5 burnt | R5 can be: open, xN, =VALUE, shorted",
        "R99 open | did you mean R9?",
        "C3 open | C3 can be: leak=VALUE, shorted",
        "V2 type=6V6GTX | did you mean",
        "V2 type=EL84 | is no",
        "VHT open | which half",
        "V3 half zz | half ht1",
        "V2 weak=5 | is a share up to 1",
        "C3 leak=2m | 2M for megohm",
        "line=-3 | no figure above zero",
        "R5 x0 | no figure above zero",
        "V1A gas= | V1A can be",
      })
  void saysWhatWasNotUnderstood(String phrase, String said) {
    assertThatThrownBy(() -> with(phrase)).isInstanceOf(NotAFault.class).hasMessageContaining(said);
  }
}
