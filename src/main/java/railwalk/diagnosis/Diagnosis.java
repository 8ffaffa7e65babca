package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.device.TubeType;
import railwalk.readings.MeasuredAt;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;
import railwalk.readings.ReadingSheet;
import railwalk.solve.OperatingPoint;
import railwalk.spread.SampledBands;

/**
 * What a sheet of readings says about an amplifier: each reading judged, the explanations by
 * probability, and what to read next.
 *
 * @param charted the amplifier at the conditions of its netlist
 * @param benched the amplifier at the line and with the meter of the bench
 * @param starving whether the line is too low for verdicts other than opens and shorts
 * @param suspects likeliest first, a healthy amplifier and another one among them
 * @param nextProbe empty when no reading tells the suspects apart
 * @param tried how many faults were tried
 * @param silent faults that these readings could not show, were they there
 */
public record Diagnosis(
    OperatingPoint charted,
    OperatingPoint benched,
    boolean starving,
    List<JudgedReading> readings,
    List<Suspect> suspects,
    Optional<NextProbe> nextProbe,
    int tried,
    List<Fault> silent) {
  /** How many suspects are told; the others hardly weigh. */
  private static final int MOST_SUSPECTS = 12;

  private static final double LEAST_PROBABILITY = 0.002;

  /** A fault that explains no more than this beyond a healthy amplifier does not show. */
  private static final double SILENT_GAIN = 0.7;

  private static final double EVIDENT = 2;

  /** Tubes that may be pulled for the next reading. */
  private static final int MOST_PULLED = 4;

  public Diagnosis {
    readings = List.copyOf(readings);
    suspects = List.copyOf(suspects);
    silent = List.copyOf(silent);
  }

  /** Returns whether a healthy amplifier explains the readings best. */
  public boolean healthy() {
    return suspects.get(0).kind() == Suspect.Kind.HEALTHY;
  }

  /**
   * Diagnoses an amplifier.
   *
   * @param chart the amplifier as its netlist stands
   * @param bench the same at the line and with the meter of the bench
   * @param types tube types that might have been fitted by mistake
   * @throws NoOperatingPoint when the healthy amplifier does not settle
   */
  public static Diagnosis of(Circuit chart, Circuit bench, ReadingSheet sheet, List<TubeType> types)
      throws NoOperatingPoint {
    return of(chart, bench, sheet, types, SampledBands.BUILDS);
  }

  /** Diagnoses an amplifier, its limits read off {@code builds}; 0 for limits of first order. */
  static Diagnosis of(
      Circuit chart, Circuit bench, ReadingSheet sheet, List<TubeType> types, int builds)
      throws NoOperatingPoint {
    return new Builder(chart, bench, sheet).build(types, builds);
  }

  private static final class Builder {
    private final ReadingSheet sheet;
    private final Amplifier benched;
    private final Amplifier charted;
    private final List<Probe> probes = new ArrayList<>();

    Builder(Circuit chart, Circuit bench, ReadingSheet sheet) throws NoOperatingPoint {
      this.sheet = sheet;
      List<Probe> places = sheet.readings().stream().map(Probe::of).toList();
      Set<String> states = Predictor.states(places);
      benched = new Amplifier(bench, states);
      double[] expected = new Predictor(benched, places).unloaded(benched.healthy());
      for (int i = 0; i < expected.length; i++) {
        double value = sheet.readings().get(i).value();
        probes.add(places.get(i).onRange(bench.meter(), expected[i], value));
      }
      charted = chart.equals(bench) ? benched : new Amplifier(chart, states);
    }

    Diagnosis build(List<TubeType> types, int builds) throws NoOperatingPoint {
      Judge judge =
          new Judge(
              new Predictor(charted, probes),
              charted,
              new Predictor(benched, probes),
              benched,
              builds);
      List<JudgedReading> judged = judge.judge(sheet.readings());
      List<Integer> counted = new ArrayList<>();
      List<Probe> countedProbes = new ArrayList<>();
      for (int i = 0; i < judged.size(); i++) {
        Verdict verdict = judged.get(i).verdict();
        if (verdict != Verdict.QUESTIONED && !Double.isNaN(judged.get(i).meter())) {
          counted.add(i);
          countedProbes.add(probes.get(i));
        }
      }
      double[] figures = new double[counted.size()];
      for (int i = 0; i < figures.length; i++) {
        figures[i] = Judge.figure(sheet.readings().get(counted.get(i)));
      }
      OperatingPoint healthy = benched.healthy("");
      List<Fault> faults = Faults.of(benched.circuit(), healthy.map(), types);
      Ranking ranking = new Ranking(benched, new Predictor(benched, countedProbes), figures);
      List<Explanation> ranked = ranking.rank(faults, Frequency.standard());
      return told(judged, counted, countedProbes, figures, ranking, ranked, faults.size());
    }

    private Diagnosis told(
        List<JudgedReading> judged,
        List<Integer> counted,
        List<Probe> countedProbes,
        double[] figures,
        Ranking ranking,
        List<Explanation> ranked,
        int tried)
        throws NoOperatingPoint {
      List<Explanation> shown = new ArrayList<>();
      List<Fault> silent = new ArrayList<>();
      Map<Explanation, Double> probabilities = probabilities(ranked, shown, silent);
      List<Suspect> suspects = new ArrayList<>();
      List<Probe> points = BenchPoints.of(benched.healthy(""));
      Groups groups = new Groups(benched.asItStands(), points);
      Map<Explanation, Integer> groupOf = new LinkedHashMap<>();
      for (Explanation explanation : shown) {
        double probability = probabilities.getOrDefault(explanation, 0.0);
        boolean named = explanation.kind() != Suspect.Kind.FAULT;
        boolean weighs = suspects.size() < MOST_SUSPECTS && probability > LEAST_PROBABILITY;
        if (weighs || named || suspects.isEmpty()) {
          int group = groups.of(explanation);
          groupOf.put(explanation, group);
          suspects.add(suspect(explanation, probability, group, ranking, ranked, counted, figures));
        }
      }
      Optional<NextProbe> next = next(countedProbes, figures, points, groupOf, probabilities);
      return new Diagnosis(
          charted.healthy(""),
          benched.healthy(""),
          Judge.starves(benched),
          judged,
          suspects,
          next,
          tried,
          silent);
    }

    /**
     * Returns the probabilities of what is left once faults that the readings do not show are put
     * with the healthy amplifier, which looks the same.
     */
    private static Map<Explanation, Double> probabilities(
        List<Explanation> ranked, List<Explanation> shown, List<Fault> silent) {
      double healthyFit = Double.NEGATIVE_INFINITY;
      double[] logs = new double[ranked.size()];
      for (int i = 0; i < logs.length; i++) {
        logs[i] = ranked.get(i).logPosterior();
        if (ranked.get(i).kind() == Suspect.Kind.HEALTHY) {
          healthyFit = ranked.get(i).fit().logDensity();
        }
      }
      double sum = Ranking.logSum(logs);
      double folded = 0;
      Map<Explanation, Double> probabilities = new LinkedHashMap<>();
      for (Explanation e : ranked) {
        double probability = Math.exp(e.logPosterior() - sum);
        boolean silentFault =
            e.kind() == Suspect.Kind.FAULT && e.fit().logDensity() < healthyFit + SILENT_GAIN;
        if (silentFault) {
          folded += probability;
          if (e.fit().logDensity() > healthyFit - SILENT_GAIN) {
            silent.addAll(e.faults());
          }
        } else {
          shown.add(e);
          probabilities.put(e, probability);
        }
      }
      for (Explanation e : shown) {
        if (e.kind() == Suspect.Kind.HEALTHY) {
          probabilities.merge(e, folded, Double::sum);
        }
      }
      shown.sort(
          Comparator.comparingDouble((Explanation e) -> probabilities.getOrDefault(e, 0.0))
              .reversed());
      return probabilities;
    }

    private static Suspect suspect(
        Explanation e,
        double probability,
        int group,
        Ranking ranking,
        List<Explanation> ranked,
        List<Integer> counted,
        double[] figures) {
      List<Evidence> supporting = new ArrayList<>();
      List<Evidence> against = new ArrayList<>();
      Prediction healthy = ranking.healthy();
      Explanation fine =
          ranked.stream().filter(x -> x.kind() == Suspect.Kind.HEALTHY).findFirst().orElse(e);
      double[] ofHealthy = ranking.deviations(fine);
      double[] ofThis = ranking.deviations(e);
      for (int i = 0; i < figures.length; i++) {
        double shows = e.prediction().values()[i];
        double fromHealthy = (figures[i] - healthy.values()[i]) / ofHealthy[i];
        double fromThis = (figures[i] - shows) / ofThis[i];
        boolean explained =
            Math.abs(fromHealthy) > EVIDENT && Math.abs(fromThis) < Math.abs(fromHealthy) / 2;
        Evidence evidence =
            new Evidence(
                counted.get(i), healthy.values()[i], shows, explained ? fromHealthy : fromThis);
        if (e.kind() == Suspect.Kind.FAULT && explained) {
          supporting.add(evidence);
        } else if (e.kind() != Suspect.Kind.NOT_THIS_AMPLIFIER
            && Math.abs(fromThis) > EVIDENT + 0.5) {
          against.add(evidence);
        }
      }
      supporting.sort((a, b) -> Double.compare(Math.abs(b.deviations()), Math.abs(a.deviations())));
      against.sort((a, b) -> Double.compare(Math.abs(b.deviations()), Math.abs(a.deviations())));
      List<Double> estimates = new ArrayList<>();
      List<Double> lows = new ArrayList<>();
      List<Double> highs = new ArrayList<>();
      for (int f = 0; f < e.faults().size(); f++) {
        boolean open = e.faults().get(f).range().open();
        estimates.add(open ? e.severities().get(f) : Double.NaN);
        lows.add(open ? e.lows().get(f) : Double.NaN);
        highs.add(open ? e.highs().get(f) : Double.NaN);
      }
      return new Suspect(
          e.kind(), e.faults(), estimates, lows, highs, probability, group, supporting, against);
    }

    private Optional<NextProbe> next(
        List<Probe> read,
        double[] figures,
        List<Probe> points,
        Map<Explanation, Integer> groupOf,
        Map<Explanation, Double> probabilities)
        throws NoOperatingPoint {
      List<Probe> places = places(read, points, groupOf.keySet());
      List<Probe> all = new ArrayList<>(read);
      all.addAll(places);
      Amplifier amplifier = benched.also(Predictor.states(all));
      ProbeSearch search = new ProbeSearch(amplifier, read, figures, places);
      List<ProbeSearch.Outlook> outlooks = new ArrayList<>();
      groupOf.forEach(
          (explanation, group) -> {
            if (explanation.kind() != Suspect.Kind.NOT_THIS_AMPLIFIER) {
              search
                  .outlook(explanation, group, probabilities.getOrDefault(explanation, 0.0))
                  .ifPresent(outlooks::add);
            }
          });
      return search.best(outlooks);
    }

    /**
     * Returns the places that were not read: pins and supply nodes, suspects with the power off.
     */
    private List<Probe> places(
        List<Probe> read, List<Probe> points, Set<Explanation> explanations) {
      Set<MeasuredAt> taken = new LinkedHashSet<>();
      for (Probe probe : read) {
        if (probe.kind() == ReadingKind.DC && probe.state().isEmpty()) {
          taken.add(probe.at());
        }
      }
      List<Probe> places = new ArrayList<>();
      for (Probe point : points) {
        if (!taken.contains(point.at())) {
          places.add(point);
        }
      }
      Set<String> names = new LinkedHashSet<>();
      Set<String> pulled = new LinkedHashSet<>();
      for (Explanation explanation : explanations) {
        for (Fault fault : explanation.faults()) {
          Optional<Element> element = benched.circuit().element(fault.element());
          if (element.isPresent() && names.add(fault.element())) {
            cold(element.get(), places);
            pulled.addAll(bottlesAt(element.get()));
          }
        }
      }
      pulled.stream().limit(MOST_PULLED).forEach(bottle -> withPulled(bottle, places));
      return places;
    }

    /** Returns the amplifying tube that a part is a piece of, or whose grid it hangs on. */
    private Set<String> bottlesAt(Element element) {
      Set<String> bottles = new LinkedHashSet<>();
      for (AmplifierSection section : benched.circuit().elements(AmplifierSection.class)) {
        boolean own = section.name().equals(element.name());
        boolean atGrid =
            element.bottle().isEmpty()
                && !section.grid().equals(benched.circuit().reference())
                && element.nodes().contains(section.grid());
        if (own || atGrid) {
          bottles.add(section.bottle());
        }
      }
      return bottles;
    }

    /** Adds the grids of a tube with the tube out of its socket: what stays comes from outside. */
    private void withPulled(String bottle, List<Probe> places) {
      for (AmplifierSection section : benched.circuit().elements(AmplifierSection.class)) {
        Node grid = section.grid();
        if (section.bottle().equals(bottle) && !grid.equals(benched.circuit().reference())) {
          places.add(
              new Probe(
                  section.name() + ".grid",
                  new MeasuredAt.AtNode(grid),
                  ReadingKind.DC,
                  Reading.pulled(bottle),
                  Double.NaN));
        }
      }
    }

    private static void cold(Element element, List<Probe> places) {
      if (element.bottle().isEmpty() && element.nodes().size() == 2) {
        MeasuredAt at =
            new MeasuredAt.Across(element, element.nodes().get(0), element.nodes().get(1));
        places.add(new Probe(element.name(), at, ReadingKind.OHMS, "", Double.NaN));
      }
    }
  }
}
