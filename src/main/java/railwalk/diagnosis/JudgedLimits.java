package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Resistor;
import railwalk.readings.MeasuredAt;
import railwalk.solve.OperatingPoint;
import railwalk.spread.SampledBands;
import railwalk.spread.Samples;

/**
 * The limits between which 99 healthy amplifiers in 100 read at some places, as the meter shows
 * them. DC volts, drops, and the currents of tubes and resistors are read off builds that are
 * solved one by one, the meter's loading of each counted in; what no part spread explains (ripple,
 * alternating volts, ohms) keeps its own spread.
 */
final class JudgedLimits {
  /** Standard deviations that leave half a per cent of a normal spread on either side. */
  static final double DEVIATIONS = 2.576;

  /** Share of the builds left out on either side. */
  private static final double TAIL = 0.005;

  private final double[] lows;
  private final double[] highs;

  private JudgedLimits(double[] lows, double[] highs) {
    this.lows = lows;
    this.highs = highs;
  }

  /**
   * Returns the limits of first order about the middle of {@code bench}, the nominal amplifier
   * always within.
   */
  static JudgedLimits ofFirstOrder(Prediction bench) {
    double[] lows = new double[bench.values().length];
    double[] highs = new double[lows.length];
    for (int i = 0; i < lows.length; i++) {
      double variance = bench.ownSpread()[i] * bench.ownSpread()[i] + bench.sharedVariance(i);
      double half = DEVIATIONS * Math.sqrt(variance);
      double middle = bench.values()[i];
      lows[i] = Math.min(middle - bench.shifts()[i], middle - half);
      highs[i] = Math.max(middle - bench.shifts()[i], middle + half);
    }
    return new JudgedLimits(lows, highs);
  }

  /** Returns the limits by {@code builds} builds, the nominal amplifier always within. */
  static JudgedLimits sampled(
      Predictor predictor, Prediction bench, Map<String, OperatingPoint> points, int builds) {
    JudgedLimits limits = ofFirstOrder(bench);
    Map<String, List<Integer>> byState = new LinkedHashMap<>();
    for (int i = 0; i < limits.lows.length; i++) {
      Probe probe = predictor.probes().get(i);
      if (isSampled(probe) && !Double.isNaN(bench.values()[i])) {
        byState.computeIfAbsent(Predictor.stateOf(probe), s -> new ArrayList<>()).add(i);
      }
    }
    byState.forEach(
        (state, places) -> {
          OperatingPoint point = points.get(state);
          if (point == null) {
            throw new IllegalStateException("not solved in state " + state);
          }
          Samples samples =
              Samples.of(
                  point, builds, SampledBands.SEED, build -> predictor.values(places, build));
          for (int k = 0; k < places.size(); k++) {
            int i = places.get(k);
            double nominal = bench.values()[i] - bench.shifts()[i];
            limits.take(i, nominal, samples.quantile(k, TAIL), samples.quantile(k, 1 - TAIL));
          }
        });
    return limits;
  }

  private void take(int place, double nominal, double low, double high) {
    if (!Double.isNaN(low) && !Double.isNaN(high)) {
      lows[place] = Math.min(nominal, low);
      highs[place] = Math.max(nominal, high);
    }
  }

  private static boolean isSampled(Probe probe) {
    return switch (probe.kind()) {
      case DC -> true;
      case MA ->
          probe.at() instanceof MeasuredAt.Through through
              && (through.element() instanceof AmplifierSection
                  || through.element() instanceof Resistor);
      case AC, RIPPLE, OHMS -> false;
    };
  }

  double low(int place) {
    return lows[place];
  }

  double high(int place) {
    return highs[place];
  }
}
