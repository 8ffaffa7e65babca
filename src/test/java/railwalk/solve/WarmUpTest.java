package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.circuit.Node;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.walk.SupplyNode;

/** The course from switch-on. */
class WarmUpTest {
  private static final double MINUTE_SECONDS = 60;

  private static WarmUpCourse cold(Circuit circuit) {
    return course(circuit, false);
  }

  private static WarmUpCourse course(Circuit circuit, boolean hot) {
    OperatingPoint running = SampleAmps.solve(circuit);
    return followed(WarmUp.of(List.of(new WarmUp.Stretch(running, MINUTE_SECONDS)), hot));
  }

  private static WarmUpCourse followed(WarmUpOutcome outcome) {
    if (outcome instanceof WarmUpOutcome.Lost lost) {
      throw new AssertionError(lost.toString());
    }
    return ((WarmUpOutcome.Followed) outcome).course();
  }

  private static double[] volts(WarmUpCourse course, String node) {
    return course.volts(course.circuit().node(node).orElseThrow());
  }

  /** Returns the volts at an instant, between two of the course along a straight line. */
  private static double at(WarmUpCourse course, String node, double seconds) {
    double[] times = course.seconds();
    double[] volts = volts(course, node);
    int i = 1;
    while (times[i] < seconds) {
      i++;
    }
    double share = (seconds - times[i - 1]) / (times[i] - times[i - 1]);
    return volts[i - 1] + share * (volts[i] - volts[i - 1]);
  }

  private static WarmUpPeak peak(WarmUpCourse course, String node) {
    return WarmUpPeak.of(course.seconds(), volts(course, node));
  }

  /** A capacitor charged through a resistor: V · (1 − exp(−t / RC)), any textbook. */
  @Test
  void chargesACapacitorAsTheTextbookSays() {
    WarmUpCourse course =
        cold(
            new CircuitBuilder()
                .v("V1", "a", "0", 300)
                .r("R1", "a", "b", 100e3)
                .c("C1", "b", "0", 47e-6)
                .line(120, 60)
                .build());
    double worst = 0;
    double[] volts = volts(course, "b");
    for (int i = 1; i < volts.length; i++) {
      double expected = 300 * -Math.expm1(-course.seconds()[i] / 4.7);
      worst = Math.max(worst, Math.abs(volts[i] - expected));
    }
    System.out.printf("RC of 4.7 s: %d instants, worst %.3f V of 300 V%n", volts.length - 1, worst);
    assertThat(worst).isLessThan(0.6);
  }

  /**
   * A large reservoir that takes tens of line periods to charge, against the same circuit stepped
   * through every period by Hipparchus (Dormand–Prince 8(5,3)), the diode being 0.72 V when it
   * conducts (usual forward volts of a silicon rectifier at tens of milliamperes).
   */
  @Test
  void chargesAReservoirAsAGeneralIntegratorDoes() {
    double farads = 220e-6;
    double seriesOhms = 400;
    double loadOhms = 20e3;
    WarmUpCourse course =
        cold(
            new CircuitBuilder()
                .winding("VHT", "h", "0", 250, seriesOhms)
                .diode("D1", "h", "b")
                .c("C1", "b", "0", farads)
                .r("RL", "b", "0", loadOhms)
                .line(230, 50)
                .build());
    OrdinaryDifferentialEquation reservoir =
        new OrdinaryDifferentialEquation() {
          @Override
          public int getDimension() {
            return 1;
          }

          @Override
          public double[] computeDerivatives(double t, double[] y) {
            double drive = 250 * Math.sqrt(2) * Math.sin(2 * Math.PI * 50 * t) - 0.72 - y[0];
            return new double[] {(Math.max(0, drive) / seriesOhms - y[0] / loadOhms) / farads};
          }
        };
    double greatest = 0;
    double worst = 0;
    double[] state = {0};
    for (int period = 0; period < 100; period++) {
      double[] before = state;
      state =
          new DormandPrince853Integrator(1e-9, 1e-3, 1e-7, 1e-7)
              .integrate(reservoir, new ODEState(period / 50.0, before), (period + 1) / 50.0)
              .getPrimaryState();
      greatest = state[0];
      if (period >= 4) {
        double expected = (before[0] + state[0]) / 2;
        worst = Math.max(worst, Math.abs(at(course, "b", period / 50.0) - expected));
      }
    }
    System.out.printf("reservoir: worst %.2f V, comes to %.1f V%n", worst, greatest);
    assertThat(worst).isLessThan(0.012 * greatest);
    assertThat(at(course, "b", 2)).isCloseTo(greatest, within(0.01 * greatest));
  }

  static Stream<Path> netlists() {
    List<Path> all = new ArrayList<>();
    for (String folder : new String[] {"amps", "supplies"}) {
      try (Stream<Path> files = Files.list(Path.of("test-netlists", folder))) {
        files.filter(f -> f.toString().endsWith(".cir")).sorted().forEach(all::add);
      } catch (IOException e) {
        throw new UncheckedIOException(e);
      }
    }
    return all.stream();
  }

  /** A minute on, cold or hot, everything stands where the steady solution has it. */
  @ParameterizedTest
  @MethodSource("netlists")
  void comesToTheSteadySolution(Path netlist) throws IOException {
    Circuit circuit = NetlistReader.read(netlist, Catalogue.standard()).circuit().orElseThrow();
    OperatingPoint running = SampleAmps.solve(circuit);
    for (boolean hot : new boolean[] {false, true}) {
      WarmUpCourse course = course(circuit, hot);
      for (SupplyNode supply : running.map().supplyNodes()) {
        double[] volts = course.volts(supply.node());
        double expected = running.volts(supply.node());
        assertThat(volts[volts.length - 1])
            .as(supply.node().name())
            .isCloseTo(expected, within(1e-4 * Math.max(1, Math.abs(expected))));
      }
    }
  }

