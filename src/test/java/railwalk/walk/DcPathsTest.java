package railwalk.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.device.Electrode;

class DcPathsTest {
  private static String line(List<DcStep> steps) {
    StringBuilder line = new StringBuilder();
    for (DcStep step : steps) {
      if (line.length() == 0) {
        line.append(step.from().name());
      }
      line.append(" -").append(step.element().name()).append("- ").append(step.to().name());
    }
    return line.toString();
  }

  private static CircuitBuilder amplifier() {
    return new CircuitBuilder()
        .winding("VHT", new double[] {250, 50, 300}, 40, "h1", "bt", "0", "h2")
        .rectifier("V9", "h1", "h2", "b1")
        .c("C1", "b1", "0", 20e-6)
        .diode("D1", "n1", "bt")
        .c("C9", "0", "n1", 50e-6)
        .r("R9", "n1", "0", 47e3)
        .r("RG", "n1", "g2", 220e3)
        .r("R1", "b1", "b2", 1e3)
        .c("C2", "b2", "0", 20e-6)
        .r("RP", "b2", "p1", 100e3)
        .triode("V1", "A", "p1", "g1", "k1")
        .r("RK", "k1", "0", 1500)
        .r("RG1", "g1", "0", 1e6)
        .l("LOT", "b1", "p2", 8, 200)
        .beam("V2", "p2", "b2", "g2", "0");
  }

  @Test
  void throughATriodeAndBack() {
    Circuit circuit = amplifier().build();
    SupplyMap map = map(circuit);
    DcPath path = new DcPaths(map, circuit).to(circuit.node("p1").orElseThrow());
    assertThat(line(path.there())).isEqualTo("0 -VHT- bt -VHT- h1 -V9- b1 -R1- b2 -RP- p1");
    assertThat(line(path.back())).isEqualTo("p1 -V1A- k1 -RK- 0");
    DcPath cathode = new DcPaths(map, circuit).to(circuit.node("k1").orElseThrow());
    assertThat(line(cathode.there())).endsWith("b2 -RP- p1 -V1A- k1");
    assertThat(line(cathode.back())).isEqualTo("k1 -RK- 0");
  }

  @Test
  void screensHangOnTheirOwnNode() {
    Circuit circuit = amplifier().build();
    AmplifierSection beam = (AmplifierSection) circuit.element("V2").orElseThrow();
    DcPath path = new DcPaths(map(circuit), circuit).to(beam, Electrode.SCREEN);
    assertThat(line(path.there())).endsWith("b1 -R1- b2");
    assertThat(line(path.back())).isEqualTo("b2 -V2- 0");
  }

  @Test
  void gridsHangOnTheirLeak() {
    Circuit circuit = amplifier().build();
    SupplyMap map = map(circuit);
    DcPath bias = new DcPaths(map, circuit).to(circuit.node("g2").orElseThrow());
    assertThat(line(bias.there())).isEqualTo("0 -VHT- bt -D1- n1 -RG- g2");
    assertThat(bias.back()).isEmpty();
    DcPath leak = new DcPaths(map, circuit).to(circuit.node("g1").orElseThrow());
    assertThat(line(leak.there())).isEqualTo("0 -RG1- g1");
    assertThat(leak.supply()).isNull();
  }

  private static SupplyMap map(Circuit circuit) {
    return Walk.of(circuit);
  }

  @Test
  void aBridgeGoesBackThroughItsOtherDiode() {
    Circuit circuit =
        new CircuitBuilder()
            .winding("VHT", "h1", "h2", 300, 60)
            .diode("D1", "h1", "b1")
            .diode("D2", "h2", "b1")
            .diode("D3", "0", "h1")
            .diode("D4", "0", "h2")
            .c("C1", "b1", "0", 50e-6)
            .r("RP", "b1", "p1", 100e3)
            .triode("V1", "A", "p1", "0", "k1")
            .r("RK", "k1", "0", 1500)
            .build();
    SupplyMap map = Walk.of(circuit);
    DcPath path = new DcPaths(map, circuit).to(circuit.node("p1").orElseThrow());
    assertThat(line(path.there())).isEqualTo("h2 -VHT- h1 -D1- b1 -RP- p1");
    assertThat(line(path.back())).isEqualTo("p1 -V1A- k1 -RK- 0 -D4- h2");
  }

  @Test
  void theReturnPassesTheBackBiasResistor() {
    Circuit circuit =
        new CircuitBuilder()
            .winding("VHT", new double[] {300, 300}, 90, "h1", "ct", "h2")
            .rectifier("V9", "h1", "h2", "b1")
            .c("C1", "b1", "ct", 20e-6)
            .r("RB", "ct", "0", 220)
            .r("RP", "b1", "p1", 100e3)
            .triode("V1", "A", "p1", "0", "k1")
            .r("RK", "k1", "0", 1500)
            .build();
    SupplyMap map = Walk.of(circuit);
    DcPath path = new DcPaths(map, circuit).to(circuit.node("p1").orElseThrow());
    assertThat(line(path.there())).isEqualTo("ct -VHT- h1 -V9- b1 -RP- p1");
    assertThat(line(path.back())).isEqualTo("p1 -V1A- k1 -RK- 0 -RB- ct");
  }

  @Test
  void aTailOnANegativeRailComesHomeThroughIt() {
    Circuit circuit =
        new CircuitBuilder()
            .v("VP", "b", "0", 300)
            .v("VN", "0", "n", 100)
            .r("RP", "b", "p1", 100e3)
            .triode("V1", "A", "p1", "0", "k1")
            .r("RT", "k1", "n", 100e3)
            .build();
    SupplyMap map = Walk.of(circuit);
    DcPath path = new DcPaths(map, circuit).to(circuit.node("k1").orElseThrow());
    assertThat(line(path.there())).isEqualTo("0 -VP- b -RP- p1 -V1A- k1");
    assertThat(line(path.back())).isEqualTo("k1 -RT- n -VN- 0");
  }

  @Test
  void whatDrawsFromASupplyNode() {
    Circuit circuit = amplifier().build();
    List<SupplyLoad> loads =
        SupplyLoads.of(map(circuit), circuit, circuit.node("b2").orElseThrow());
    assertThat(loads).hasSize(2);
    assertThat(loads.get(0).electrodes().get(0).electrode()).isEqualTo(Electrode.SCREEN);
    assertThat(loads.get(0).parts()).isEmpty();
    assertThat(loads.get(1).parts().get(0).element().name()).isEqualTo("RP");
    assertThat(loads.get(1).electrodes().get(0).tube().name()).isEqualTo("V1A");
    List<SupplyLoad> first =
        SupplyLoads.of(map(circuit), circuit, circuit.node("b1").orElseThrow());
    assertThat(first)
        .extracting(load -> load.parts().get(0).element().name())
        .containsExactly("R1", "LOT");
    assertThat(first.get(0).supplyNodes().get(0).name()).isEqualTo("b2");
  }
}
