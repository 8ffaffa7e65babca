package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static railwalk.netlist.Reading.circuit;
import static railwalk.netlist.Reading.codes;
import static railwalk.netlist.Reading.part;
import static railwalk.netlist.Reading.read;

import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;

class WindingsTest {
  private static Winding winding(String... lines) {
    return part(circuit(lines), "VHT", Winding.class);
  }

  @Test
  void aPlainWindingHasOneSection() {
    Winding winding = winding("VHT a b RMS 325 rdc=95", "R1 a b 1k");
    assertThat(winding.sections()).hasSize(1);
    assertThat(winding.sections().get(0).openRmsVolts()).isEqualTo(325);
    assertThat(winding.sections().get(0).ohms()).isEqualTo(95);
    assertThat(winding.sections().get(0).a().name()).isEqualTo("a");
    assertThat(winding.wall()).isFalse();
    assertThat(winding.atLineVolts()).isNaN();
  }

  /** 325-60-0-325: 265 V, 60 V and 325 V of turns, all wound in one sense. */
  @Test
  void tapFiguresAreVoltsFromTheTapMarkedZero() {
    Winding winding = winding("VHT h1 bt 0 h2 RMS 325-60-0-325 rdc=80,15,98", "R1 h1 h2 1k");
    assertThat(winding.sections().stream().map(Winding.Section::openRmsVolts))
        .containsExactly(265.0, 60.0, 325.0);
    assertThat(winding.sections().stream().map(Winding.Section::ohms))
        .containsExactly(80.0, 15.0, 98.0);
    assertThat(Reading.names(winding.nodes())).containsExactly("h1", "bt", "0", "h2");
  }

  @Test
  void aTapAtOneEndIsAPlainWindingWithATap() {
    Winding winding = winding("VHT a t 0 RMS 50-20-0", "R1 a 0 1k");
    assertThat(winding.sections().stream().map(Winding.Section::openRmsVolts))
        .containsExactly(30.0, 20.0);
  }

  @Test
  void centreTappedVoltsAreSplit() {
    Winding winding = winding("VHT a 0 b RMS 650VCT rdc=95,101", "R1 a b 1k");
    assertThat(winding.sections().stream().map(Winding.Section::openRmsVolts))
        .containsExactly(325.0, 325.0);
  }

  /** A sine of 460 V amplitude at the line's frequency is 325.27 V rms. */
  @Test
  void aSineAtTheLinesFrequencyIsAWinding() {
    Winding winding = winding(".line 117 60", "VHT a b SIN(0 460 60) rdc=95", "R1 a b 1k");
    assertThat(winding.sections().get(0).openRmsVolts())
        .isCloseTo(460 / Math.sqrt(2), within(1e-12));
  }

  @Test
  void aSineWithoutDotLineTellsTheFrequency() {
    Circuit circuit = circuit("VHT a b SINE 0 460 50", "R1 a b 1k");
    assertThat(circuit.line().stated()).isFalse();
    assertThat(circuit.line().hertz()).isEqualTo(50);
  }

  @Test
  void aSineOfAnotherFrequencyIsASignal() {
    Circuit circuit = circuit(".line 117 60", "VHT a b SIN(1.5 460 400)", "R1 a b 1k");
    assertThat(part(circuit, "VHT", VoltageSource.class).volts()).isEqualTo(1.5);
  }

  /**
   * 300 V at 100 mA through 120 ohm of its own and 20 ohm of a 120 V primary: 20 · (300/120)² = 125
   * ohm, so 300 + 0.1 · 245 = 324.5 V open. Arithmetic by hand.
   */
  @Test
  void loadVoltsAreWorkedBackThroughBothResistances() {
    Winding winding =
        winding(
            ".line 120 60",
            ".transformer T1 primary=120 rdc=20",
            "VHT a b RMS 300 load=100mA rdc=120 on=T1",
            "R1 a b 1k");
    assertThat(winding.sections().get(0).openRmsVolts()).isCloseTo(324.5, within(1e-9));
    assertThat(winding.transformer()).isEqualTo("T1");
  }

  /** Each side for itself: 300 + 0.1 · 90 and 300 + 0.1 · 110, no reflected primary. */
  @Test
  void loadVoltsOfATappedWindingAreWorkedBackSideBySide() {
    Winding winding = winding("VHT a 0 b RMS 300-0-300 load=100mA rdc=90,110", "R1 a b 1k");
    assertThat(winding.sections().get(0).openRmsVolts()).isCloseTo(309, within(1e-9));
    assertThat(winding.sections().get(1).openRmsVolts()).isCloseTo(311, within(1e-9));
  }

  @Test
  void atGivesTheLineThatTheVoltsWereMeasuredOn() {
    Winding winding = winding(".line 120 60", "VHT a b RMS 330 at=122.4 rdc=90", "R1 a b 1k");
    assertThat(winding.atLineVolts()).isEqualTo(122.4);
  }

  @Test
  void theWallIsKnownByItsName() {
    assertThat(
            part(circuit("VLINE a b RMS 117 rdc=.5", "R1 a b 1k"), "VLINE", Winding.class).wall())
        .isTrue();
    assertThat(part(circuit("VMAINS a b RMS 230", "R1 a b 1k"), "VMAINS", Winding.class).wall())
        .isTrue();
  }

  @Test
  void theWallIsKnownByTheLinesVoltsWithoutTransformer() {
    NetlistResult result = read(".line 120 60 design=117", "V1 a b RMS 117", "R1 a b 1k");
    assertThat(part(result.circuit().orElseThrow(), "V1", Winding.class).wall()).isTrue();
    assertThat(codes(result)).contains("wall-assumed");
  }

  @Test
  void aWindingOnATransformerIsNeverTheWall() {
    Circuit circuit =
        circuit(
            ".line 117 60",
            ".transformer T1 primary=117 rdc=5",
            "VLINE2 a b RMS 117 on=T1",
            "R1 a b 1k");
    assertThat(part(circuit, "VLINE2", Winding.class).wall()).isFalse();
  }

  @Test
  void aHighTensionWindingNearTheLinesVoltsWithItsResistanceIsAWinding() {
    Circuit circuit = circuit(".line 117 60", "V1 a b RMS 120 rdc=40", "R1 a b 1k");
    assertThat(part(circuit, "V1", Winding.class).wall()).isFalse();
  }

  @Test
  void aMissingResistanceIsNotANumber() {
    Winding winding = winding("VHT a 0 b RMS 300-0-300", "R1 a b 1k");
    assertThat(winding.sections().get(0).ohms()).isNaN();
  }

  @Test
  void anUnknownResistanceIsListed() {
    NetlistResult result = read("VHT a 0 b RMS 300-0-300 rdc=95,?", "R1 a b 1k");
    assertThat(result.origins().unknowns()).hasSize(1);
    assertThat(result.origins().unknowns().get(0).element()).isEqualTo("VHT");
    assertThat(result.origins().unknowns().get(0).span().column()).isEqualTo(32);
  }
}
