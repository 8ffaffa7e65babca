package railwalk.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.circuit.Node;

class DcReachTest {
  private static CircuitBuilder stage() {
    return new CircuitBuilder()
        .v("VB", "b", "0", 300)
        .r("RP", "b", "p", 100e3)
        .triode("V1", "A", "p", "g", "k")
        .r("RK", "k", "0", 1500)
        .c("CK", "k", "0", 25e-6)
        .r("RG", "g", "0", 1e6);
  }

  private static DcReach reach(CircuitBuilder builder) {
    Circuit circuit = builder.build();
    return DcReach.of(circuit, DcBranches.of(circuit), List.of());
  }

  private static Set<String> undefined(CircuitBuilder builder) {
    return reach(builder).undefined().stream().map(Node::name).collect(Collectors.toSet());
  }

  @Test
  void aWholeStageIsDefined() {
    assertThat(undefined(stage())).isEmpty();
    assertThat(reach(stage()).idleSections()).isEmpty();
  }

  @Test
  void aGridBehindACapacitorIsNot() {
    CircuitBuilder builder =
        stage().c("CC", "p", "g2", 22e-9).triode("V1", "B", "b", "g2", "k2").r("RK2", "k2", "0", 1);
    assertThat(undefined(builder)).containsExactly("g2");
    assertThat(reach(builder).idleSections()).isEmpty();
  }

  @Test
  void aLeakyCapacitorTiesItDown() {
    CircuitBuilder builder = stage();
    builder.add(new Capacitor("CC", builder.node("p"), builder.node("x"), 22e-9, 400, 50e6, false));
    assertThat(undefined(builder)).isEmpty();
  }

  @Test
  void aPlateThatLeadsNowhereIdlesItsSection() {
    CircuitBuilder builder =
        stage()
            .triode("V2", "A", "p2", "g", "k2")
            .r("RK2", "k2", "0", 1500)
            .c("C", "p2", "0", 1e-9);
    assertThat(undefined(builder)).containsExactly("p2");
    assertThat(reach(builder).idleSections()).containsExactly("V2A");
  }

  @Test
  void aCathodeThatLeadsNowhereIdlesItsSection() {
    CircuitBuilder builder = stage().triode("V2", "A", "b", "g", "k2").c("C", "k2", "0", 25e-6);
    assertThat(undefined(builder)).containsExactly("k2");
    assertThat(reach(builder).idleSections()).containsExactly("V2A");
  }

  @Test
  void aSharedCathodeThatLeadsNowhereIdlesBoth() {
    // plate, cathode, plate: a loop of the graph, though no current can circle in it
    CircuitBuilder builder =
        stage().beam("V3", "b", "b", "g", "kk").beam("V4", "b", "b", "g", "kk");
    assertThat(undefined(builder)).containsExactly("kk");
    assertThat(reach(builder).idleSections()).containsExactly("V3", "V4");
  }

  @Test
  void aCascodeIsDefined() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .v("VB", "b", "0", 300)
            .r("RP", "b", "p", 100e3)
            .triode("V1", "B", "p", "gu", "m")
            .triode("V1", "A", "m", "g", "k")
            .r("RK", "k", "0", 1500)
            .r("RG", "g", "0", 1e6)
            .r("R1", "b", "gu", 470e3)
            .r("R2", "gu", "0", 220e3);
    assertThat(undefined(builder)).isEmpty();
    assertThat(reach(builder).idleSections()).isEmpty();
  }

  @Test
  void aScreenThatLeadsNowhereLeavesThePlateWorking() {
    CircuitBuilder builder =
        stage().beam("V3", "b", "s", "g", "k3").r("RK3", "k3", "0", 250).c("CS", "s", "0", 1e-7);
    assertThat(undefined(builder)).containsExactly("s");
    assertThat(reach(builder).idleSections()).isEmpty();
  }

  @Test
  void aGridIsNoWayToTheReference() {
    CircuitBuilder builder =
        stage().i("I1", "0", "0", 0).r("RGS", "g5", "g6", 1e3).triode("V5", "A", "b", "g6", "k");
    assertThat(undefined(builder)).containsExactlyInAnyOrder("g5", "g6");
  }

  @Test
  void railsBehindAnOpenSwitchDrainThroughTwoTubes() {
    CircuitBuilder builder =
        stage()
            .contact("S1", "b", "b2", false)
            .beam("V3", "b2", "b2", "g", "k3")
            .r("RK3", "k3", "0", 250);
    assertThat(undefined(builder)).isEmpty();
  }

  @Test
  void aReservoirWithoutLoadIsDefinedByItsGroup() {
    Circuit circuit =
        new CircuitBuilder()
            .winding("VHT", new double[] {300, 300}, 90, "h1", "0", "h2")
            .rectifier("V5", "h1", "h2", "b1")
            .c("C1", "b1", "0", 20e-6)
            .build();
    assertThat(Walk.of(circuit).undefined()).isEmpty();
  }

  @Test
  void parallelPartsAreNoBridge() {
    // two triodes side by side between two parts of the circuit: neither is the only link
    CircuitBuilder builder =
        stage()
            .contact("S1", "b", "b2", false)
            .triode("V2", "A", "b2", "g", "k2")
            .triode("V2", "B", "b2", "g", "k2")
            .r("RK2", "k2", "0", 1500);
    assertThat(undefined(builder)).isEmpty();
  }
}
