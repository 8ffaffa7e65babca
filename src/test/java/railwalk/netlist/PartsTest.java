package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static railwalk.netlist.Reading.circuit;
import static railwalk.netlist.Reading.codes;
import static railwalk.netlist.Reading.names;
import static railwalk.netlist.Reading.part;
import static railwalk.netlist.Reading.read;

import org.junit.jupiter.api.Test;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Coupling;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Diode;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Wire;
import railwalk.device.SiliconLaw;
import railwalk.device.TwoPoleCurrent;
import railwalk.device.TwoPoleLaw;
import railwalk.device.ZenerLaw;

class PartsTest {
  @Test
  void positionDecidesWhatAWordIsNeverItsLook() {
    Resistor resistor = part(circuit("R1 100k 4k7 10k 1/2W 5%"), "R1", Resistor.class);
    assertThat(names(resistor.nodes())).containsExactly("100k", "4k7");
    assertThat(resistor.ohms()).isEqualTo(10e3);
    assertThat(resistor.ratedWatts()).isEqualTo(0.5);
    assertThat(resistor.tolerance()).isEqualTo(0.05);
  }

  @Test
  void aToleranceLetterCountsUntilAPercentageStandsThere() {
    assertThat(part(circuit("R1 a b 4k7J"), "R1", Resistor.class).tolerance()).isEqualTo(0.05);
    assertThat(part(circuit("R1 a b 4k7J 1%"), "R1", Resistor.class).tolerance()).isEqualTo(0.01);
  }

  @Test
  void aQuestionMarkIsAnUnknownValue() {
    NetlistResult result = read("R1 a b ?", "XP1 a w b POT ? set=.5");
    Circuit circuit = result.circuit().orElseThrow();
    assertThat(part(circuit, "R1", Resistor.class).unknown()).isTrue();
    assertThat(part(circuit, "P1", Potentiometer.class).ohms()).isNaN();
    assertThat(result.origins().unknowns().stream().map(Origins.Unknown::element))
        .containsExactly("R1", "P1");
  }

  @Test
  void aResistorOfNothingIsAWire() {
    assertThat(part(circuit("R1 a b 0"), "R1", Wire.class).bottle()).isEmpty();
  }

  @Test
  void capacitorsKeepRatingLeakAndSafetyMark() {
    Circuit circuit =
        circuit(
            "C1 a b 22u 450V leak=20M", "C2 a b 47n Y2 250V", "C3 a b .1u X2", "C4 a b 4n7 X1Y1");
    Capacitor c1 = part(circuit, "C1", Capacitor.class);
    assertThat(c1.ratedVolts()).isEqualTo(450);
    assertThat(c1.leakOhms()).isEqualTo(20e6);
    assertThat(c1.safetyRated()).isFalse();
    assertThat(part(circuit, "C2", Capacitor.class).safetyRated()).isTrue();
    assertThat(part(circuit, "C3", Capacitor.class).safetyRated()).isFalse();
    assertThat(part(circuit, "C4", Capacitor.class).safetyRated()).isTrue();
  }

  @Test
  void henriesMayBeLeftOut() {
    Inductor half = part(circuit("LOT b1 p3 rdc=52 90mA", "R1 b1 p3 1k"), "LOT", Inductor.class);
    assertThat(half.henries()).isNaN();
    assertThat(half.dcOhms()).isEqualTo(52);
    Inductor choke = part(circuit("L1 a b 10H 120ohm", "R1 a b 1k"), "L1", Inductor.class);
    assertThat(choke.henries()).isEqualTo(10);
    assertThat(choke.dcOhms()).isEqualTo(120);
  }

  @Test
  void sourcesKeepTheirDcPart() {
    Circuit circuit =
        circuit(
            "V1 a 0 9",
            "V2 b 0 DC 9 rdc=.3",
            "V3 c 0 DC 1.5 AC 1 0",
            "V4 d 0 AC 1",
            "V5 e 0 PULSE(2 5 0 1u 1u 1m 2m)",
            "V6 f 0 dc=3",
            "I1 0 g DC 5m",
            "R1 g 0 1k");
    assertThat(part(circuit, "V1", VoltageSource.class).volts()).isEqualTo(9);
    assertThat(part(circuit, "V2", VoltageSource.class).seriesOhms()).isEqualTo(0.3);
    assertThat(part(circuit, "V3", VoltageSource.class).volts()).isEqualTo(1.5);
    assertThat(part(circuit, "V4", VoltageSource.class).volts()).isZero();
    assertThat(part(circuit, "V5", VoltageSource.class).volts()).isEqualTo(2);
    assertThat(part(circuit, "V6", VoltageSource.class).volts()).isEqualTo(3);
    assertThat(part(circuit, "I1", CurrentSource.class).amps()).isEqualTo(5e-3);
  }

  @Test
  void controlledSourcesAreReadWithOrWithoutParentheses() {
    Circuit circuit =
        circuit("E1 a 0 (c d) 10", "G1 a 0 c d 2m", "V1 c d 0", "F1 a 0 V1 5", "H1 b 0 V1 1k");
    assertThat(part(circuit, "E1", ControlledSource.class).gain()).isEqualTo(10);
    assertThat(part(circuit, "G1", ControlledSource.class).controlB()).isNotNull();
    assertThat(part(circuit, "F1", ControlledSource.class).controlElement()).isEqualTo("V1");
    assertThat(part(circuit, "H1", ControlledSource.class).kind())
        .isEqualTo(ControlledSource.Kind.VOLTS_BY_AMPS);
  }

