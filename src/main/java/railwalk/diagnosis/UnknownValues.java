package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.Circuit;
import railwalk.readings.MeasuredAt;
import railwalk.readings.ReadingKind;
import railwalk.readings.ReadingSheet;

/**
 * Resistances that a netlist leaves open, solved from readings: the logarithms are looked for over
 * the decades, one at a time, then by damped least squares (Gauss–Newton, Levenberg's damping) with
 * the residuals weighted by the inverse covariance of part spreads and meter. A value's deviation
 * is that of the normal equations.
 */
public final class UnknownValues {
  private static final double DECADE = Math.log(10);

  /** Decades looked at on either side of the middle, in halves. */
  private static final int HALF_DECADES = 7;

  private static final int PASSES = 2;
  private static final int MOST_STEPS = 25;
  private static final int MOST_DAMPINGS = 6;
  private static final double FIRST_DAMPING = 1e-3;
  private static final double LONGEST_STEP = 1.5;
  private static final double SETTLED_STEP = 5e-4;

  /** A reading with less than this share of what is told of a value is not named. */
  private static final double WORTH_NAMING = 0.1;

  private static final int MOST_NAMED = 3;

  private final List<OpenValue> open;
  private final List<FoundValue> found;

  private UnknownValues(List<OpenValue> open, List<FoundValue> found) {
    this.open = open;
    this.found = List.copyOf(found);
  }

  /**
   * Solves the open values of an amplifier.
   *
   * @param bench at the line and with the meter of the bench; NaN where a value is open
   * @param elements names of the parts whose value is open, once for each value
   * @throws NoOperatingPoint when the amplifier settles with none of the values tried
   * @throws IllegalArgumentException when a part is not there
   */
  public static UnknownValues of(Circuit bench, ReadingSheet sheet, List<String> elements)
      throws NoOperatingPoint {
    List<OpenValue> open = OpenValue.of(bench, elements);
    List<Probe> probes = new ArrayList<>();
    double[] read = new double[sheet.readings().size()];
    for (int i = 0; i < read.length; i++) {
      read[i] = Judge.figure(sheet.readings().get(i));
      probes.add(Probe.of(sheet.readings().get(i)).onRange(bench.meter(), read[i], read[i]));
    }
    return new UnknownValues(open, new Search(bench, open, probes, read).found());
  }

  /** Returns the values in the order asked for. */
  public List<FoundValue> values() {
    return found;
  }

  /** Returns {@code circuit} with the values found, guesses where they are not determined. */
  public Circuit applyTo(Circuit circuit) {
    Circuit known = circuit;
    for (int u = 0; u < found.size(); u++) {
      known = open.get(u).put(known, found.get(u).ohms());
    }
    return known;
  }

  private record Search(Circuit bench, List<OpenValue> open, List<Probe> probes, double[] read) {
    List<FoundValue> found() throws NoOperatingPoint {
      ValueFit fit = best();
      double[][] slopes = fit.slopes().orElseGet(() -> new double[open.size()][read.length]);
      Covariance posterior = fit.posterior(slopes, 0);
      List<FoundValue> values = new ArrayList<>();
      for (int u = 0; u < open.size(); u++) {
        OpenValue value = open.get(u);
        double deviation = Math.sqrt(posterior.precision(u, u));
        boolean enough = FoundValue.determined(deviation);
        values.add(
            new FoundValue(
                value.element().name(),
                value.section(),
                value.resistor(),
                Math.exp(fit.logs()[u]),
                deviation,
                enough ? named(fit.told(slopes[u])) : List.of(),
                enough ? Optional.empty() : Optional.of(missing(u, fit, posterior))));
      }
      return values;
    }

    private ValueFit best() throws NoOperatingPoint {
      List<ValueFit> starts = new ArrayList<>();
      int[] shifts = open.size() == 1 ? new int[] {0} : new int[] {0, -3, 3};
      for (int shift : shifts) {
        double[] logs = new double[open.size()];
        for (int u = 0; u < logs.length; u++) {
          logs[u] = Math.log(open.get(u).middleOhms()) + shift * DECADE / 2;
        }
        scanned(logs).ifPresent(starts::add);
      }
      Optional<ValueFit> best = Optional.empty();
      for (ValueFit start : starts) {
        ValueFit fit = refined(start);
        if (best.isEmpty() || fit.cost() < best.get().cost()) {
          best = Optional.of(fit);
        }
      }
      if (best.isPresent()) {
        return best.get();
      }
      double[] middle = open.stream().mapToDouble(v -> Math.log(v.middleOhms())).toArray();
      new Amplifier(ValueFit.circuit(bench, open, middle), Predictor.states(probes));
      throw new NoOperatingPoint("", open.get(0).a().name(), "no value tried lets it settle");
    }

