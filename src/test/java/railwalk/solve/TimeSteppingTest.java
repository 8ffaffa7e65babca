package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.circuit.Node;
import railwalk.device.SiliconLaw;
import railwalk.device.TwoPoleCurrent;
import railwalk.device.TwoPoleLaw;
import railwalk.walk.Walk;

/**
 * Time stepping against Hipparchus (Dormand–Prince 8(5,3), a general-purpose solver of ordinary
 * differential equations) on six supplies whose state equations are written out by hand here: the
 * current of a rectifier behind its winding follows from v = Rs · i + drop(i).
 */
class TimeSteppingTest {
  private static final double HERTZ = 60;
  private static final double PERIOD = 1 / HERTZ;
  private static final int PERIODS = 30;
  private static final double RMS = 200;
  private static final double OHMS = 40;
  private static final double FARADS = 20e-6;
  private static final double LOAD = 4_000;
  private static final double HENRIES = 2;
  private static final TwoPoleLaw SILICON = SiliconLaw.generic();

  /** Derivatives of the states at an instant; the first state is the volts of the output. */
  private interface StateEquations {
    double[] derivatives(double emf, double[] states);
  }

  private record Sample(String name, Circuit circuit, StateEquations equations, double[] start) {}

  @Test
  void agreesWithAGeneralIntegratorOnSixSupplies() {
    for (Sample sample : samples()) {
      Circuit circuit = sample.circuit();
      Node output = circuit.node("b1").orElseThrow();
      OperatingPoint averaged =
          ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, Walk.of(circuit))).point();
      LineCycle cycle = ((CycleOutcome.Settled) TimeStepping.of(averaged)).cycle();
      double[] expected = integrate(sample);
      System.out.printf(
          "%-20s %.4f V against %.4f V (%+.4f %%), ripple %.4f V against %.4f V (%+.3f %%)%n",
          sample.name(),
          cycle.meanVolts(output),
          expected[0],
          100 * (cycle.meanVolts(output) / expected[0] - 1),
          cycle.rippleVoltsRms(output),
          expected[1],
          100 * (cycle.rippleVoltsRms(output) / expected[1] - 1));
      assertThat(Math.abs(cycle.meanVolts(output) / expected[0] - 1)).isLessThan(0.0005);
      assertThat(Math.abs(cycle.rippleVoltsRms(output) / expected[1] - 1)).isLessThan(0.01);
    }
  }

  private static List<Sample> samples() {
    TwoPoleLaw tube = (TwoPoleLaw) SampleAmps.type("5Y3GT").sections().get(0).law();
    double[] halves = {RMS, RMS};
    return List.of(
        new Sample(
            "tube centre tap",
            loaded()
                .winding("VH", halves, OHMS, "h1", "0", "h2")
                .rectifier(SampleAmps.type("5Y3GT"), "V1", "h1", "h2", "b1")
                .build(),
            (e, y) -> {
              double charge = amps(tube, 1, e - y[0]) + amps(tube, 1, -e - y[0]);
              return new double[] {(charge - y[0] / LOAD) / FARADS};
            },
            new double[] {220}),
        new Sample(
            "silicon half-wave",
            loaded().winding("VH", "h1", "0", RMS, OHMS).diode("D1", "h1", "b1").build(),
            (e, y) -> new double[] {(amps(SILICON, 1, e - y[0]) - y[0] / LOAD) / FARADS},
            new double[] {240}),
        new Sample(
            "silicon bridge",
            loaded()
                .winding("VH", "h1", "h2", RMS, OHMS)
                .diode("D1", "h1", "b1")
                .diode("D2", "h2", "b1")
                .diode("D3", "0", "h1")
                .diode("D4", "0", "h2")
                .build(),
            (e, y) -> {
              double charge = amps(SILICON, 2, e - y[0]) + amps(SILICON, 2, -e - y[0]);
              return new double[] {(charge - y[0] / LOAD) / FARADS};
            },
            new double[] {250}),
        new Sample(
            "full-wave doubler",
            new CircuitBuilder()
                .line(120, HERTZ)
                .winding("VH", "h1", "m", RMS, OHMS)
                .diode("D1", "h1", "b1")
                .diode("D2", "0", "h1")
                .c("CU", "b1", "m", FARADS)
                .c("CL", "m", "0", FARADS)
                .r("RL", "b1", "0", 2 * LOAD)
                .build(),
            (e, y) -> {
              double upper = y[0] - y[1];
              double load = y[0] / (2 * LOAD);
              double chargesUpper = (amps(SILICON, 1, e - upper) - load) / FARADS;
              double chargesLower = (amps(SILICON, 1, -e - y[1]) - load) / FARADS;
              return new double[] {chargesUpper + chargesLower, chargesLower};
            },
            new double[] {480, 240}),
        new Sample(
            "half-wave doubler",
            loaded()
                .winding("VH", "h1", "0", RMS, OHMS)
                .c("CX", "h1", "x", FARADS)
                .diode("D1", "0", "x")
                .diode("D2", "x", "b1")
                .build(),
            (e, y) -> {
              double on = amps(SILICON, 1, e - y[1] - y[0]);
              double back = amps(SILICON, 1, y[1] - e);
              return new double[] {(on - y[0] / LOAD) / FARADS, (on - back) / FARADS};
            },
            new double[] {400, -240}),
        new Sample(
            "choke input",
            loaded()
                .winding("VH", halves, OHMS, "h1", "0", "h2")
                .diode("D1", "h1", "x")
                .diode("D2", "h2", "x")
                .l("L1", "x", "b1", HENRIES, OHMS)
                .build(),
            (e, y) -> {
              double volts = rectified(e, Math.max(0, y[1]));
              double rise = (volts - y[0] - OHMS * y[1]) / HENRIES;
              return new double[] {
                (y[1] - y[0] / LOAD) / FARADS, y[1] <= 0 ? Math.max(0, rise) : rise
              };
            },
            new double[] {170, 0.04}));
  }

  private static CircuitBuilder loaded() {
    return new CircuitBuilder()
        .line(120, HERTZ)
        .c("C1", "b1", "0", FARADS)
        .r("RL", "b1", "0", LOAD);
  }

  /** Returns the mean of the first state and the rms of what is left of it, after a while. */
  private static double[] integrate(Sample sample) {
    int states = sample.start().length;
    OrdinaryDifferentialEquation equation =
        new OrdinaryDifferentialEquation() {
          @Override
          public int getDimension() {
            return states + 2;
          }

          @Override
          public double[] computeDerivatives(double t, double[] y) {
            double emf = Math.sqrt(2) * RMS * Math.sin(2 * Math.PI * HERTZ * t);
            double[] own = sample.equations().derivatives(emf, y);
            double[] all = new double[states + 2];
            System.arraycopy(own, 0, all, 0, states);
            all[states] = y[0];
            all[states + 1] = y[0] * y[0];
            return all;
          }
        };
    DormandPrince853Integrator integrator = new DormandPrince853Integrator(1e-10, 4e-5, 1e-8, 1e-8);
    double[] from = new double[states + 2];
    System.arraycopy(sample.start(), 0, from, 0, states);
    double[] settled =
        integrator.integrate(equation, new ODEState(0, from), PERIODS * PERIOD).getPrimaryState();
    settled[states] = 0;
    settled[states + 1] = 0;
    double[] end =
        integrator.integrate(equation, new ODEState(0, settled), 2 * PERIOD).getPrimaryState();
    double mean = end[states] / (2 * PERIOD);
    return new double[] {mean, Math.sqrt(end[states + 1] / (2 * PERIOD) - mean * mean)};
  }

  /** Returns the current of {@code count} rectifiers in series behind a winding, by bisection. */
  private static double amps(TwoPoleLaw law, int count, double volts) {
    if (volts <= 0) {
      return 0;
    }
    TwoPoleCurrent current = new TwoPoleCurrent();
    double low = 0;
    double high = volts / count;
    for (int k = 0; k < 50; k++) {
      double drop = (low + high) / 2;
      law.evaluate(drop, current);
      if (count * drop + OHMS * current.amps > volts) {
        high = drop;
      } else {
        low = drop;
      }
    }
    law.evaluate((low + high) / 2, current);
    return current.amps;
  }

  /** Returns the volts behind both diodes at which they carry {@code wanted} together. */
  private static double rectified(double emf, double wanted) {
    double low = -100;
    double high = Math.abs(emf);
    for (int k = 0; k < 50; k++) {
      double volts = (low + high) / 2;
      if (amps(SILICON, 1, emf - volts) + amps(SILICON, 1, -emf - volts) > wanted) {
        low = volts;
      } else {
        high = volts;
      }
    }
    return (low + high) / 2;
  }
}
