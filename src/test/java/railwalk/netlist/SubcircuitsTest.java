package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static railwalk.netlist.Reading.circuit;
import static railwalk.netlist.Reading.codes;
import static railwalk.netlist.Reading.names;
import static railwalk.netlist.Reading.part;
import static railwalk.netlist.Reading.read;

import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Resistor;

class SubcircuitsTest {
  @Test
  void innerNamesCarryTheUse() {
    Circuit circuit =
        circuit(
            ".subckt filter in out r=1k",
            "R1 in mid {r}",
            "R2 mid out {2*r}",
            "C1 mid 0 10u",
            ".ends filter",
            "XA b c filter PARAMS: r=10k",
            "XB c d filter",
            "R1 d gnd 1k");
    assertThat(part(circuit, "XA.R1", Resistor.class).ohms()).isEqualTo(10e3);
    assertThat(part(circuit, "XB.R2", Resistor.class).ohms()).isEqualTo(2e3);
    assertThat(names(part(circuit, "XB.R1", Resistor.class).nodes()))
        .containsExactly("c", "XB:mid");
    assertThat(names(circuit.nodes())).containsExactly("b", "c", "XA:mid", "0", "d", "XB:mid");
  }

  @Test
  void subcircuitsNestAndParametersAreReadWhereTheyAreWritten() {
    Circuit circuit =
        circuit(
            ".param r=5k",
            ".subckt inner a b r=1",
            "R1 a b {r}",
            ".ends",
            ".subckt outer a b",
            ".param half={r/2}",
            "X1 a m inner r={half}",
            "X2 m b inner r={r}",
            ".ends",
            "X9 p 0 outer",
            "R1 p 0 1k");
    assertThat(part(circuit, "X9.X1.R1", Resistor.class).ohms()).isEqualTo(2500);
    assertThat(part(circuit, "X9.X2.R1", Resistor.class).ohms()).isEqualTo(5000);
    assertThat(names(part(circuit, "X9.X1.R1", Resistor.class).nodes()))
        .containsExactly("p", "X9:m");
  }

  @Test
  void namesInsideReferToTheInside() {
    Circuit circuit =
        circuit(
            ".subckt mirror a b",
            "VS a m 0",
            "R1 m 0 1k",
            "F1 b 0 VS 2",
            ".ends",
            "X1 p q mirror",
            "R1 p q 1k");
    assertThat(part(circuit, "X1.F1", ControlledSource.class).controlElement()).isEqualTo("X1.VS");
  }

  @Test
  void globalNodesAreOneNodeInside() {
    Circuit circuit =
        circuit(
            ".global b+",
            ".subckt s a",
            "R1 a b+ 1k",
            ".ends",
            "X1 p s",
            "R2 p b+ 1k",
            "R3 B+ 0 1k");
    assertThat(circuit.node("X1:b+")).isEmpty();
  }

  @Test
  void whatIsWrongInAnUnusedSubcircuitIsNobodysConcern() {
    NetlistResult result =
        read(
            ".subckt odd a b",
            "G1 a b VALUE={pow(V(a),1.5)/(1+{x}}",
            ".ends",
            "R1 a 0 1k",
            "R2 a 0 1k");
    assertThat(result.diagnostics()).isEmpty();
  }

  @Test
  void aMistakeInsideIsSaidOnceHoweverOftenItIsUsed() {
    NetlistResult result =
        read(".subckt odd a b", "R1 a b 1OOk", ".ends", "X1 a 0 odd", "X2 a 0 odd");
    assertThat(codes(result)).containsOnlyOnce("letter-for-digit");
  }

  /** A deck as simulators write them: models by behaviour, analysis lines, a library not here. */
  @Test
  void aDeckSomeoneAlreadyHasJustLoads() {
    NetlistResult result =
        read(
            "XU1 N002 N003 N004 12AX7",
            "XU2 N006 N002 N007 12AX7",
            "R1 N001 N002 100K",
            "R2 N004 0 1.5K",
            "R3 N003 0 1Meg",
            "R4 N001 N006 100K",
            "R5 N007 0 1.5K",
            "C1 N003 N005 .022µ",
            "V1 N001 0 300",
            "V2 N005 0 SINE(0 1 1k) AC 1",
            ".SUBCKT 12AX7 1 2 3 ; plate grid cathode",
            "+ PARAMS: MU=100 EX=1.4 KG1=1060 KP=600 KVB=300 RGI=2000",
            "E1 7 0 VALUE={V(1,3)/KP*LOG(1+EXP(KP*(1/MU+V(2,3)/SQRT(KVB+V(1,3)*V(1,3)))))}",
            "G1 1 3 VALUE={(PWR(V(7),EX)+PWRS(V(7),EX))/KG1}",
            "D3 5 3 DX",
            ".MODEL DX D(IS=1N RS=1 CJO=10PF TT=1N)",
            ".ENDS 12AX7",
            ".tran 0 100m 0 1u",
            ".lib C:\\models\\tubes.lib",
            ".options plotwinsize=0",
            ".end");
    Circuit circuit = result.circuit().orElseThrow();
    assertThat(circuit.bottles()).hasSize(2);
    assertThat(names(circuit.element("U2A").orElseThrow().nodes()))
        .containsExactly("N006", "N002", "N007");
    assertThat(result.diagnostics()).noneMatch(d -> d.isError());
  }
}
