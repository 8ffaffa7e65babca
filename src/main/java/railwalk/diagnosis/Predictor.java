package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Meter;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Winding;
import railwalk.device.Electrode;
import railwalk.readings.MeasuredAt;
import railwalk.readings.ReadingKind;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;
import railwalk.spread.SpreadFactors;
import railwalk.walk.RippleGroup;

/** What a meter shows at some places of a solved amplifier. */
final class Predictor {
  /** Up to this ratio of source to meter resistance the straight-line reading serves here. */
  private static final double STRAIGHT_LOADING = 0.1;

  /** More than an ohmmeter of the bench shows. */
  static final double OPEN_READING_OHMS = 20e6;

  /** One deviation of readings that no spread factor explains, as a share. */
  private static final double RIPPLE_SPREAD = 0.2;

  private static final double RIPPLE_FLOOR_VOLTS = 0.02;
  private static final double AC_SPREAD = 0.03;
  private static final double OHMS_SPREAD = 0.06;
  private static final double OHMS_FLOOR = 0.5;
  private static final double CURRENT_SPREAD = 0.1;

  /** How far tube laws are off their published curves at a node, as a share of its volts. */
  private static final double LAW_ERROR = 0.004;

  private static final double LEAST_VARIANCE = 1e-12;

  /** One deviation of the resistance that a meter sees, as a share: ten-per-cent resistors. */
  private static final double SOURCE_SPREAD = 0.06;

  private final Map<String, OperatingPoint> healthy;
  private final Map<String, Set<Node>> withinSupplies = new HashMap<>();
  private final Meter meter;
  private final List<Probe> probes;
  private final FactorIndex factors = new FactorIndex();

  Predictor(Amplifier amplifier, List<Probe> probes) {
    this.healthy = amplifier.healthy();
    this.meter = amplifier.circuit().meter();
    this.probes = List.copyOf(probes);
    healthy.forEach((state, point) -> withinSupplies.put(state, within(point)));
  }

  private static Set<Node> within(OperatingPoint point) {
    Set<Node> nodes = new HashSet<>();
    for (RippleGroup group : point.map().groups()) {
      nodes.addAll(group.nodes());
      nodes.removeAll(group.ports());
    }
    return nodes;
  }

  List<Probe> probes() {
    return probes;
  }

  static String stateOf(Probe probe) {
    return probe.kind() == ReadingKind.OHMS ? Amplifier.COLD : probe.state();
  }

  /** Returns what the meter shows at each place; the spread's own shift is left out. */
  double[] values(Map<String, OperatingPoint> points) {
    double[] values = new double[probes.size()];
    for (int i = 0; i < values.length; i++) {
      values[i] = value(probes.get(i), point(points, probes.get(i)));
    }
    return values;
  }

  /** Returns what the meter shows at some of the places, by number, all in the state of a point. */
  double[] values(List<Integer> places, OperatingPoint point) {
    double[] values = new double[places.size()];
    for (int k = 0; k < values.length; k++) {
      values[k] = value(probes.get(places.get(k)), point);
    }
    return values;
  }

  /** Returns what stands at each place before a meter loads it. */
  double[] unloaded(Map<String, OperatingPoint> points) {
    double[] values = new double[probes.size()];
    for (int i = 0; i < values.length; i++) {
      Probe probe = probes.get(i);
      OperatingPoint point = point(points, probe);
      boolean direct = probe.kind() == ReadingKind.DC;
      if (direct && probe.at() instanceof MeasuredAt.AtNode node) {
        values[i] = point.volts(node.node());
      } else if (direct && probe.at() instanceof MeasuredAt.Across part) {
        values[i] = Math.abs(point.volts(part.a()) - point.volts(part.b()));
      } else {
        values[i] = value(probe, point);
      }
    }
    return values;
  }

  private static OperatingPoint point(Map<String, OperatingPoint> points, Probe probe) {
    OperatingPoint point = points.get(stateOf(probe));
    if (point == null) {
      throw new IllegalStateException("not solved in state " + stateOf(probe));
    }
    return point;
  }

