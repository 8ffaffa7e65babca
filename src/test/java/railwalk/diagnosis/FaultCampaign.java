package railwalk.diagnosis;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.function.UnaryOperator;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.device.AmplifierLaw;
import railwalk.device.Catalogue;
import railwalk.device.PentodeLaw;
import railwalk.device.TriodeLaw;
import railwalk.device.TubeType;
import railwalk.netlist.NetlistReader;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;
import railwalk.readings.ReadingSheet;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.spread.RandomBuild;
import railwalk.walk.Walk;

/**
 * Puts faults into amplifiers whose parts are drawn at random, reads them with a meter that is a
 * little wrong, and has them diagnosed after the nominal netlist. The diagnosis never sees the
 * drawn amplifier.
 */
final class FaultCampaign {
  private static final double METER_SHARE = 0.01;

  private final double muError;
  private final Circuit nominal;
  private final Amplifier healthy;
  private final List<TubeType> types;
  final List<Fault> faults;
  final List<Probe> points;
  private final Prediction expected;
  private final double[] limits;

  /** What became of one case. */
  record Outcome(Fault fault, double severity, int place, int groupSize, Diagnosis diagnosis) {}

  /**
   * @param muError share by which the mu of the tubes on the bench differs from the netlist's law,
   *     up or down; 0 for tubes that follow the law
   */
  FaultCampaign(Path netlist, double muError) throws IOException, NoOperatingPoint {
    this.muError = muError;
    nominal = NetlistReader.read(netlist, Catalogue.standard()).circuit().orElseThrow();
    types = Catalogue.standard().types();
    healthy = new Amplifier(nominal, Set.of());
    OperatingPoint point = healthy.healthy("");
    faults = Faults.of(nominal, point.map(), types);
    points = BenchPoints.of(point);
    Predictor predictor = new Predictor(healthy, points);
    expected = predictor.predict(healthy.healthy());
    limits = predictor.meterLimits(expected.values());
  }

  /** Returns whether the fault moves some readable point out of its band, on the nominal amp. */
  boolean shows(Fault fault, double severity) {
    Optional<Map<String, OperatingPoint>> points = healthy.with(fault, severity);
    if (points.isEmpty()) {
      return false;
    }
    double[] values = new Predictor(healthy, this.points).values(points.get());
    for (int i = 0; i < values.length; i++) {
      double variance = 0;
      for (double volts : expected.rows()[i]) {
        variance += volts * volts;
      }
      double half = JudgedLimits.DEVIATIONS * Math.sqrt(variance) + limits[i];
      if (Math.abs(values[i] - expected.values()[i]) > half) {
        return true;
      }
    }
    return false;
  }

  static double severity(Fault fault, Random random) {
    Range range = fault.range();
    return range.open()
        ? range.low() * Math.pow(range.high() / range.low(), random.nextDouble())
        : range.low();
  }

  /** Returns a random build with {@code fault} in it. */
  Patient patient(Fault fault, double severity, Random random) {
    return patient(List.of(fault), List.of(severity), random);
  }

  /** Returns a random build with several faults in it. */
  Patient patient(List<Fault> several, List<Double> severities, Random random) {
    return new Patient(
        built(random),
        circuit -> {
          Circuit faulted = circuit;
          for (int f = 0; f < several.size(); f++) {
            faulted = several.get(f).applyTo(faulted, severities.get(f));
          }
          return faulted;
        },
        random);
  }

  /** Returns the amplifier as its netlist has it. */
  Circuit nominalCircuit() {
    return nominal;
  }

  /** Returns a random build with nothing wrong. */
  Patient healthy(Random random) {
    return new Patient(built(random), c -> c, random);
  }

  private Circuit built(Random random) {
    Circuit built = RandomBuild.of(nominal, () -> 1e-9 + random.nextDouble() * (1 - 2e-9));
    return muError == 0 ? built : withOtherLaws(built, random);
  }

  /** Returns {@code built} with each tube's mu off by {@link #muError}, up or down. */
  private Circuit withOtherLaws(Circuit built, Random random) {
    Map<String, Double> factors = new HashMap<>();
    for (Bottle bottle : built.bottles()) {
      factors.put(bottle.name(), 1 + (random.nextBoolean() ? muError : -muError));
    }
    List<Element> elements = new ArrayList<>();
    for (Element element : built.elements()) {
      elements.add(
          element instanceof AmplifierSection s
              ? withMu(s, factors.getOrDefault(s.bottle(), 1.0))
              : element);
    }
    return built.withElements(elements);
  }

  private static AmplifierSection withMu(AmplifierSection s, double factor) {
    AmplifierLaw law = s.law();
    if (law instanceof TriodeLaw t) {
      law =
          new TriodeLaw(
              factor * t.mu(), t.exponent(), t.kg(), t.kp(), t.kvb(), t.contactVolts(), t.grid());
    } else if (law instanceof PentodeLaw p) {
      law =
          new PentodeLaw(
              factor * p.mu(),
              p.exponent(),
              p.kg(),
              p.kp(),
              p.kvb(),
              p.contactVolts(),
              p.lambda(),
              p.knee(),
              p.screenShare(),
              p.screenRise(),
              p.grid());
    }
    return s.withLaw(law);
  }

  /** An amplifier on the bench, to be read with a meter that is a little wrong. */
  final class Patient {
    private final Circuit built;
    private final UnaryOperator<Circuit> fault;
    private final Random random;
    private final Map<String, Optional<OperatingPoint>> solved = new HashMap<>();

    private Patient(Circuit built, UnaryOperator<Circuit> fault, Random random) {
      this.built = built;
      this.fault = fault;
      this.random = random;
    }