  @Test
  void coupledCoilsAreNamed() {
    Circuit circuit =
        circuit("L1 a b 5 rdc=1", "L2 b c 5 rdc=1", "L3 c a 5 rdc=1", "K1 L1 L2 L3 0.9");
    assertThat(circuit.elements(Coupling.class).stream().map(Coupling::second))
        .containsExactly("L2", "L3");
  }

  @Test
  void switchesTakeAPosition() {
    Circuit circuit =
        circuit(
            "XS1 a b SWITCH open", "XS2 c p1 p2 p3 SWITCH 2", "S3 a b SWITCH closed", "R1 a b 1k");
    assertThat(part(circuit, "S1", Switch.class).position()).isZero();
    Switch rotary = part(circuit, "S2", Switch.class);
    assertThat(rotary.position()).isEqualTo(2);
    assertThat(names(rotary.poles())).containsExactly("p1", "p2", "p3");
    assertThat(part(circuit, "S3", Switch.class).position()).isEqualTo(1);
  }

  @Test
  void fusesAndLampsTakeTheirRatings() {
    Circuit circuit =
        circuit(
            "XF1 a b FUSE 500mA slow",
            "XLP1 a b LAMP 6.3V 150mA",
            "XLP2 a b LAMP 120V 60W",
            "R1 a b 1k");
    assertThat(part(circuit, "F1", Fuse.class).ratedAmps()).isEqualTo(0.5);
    assertThat(part(circuit, "LP1", Lamp.class).ratedAmps()).isEqualTo(0.15);
    assertThat(part(circuit, "LP2", Lamp.class).ratedAmps()).isEqualTo(0.5);
  }

  @Test
  void potentiometersTakeTheirSetting() {
    Circuit circuit = circuit("XP1 a w b POT 50k set=0.4", "XP2 a w b POT 1M AUDIO set=30%");
    assertThat(part(circuit, "P1", Potentiometer.class).share()).isEqualTo(0.4);
    assertThat(part(circuit, "P2", Potentiometer.class).share()).isCloseTo(0.3, within(1e-12));
    assertThat(part(circuit, "P2", Potentiometer.class).ohms()).isEqualTo(1e6);
    Circuit marked = circuit("XP1 a w b POT 500KA set=0.5", "XP2 a w b POT B25k set=0.5");
    assertThat(part(marked, "P1", Potentiometer.class).ohms()).isEqualTo(500e3);
    assertThat(part(marked, "P2", Potentiometer.class).ohms()).isEqualTo(25e3);
  }

  private static TwoPoleLaw law(String... lines) {
    return part(circuit(lines), "D1", Diode.class).law();
  }

  private static double amps(TwoPoleLaw law, double volts) {
    TwoPoleCurrent current = new TwoPoleCurrent();
    law.evaluate(volts, current);
    return current.amps;
  }

  @Test
  void diodesAreSiliconZenerOrSelenium() {
    assertThat(law("D1 a b 1N4007")).isEqualTo(SiliconLaw.generic());
    assertThat(law("D1 a b ZENER 12V")).isInstanceOf(ZenerLaw.class);
    assertThat(amps(law("D1 a b ZENER 5V1"), -5.2)).isNegative();
    // common practice: a 130 V stack drops about 5 V at its rated current
    assertThat(amps(law("D1 a b SELENIUM 130V 100mA"), 5)).isCloseTo(0.1, within(1e-9));
  }

  /** The SPICE diode equation at 300.15 K: 1e-9 · (exp(0.5 / (1.8 · 0.025865)) − 1). */
  @Test
  void aModelGivesItsOwnConstants() {
    double expected = 1e-9 * Math.expm1(0.5 / (1.8 * 0.025865));
    for (String model :
        new String[] {".model DX D(IS=1e-9 N=1.8)", ".model DX D IS=1n N=1.8 CJO=5p"}) {
      assertThat(amps(law("D1 a b DX", model), 0.5)).isCloseTo(expected, within(expected * 1e-9));
    }
    assertThat(law("D1 a b DZ", ".model DZ D(BV=33)")).isInstanceOf(ZenerLaw.class);
    assertThat(law("D1 a b DR", ".model DR D(IS=1e-9 BV=1000)")).isInstanceOf(SiliconLaw.class);
    assertThat(law("D1 a b DE", ".model DE D")).isEqualTo(SiliconLaw.generic());
  }

  @Test
  void theSecondOfTwoValuesIsRefused() {
    assertThat(codes(read("R1 a b c 10k", "R2 a b 10k 22k"))).contains("not-a-value", "two-values");
  }

  @Test
  void noVoltmeterHasTwelveOhms() {
    assertThat(codes(read(".meter 12x", "R1 a 0 1k"))).contains("meter-spec");
    assertThat(codes(read(".meter 1M", "R1 a 0 1k"))).doesNotContain("meter-spec");
  }
}