  private double value(Probe probe, OperatingPoint point) {
    MeasuredAt at = probe.at();
    if (at instanceof MeasuredAt.AtNode node) {
      return switch (probe.kind()) {
        case DC, MA -> volts(probe, point, node.node());
        case RIPPLE -> point.rippleVoltsRms(node.node()).orElse(0.0);
        case OHMS -> shownOhms(point.sourceOhms(node.node()));
        case AC -> windingVolts(point.circuit(), node.node());
      };
    }
    if (at instanceof MeasuredAt.Across part) {
      if (probe.kind() == ReadingKind.OHMS) {
        return shownOhms(point.sourceOhms(part.a(), part.b()));
      }
      double volts = Math.abs(point.volts(part.a()) - point.volts(part.b()));
      double source = point.sourceOhms(part.a(), part.b());
      double meterOhms = probe.meterOhms(meter, volts);
      return Double.isNaN(source) ? volts : volts / (1 + source / meterOhms);
    }
    if (at instanceof MeasuredAt.OnWinding winding) {
      return windingVolts(point.circuit(), winding.winding().name());
    }
    return Math.abs(amps((MeasuredAt.Through) at, point));
  }

  private double volts(Probe probe, OperatingPoint point, Node node) {
    double volts = point.volts(node);
    double ratio = loading(probe, point, node, volts);
    if (Double.isNaN(ratio)) {
      return volts;
    }
    return ratio <= STRAIGHT_LOADING
        ? volts / (1 + ratio)
        : point.meterVolts(node, probe.meterOhms(meter, volts));
  }

  /**
   * Returns source over meter resistance. Within a supply the healthy amplifier's source resistance
   * stands for all, which a fault there moves little beside a meter's.
   */
  private double loading(Probe probe, OperatingPoint point, Node node, double volts) {
    String state = stateOf(probe);
    Set<Node> within = withinSupplies.get(state);
    OperatingPoint seen = point;
    if (within != null && within.contains(node)) {
      seen = point(healthy, probe);
    }
    return seen.sourceOhms(node) / probe.meterOhms(meter, volts);
  }

  private static double shownOhms(double ohms) {
    return Double.isNaN(ohms) ? OPEN_READING_OHMS : Math.min(ohms, OPEN_READING_OHMS);
  }

  private static double windingVolts(Circuit circuit, String name) {
    double sum = 0;
    for (Winding winding : circuit.elements(Winding.class)) {
      if (winding.name().equals(name)) {
        for (Winding.Section s : winding.sections()) {
          sum += alternating(circuit, winding, s);
        }
      }
    }
    return sum;
  }

  /** Returns the alternating volts from a winding's end to the reference on the same winding. */
  private static double windingVolts(Circuit circuit, Node node) {
    for (Winding winding : circuit.elements(Winding.class)) {
      List<Node> nodes = winding.nodes();
      int from = nodes.indexOf(node);
      int to = nodes.indexOf(circuit.reference());
      if (from >= 0 && to >= 0) {
        double sum = 0;
        for (int s = Math.min(from, to); s < Math.max(from, to); s++) {
          sum += alternating(circuit, winding, winding.sections().get(s));
        }
        return sum;
      }
    }
    return Double.NaN;
  }

  private static double alternating(Circuit circuit, Winding winding, Winding.Section section) {
    boolean open = section.ohms() >= Rewire.OPEN_OHMS;
    return open ? 0 : section.openRmsVolts() * circuit.line().scale(winding.atLineVolts());
  }

  private static double amps(MeasuredAt.Through through, OperatingPoint point) {
    @Nullable Element element = point.circuit().element(through.element().name()).orElse(null);
    if (element == null) {
      return 0;
    }
    if (!(element instanceof AmplifierSection section)) {
      return point.amps(element);
    }
    SectionPoint at = point.at(section);
    double screen = Double.isNaN(at.screenAmps()) ? 0 : at.screenAmps();
    Electrode electrode = through.electrode();
    if (electrode == Electrode.SCREEN) {
      return screen;
    }
    if (electrode == Electrode.GRID) {
      return at.gridAmps();
    }
    return electrode == Electrode.CATHODE
        ? at.plateAmps() + screen + at.gridAmps()
        : at.plateAmps();
  }

  /** Returns values with the spread's shift, and how they go from build to build. */
  Prediction predict(Map<String, OperatingPoint> points) {
    double[] values = values(points);
    double[] own = new double[values.length];
    double[] shifts = new double[values.length];
    Map<String, SpreadFactors> spreads = new HashMap<>();
    Map<String, int[]> numbers = new HashMap<>();
    points.forEach(
        (state, point) -> {
          SpreadFactors spread = SpreadFactors.of(point);
          spreads.put(state, spread);
          numbers.put(state, factors.of(spread.names()));
        });
    double[][] rows = new double[values.length][factors.size()];
    for (int i = 0; i < values.length; i++) {
      Probe probe = probes.get(i);
      String state = stateOf(probe);
      SpreadFactors spread = spreads.get(state);
      int[] number = numbers.get(state);
      if (spread == null || number == null) {
        throw new IllegalStateException(state);
      }
      own[i] = ownSpread(probe, values[i]);
      shifts[i] = fill(probe, point(points, probe), spread, number, rows[i], own, i);
      values[i] += shifts[i];
    }
    return new Prediction(values, shifts, rows, own);
  }

