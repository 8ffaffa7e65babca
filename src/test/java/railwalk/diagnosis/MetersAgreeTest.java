package railwalk.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Meter;
import railwalk.circuit.Resistor;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.solve.NearbySolver;
import railwalk.solve.OperatingPoint;
import railwalk.spread.RandomBuild;
import railwalk.spread.SampledBands;

/**
 * The same amplifiers read with a meter of 20 kΩ/V, each point on its range, and with one of 10 MΩ,
 * without noise: both stand on the same side of their own band's edges. The meter's own error,
 * which differs between the two, is left out.
 */
class MetersAgreeTest {
  private static final Meter NEEDLE =
      new Meter(Double.NaN, 20e3, List.of(2.5, 10.0, 50.0, 250.0, 500.0, 1000.0));
  private static final Meter DIGITAL = Meter.TEN_MEGOHM;
  private static final int AMPLIFIERS = 30;

  /** Grids at the reference read nothing but rounding; neither meter shows that much. */
  private static final double LEAST_VOLTS = 1e-4;

  /**
   * A needle meter that shows less than this share of the volts has taken the place of the point's
   * own resistance (a grid that biases itself across ten megohms): what it shows then says little
   * of the part, and its verdict is left out.
   */
  private static final double MOSTLY_METER = 0.5;

  /** How near to an edge the two may differ, as a share of the edge's volts. */
  private static final double EDGE_SHARE = 0.02;

  /** One meter at the bench: what it should show at every point, and what it shows. */
  private static final class Bench {
    private final Predictor predictor;
    private final JudgedLimits limits;
    private final List<Integer> places;

    Bench(Circuit circuit) throws NoOperatingPoint {
      Amplifier amplifier = new Amplifier(circuit, Set.of(""));
      List<Probe> probes = new ArrayList<>();
      for (Probe probe : BenchPoints.of(amplifier.healthy(""))) {
        Predictor bare = new Predictor(amplifier, List.of(probe));
        double expected = bare.unloaded(amplifier.healthy())[0];
        probes.add(probe.onRange(circuit.meter(), expected, expected));
      }
      predictor = new Predictor(amplifier, probes);
      Prediction bench = predictor.predict(amplifier.healthy());
      limits = JudgedLimits.sampled(predictor, bench, amplifier.healthy(), SampledBands.BUILDS);
      places = IntStream.range(0, probes.size()).boxed().toList();
    }

    double[] read(OperatingPoint amplifier) {
      return predictor.values(places, amplifier);
    }

    int side(int place, double reading) {
      return reading < limits.low(place) ? -1 : reading > limits.high(place) ? 1 : 0;
    }

    boolean onEdge(int place, double reading) {
      return near(reading, limits.low(place)) || near(reading, limits.high(place));
    }

    private static boolean near(double reading, double edge) {
      return Math.abs(reading - edge) <= EDGE_SHARE * Math.abs(edge);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"towpath", "weirside", "lockgate", "millrace"})
  void sameVerdicts(String name) throws IOException, NoOperatingPoint {
    Circuit circuit =
        NetlistReader.read(Path.of("test-netlists/amps", name + ".cir"), Catalogue.standard())
            .circuit()
            .orElseThrow();
    Bench needle = new Bench(circuit.withMeter(NEEDLE));
    Bench digital = new Bench(circuit.withMeter(DIGITAL));
    NearbySolver solver = new NearbySolver(new Amplifier(circuit, Set.of("")).healthy(""));
    SplittableRandom random = new SplittableRandom(20);
    int compared = 0;
    int outside = 0;
    int onEdge = 0;
    int swamped = 0;
    List<String> differing = new ArrayList<>();
    for (int amplifier = 0; amplifier < AMPLIFIERS; amplifier++) {
      Circuit faulted = faulted(circuit, random);
      OperatingPoint point = solver.solve(faulted).orElseThrow();
      double[] byNeedle = needle.read(point);
      double[] byDigital = digital.read(point);
      for (int i = 0; i < byNeedle.length; i++) {
        if (!(Math.abs(byDigital[i]) > LEAST_VOLTS)) {
          continue;
        }
        if (Math.abs(byNeedle[i]) < MOSTLY_METER * Math.abs(byDigital[i])) {
          swamped++;
          continue;
        }
        compared++;
        int side = digital.side(i, byDigital[i]);
        outside += side == 0 ? 0 : 1;
        if (needle.side(i, byNeedle[i]) != side) {
          if (needle.onEdge(i, byNeedle[i]) || digital.onEdge(i, byDigital[i])) {
            onEdge++;
          } else {
            differing.add(
                "%s %s: %.4g in %.4g..%.4g against %.4g in %.4g..%.4g"
                    .formatted(
                        name,
                        needle.predictor.probes().get(i).name(),
                        byNeedle[i],
                        needle.limits.low(i),
                        needle.limits.high(i),
                        byDigital[i],
                        digital.limits.low(i),
                        digital.limits.high(i)));
          }
        }
      }
    }
    System.out.printf(
        "%-9s %d readings with either meter, %d outside the band, %d differ on an edge, %d elsewhere;"
            + " %d left out%n",
        name, compared, outside, onEdge, differing.size(), swamped);
    differing.forEach(System.out::println);
    assertThat(outside).isGreaterThan(compared / 50);
    assertThat(differing).isEmpty();
  }

  /** Returns a build with one resistor half to three times its value. */
  private static Circuit faulted(Circuit circuit, SplittableRandom random) {
    Circuit build = RandomBuild.of(circuit, () -> random.nextDouble(1e-9, 1));
    List<Element> elements = new ArrayList<>(build.elements());
    List<Resistor> resistors = build.elements(Resistor.class);
    Resistor r = resistors.get(random.nextInt(resistors.size()));
    double ohms = r.ohms() * Math.exp(random.nextDouble(Math.log(0.5), Math.log(3)));
    elements.set(
        elements.indexOf(r),
        new Resistor(r.name(), r.a(), r.b(), ohms, r.ratedWatts(), r.tolerance()));
    return build.withElements(elements);
  }
}