  /**
   * Before any tube draws, a silicon supply stands at the crest of its winding, √2 times the rms
   * volts less the diode's drop (handbooks). The one load left is a regulator tube's feed.
   */
  @Test
  void siliconStandsAtTheCrestUntilTubesDraw() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .line(230, 50)
            .winding("VHT", "h1", "0", 260, 120)
            .diode("D1", "h1", "b1")
            .c("C1", "b1", "0", 47e-6)
            .r("R1", "b1", "b2", 1500)
            .c("C2", "b2", "0", 47e-6)
            .l("LO", "b1", "p", Double.NaN, 310)
            .pentode(SampleAmps.type("EL84"), "V2", "p", "b2", "g", "k")
            .r("R3", "g", "0", 470e3)
            .r("R4", "k", "0", 180)
            .c("C4", "k", "0", 100e-6);
    WarmUpCourse course = cold(builder.build());
    double crest = 260 * Math.sqrt(2);
    System.out.printf(
        "silicon: %.1f V at 2 s against a crest of %.1f V, %.1f V warm%n",
        at(course, "b1", 2), crest, at(course, "b1", 60));
    assertThat(at(course, "b1", 2)).isBetween(crest - 1.5, crest - 0.2);
    assertThat(at(course, "b2", 2)).isBetween(crest - 1.5, crest - 0.2);
    assertThat(at(course, "b1", 60)).isLessThan(0.95 * crest);
  }

  /**
   * A filament rectifier is ahead of indirectly heated output tubes and lets the supply rise to its
   * no-load volts; a rectifier with a heater comes up after them (common practice).
   */
  @Test
  void onlyARectifierThatIsAheadOvershoots() {
    Circuit slow = SampleAmps.fixedBias(1).build();
    Circuit fast =
        slow.inState(
            new State("", List.of(new StateChange.TubeFitted("V9", SampleAmps.type("5U4GB")))));
    WarmUpPeak heater = peak(cold(slow), "b1");
    WarmUpPeak filament = peak(cold(fast), "b1");
    System.out.printf(
        "b1: GZ34 %.1f V highest, %.1f V running; 5U4GB %.1f V after %.1f s, %.1f V running%n",
        heater.volts(),
        heater.endVolts(),
        filament.volts(),
        filament.seconds(),
        filament.endVolts());
    assertThat(heater.volts()).isLessThan(1.005 * heater.endVolts());
    assertThat(filament.volts()).isGreaterThan(1.05 * filament.endVolts());
    assertThat(filament.seconds()).isBetween(2.0, 8.0);
    assertThat(peak(course(fast, true), "b1").volts()).isLessThan(1.01 * filament.endVolts());
  }

  /** A switch thrown on the way: volts go on from where they were and end at the new rest. */
  @Test
  void goesOnFromWhereASwitchFoundIt() {
    CircuitBuilder builder =
        new CircuitBuilder()
            .line(120, 60)
            .v("V1", "a", "0", 300)
            .r("R1", "a", "b", 100e3)
            .c("C1", "b", "0", 20e-6)
            .contact("S1", "b", "c", false)
            .r("R2", "c", "0", 100e3);
    Circuit open = builder.build();
    Circuit closed = open.inState(new State("", List.of(new StateChange.SwitchPosition("S1", 1))));
    WarmUpCourse course =
        followed(
            WarmUp.of(
                List.of(
                    new WarmUp.Stretch(SampleAmps.solve(open), 30),
                    new WarmUp.Stretch(SampleAmps.solve(closed), MINUTE_SECONDS)),
                false));
    assertThat(at(course, "b", 30)).isCloseTo(300, within(0.5));
    double expected = 150 + 150 * Math.exp(-1);
    assertThat(at(course, "b", 31)).isCloseTo(expected, within(1.0));
    assertThat(at(course, "b", 60)).isCloseTo(150, within(0.1));
  }

  /**
   * An empty reservoir behind silicon takes about what the winding's resistance lets through near
   * the crest, and no more than the crest over that resistance (Ohm's law).
   */
  @Test
  void firstChargeIsHeldDownByTheWinding() {
    OperatingPoint running =
        SampleAmps.solve(
            new CircuitBuilder()
                .line(230, 50)
                .winding("VHT", "h", "0", 250, 60)
                .diode("D1", "h", "b")
                .c("C1", "b", "0", 1000e-6)
                .r("RL", "b", "0", 20e3)
                .build());
    WarmUpCourse course =
        followed(WarmUp.of(List.of(new WarmUp.Stretch(running, MINUTE_SECONDS)), true));
    double crestAmps = 250 * Math.sqrt(2) / 60;
    double peakAmps = course.firstCharges().get(0).peakAmps();
    System.out.printf("first charge %.2f A, crest over winding %.2f A%n", peakAmps, crestAmps);
    assertThat(peakAmps).isBetween(0.85 * crestAmps, crestAmps);
  }

  @Test
  void nodesWithoutAPathAreNotPredicted() {
    Circuit circuit =
        new CircuitBuilder()
            .line(120, 60)
            .v("V1", "a", "0", 300)
            .r("R1", "a", "0", 100e3)
            .c("C1", "a", "f", 1e-6)
            .c("C2", "f", "0", 1e-6)
            .build();
    Node floating = circuit.node("f").orElseThrow();
    assertThat(cold(circuit).volts(floating)).endsWith(Double.NaN);
  }
}
