package railwalk.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Path;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;

/** Cold ohms against sums by hand and against a dense solution by a general matrix library. */
class ColdOhmsTest {
  private static final double OPEN_OHMS = 20e6;
  private static final double TINY_SIEMENS = 1e-13;
  private static final double WIRE_OHMS = 1e-6;

  private static Circuit circuit(String... lines) {
    return NetlistReader.readText(
            "test.cir", "* test\n" + String.join("\n", lines) + "\n", Catalogue.standard())
        .circuit()
        .orElseThrow();
  }

  private static ColdOhms.Reading at(Circuit circuit, String node) throws NoOperatingPoint {
    return ColdOhms.of(circuit).at(circuit.node(node).orElseThrow());
  }

  /** Series and parallel by hand: a = 10k ∥ 50k, b = 30k ∥ 30k, c = b + 5k. */
  @Test
  void seriesAndParallelByHand() throws NoOperatingPoint {
    Circuit circuit = circuit("R1 a 0 10k", "R2 a b 20k", "R3 b 0 30k", "R4 b c 5k");
    assertThat(at(circuit, "a").ohms()).isCloseTo(10e3 * 50e3 / 60e3, within(1e-3));
    assertThat(at(circuit, "b").ohms()).isCloseTo(15e3, within(1e-3));
    assertThat(at(circuit, "c").ohms()).isCloseTo(20e3, within(1e-3));
  }

  /**
   * One resistor uniform within ±10 % deviates by 10 %/√3; 1.645 of that is 9.50 %. Two equal ones
   * in series: half the variance each way, 9.50 %/√2.
   */
  @Test
  void bandByHand() throws NoOperatingPoint {
    Circuit circuit = circuit("R1 a 0 10k", "R2 a b 10k");
    double one = 1.645 * 0.1 / Math.sqrt(3);
    assertThat(at(circuit, "a").highOhms()).isCloseTo(10e3 * (1 + one), within(0.1));
    assertThat(at(circuit, "b").lowOhms()).isCloseTo(20e3 * (1 - one / Math.sqrt(2)), within(0.1));
  }

  /** A diode counts as open and is told of; an electrolytic is charged through what hangs on it. */
  @Test
  void diodesAndElectrolytics() throws NoOperatingPoint {
    Circuit circuit =
        circuit(
            "R1 a 0 220k",
            "C1 a 0 47u 450V",
            "D1 d a 1N4007",
            "R2 d 0 47k",
            "C2 e 0 10u 450V",
            "R3 e f 1k");
    ColdOhms.Reading behind = at(circuit, "d");
    assertThat(behind.ohms()).isCloseTo(47e3, within(5.0));
    assertThat(behind.throughDiode()).isTrue();
    ColdOhms.Reading charged = at(circuit, "a");
    double low = 1 - 1.645 * 0.1 / Math.sqrt(3);
    double formed = 220e3 * 500e3 / 720e3;
    assertThat(charged.startOhms()).isLessThan(1);
    assertThat(charged.pastOhms()).isCloseTo(low * formed, within(0.001 * formed));
    ColdOhms.Reading open = at(circuit, "f");
    assertThat(open.ohms()).isInfinite();
    assertThat(open.startOhms()).isCloseTo(1e3, within(1.0));
    assertThat(open.pastOhms()).isCloseTo(501e3, within(10.0));
  }

  @ParameterizedTest
  @ValueSource(strings = {"weirside", "lockgate", "millrace", "towpath"})
  void demosAgainstDenseInverse(String name) throws IOException, NoOperatingPoint {
    Circuit circuit =
        NetlistReader.read(Path.of("test-netlists/amps/" + name + ".cir"), Catalogue.standard())
            .circuit()
            .orElseThrow();
    ColdOhms cold = ColdOhms.of(circuit);
    DMatrixRMaj inverse = inverse(circuit);
    int compared = 0;
    double worst = 0;
    for (Node node : circuit.nodes()) {
      double expected = inverse.get(node.index(), node.index());
      double found = cold.at(node).ohms();
      if (expected >= OPEN_OHMS) {
        assertThat(found).as(node.name()).isInfinite();
      } else {
        worst = Math.max(worst, Math.abs(found - expected) / Math.max(1, expected));
        compared++;
      }
    }
    System.out.printf("%s: %d nodes, worst difference %.2g%n", name, compared, worst);
    assertThat(compared).isGreaterThan(5);
    assertThat(worst).isLessThan(1e-3);
  }

  /** Returns the resistances of the unplugged amplifier, its tubes and diodes out. */
  private static DMatrixRMaj inverse(Circuit circuit) {
    int count = circuit.nodes().size();
    DMatrixRMaj siemens = new DMatrixRMaj(count, count);
    for (int n = 0; n < count; n++) {
      siemens.add(n, n, TINY_SIEMENS);
    }
    siemens.add(circuit.reference().index(), circuit.reference().index(), 1e9);
    for (Element element : circuit.elements()) {
      if (!element.bottle().isEmpty()) {
        continue;
      }
      if (element instanceof Resistor r) {
        tie(siemens, r.a(), r.b(), r.ohms());
      } else if (element instanceof Inductor l) {
        tie(siemens, l.a(), l.b(), l.dcOhms());
      } else if (element instanceof Capacitor c) {
        tie(siemens, c.a(), c.b(), c.leakOhms());
      } else if (element instanceof Potentiometer p) {
        tie(siemens, p.b(), p.wiper(), p.share() * p.ohms());
        tie(siemens, p.wiper(), p.a(), (1 - p.share()) * p.ohms());
      } else if (element instanceof Winding w) {
        if (!w.wall()) {
          w.sections().forEach(s -> tie(siemens, s.a(), s.b(), s.ohms()));
        }
      } else if (!(element instanceof railwalk.circuit.Diode)
          && !(element instanceof Switch s && s.position() == 0)) {
        tie(siemens, element.nodes().get(0), element.nodes().get(1), WIRE_OHMS);
      }
    }
    DMatrixRMaj inverse = new DMatrixRMaj(count, count);
    assertThat(CommonOps_DDRM.invert(siemens, inverse)).isTrue();
    return inverse;
  }

  private static void tie(DMatrixRMaj siemens, Node a, Node b, double ohms) {
    double amount = 1 / Math.max(WIRE_OHMS, ohms);
    siemens.add(a.index(), a.index(), amount);
    siemens.add(b.index(), b.index(), amount);
    siemens.add(a.index(), b.index(), -amount);
    siemens.add(b.index(), a.index(), -amount);
  }
}