  private static double ownSpread(Probe probe, double value) {
    return switch (probe.kind()) {
      case DC -> 0;
      case AC -> AC_SPREAD * value;
      case RIPPLE -> RIPPLE_SPREAD * value + RIPPLE_FLOOR_VOLTS;
      case OHMS -> OHMS_SPREAD * value + OHMS_FLOOR;
      case MA -> CURRENT_SPREAD * Math.abs(value);
    };
  }

  /** Fills the row of a place and returns the shift of its middle. */
  private double fill(
      Probe probe,
      OperatingPoint point,
      SpreadFactors spread,
      int[] number,
      double[] row,
      double[] own,
      int place) {
    MeasuredAt at = probe.at();
    if (probe.kind() == ReadingKind.DC && at instanceof MeasuredAt.AtNode node) {
      double volts = point.volts(node.node());
      double ratio = loading(probe, point, node.node(), volts);
      double passed = Double.isNaN(ratio) ? 1 : 1 / (1 + ratio);
      add(row, spread.row(node.node()), number, passed);
      own[place] =
          Double.isNaN(ratio) ? 0 : SOURCE_SPREAD * Math.abs(volts) * ratio * passed * passed;
      return passed * spread.shiftVolts(node.node());
    }
    if (probe.kind() == ReadingKind.DC && at instanceof MeasuredAt.Across part) {
      double sign = point.volts(part.a()) < point.volts(part.b()) ? -1 : 1;
      add(row, spread.row(part.a()), number, sign);
      add(row, spread.row(part.b()), number, -sign);
      return sign * (spread.shiftVolts(part.a()) - spread.shiftVolts(part.b()));
    }
    if (probe.kind() == ReadingKind.MA
        && at instanceof MeasuredAt.Through through
        && point.circuit().element(through.element().name()).orElse(null) instanceof Resistor r) {
      own[place] = 0;
      double amps = point.amps(r);
      double sign = amps < 0 ? -1 : 1;
      add(row, spread.row(r.a()), number, sign / r.ohms());
      add(row, spread.row(r.b()), number, -sign / r.ohms());
      int factor = spread.names().indexOf(r.name());
      if (factor >= 0) {
        row[number[factor]] -= Math.abs(amps) * spread.deviation(factor);
      }
    }
    return 0;
  }

  private static void add(double[] row, double[] more, int[] number, double factor) {
    for (int f = 0; f < more.length; f++) {
      row[number[f]] += factor * more[f];
    }
  }

  /** Returns the limit of the meter's error at each place where it shows {@code values}. */
  double[] meterLimits(double[] values) {
    double[] limits = new double[values.length];
    for (int i = 0; i < limits.length; i++) {
      Probe probe = probes.get(i);
      limits[i] =
          switch (probe.kind()) {
            case DC, AC, RIPPLE -> MeterError.limitVolts(meter, values[i], probe.rangeVolts());
            case OHMS, MA -> 0.01 * Math.abs(values[i]);
          };
    }
    return limits;
  }

  /**
   * Returns the variances that readings of {@code values} have each for itself: the meter's error,
   * the tube laws' own, and what no spread factor explains.
   */
  double[] ownVariances(double[] values, double[] ownSpread) {
    double[] limits = meterLimits(values);
    double[] variances = new double[values.length];
    for (int i = 0; i < variances.length; i++) {
      double meter = limits[i] / Math.sqrt(3);
      double law = LAW_ERROR * values[i];
      variances[i] = meter * meter + law * law + ownSpread[i] * ownSpread[i] + LEAST_VARIANCE;
    }
    return variances;
  }

  /** Returns the states that {@code probes} need. */
  static Set<String> states(List<Probe> probes) {
    Set<String> states = new java.util.LinkedHashSet<>();
    List<Probe> all = new ArrayList<>(probes);
    all.forEach(p -> states.add(stateOf(p)));
    return states;
  }
}
