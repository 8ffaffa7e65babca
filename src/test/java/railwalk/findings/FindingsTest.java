package railwalk.findings;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.circuit.RegulatorSection;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.walk.SupplyMap;
import railwalk.walk.Walk;

/** Each finding on an amplifier that is healthy but for one thing. */
class FindingsTest {
  private static TubeType type(String name) {
    return Catalogue.standard().find(name).orElseThrow();
  }

  private static List<Finding> findings(CircuitBuilder builder) {
    Circuit circuit = builder.build();
    SupplyMap map = Walk.of(circuit);
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, map);
    assertThat(outcome).isInstanceOf(SolveOutcome.Solved.class);
    return Findings.of(circuit, map, ((SolveOutcome.Solved) outcome).point());
  }

  private static List<Finding> wiring(CircuitBuilder builder) {
    Circuit circuit = builder.build();
    return Findings.of(circuit, Walk.of(circuit), null);
  }

  private static List<String> codes(List<Finding> findings) {
    findings.forEach(f -> System.out.println(f.code() + ": " + f.message()));
    return findings.stream().map(Finding::code).toList();
  }

  /** Windings, rectifier and reservoir: 275-0-275 V, 5Y3GT, 16 µF. */
  private static CircuitBuilder supply() {
    return new CircuitBuilder()
        .line(120, 60)
        .winding("VHT", new double[] {275, 275}, 150, "h1", "0", "h2")
        .rectifier(type("5Y3GT"), "V3", "h1", "h2", "b1")
        .c("C1", "b1", "0", 16e-6, 475);
  }

  private static CircuitBuilder preamp(CircuitBuilder builder) {
    return builder
        .r("R2", "b2", "b3", 15e3, 1)
        .c("C3", "b3", "0", 10e-6, 450)
        .r("R3", "b3", "p1", 100e3, 0.5)
        .triode(type("12AX7"), "V1", "A", "p1", "g1", "k1")
        .r("R4", "g1", "0", 1e6)
        .r("R5", "k1", "0", 1500)
        .c("C4", "k1", "0", 25e-6, 25)
        .c("C5", "p1", "g2", 22e-9, 400);
  }

  private static CircuitBuilder output(CircuitBuilder builder) {
    return builder
        .l("LOT", "b1", "p2", 8, 300)
        .pentode(type("6V6GT"), "V2", "p2", "b2", "g2", "k2")
        .r("R6", "g2", "0", 330e3)
        .r("R7", "k2", "0", 560, 5)
        .c("C6", "k2", "0", 25e-6, 50);
  }

  private static CircuitBuilder dropper(CircuitBuilder builder) {
    return builder.r("R1", "b1", "b2", 2200, 2).c("C2", "b2", "0", 16e-6, 475);
  }

  private static CircuitBuilder healthy() {
    return output(preamp(dropper(supply())));
  }

  @Test
  void aHealthyAmplifierGivesNone() {
    assertThat(codes(findings(healthy()))).isEmpty();
    assertThat(codes(wiring(healthy()))).isEmpty();
  }

  @Test
  void aGridWithoutALeak() {
    CircuitBuilder builder =
        preamp(dropper(supply()))
            .l("LOT", "b1", "p2", 8, 300)
            .pentode(type("6V6GT"), "V2", "p2", "b2", "g2", "k2")
            .r("R7", "k2", "0", 560, 5);
    List<Finding> found = wiring(builder);
    assertThat(codes(found)).containsExactly("grid-no-leak");
    assertThat(found.get(0).message())
        .isEqualTo("the grid of V2 (6V6GT) has no leak: node g2 has no DC path");
    assertThat(found.get(0).elementName()).isEqualTo("V2");
  }

  @Test
  void bothPlatesOfARectifierInPhase() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VA", "h1", "0", 300, 150)
            .winding("VB", "h2", "0", 300, 150)
            .rectifier(type("5Y3GT"), "V3", "h1", "h2", "b1")
            .c("C1", "b1", "0", 16e-6, 475);
    assertThat(codes(wiring(output(preamp(dropper(builder))))))
        .containsExactly("rectifier-in-phase");
    CircuitBuilder right =
        new CircuitBuilder()
            .winding("VA", "h1", "0", 300, 150)
            .winding("VB", "0", "h2", 300, 150)
            .rectifier(type("5Y3GT"), "V3", "h1", "h2", "b1")
            .c("C1", "b1", "0", 16e-6, 475);
    assertThat(codes(wiring(output(preamp(dropper(right)))))).isEmpty();
  }

  @Test
  void platesInParallelOnOneEndAreHalfWaveByDesign() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VA", "h1", "0", 300, 150)
            .r("RA", "h1", "pa", 47)
            .r("RB", "h1", "pb", 47)
            .rectifier(type("5Y3GT"), "V3", "pa", "pb", "b1")
            .c("C1", "b1", "0", 16e-6, 475);
    assertThat(codes(wiring(output(preamp(dropper(builder)))))).isEmpty();
  }

  @Test
  void siliconDiodesInPhaseButNotABridge() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VA", "h1", "0", 260, 100)
            .winding("VB", "h2", "0", 260, 100)
            .diode("D1", "h1", "b1")
            .diode("D2", "h2", "b1")
            .c("C1", "b1", "0", 16e-6, 475);
    assertThat(codes(wiring(output(preamp(dropper(builder))))))
        .containsExactly("rectifier-in-phase");
    CircuitBuilder bridge =
        new CircuitBuilder()
            .winding("VA", "h1", "h2", 260, 100)
            .diode("D1", "h1", "b1")
            .diode("D2", "h2", "b1")
            .diode("D3", "0", "h1")
            .diode("D4", "0", "h2")
            .c("C1", "b1", "0", 16e-6, 475);
    assertThat(codes(wiring(output(preamp(dropper(bridge)))))).isEmpty();
  }

  @Test
  void screenAndGridExchanged() {
    CircuitBuilder builder =
        preamp(dropper(supply()))
            .l("LOT", "b1", "p2", 8, 300)
            .pentode(type("6V6GT"), "V2", "p2", "g2", "b2", "k2")
            .r("R6", "g2", "0", 330e3)
            .r("R7", "k2", "0", 560, 5);
    assertThat(codes(wiring(builder))).containsExactly("screen-grid-exchanged");
    assertThat(codes(findings(builder))).contains("screen-grid-exchanged");
  }

  @Test
  void plateAndScreenExchanged() {
    CircuitBuilder builder =
        preamp(dropper(supply()))
            .l("LOT", "b1", "p2", 8, 300)
            .pentode(type("6V6GT"), "V2", "b2", "p2", "g2", "k2")
            .r("R6", "g2", "0", 330e3)
            .r("R7", "k2", "0", 560, 5);
    assertThat(codes(wiring(builder))).containsExactly("plate-screen-exchanged");
  }

  @Test
  void aWindingThatLooksLikeAReflectedLoad() {
    CircuitBuilder builder =
        preamp(dropper(supply()))
            .l("LOT", "b1", "p2", Double.NaN, 5000)
            .pentode(type("6V6GT"), "V2", "p2", "b2", "g2", "k2")
            .r("R6", "g2", "0", 330e3)
            .r("R7", "k2", "0", 560, 5);
    assertThat(codes(wiring(builder))).containsExactly("reflected-load");
  }

  @Test
  void aCathodeThatGoesNowhere() {
    CircuitBuilder builder =
        preamp(dropper(supply()))
            .l("LOT", "b1", "p2", 8, 300)
            .pentode(type("6V6GT"), "V2", "p2", "b2", "g2", "k2")
            .r("R6", "g2", "0", 330e3)
            .c("C6", "k2", "0", 25e-6, 50);
    List<Finding> found = findings(builder);
    assertThat(codes(found)).containsExactly("no-current");
    assertThat(found.get(0).message()).contains("cathode", "k2", "no current flows");
  }

  @Test
  void aCapacitorOverItsRating() {
    CircuitBuilder builder = output(preamp(supply().r("R1", "b1", "b2", 2200, 2)));
    builder.c("C2", "b2", "0", 16e-6, 250);
    assertThat(codes(findings(builder))).containsExactly("capacitor-volts");
  }

  @Test
  void aCapacitorAcrossNothing() {
    assertThat(codes(wiring(healthy().c("C9", "b22", "0", 16e-6, 450))))
        .contains("capacitor-nowhere");
    assertThat(codes(wiring(healthy().c("C9", "b2", "b2", 16e-6, 450))))
        .containsExactly("capacitor-nowhere");
  }

  @Test
  void aTubeOverItsLimits() {
    CircuitBuilder builder =
        preamp(dropper(supply()))
            .l("LOT", "b1", "p2", 8, 300)
            .pentode(type("6V6GT"), "V2", "p2", "b2", "g2", "k2")
            .r("R6", "g2", "0", 330e3)
            .r("R7", "k2", "0", 180, 5);
    assertThat(codes(findings(builder))).contains("plate-watts");
  }

  @Test
  void aFirstCapacitorTooLargeForTheRectifier() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VHT", new double[] {275, 275}, 150, "h1", "0", "h2")
            .rectifier(type("5Y3GT"), "V3", "h1", "h2", "kr")
            .contact("S1", "kr", "b1", true)
            .c("C1", "b1", "0", 16e-6, 475)
            .c("C1B", "b1", "0", 16e-6, 475);
    List<Finding> found = wiring(output(preamp(dropper(builder))));
    assertThat(codes(found)).containsExactly("first-capacitor");
    assertThat(found.get(0).message()).contains("C1 + C1B", "32 µF", "20 µF");
  }

  @Test
  void aSecondCapacitorBeyondTheFieldCoilIsNoFirstCapacitor() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VHT", new double[] {275, 275}, 150, "h1", "ct", "h2")
            .rectifier(type("5Y3GT"), "V3", "h1", "h2", "b1")
            .c("C1", "b1", "ct", 16e-6, 475)
            .l("LF", "ct", "0", 10, 300)
            .c("C1B", "b1", "0", 16e-6, 475);
    assertThat(codes(wiring(output(preamp(dropper(builder)))))).isEmpty();
  }

  @Test
  void capacitorsInSeriesCountByHalf() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .winding("VHT", new double[] {275, 275}, 150, "h1", "0", "h2")
            .rectifier(type("5Y3GT"), "V3", "h1", "h2", "b1")
            .c("C1", "b1", "m", 32e-6, 300)
            .c("C1B", "m", "0", 32e-6, 300)
            .r("RE1", "b1", "m", 220e3, 1)
            .r("RE2", "m", "0", 220e3, 1);
    assertThat(codes(findings(output(preamp(dropper(builder)))))).isEmpty();
  }

  @Test
  void aResistorAndAFuseTooSmall() {
    CircuitBuilder builder =
        output(preamp(supply().r("R1", "b1", "b2x", 2200, 0.01).fuse("F1", "b2x", "b2", 4e-3)));
    builder.c("C2", "b2", "0", 16e-6, 475);
    assertThat(codes(findings(builder))).containsExactly("resistor-watts", "fuse-current");
  }

  @Test
  void aGridLeakOverItsRating() {
    CircuitBuilder builder =
        preamp(dropper(supply()))
            .l("LOT", "b1", "p2", 8, 300)
            .pentode(type("6V6GT"), "V2", "p2", "b2", "g2", "k2")
            .r("R6", "g2", "0", 1e6)
            .r("R7", "k2", "0", 560, 5);
    List<Finding> found = findings(builder);
    assertThat(codes(found)).containsExactly("grid-leak");
    assertThat(found.get(0).message()).contains("1 MΩ", "500 kΩ", "cathode bias");
  }

  @Test
  void aRegulatorThatStaysDark() {
    CircuitBuilder dark = healthy().r("R20", "b2", "vr", 100e3, 2);
    dark.add(
        new RegulatorSection(
            "V7", "V7", "", type("0A2").sections().get(0), dark.node("vr"), dark.node("0")));
    dark.r("R21", "vr", "0", 47e3, 2);
    assertThat(codes(findings(dark))).containsExactly("regulator-dark");
  }

  @Test
  void aRegulatorOutsideItsCurrent() {
    for (double ohms : new double[] {3e3, 33e3}) {
      CircuitBuilder builder = healthy().r("R20", "b1", "vr", ohms, 10);
      builder.add(
          new RegulatorSection(
              "V7",
              "V7",
              "",
              type("0A2").sections().get(0),
              builder.node("vr"),
              builder.node("0")));
      assertThat(codes(findings(builder))).contains("regulator-current");
    }
  }

  @Test
  void aRectifierOverItsCurrent() {
    assertThat(codes(findings(healthy().r("RX", "b1", "0", 1800, 100)))).contains("rectifier-dc");
  }

  /** A transformerless set; {@code low} is where the wall's second wire goes. */
  private static CircuitBuilder transformerless(String low) {
    return new CircuitBuilder()
        .line(120, 60)
        .wall("VW", "hot", low, 120)
        .r("RS", "hot", "pr", 33, 2)
        .rectifier(type("35W4"), "V3", "pr", "b1")
        .c("C1", "b1", "bm", 40e-6, 150)
        .r("R1", "b1", "b2", 1e3, 1)
        .c("C2", "b2", "bm", 40e-6, 150)
        .reference("bm")
        .l("LOT", "b1", "p2", 4, 150)
        .pentode(type("50C5"), "V2", "p2", "b2", "g2", "k2")
        .r("RK", "k2", "bm", 150, 1)
        .r("RG2", "g2", "bm", 470e3);
  }

  @Test
  void theCommonNegativeOnTheLine() {
    CircuitBuilder builder =
        transformerless("bm").c("C9", "bm", "chassis", 47e-9, 400).r("R9", "bm", "chassis", 220e3);
    List<Finding> found = wiring(builder);
    assertThat(codes(found)).containsExactly("hot-chassis", "hot-chassis", "line-capacitor");
    assertThat(found.get(0).message()).contains("chassis", "R9", "220 kΩ", "545 µA");
    assertThat(found.get(1).message()).contains("common negative (bm)", "on or off");
  }

  @Test
  void aSwitchInTheNegativeSideLeavesTheChassisLive() {
    CircuitBuilder builder =
        transformerless("ln").contact("S1", "ln", "bm", true).r("RH", "hot", "bm", 800, 50);
    List<Finding> found = wiring(builder);
    assertThat(codes(found)).containsExactly("hot-chassis");
    assertThat(found.get(0).message()).contains("S1", "live even when off");
  }

  @Test
  void aBridgeOnTheWall() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .wall("VW", "l", "n", 120)
            .diode("D1", "l", "b1")
            .diode("D2", "n", "b1")
            .diode("D3", "0", "l")
            .diode("D4", "0", "n")
            .c("C1", "b1", "0", 40e-6, 250)
            .r("RL", "b1", "0", 5e3, 10);
    List<Finding> found = wiring(builder);
    assertThat(codes(found)).containsExactly("hot-chassis");
    assertThat(found.get(0).message()).contains("the chassis", "half-wave");
  }

  @Test
  void anIsolatedAmplifierWithACapacitorFromTheLine() {
    CircuitBuilder builder =
        healthy().wall("VW", "l", "n", 120).c("C99", "l", "0", 47e-9, 600).r("RI", "l", "n", 1e5);
    assertThat(codes(wiring(builder))).contains("line-capacitor").doesNotContain("hot-chassis");
  }

  @Test
  void nodesWithoutADcPathAreNoted() {
    CircuitBuilder builder = healthy().c("CX", "p1", "x", 1e-9).c("CY", "x", "y", 1e-9);
    List<Finding> found = wiring(builder);
    assertThat(codes(found)).containsExactly("not-predictable");
    assertThat(found.get(0).message()).endsWith("x, y");
  }
}
