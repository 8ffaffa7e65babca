package railwalk.spread;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import org.hipparchus.random.RandomDataGenerator;
import org.junit.jupiter.api.Test;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Resistor;
import railwalk.device.Catalogue;
import railwalk.device.SectionType;
import railwalk.netlist.NetlistReader;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.walk.SupplyMap;
import railwalk.walk.Walk;

/**
 * Bands of used tubes and carbon-composition resistors against a Monte Carlo of the same stage: a
 * general-purpose random generator (Hipparchus RandomDataGenerator, fixed seed) draws tube currents
 * from a normal distribution with the limits at two deviations and resistors evenly between their
 * limits; every draw is solved again. Limits: common practice, −35/+20 % and −5/+15 %.
 */
class UsedPartsTest {
  private static final int DRAWS = 4000;
  private static final String STAGE =
      """
      * stage
      %s
      V9 b 0 250
      RD b bb 22k
      RB bb 0 330k
      RP bb p 100k
      XV1A p g k 12AX7
      RG g 0 470k
      RK k 0 1k5
      """;

  private static Circuit circuit(String spread) {
    return NetlistReader.readText("s.cir", STAGE.formatted(spread), Catalogue.standard())
        .circuit()
        .orElseThrow();
  }

  private static OperatingPoint solve(Circuit circuit) {
    SupplyMap map = Walk.of(circuit);
    return ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, map)).point();
  }

  /** Returns the 5 % and 95 % points of the volts of {@code node} over all draws. */
  private static double[] drawn(Circuit circuit, String node, boolean used, boolean carbon) {
    RandomDataGenerator random = new RandomDataGenerator(1947);
    double[] volts = new double[DRAWS];
    for (int draw = 0; draw < DRAWS; draw++) {
      List<Element> elements = new ArrayList<>();
      for (Element element : circuit.elements()) {
        if (element instanceof Resistor r) {
          double share = carbon ? random.nextUniform(0.95, 1.15) : random.nextUniform(0.9, 1.1);
          elements.add(new Resistor(r.name(), r.a(), r.b(), share * r.ohms(), r.ratedWatts(), 0.1));
        } else if (element instanceof AmplifierSection s) {
          double emission = used ? random.nextNormal(0.925, 0.1375) : random.nextNormal(1, 0.15);
          elements.add(weakened(s, Math.max(0.1, emission)));
        } else {
          elements.add(element);
        }
      }
      Circuit drawnCircuit = circuit.withElements(elements);
      volts[draw] = solve(drawnCircuit).volts(drawnCircuit.node(node).orElseThrow());
    }
    Arrays.sort(volts);
    return new double[] {volts[DRAWS / 20], volts[DRAWS - DRAWS / 20]};
  }

  private static AmplifierSection weakened(AmplifierSection s, double emission) {
    SectionType t = s.type();
    SectionType weak =
        new SectionType(
            t.id(),
            t.kind(),
            s.law().withEmission(emission),
            t.ratings(),
            t.rectifierRatings(),
            t.spreadLow(),
            t.spreadHigh());
    return new AmplifierSection(
        s.name(),
        s.bottle(),
        s.section(),
        weak,
        s.plate(),
        s.screen(),
        s.grid(),
        s.cathode(),
        s.suppressor());
  }

  private static void compare(String spread, boolean used, boolean carbon) {
    Circuit circuit = circuit(spread);
    OperatingPoint point = solve(circuit);
    Bands bands = FirstOrderBands.of(point);
    for (String node : List.of("bb", "p", "k")) {
      Band band = band(bands, circuit, node);
      double[] drawn = drawn(circuit, node, used, carbon);
      double expected = point.volts(circuit.node(node).orElseThrow());
      double width = drawn[1] - drawn[0];
      System.out.printf(
          "%-38s %-2s expected %.3f V, band %.3f to %.3f V, drawn %.3f to %.3f V%n",
          spread.isEmpty() ? "new tubes, plain resistors" : spread,
          node,
          expected,
          band.lowVolts(),
          band.highVolts(),
          drawn[0],
          drawn[1]);
      assertThat(band.lowVolts()).isCloseTo(drawn[0], within(0.12 * width));
      assertThat(band.highVolts()).isCloseTo(drawn[1], within(0.12 * width));
      assertThat(expected).isBetween(band.lowVolts(), band.highVolts());
    }
  }

  @Test
  void newParts() {
    compare("", false, false);
  }

  @Test
  void usedTubes() {
    compare(".spread tubes=used", true, false);
  }

  @Test
  void carbonResistors() {
    compare(".spread resistors=carbon", false, true);
  }

  @Test
  void both() {
    compare(".spread tubes=used resistors=carbon", true, true);
  }

  /** Used tubes draw less on average: the middle of the plate's band moves up. */
  @Test
  void theMiddleMovesWithTheWear() {
    Band fresh = bandOf("", "p");
    Band worn = bandOf(".spread tubes=used", "p");
    assertThat(worn.lowVolts() + worn.highVolts())
        .isGreaterThan(fresh.lowVolts() + fresh.highVolts());
    assertThat(bandOf(".spread tubes=new resistors=film", "p")).isEqualTo(fresh);
  }

  private static Band bandOf(String spread, String node) {
    Circuit circuit = circuit(spread);
    return band(FirstOrderBands.of(solve(circuit)), circuit, node);
  }

  private static Band band(Bands bands, Circuit circuit, String node) {
    return Objects.requireNonNull(bands.byNode().get(circuit.node(node).orElseThrow()));
  }
}
