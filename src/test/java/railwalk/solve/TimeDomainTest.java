package railwalk.solve;

import static org.assertj.core.api.Assertions.assertThat;

import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.ODEStateAndDerivative;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.device.Catalogue;
import railwalk.device.Electrode;
import railwalk.device.TubeType;
import railwalk.device.TwoPoleCurrent;
import railwalk.device.TwoPoleLaw;
import railwalk.walk.Walk;

/**
 * A full-wave supply with a tube rectifier, capacitor input, dropper and second capacitor, against
 * a time-domain integration of the same circuit by Hipparchus (Dormand–Prince 8(5,3), a
 * general-purpose ordinary differential equation solver) over enough periods to forget the start.
 */
class TimeDomainTest {
  private static final double RMS_VOLTS = 325;
  private static final double SERIES_OHMS = 95;
  private static final double FIRST_FARADS = 20e-6;
  private static final double DROPPER_OHMS = 1000;
  private static final double SECOND_FARADS = 20e-6;
  private static final double FIRST_LOAD_OHMS = 8000;
  private static final double SECOND_LOAD_OHMS = 15_000;
  private static final double HERTZ = 60;

  @Test
  void agreesWithAGeneralIntegrator() {
    for (String name : new String[] {"5Y3GT", "GZ34", "EZ81"}) {
      TubeType type = Catalogue.standard().find(name).orElseThrow();
      double[] expected = integrate((TwoPoleLaw) type.sections().get(0).law());
      Circuit circuit =
          new CircuitBuilder()
              .winding("VHT", new double[] {RMS_VOLTS, RMS_VOLTS}, SERIES_OHMS, "h1", "0", "h2")
              .rectifier(type, "V1", "h1", "h2", "b1")
              .c("C1", "b1", "0", FIRST_FARADS)
              .r("R1", "b1", "b2", DROPPER_OHMS)
              .c("C2", "b2", "0", SECOND_FARADS)
              .r("R2", "b1", "0", FIRST_LOAD_OHMS)
              .r("R3", "b2", "0", SECOND_LOAD_OHMS)
              .line(120, HERTZ)
              .build();
      OperatingPoint point =
          ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, Walk.of(circuit))).point();
      double first = point.volts(circuit.node("b1").orElseThrow());
      double second = point.volts(circuit.node("b2").orElseThrow());
      double ripple = point.rippleVoltsRms(circuit.node("b1").orElseThrow()).orElseThrow();
      System.out.printf(
          "%s: b1 %.3f V against %.3f V (%+.3f %%), b2 %.3f V against %.3f V, ripple %.3f V"
              + " against %.3f V%n",
          name,
          first,
          expected[0],
          100 * (first / expected[0] - 1),
          second,
          expected[1],
          ripple,
          expected[2]);
      assertThat(type.pinsOf("", Electrode.PLATE1)).isNotEmpty();
      assertThat(Math.abs(first / expected[0] - 1)).isLessThan(0.0005);
      assertThat(Math.abs(second / expected[1] - 1)).isLessThan(0.0005);
      assertThat(Math.abs(ripple / expected[2] - 1)).isLessThan(0.01);
    }
  }

  /** Returns mean volts of both capacitors and the rms ripple of the first, periodic. */
  private static double[] integrate(TwoPoleLaw law) {
    DormandPrince853Integrator integrator = new DormandPrince853Integrator(1e-9, 2e-5, 1e-9, 1e-9);
    OrdinaryDifferentialEquation supply =
        new OrdinaryDifferentialEquation() {
          @Override
          public int getDimension() {
            return 5;
          }

          @Override
          public double[] computeDerivatives(double t, double[] y) {
            double emf = Math.sqrt(2) * RMS_VOLTS * Math.sin(2 * Math.PI * HERTZ * t);
            double charge = pathAmps(law, emf - y[0]) + pathAmps(law, -emf - y[0]);
            double through = (y[0] - y[1]) / DROPPER_OHMS;
            return new double[] {
              (charge - through - y[0] / FIRST_LOAD_OHMS) / FIRST_FARADS,
              (through - y[1] / SECOND_LOAD_OHMS) / SECOND_FARADS,
              y[0],
              y[1],
              y[0] * y[0]
            };
          }
        };
    double period = 1 / HERTZ;
    ODEStateAndDerivative settled =
        integrator.integrate(
            supply, new ODEState(0, new double[] {380, 355, 0, 0, 0}), 40 * period);
    double[] y = settled.getPrimaryState();
    double[] end =
        integrator
            .integrate(supply, new ODEState(0, new double[] {y[0], y[1], 0, 0, 0}), 2 * period)
            .getPrimaryState();
    double mean = end[2] / (2 * period);
    return new double[] {
      mean, end[3] / (2 * period), Math.sqrt(end[4] / (2 * period) - mean * mean)
    };
  }

  /**
   * Returns the current of one plate behind its winding half: v = Rs · i + drop(i), by bisection.
   */
  private static double pathAmps(TwoPoleLaw law, double volts) {
    if (volts <= 0) {
      return 0;
    }
    TwoPoleCurrent current = new TwoPoleCurrent();
    double low = 0;
    double high = volts;
    for (int k = 0; k < 60; k++) {
      double drop = (low + high) / 2;
      law.evaluate(drop, current);
      if (drop + SERIES_OHMS * current.amps > volts) {
        high = drop;
      } else {
        low = drop;
      }
    }
    law.evaluate((low + high) / 2, current);
    return current.amps;
  }
}