    /** Returns the best over the decades, one value at a time. */
    private Optional<ValueFit> scanned(double[] start) {
      Optional<ValueFit> best = ValueFit.of(bench, open, start, probes, read);
      int passes = open.size() == 1 ? 1 : PASSES;
      for (int pass = 0; pass < passes; pass++) {
        for (int u = 0; u < start.length; u++) {
          double middle = Math.log(open.get(u).middleOhms());
          double[] from = best.isPresent() ? best.get().logs() : start;
          for (int half = -HALF_DECADES; half <= HALF_DECADES; half++) {
            double[] logs = from.clone();
            logs[u] = middle + half * DECADE / 2;
            Optional<ValueFit> fit = ValueFit.of(bench, open, logs, probes, read);
            if (fit.isPresent() && (best.isEmpty() || fit.get().cost() < best.get().cost())) {
              best = fit;
            }
          }
        }
      }
      return best;
    }

    private ValueFit refined(ValueFit start) {
      ValueFit fit = start;
      double damping = FIRST_DAMPING;
      for (int step = 0; step < MOST_STEPS; step++) {
        Optional<double[][]> slopes = fit.slopes();
        if (slopes.isEmpty()) {
          return fit;
        }
        ValueFit before = fit;
        double moved = 0;
        for (int attempt = 0; attempt < MOST_DAMPINGS && moved == 0; attempt++) {
          double[] change = before.step(slopes.get(), damping);
          double[] logs = before.logs();
          double longest = 0;
          for (int u = 0; u < logs.length; u++) {
            double bounded = Math.max(-LONGEST_STEP, Math.min(LONGEST_STEP, change[u]));
            logs[u] += bounded;
            longest = Math.max(longest, Math.abs(bounded));
          }
          if (longest < SETTLED_STEP) {
            return fit;
          }
          Optional<ValueFit> next = ValueFit.of(bench, open, logs, probes, read);
          if (next.isPresent() && next.get().cost() < before.cost()) {
            fit = next.get();
            moved = longest;
            damping /= 10;
          } else {
            damping *= 10;
          }
        }
        if (moved == 0) {
          return fit;
        }
      }
      return fit;
    }

    private List<String> named(double[] told) {
      List<Integer> order = new ArrayList<>();
      for (int i = 0; i < told.length; i++) {
        if (told[i] >= WORTH_NAMING) {
          order.add(i);
        }
      }
      order.sort(Comparator.comparingDouble((Integer i) -> told[i]).reversed());
      Set<String> names = new LinkedHashSet<>();
      for (int i : order.subList(0, Math.min(MOST_NAMED, order.size()))) {
        names.add(probes.get(i).name());
      }
      return List.copyOf(names);
    }

    /** Returns the unread point, or the part itself in ohms, that would narrow a value most. */
    private Probe missing(int u, ValueFit fit, Covariance posterior) throws NoOperatingPoint {
      OpenValue value = open.get(u);
      Probe cold =
          new Probe(
              value.element().name(),
              new MeasuredAt.Across(value.element(), value.a(), value.b()),
              ReadingKind.OHMS,
              "",
              Double.NaN);
      Circuit known = ValueFit.circuit(bench, open, fit.logs());
      Amplifier amplifier = new Amplifier(known, Set.of("", Amplifier.COLD));
      List<Probe> places = new ArrayList<>();
      for (Probe point : BenchPoints.of(amplifier.healthy(""))) {
        if (!isRead(point)) {
          places.add(point);
        }
      }
      places.add(cold);
      Predictor predictor = new Predictor(amplifier, places);
      Prediction prediction = predictor.predict(amplifier.healthy());
      double[] own = predictor.ownVariances(prediction.values(), prediction.ownSpread());
      Optional<double[][]> slopes = ValueFit.slopes(amplifier, predictor, open, fit.logs());
      if (slopes.isEmpty()) {
        return cold;
      }
      Probe best = cold;
      double greatest = 0;
      for (int p = 0; p < places.size(); p++) {
        double[] slope = new double[open.size()];
        for (int v = 0; v < slope.length; v++) {
          slope[v] = slopes.get()[v][p];
        }
        double[] carried = posterior.weighted(slope);
        double variance = own[p] + prediction.sharedVariance(p) + ValueFit.dot(slope, carried);
        double gain = carried[u] * carried[u] / variance;
        if (gain > greatest) {
          greatest = gain;
          best = places.get(p);
        }
      }
      return best;
    }

    private boolean isRead(Probe point) {
      for (Probe probe : probes) {
        if (probe.kind() == ReadingKind.DC
            && probe.state().isEmpty()
            && probe.at().equals(point.at())) {
          return true;
        }
      }
      return false;
    }
  }
}
