package railwalk.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/** Supply trees of a dozen kinds of amplifiers. */
class SupplyTreeTest {
  /** Returns a line for each supply node: "b2 < b1 by R1", indented by depth. */
  private static List<String> tree(SupplyMap map) {
    return map.supplyNodes().stream()
        .map(
            supply -> {
              String line = " ".repeat(supply.depth()) + supply.node().name();
              Node parent = supply.parent();
              line += parent == null ? "" : " < " + parent.name();
              return supply.droppers().isEmpty()
                  ? line
                  : line
                      + " by "
                      + supply.droppers().stream()
                          .map(Element::name)
                          .collect(Collectors.joining(" "));
            })
        .toList();
  }

  private static String feed(SupplyMap map, Circuit circuit, String node) {
    return map.supplyOf(circuit.node(node).orElseThrow()).map(Node::name).orElse("-");
  }

  private static CircuitBuilder fullWave() {
    return new CircuitBuilder()
        .winding("VHT", new double[] {300, 300}, 90, "h1", "0", "h2")
        .rectifier("V9", "h1", "h2", "b1")
        .c("C1", "b1", "0", 20e-6);
  }

  /** Adds an output stage: plate through a transformer from one node, screen from another. */
  private static CircuitBuilder output(
      CircuitBuilder builder, String tube, String plateFeed, String screen) {
    return builder
        .l("LOT" + tube, plateFeed, "p" + tube, 8, 300)
        .beam(tube, "p" + tube, screen, "g" + tube, "k" + tube)
        .r("RG" + tube, "g" + tube, "0", 330e3)
        .r("RK" + tube, "k" + tube, "0", 270)
        .c("CK" + tube, "k" + tube, "0", 25e-6);
  }

  /** Adds a triode stage with its plate load. */
  private static CircuitBuilder preamp(CircuitBuilder builder, String tube, String feed) {
    return builder
        .r("RP" + tube, feed, "p" + tube, 100e3)
        .triode(tube, "A", "p" + tube, "g" + tube, "k" + tube)
        .r("RG" + tube, "g" + tube, "0", 1e6)
        .r("RK" + tube, "k" + tube, "0", 1500)
        .c("CK" + tube, "k" + tube, "0", 25e-6)
        .c("CC" + tube, "p" + tube, "out" + tube, 22e-9)
        .r("RL" + tube, "out" + tube, "0", 1e6);
  }