    private Optional<OperatingPoint> solved(String state) {
      return solved.computeIfAbsent(
          state,
          s -> {
            Circuit faulted = fault.apply(Amplifier.inState(built, s));
            return OperatingPointSolver.solve(faulted, Walk.of(faulted))
                    instanceof SolveOutcome.Solved point
                ? Optional.of(point.point())
                : Optional.empty();
          });
    }

    /** Returns whether it has an operating point at all. */
    boolean settles() {
      return solved("").isPresent();
    }

    /** Returns what the meter shows; empty where the amplifier does not settle in that state. */
    Optional<Reading> read(Probe probe) throws NoOperatingPoint {
      String state = Predictor.stateOf(probe);
      Optional<OperatingPoint> point = solved(state);
      if (point.isEmpty()) {
        return Optional.empty();
      }
      Amplifier seen = new Amplifier(nominal, Set.of(state));
      Predictor open = new Predictor(seen, List.of(probe));
      double charted = open.unloaded(seen.healthy())[0];
      double found = open.unloaded(Map.of(state, point.get()))[0];
      Probe onRange = probe.onRange(nominal.meter(), charted, charted < found ? 0 : found);
      double exact = new Predictor(seen, List.of(onRange)).values(Map.of(state, point.get()))[0];
      double shown = exact * (1 + METER_SHARE * (2 * random.nextDouble() - 1));
      if (probe.kind() != ReadingKind.OHMS) {
        double limit = MeterError.limitVolts(nominal.meter(), exact, onRange.rangeVolts());
        double digit = Math.max(1e-6, limit - METER_SHARE * Math.abs(exact));
        shown = digit * Math.rint(shown / digit);
      }
      return Optional.of(
          new Reading(
              probe.name(), probe.at(), probe.kind(), shown, probe.state(), Double.NaN, "", null));
    }

    /** Returns readings at all of {@code probes}. */
    List<Reading> read(List<Probe> probes) throws NoOperatingPoint {
      List<Reading> readings = new ArrayList<>();
      for (Probe probe : probes) {
        read(probe).ifPresent(readings::add);
      }
      return readings;
    }
  }

  /** Diagnoses readings after the nominal netlist. */
  Diagnosis diagnose(List<Reading> readings) throws NoOperatingPoint {
    return Diagnosis.of(nominal, nominal, new ReadingSheet(readings, Double.NaN, ""), types, 0);
  }

  /**
   * Returns the place of {@code fault} among the groups of suspects, from 1; 99 when it is not
   * there. A fault counts as found where it, or one that reads alike, is named.
   */
  Outcome outcome(Fault fault, double severity, Diagnosis diagnosis) throws NoOperatingPoint {
    List<Integer> order = new ArrayList<>();
    for (Suspect suspect : diagnosis.suspects()) {
      if (!order.contains(suspect.group())) {
        order.add(suspect.group());
      }
    }
    for (int group : order) {
      List<Suspect> members =
          diagnosis.suspects().stream().filter(s -> s.group() == group).toList();
      if (holds(members, fault, severity)) {
        int faulted = (int) members.stream().filter(s -> s.kind() == Suspect.Kind.FAULT).count();
        return new Outcome(fault, severity, order.indexOf(group) + 1, faulted, diagnosis);
      }
    }
    return new Outcome(fault, severity, 99, 0, diagnosis);
  }

  /** Returns the probability of the group that {@code fault} belongs to. */
  double probability(Fault fault, double severity, Diagnosis diagnosis) {
    Outcome outcome;
    try {
      outcome = outcome(fault, severity, diagnosis);
    } catch (NoOperatingPoint unsettled) {
      return 0;
    }
    List<Integer> order = diagnosis.suspects().stream().map(Suspect::group).distinct().toList();
    return outcome.place() > order.size()
        ? 0
        : diagnosis.suspects().stream()
            .filter(s -> s.group() == order.get(outcome.place() - 1))
            .mapToDouble(Suspect::probability)
            .sum();
  }

  private boolean holds(List<Suspect> members, Fault fault, double severity) {
    Groups groups = new Groups(healthy, points);
    int own = groups.of(explanation(fault, severity));
    for (Suspect suspect : members) {
      if (suspect.kind() == Suspect.Kind.FAULT) {
        Fault named = suspect.faults().get(0);
        if (samePart(named, fault) || groups.of(explanation(named, estimate(suspect))) == own) {
          return true;
        }
      }
    }
    return false;
  }

  /** Kinds that are one fault at different degrees. */
  private static final List<Set<FaultKind>> DEGREES =
      List.of(
          Set.of(FaultKind.RESISTOR_HIGH, FaultKind.RESISTOR_OPEN),
          Set.of(FaultKind.RESISTOR_LOW, FaultKind.RESISTOR_SHORTED),
          Set.of(FaultKind.CAPACITOR_LEAKY, FaultKind.CAPACITOR_SHORTED),
          Set.of(FaultKind.SECTION_WEAK, FaultKind.SECTION_DEAD));

  /** The same part failed in the same way, if in another degree. */
  private static boolean samePart(Fault one, Fault other) {
    return one.element().equals(other.element())
        && (one.equals(other)
            || DEGREES.stream()
                .anyMatch(kinds -> kinds.contains(one.kind()) && kinds.contains(other.kind())));
  }

  private static double estimate(Suspect suspect) {
    double estimate = suspect.estimates().get(0);
    return Double.isNaN(estimate) ? suspect.faults().get(0).range().low() : estimate;
  }

  private static Explanation explanation(Fault fault, double severity) {
    return new Explanation(
        Suspect.Kind.FAULT,
        List.of(new Candidate(fault)),
        List.of(severity),
        List.of(severity),
        List.of(severity),
        0,
        new Fit(0, new boolean[0], new double[0]),
        new Prediction(new double[0], new double[0], new double[0][], new double[0]));
  }
}
