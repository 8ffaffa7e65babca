package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static railwalk.netlist.Reading.circuit;
import static railwalk.netlist.Reading.codes;
import static railwalk.netlist.Reading.names;
import static railwalk.netlist.Reading.part;
import static railwalk.netlist.Reading.read;

import org.junit.jupiter.api.Test;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Filament;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Switch;
import railwalk.device.Catalogue;

class StatesTest {
  private static Circuit inState(String... lines) {
    Circuit circuit = circuit(lines);
    assertThat(circuit.states()).hasSize(1);
    return circuit.inState(circuit.states().get(0));
  }

  @Test
  void switchesControlsAndTheLineAreSet() {
    Circuit circuit =
        inState(
            ".line 120 60 design=117",
            "XS1 a b SWITCH closed",
            "XP1 a w b POT 50k set=0.5",
            "R1 w 0 1M",
            ".state standby S1=open XP1=20% line=108");
    assertThat(part(circuit, "S1", Switch.class).position()).isZero();
    assertThat(part(circuit, "P1", Potentiometer.class).share()).isEqualTo(0.2);
    assertThat(circuit.line().volts()).isEqualTo(108);
    assertThat(circuit.line().designVolts()).isEqualTo(117);
    assertThat(circuit.line().scale(Double.NaN)).isEqualTo(108.0 / 117);
  }

  @Test
  void aTubeOutLeavesItsSocketButNoPart() {
    Circuit circuit =
        inState(
            "XV1 12AX7 1=p 2=g 3=k 6=p 7=g 8=k 4=h 5=i",
            "R1 p g 1k",
            "R2 h i 1k",
            "R3 k 0 1k",
            ".state out V1=out");
    assertThat(circuit.elements()).extracting(e -> e.name()).containsExactly("R1", "R2", "R3");
    assertThat(circuit.bottle("V1")).isPresent();
  }

  @Test
  void aStandInCanBeOutToo() {
    Circuit circuit =
        inState("XV6 UNKNOWN plate=p cathode=k draws plate=2mA", "R1 p k 1k", ".state out V6=out");
    assertThat(circuit.elements()).extracting(e -> e.name()).containsExactly("R1");
  }

  /** 5Y3GT out, GZ34 in: its cathode is pin 8, its heater runs from 2 to 8. */
  @Test
  void anotherTypeIsFittedPinByPin() {
    Circuit before =
        circuit("XV5 5Y3GT 2=f1 8=f2 4=a 6=b", "R1 a b 1k", "R2 f1 f2 1k", ".state swap V5=5AR4");
    Circuit after = before.inState(before.states().get(0));
    assertThat(part(before, "V5", RectifierSection.class).cathode().name())
        .isEqualTo("V5:filament");
    RectifierSection fitted = part(after, "V5", RectifierSection.class);
    assertThat(fitted.cathode().name()).isEqualTo("f2");
    assertThat(after.bottle("V5").orElseThrow().type().name()).isEqualTo("GZ34");
    assertThat(after.elements(Filament.class)).hasSize(1);
    assertThat(after.nodes()).isEqualTo(before.nodes());
    assertThat(after.elements().get(0)).isEqualTo(fitted);
  }

  @Test
  void theOtherWayRoundAFilamentGetsItsMiddle() {
    Circuit before =
        circuit("XV5 GZ34 2=f1 8=f2 4=a 6=b", "R1 a b 1k", "R2 f1 f2 1k", ".state swap V5=5Y3GT");
    Circuit after = before.inState(before.states().get(0));
    assertThat(part(after, "V5", RectifierSection.class).cathode().name()).isEqualTo("V5:filament");
    assertThat(after.nodes()).hasSize(before.nodes().size() + 1);
    assertThat(after.nodes().get(after.nodes().size() - 1).index())
        .isEqualTo(after.nodes().size() - 1);
    assertThat(after.nodes().subList(0, before.nodes().size())).isEqualTo(before.nodes());
  }

  @Test
  void anotherTypeIsFittedByElectrodeWhereTheNetlistNamesThose() {
    Circuit after = inState("XV1A p g k 12AX7", "R1 p g 1k", "R2 k 0 1k", ".state swap V1=12AT7");
    AmplifierSection section = part(after, "V1A", AmplifierSection.class);
    assertThat(names(section.nodes())).containsExactly("p", "g", "k");
    assertThat(section.type().law())
        .isEqualTo(Catalogue.standard().find("12AT7").orElseThrow().sections().get(0).law());
    Circuit rectifier =
        inState("XV5 a b hot 5Y3GT", "R1 a b 1k", "R2 hot 0 1k", ".state s V5=GZ34");
    RectifierSection fitted = part(rectifier, "V5", RectifierSection.class);
    assertThat(names(fitted.plates())).containsExactly("a", "b");
    assertThat(fitted.cathode().name()).isEqualTo("hot");
  }

  @Test
  void aPentodeMayGiveWayToAnotherWithASuppressor() {
    Circuit after =
        inState("XV3 6V6GT 3=p 4=s 5=g 8=k", "R1 p s 1k", "R2 g k 1k", ".state s V3=EL34");
    AmplifierSection fitted = part(after, "V3", AmplifierSection.class);
    assertThat(names(fitted.nodes())).containsExactly("p", "s", "g", "k");
    assertThat(fitted.suppressor()).isNull();
  }

  @Test
  void aStateNamesWhatThereIs() {
    NetlistResult result =
        read(
            ".line 120 60",
            "XS1 a 0 SWITCH closed",
            "R1 a 0 1k",
            "XV1 5Y3GT 4=a 6=a 8=0",
            ".state x S2=open S1=4 R1=2 V1=EL84 V1=12ZZ9 line=0");
    assertThat(codes(result))
        .contains(
            "no-such-part",
            "switch-position",
            "state-of-part",
            "state-socket",
            "unknown-type",
            "line-range");
  }
}