  @Test
  void singleEndedWithResistorsAndCapacitors() {
    CircuitBuilder builder =
        fullWave().r("R1", "b1", "b2", 1e3).c("C2", "b2", "0", 20e-6).r("R2", "b2", "b3", 10e3);
    output(builder.c("C3", "b3", "0", 8e-6), "V2", "b1", "b2");
    Circuit circuit = preamp(builder, "V1", "b3").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " b2 < b1 by R1", "  b3 < b2 by R2");
    assertThat(feed(map, circuit, "pV2")).isEqualTo("b1");
    assertThat(feed(map, circuit, "kV2")).isEqualTo("b1");
    assertThat(feed(map, circuit, "pV1")).isEqualTo("b3");
    assertThat(feed(map, circuit, "kV1")).isEqualTo("b3");
    assertThat(feed(map, circuit, "gV1")).isEqualTo("-");
    assertThat(feed(map, circuit, "outV1")).isEqualTo("-");
    assertThat(map.undefined()).isEmpty();
  }

  @Test
  void aScreenWithItsOwnDropperIsNoSupplyNode() {
    CircuitBuilder builder =
        fullWave().r("R1", "b1", "s", 4700).c("C2", "s", "0", 8e-6).r("R2", "b1", "b2", 22e3);
    output(builder.c("C3", "b2", "0", 8e-6), "V2", "b1", "s");
    Circuit circuit = preamp(builder, "V1", "b2").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " b2 < b1 by R2");
    assertThat(feed(map, circuit, "s")).isEqualTo("b1");
  }

  @Test
  void standbySwitchAndChoke() {
    CircuitBuilder builder =
        fullWave()
            .contact("S1", "b1", "b1s", true)
            .l("L1", "b1s", "b2", 5, 100)
            .c("C2", "b2", "0", 20e-6)
            .r("R1", "b2", "b3", 10e3)
            .c("C3", "b3", "0", 20e-6);
    output(builder, "V2", "b1s", "b2");
    Circuit circuit = preamp(builder, "V1", "b3").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map))
        .containsExactly("b1", " b1s < b1 by S1", "  b2 < b1s by L1", "   b3 < b2 by R1");
    // the transformer's winding between b1s and the plate is no choke
    assertThat(feed(map, circuit, "pV2")).isEqualTo("b1s");
  }

  @Test
  void standbyBetweenRectifierAndFirstCapacitor() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VHT", new double[] {300, 300}, 90, "h1", "0", "h2")
            .rectifier("V9", "h1", "h2", "kr")
            .contact("S1", "kr", "b1", true)
            .c("C1", "b1", "0", 20e-6);
    output(builder, "V2", "b1", "b1");
    Circuit circuit = preamp(builder, "V1", "b1").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1 by S1");
    assertThat(feed(map, circuit, "pV2")).isEqualTo("b1");
  }

  @Test
  void chokeInput() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VHT", new double[] {300, 300}, 90, "h1", "0", "h2")
            .rectifier("V9", "h1", "h2", "kr")
            .l("L1", "kr", "b1", 10, 120)
            .c("C1", "b1", "0", 20e-6);
    Circuit circuit = output(builder, "V2", "b1", "b1").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1 by L1");
  }

  @Test
  void dividerFeedsTwoScreens() {
    CircuitBuilder builder =
        fullWave()
            .r("R1", "b1", "s", 5e3)
            .r("R2", "s", "0", 50e3)
            .c("C2", "s", "0", 8e-6)
            .r("R3", "s", "s2", 100)
            .r("R4", "s", "s3", 100);
    output(builder, "V2", "b1", "s2");
    Circuit circuit = output(builder, "V3", "b1", "s3").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " s < b1 by R1");
    assertThat(feed(map, circuit, "s3")).isEqualTo("s");
  }

  @Test
  void ultraLinearTapsAreNoSupplyNodes() {
    CircuitBuilder builder = fullWave();
    for (String tube : List.of("V2", "V3")) {
      builder
          .l("LA" + tube, "b1", "t" + tube, 4, 40)
          .l("LB" + tube, "t" + tube, "p" + tube, 4, 60)
          .r("RS" + tube, "t" + tube, "s" + tube, 470)
          .beam(tube, "p" + tube, "s" + tube, "g" + tube, "k" + tube)
          .r("RG" + tube, "g" + tube, "0", 220e3)
          .r("RK" + tube, "k" + tube, "0", 270);
    }
    Circuit circuit = builder.build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1");
    assertThat(feed(map, circuit, "sV2")).isEqualTo("b1");
  }

  @Test
  void aChokeWithoutItsCapacitorIsStillAChoke() {
    CircuitBuilder builder = fullWave().l("L1", "b1", "b2", 8, 100);
    output(builder, "V2", "b2", "b2");
    Circuit circuit = preamp(builder, "V1", "b2").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " b2 < b1 by L1");
  }

  @Test
  void separateBiasWinding() {
    CircuitBuilder builder =
        fullWave()
            .winding("VB", "hb", "0", 50, 20)
            .diode("D1", "n1", "hb")
            .c("C10", "0", "n1", 47e-6)
            .r("R10", "n1", "n2", 4700)
            .c("C11", "0", "n2", 47e-6)
            .pot("P1", "n2", "w", "n3", 25e3, 0.5)
            .r("R11", "n3", "0", 22e3)
            .r("R12", "w", "gV2", 220e3)
            .r("R13", "w", "gV3", 220e3);
    for (String tube : List.of("V2", "V3")) {
      builder
          .l("LOT" + tube, "b1", "p" + tube, 4, 60)
          .beam(tube, "p" + tube, "b1", "g" + tube, "0");
    }
    Circuit circuit = builder.build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", "n1", " n2 < n1 by R10", "  w < n2 by P1");
    assertThat(feed(map, circuit, "gV3")).isEqualTo("w");
    assertThat(feed(map, circuit, "n3")).isEqualTo("w");
    assertThat(map.supplyNode(circuit.node("n1").orElseThrow()).orElseThrow().group()).isEqualTo(1);
  }

  @Test
  void backBiasResistor() {
    // the centre tap stands below chassis by what all current drops across RB
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VHT", new double[] {300, 300}, 90, "h1", "ct", "h2")
            .rectifier("V9", "h1", "h2", "b1")
            .c("C1", "b1", "ct", 20e-6)
            .r("RB", "ct", "0", 220)
            .r("R1", "b1", "b2", 2200)
            .c("C2", "b2", "ct", 20e-6)
            .r("R2", "ct", "nb", 100e3)
            .c("C3", "nb", "0", 10e-6)
            .r("RG", "nb", "g2", 330e3)
            .l("LOT", "b1", "p2", 8, 300)
            .beam("V2", "p2", "b2", "g2", "0");
    Circuit circuit = preamp(builder, "V1", "b2").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " b2 < b1 by R1", "ct", " nb < ct by R2");
    assertThat(feed(map, circuit, "g2")).isEqualTo("nb");
    assertThat(map.undefined()).isEmpty();
  }

  @Test
  void aBridgeLiftedOffChassisByItsBiasResistor() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VHT", "h1", "h2", 300, 60)
            .diode("D1", "h1", "b1")
            .diode("D2", "h2", "b1")
            .diode("D3", "bn", "h1")
            .diode("D4", "bn", "h2")
            .c("C1", "b1", "bn", 50e-6)
            .r("RB", "bn", "0", 220)
            .r("R1", "b1", "b2", 2200)
            .c("C2", "b2", "bn", 20e-6)
            .r("R2", "bn", "nb", 100e3)
            .c("C3", "nb", "0", 10e-6)
            .r("RG", "nb", "g2", 330e3)
            .l("LOT", "b1", "p2", 8, 300)
            .beam("V2", "p2", "b2", "g2", "0");
    Circuit circuit = preamp(builder, "V1", "b2").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " b2 < b1 by R1", "bn", " nb < bn by R2");
  }

  @Test
  void cathodeFollowerLongTailedPairAndCathodyne() {
    CircuitBuilder builder = fullWave().r("R1", "b1", "b2", 10e3).c("C2", "b2", "0", 20e-6);
    Circuit circuit =
        preamp(builder, "V1", "b2")
            // the follower's grid on the plate before it, its plate on the rail
            .triode("V1", "B", "b2", "pV1", "kf")
            .r("RF", "kf", "0", 100e3)
            // long-tailed pair: grid leaks to the tail
            .r("R20", "b2", "pa", 82e3)
            .r("R21", "b2", "pb", 100e3)
            .triode("V2", "A", "pa", "ga", "kp")
            .triode("V2", "B", "pb", "gb", "kp")
            .r("R22", "kp", "tail", 470)
            .r("R23", "tail", "0", 22e3)
            .r("R24", "ga", "tail", 1e6)
            .r("R25", "gb", "tail", 1e6)
            // cathodyne, direct-coupled
            .r("R30", "b2", "pc", 100e3)
            .triode("V3", "A", "pc", "gc", "kc")
            .r("R31", "kc", "0", 1500)
            .r("R32", "gc", "0", 1e6)
            .r("R33", "b2", "pd", 56e3)
            .triode("V3", "B", "pd", "pc", "kd")
            .r("R34", "kd", "0", 56e3)
            .build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " b2 < b1 by R1");
    for (String node : List.of("kf", "pa", "kp", "tail", "ga", "gb", "pd", "kd", "kc")) {
      assertThat(feed(map, circuit, node)).as(node).isEqualTo("b2");
    }
    assertThat(feed(map, circuit, "gc")).isEqualTo("-");
    assertThat(map.undefined()).isEmpty();
  }

  @Test
  void tailOnANegativeRail() {
    CircuitBuilder builder =
        fullWave()
            .v("VN", "0", "n", 100)
            .r("R20", "b1", "pa", 82e3)
            .triode("V2", "A", "pa", "0", "kp")
            .triode("V2", "B", "b1", "0", "kp")
            .r("R22", "kp", "n", 47e3);
    Circuit circuit = builder.build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", "n");
    assertThat(feed(map, circuit, "kp")).isEqualTo("b1");
  }

  @Test
  void transformerlessSetWithCommonNegative() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .wall("VW", "hot", "bm", 120)
            .r("RS", "hot", "pr", 33)
            .rectifier("V3", "pr", "b1")
            .c("C1", "b1", "bm", 40e-6)
            .r("R1", "b1", "b2", 1e3)
            .c("C2", "b2", "bm", 40e-6)
            .c("C9", "bm", "chassis", 47e-9)
            .r("R9", "bm", "chassis", 220e3)
            .reference("bm")
            .l("LOT", "b1", "p2", 4, 150)
            .beam("V2", "p2", "b2", "g2", "k2")
            .r("RK", "k2", "bm", 150)
            .r("RG2", "g2", "bm", 470e3)
            .r("RP", "b2", "p1", 270e3)
            .triode("V1", "A", "p1", "g1", "bm")
            .r("RG1", "g1", "bm", 6.8e6);
    Circuit circuit = builder.build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " b2 < b1 by R1");
    assertThat(map.undefined()).isEmpty();
  }

  @Test
  void parallelDroppersAndCapacitorsInSeries() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VHT", "h1", "h2", 400, 60)
            .diode("D1", "h1", "b1")
            .diode("D2", "h2", "b1")
            .diode("D3", "0", "h1")
            .diode("D4", "0", "h2")
            .c("C1", "b1", "m", 100e-6)
            .c("C2", "m", "0", 100e-6)
            .r("RE1", "b1", "m", 220e3)
            .r("RE2", "m", "0", 220e3)
            .r("R1", "b1", "b2", 2e3)
            .r("R2", "b1", "b2", 2e3)
            .c("C3", "b2", "m2", 47e-6)
            .c("C4", "m2", "0", 47e-6)
            .r("RE3", "b2", "m2", 220e3)
            .r("RE4", "m2", "0", 220e3);
    Circuit circuit = output(builder, "V2", "b1", "b2").build();
    SupplyMap map = Walk.of(circuit);
    // b2 feeds one screen and nothing else: it is charted with its tube
    assertThat(tree(map)).containsExactly("b1");
    Circuit more = preamp(builder, "V1", "b2").build();
    assertThat(tree(Walk.of(more))).containsExactly("b1", " b2 < b1 by R1 R2");
  }

  @Test
  void regulatorTubesInSeries() {
    CircuitBuilder builder =
        fullWave()
            .r("R1", "b1", "r300", 3e3)
            .regulator("V7", "r300", "r150")
            .regulator("V8", "r150", "0");
    output(builder, "V2", "b1", "r300");
    Circuit circuit = preamp(builder, "V1", "r150").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " r300 < b1 by R1", "  r150 < r300 by V7");
  }

  @Test
  void aSeriesTubeCarriesTheSupplyOn() {
    CircuitBuilder builder =
        fullWave()
            .triode("V7", "A", "b1", "g7", "br")
            .r("R1", "b1", "g7", 220e3)
            .triode("V7", "B", "g7", "ge", "vr")
            .regulator("V8", "vr", "0")
            .r("R2", "br", "vr", 22e3)
            .r("R3", "br", "ge", 150e3)
            .r("R4", "ge", "0", 100e3)
            .c("C2", "br", "0", 20e-6);
    Circuit circuit = preamp(builder, "V1", "br").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " br < b1 by V7A");
    assertThat(feed(map, circuit, "pV1")).isEqualTo("br");
    assertThat(feed(map, circuit, "g7")).isEqualTo("b1");
  }

  @Test
  void aBypassedCathodeThatABleedLiftsIsNoSeriesTube() {
    CircuitBuilder builder = preamp(fullWave(), "V1", "b1").r("RB", "b1", "kV1", 470e3);
    Circuit circuit = preamp(builder, "V2", "b1").build();
    assertThat(tree(Walk.of(circuit))).containsExactly("b1");
  }

  @Test
  void aSideBranchComesAfterTheMainChain() {
    CircuitBuilder builder =
        fullWave()
            .r("R9", "b1", "x", 47e3)
            .c("C9", "x", "0", 8e-6)
            .r("R1", "b1", "b2", 1e3)
            .c("C2", "b2", "0", 20e-6)
            .r("R2", "b2", "b3", 10e3)
            .c("C3", "b3", "0", 20e-6);
    preamp(builder, "V4", "x");
    output(builder, "V2", "b1", "b2");
    Circuit circuit = preamp(builder, "V1", "b3").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map))
        .containsExactly("b1", " b2 < b1 by R1", "  b3 < b2 by R2", " x < b1 by R9");
  }

  @Test
  void heatersLiftedAboveChassisHangOnASupplyNode() {
    CircuitBuilder builder =
        fullWave()
            .winding("VH", new double[] {3.15, 3.15}, 0.05, "f1", "hct", "f2")
            .r("R7", "b1", "hct", 270e3)
            .r("R8", "hct", "0", 33e3)
            .c("C8", "hct", "0", 10e-6);
    Circuit circuit = preamp(builder, "V1", "b1").build();
    SupplyMap map = Walk.of(circuit);
    assertThat(tree(map)).containsExactly("b1", " hct < b1 by R7");
  }

  @Test
  void aSplitPlateLoadIsASupplyNodeOnlyWhenDecoupled() {
    CircuitBuilder builder = fullWave().r("R1", "b1", "x", 47e3);
    Circuit plain = preamp(builder, "V1", "x").build();
    assertThat(tree(Walk.of(plain))).containsExactly("b1");
    Circuit decoupled = builder.c("CX", "x", "0", 0.1e-6).build();
    assertThat(tree(Walk.of(decoupled))).containsExactly("b1", " x < b1 by R1");
  }

  @Test
  void feedbackFromTheSpeakerLeavesTheSecondaryOnGround() {
    CircuitBuilder builder = preamp(fullWave(), "V1", "b1");
    Circuit circuit =
        builder.r("RF", "kV1", "sp", 22e3).l("LOS", "sp", "0", Double.NaN, 0.4).build();
    SupplyMap map = Walk.of(circuit);
    assertThat(feed(map, circuit, "kV1")).isEqualTo("b1");
    assertThat(feed(map, circuit, "sp")).isEqualTo("-");
  }
}
