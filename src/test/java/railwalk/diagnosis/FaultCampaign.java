package railwalk.diagnosis;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import railwalk.circuit.Circuit;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;
import railwalk.netlist.NetlistReader;
import railwalk.readings.Reading;
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

  private final Circuit nominal;
  private final Amplifier healthy;
  private final List<TubeType> types;
  final List<Fault> faults;
  final List<Probe> points;
  private final Prediction expected;
  private final double[] limits;

  /** What became of one case. */
  record Outcome(Fault fault, double severity, int place, int groupSize, Diagnosis diagnosis) {}

  FaultCampaign(Path netlist) throws IOException, NoOperatingPoint {
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
      double half = Judge.DEVIATIONS * Math.sqrt(variance) + limits[i];
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

  /** Returns the readings of a random build with {@code fault} in it; empty when it can't be. */
  Optional<double[]> read(Fault fault, double severity, Random random) {
    return read(c -> fault.applyTo(c, severity), random);
  }

  Optional<double[]> readHealthy(Random random) {
    return read(c -> c, random);
  }

  private Optional<double[]> read(java.util.function.UnaryOperator<Circuit> change, Random random) {
    Circuit built = RandomBuild.of(nominal, () -> 1e-9 + random.nextDouble() * (1 - 2e-9));
    Circuit faulted = change.apply(built);
    SolveOutcome outcome = OperatingPointSolver.solve(faulted, Walk.of(faulted));
    if (!(outcome instanceof SolveOutcome.Solved solved)) {
      return Optional.empty();
    }
    double[] exact = new Predictor(healthy, points).values(Map.of("", solved.point()));
    double[] read = new double[exact.length];
    for (int i = 0; i < exact.length; i++) {
      double digit =
          (MeterError.limitVolts(nominal.meter(), exact[i], Double.NaN)
              - METER_SHARE * Math.abs(exact[i]));
      double shown = exact[i] * (1 + METER_SHARE * (2 * random.nextDouble() - 1));
      read[i] = digit * Math.rint(shown / digit);
    }
    return Optional.of(read);
  }

  /** Diagnoses readings at {@code places} of {@link #points}. */
  Diagnosis diagnose(double[] read, List<Integer> places) throws NoOperatingPoint {
    List<Reading> readings = new ArrayList<>();
    for (int place : places) {
      Probe p = points.get(place);
      readings.add(new Reading(p.name(), p.at(), p.kind(), read[place], "", Double.NaN, "", null));
    }
    return Diagnosis.of(nominal, nominal, new ReadingSheet(readings, Double.NaN, ""), types);
  }

  List<Integer> all() {
    List<Integer> places = new ArrayList<>();
    for (int i = 0; i < points.size(); i++) {
      places.add(i);
    }
    return places;
  }

  /**
   * Returns the place of {@code fault} among the groups of suspects, from 1; 99 when it is not
   * there. A fault counts as found where it, or one that reads alike, is named.
   */
  Outcome outcome(Fault fault, double severity, Diagnosis diagnosis) throws NoOperatingPoint {
    Groups groups = new Groups(healthy, points);
    List<Integer> order = new ArrayList<>();
    int own = groups.of(explanation(fault, severity));
    int place = 99;
    int size = 0;
    for (Suspect suspect : diagnosis.suspects()) {
      if (!order.contains(suspect.group())) {
        order.add(suspect.group());
      }
      boolean same =
          suspect.kind() == Suspect.Kind.FAULT
              && (suspect.faults().get(0).equals(fault)
                  || samePart(suspect.faults().get(0), fault)
                  || groups.of(explanation(suspect.faults().get(0), estimate(suspect))) == own);
      if (same && place == 99) {
        place = order.indexOf(suspect.group()) + 1;
        size =
            (int) diagnosis.suspects().stream().filter(s -> s.group() == suspect.group()).count();
      }
    }
    return new Outcome(fault, severity, place, size, diagnosis);
  }

  /** The same part failed in the same way, told as a drift or as its end: high and open. */
  private static boolean samePart(Fault one, Fault other) {
    return one.element().equals(other.element())
        && (one.kind() == other.kind()
            || one.kind().word().charAt(0) == other.kind().word().charAt(0));
  }

  private static double estimate(Suspect suspect) {
    double estimate = suspect.estimates().get(0);
    return Double.isNaN(estimate) ? suspect.faults().get(0).range().low() : estimate;
  }

  private static Explanation explanation(Fault fault, double severity) {
    return new Explanation(
        Suspect.Kind.FAULT,
        new Candidate(fault),
        severity,
        severity,
        severity,
        0,
        new Fit(0, new boolean[0], new double[0]),
        new Prediction(new double[0], new double[0], new double[0][], new double[0]));
  }
}
