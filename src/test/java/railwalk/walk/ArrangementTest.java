package railwalk.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;

/** What rectifier arrangements are called when their tubes are traced by pin. */
class ArrangementTest {
  private static List<String> arrangements(String... lines) {
    String text = "title\n" + String.join("\n", lines) + "\n";
    Circuit circuit =
        NetlistReader.readText("x.cir", text, Catalogue.standard()).circuit().orElseThrow();
    return Walk.of(circuit).groups().stream().flatMap(g -> g.arrangements().stream()).toList();
  }

  @Test
  void aFilamentBeforeTheChokeIsSeenThrough() {
    assertThat(
            arrangements(
                "VHT h1 0 h2 RMS 450-0-450 rdc=40,40",
                "VF k9 f9 RMS 5 rdc=0.05",
                "XV9 5U4GB 2=f9 4=h1 6=h2 8=k9",
                "L1 k9 b1 10 rdc=80",
                "C1 b1 0 40u",
                "R1 b1 0 10k"))
        .containsExactly("full-wave, centre tap, choke input");
  }

  @Test
  void aBridgeAndAHalfWaveBiasSupply() {
    assertThat(
            arrangements(
                "VHT h1 h2 RMS 300 rdc=40",
                "D1 h1 b1 1N4007",
                "D2 h2 b1 1N4007",
                "D3 0 h1 1N4007",
                "D4 0 h2 1N4007",
                "C1 b1 0 40u",
                "R1 b1 0 10k",
                "VB hb 0 RMS 50 rdc=20",
                "D5 n1 hb 1N4007",
                "C2 0 n1 40u",
                "R2 n1 0 10k"))
        .containsExactly("bridge", "half-wave, negative");
  }
}
