package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Switch;
import railwalk.circuit.Winding;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;

/**
 * Kirchhoff's current law on every demo amplifier and in every state, added up part by part from
 * what the operating point tells its readers, ripple groups included: nothing may be missing at a
 * node.
 */
class KirchhoffTest {
  @Test
  void currentsBalanceAtEveryNodeOfEveryDemo() throws IOException {
    List<Path> demos;
    try (Stream<Path> files = Files.list(Path.of("test-netlists/amps"))) {
      demos = files.filter(f -> f.toString().endsWith(".cir")).sorted().toList();
    }
    assertThat(demos).hasSizeGreaterThanOrEqualTo(4);
    for (Path demo : demos) {
      Circuit first = NetlistReader.read(demo, Catalogue.standard()).circuit().orElseThrow();
      assertBalanced(demo + "", first);
      first.states().forEach(s -> assertBalanced(demo + " " + s.name(), first.inState(s)));
    }
  }

  private static void assertBalanced(String name, Circuit circuit) {
    OperatingPoint point = SampleAmps.solve(circuit);
    double worst = 0;
    String where = "";
    int nodes = 0;
    for (Node node : circuit.nodes()) {
      if (node.equals(circuit.reference()) || Double.isNaN(point.volts(node))) {
        continue;
      }
      double sum = 0;
      boolean told = true;
      for (Element element : circuit.elements()) {
        if (element.nodes().contains(node)) {
          told &= isTold(element, node);
          sum += told ? leaving(point, element, node) : 0;
        }
      }
      if (told) {
        nodes++;
        if (Math.abs(sum) > worst) {
          worst = Math.abs(sum);
          where = node.name();
        }
      }
    }
    System.out.printf("%s: %d nodes, worst %.2e A at %s%n", name, nodes, worst, where);
    assertThat(worst).as(name).isLessThan(1e-9);
  }

  /** A tapped winding tells its first section's current only, a rectifier the sum of its plates. */
  private static boolean isTold(Element element, Node node) {
    return !(element instanceof Winding w && w.sections().size() > 1)
        && !(element instanceof RectifierSection r
            && r.plates().size() > 1
            && r.plates().contains(node));
  }

  private static double leaving(OperatingPoint point, Element element, Node node) {
    if (element instanceof AmplifierSection tube) {
      SectionPoint at = point.at(tube);
      double amps = 0;
      amps += node.equals(tube.plate()) ? at.plateAmps() : 0;
      amps += node.equals(tube.screen()) ? at.screenAmps() : 0;
      amps += node.equals(tube.grid()) ? at.gridAmps() : 0;
      amps -= node.equals(tube.cathode()) ? at.cathodeAmps() : 0;
      return amps;
    }
    if (element instanceof Potentiometer pot) {
      double upper = point.amps(pot);
      double lower =
          (point.volts(pot.wiper()) - point.volts(pot.b()))
              / Math.max(pot.share() * pot.ohms(), LinearStamper.BRANCH_OHMS);
      return (node.equals(pot.a()) ? upper : 0)
          + (node.equals(pot.wiper()) ? lower - upper : 0)
          - (node.equals(pot.b()) ? lower : 0);
    }
    if (element instanceof Switch contact) {
      int position = contact.position();
      boolean closedHere = position > 0 && contact.poles().get(position - 1).equals(node);
      return node.equals(contact.common())
          ? point.amps(contact)
          : closedHere ? -point.amps(contact) : 0;
    }
    if (element instanceof RegulatorSection regulator) {
      return node.equals(regulator.anode()) ? point.amps(regulator) : -point.amps(regulator);
    }
    assertThat(element).isNotInstanceOf(ControlledSource.class);
    List<Node> ends = element.nodes();
    if (ends.get(0).equals(ends.get(ends.size() - 1))) {
      return 0;
    }
    return node.equals(ends.get(0)) ? point.amps(element) : -point.amps(element);
  }
}
