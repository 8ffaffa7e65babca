package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.DoubleFunction;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.VoltageSource;
import railwalk.solve.NearbySolver;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;

/**
 * How the output tubes of an amplifier idle, and where their bias would have to stand for other
 * currents.
 *
 * <p>An output tube here is a section that conducts and whose plate hangs on a coil, or whose plate
 * is rated {@value #OUTPUT_WATTS} W or more.
 */
public final class BiasSheet {
  /** Plates rated for this much are output tubes whatever they hang on, watt. */
  public static final double OUTPUT_WATTS = 5;

  /** Up to this a cathode resistor to the reference is there to measure by, ohm. */
  public static final double MOST_SENSE_OHMS = 10;

  /** Shares of the plate's watts that fixed bias is set to (common practice). */
  public static final List<Double> TARGETS = List.of(0.5, 0.6, 0.7);

  /** A cathode that makes more than this share of the grid's bias biases its tube itself. */
  private static final double OWN_BIAS = 0.5;

  /** A control moves the bias when its ends change the plate's current by more than this share. */
  private static final double MOVES = 0.01;

  private static final int SCAN_STEPS = 16;
  private static final int MOST_STEPS = 40;
  private static final double CLOSE = 1e-5;

  private final OperatingPoint point;
  private final NearbySolver nearby;
  private final List<Tube> tubes = new ArrayList<>();
  private final List<Group> groups = new ArrayList<>();

  /**
   * One output tube at rest.
   *
   * @param sense the resistor in its cathode to measure current by; null without
   * @param cathodeResistor what biases it, the sense resistor apart; null in fixed bias
   * @param coil the transformer half or choke in its plate; null without
   */
  public record Tube(
      AmplifierSection section,
      SectionPoint at,
      @Nullable Resistor sense,
      @Nullable Resistor cathodeResistor,
      @Nullable Inductor coil) {

    /** Returns whether its own cathode current makes its bias. */
    public boolean biasesItself() {
      return cathodeResistor != null;
    }

    /** Returns the plate's share of its rated watts; NaN where no rating is known. */
    public double share() {
      return at.plateWatts() / section.type().ratings().plateWattsMax();
    }
  }

  /**
   * Tubes in fixed bias that one control sets; all that none sets are one group.
   *
   * @param control null without one
   * @param targets in the order of {@link #TARGETS}
   * @param ends with the control at 0 and at 1; empty without one
   */
  public record Group(
      List<Tube> tubes,
      @Nullable Potentiometer control,
      List<Optional<Setting>> targets,
      List<Setting> ends) {
    public Group {
      tubes = List.copyOf(tubes);
      targets = List.copyOf(targets);
      ends = List.copyOf(ends);
    }
  }

  /**
   * A setting of the bias and what it comes to in the hottest tube of the group.
   *
   * @param controlShare of the control's track; NaN where no control reaches it
   * @param gridVolts at that tube's grid, against the reference
   */
  public record Setting(
      double controlShare, String hottest, double gridVolts, SectionPoint at, double share) {}

  private BiasSheet(OperatingPoint point) {
    this.point = point;
    this.nearby = new NearbySolver(point);
  }

  /** Returns the bias sheet of a solved amplifier; without tubes where it has no output tube. */
  public static BiasSheet of(OperatingPoint point) {
    BiasSheet sheet = new BiasSheet(point);
    for (AmplifierSection section : point.circuit().elements(AmplifierSection.class)) {
      if (sheet.isOutput(section)) {
        sheet.tubes.add(sheet.tube(section));
      }
    }
    sheet.group();
    return sheet;
  }

  /** Returns the solved amplifier. */
  public OperatingPoint point() {
    return point;
  }

  /** Returns the output tubes, in netlist order. */
  public List<Tube> tubes() {
    return List.copyOf(tubes);
  }

  /** Returns the tubes in fixed bias by the control that sets them. */
  public List<Group> groups() {
    return List.copyOf(groups);
  }

  private boolean isOutput(AmplifierSection section) {
    boolean conducts = !point.map().idleSections().contains(section.name());
    return conducts
        && (section.type().ratings().plateWattsMax() >= OUTPUT_WATTS
            || coil(section.plate()) != null);
  }

  private @Nullable Inductor coil(Node plate) {
    for (Inductor coil : point.circuit().elements(Inductor.class)) {
      if (coil.nodes().contains(plate)) {
        return coil;
      }
    }
    return null;
  }

  private Tube tube(AmplifierSection section) {
    SectionPoint at = point.at(section);
    Node reference = point.circuit().reference();
    Resistor sense = null;
    Resistor hottest = null;
    for (Resistor r : point.circuit().elements(Resistor.class)) {
      boolean down = r.nodes().contains(section.cathode()) && r.nodes().contains(reference);
      if (down && r.ohms() <= MOST_SENSE_OHMS) {
        sense = r;
      } else if (r.nodes().contains(section.cathode())
          && !r.a().equals(r.b())
          && (hottest == null || point.watts(r) > point.watts(hottest))) {
        hottest = r;
      }
    }
    boolean itself =
        !section.cathode().equals(reference)
            && point.volts(section.cathode()) > OWN_BIAS * -at.gridVolts();
    return new Tube(section, at, sense, itself ? hottest : null, coil(section.plate()));
  }

  private void group() {
    Map<String, List<Tube>> byControl = new LinkedHashMap<>();
    for (Tube tube : tubes) {
      if (!tube.biasesItself()) {
        String name = control(tube).map(Potentiometer::name).orElse("");
        byControl.computeIfAbsent(name, n -> new ArrayList<>()).add(tube);
      }
    }
    byControl.forEach((name, set) -> groups.add(group(name, set)));
  }

  /** Returns the control whose travel changes the tube's current most. */
  private Optional<Potentiometer> control(Tube tube) {
    Potentiometer most = null;
    double greatest = MOVES * Math.abs(tube.at.plateAmps());
    for (Potentiometer pot : point.circuit().elements(Potentiometer.class)) {
      Optional<OperatingPoint> low = set(pot, 0);
      Optional<OperatingPoint> high = set(pot, 1);
      if (low.isPresent() && high.isPresent()) {
        double change = Math.abs(amps(low.get(), tube) - amps(high.get(), tube));
        if (change > greatest) {
          greatest = change;
          most = pot;
        }
      }
    }
    return Optional.ofNullable(most);
  }

  private static double amps(OperatingPoint at, Tube tube) {
    return at.at(tube.section).plateAmps();
  }

  private Optional<OperatingPoint> set(Potentiometer pot, double share) {
    return nearby.solve(
        Rewire.change(point.circuit(), Potentiometer.class, pot.name(), p -> p.setTo(share)));
  }

  private Group group(String control, List<Tube> set) {
    Potentiometer pot = null;
    for (Potentiometer p : point.circuit().elements(Potentiometer.class)) {
      pot = p.name().equals(control) ? p : pot;
    }
    List<Optional<Setting>> targets = new ArrayList<>();
    List<Setting> ends = new ArrayList<>();
    Potentiometer found = pot;
    if (found != null) {
      for (double end : new double[] {0, 1}) {
        setting(set, end, share -> set(found, share)).ifPresent(ends::add);
      }
    }
    for (double target : TARGETS) {
      targets.add(target(set, found, target));
    }
    return new Group(set, found, targets, ends);
  }

  /** Returns the bias for a share of the plate's watts, off the control or else by the grid. */
  private Optional<Setting> target(List<Tube> set, @Nullable Potentiometer pot, double target) {
    if (pot != null) {
      Optional<Setting> set1 = root(0, 1, target, share -> setting(set, share, at -> set(pot, at)));
      if (set1.isPresent()) {
        return set1;
      }
    }
    double least = 1.5 * lowestGrid(set) - 20;
    return root(least, 0, target, volts -> setting(set, volts, at -> held(set, at)))
        .map(s -> new Setting(Double.NaN, s.hottest, s.gridVolts, s.at, s.share));
  }

  private double lowestGrid(List<Tube> set) {
    double lowest = 0;
    for (Tube tube : set) {
      lowest = Math.min(lowest, point.volts(tube.section.grid()));
    }
    return lowest;
  }

  /** Returns the amplifier with the grids of {@code set} held at {@code volts}. */
  private Optional<OperatingPoint> held(List<Tube> set, double volts) {
    Circuit circuit = point.circuit();
    for (Tube tube : set) {
      Node grid = tube.section.grid();
      circuit =
          Rewire.add(
              circuit,
              new VoltageSource(
                  tube.section.name() + ":bias", grid, circuit.reference(), volts, 1));
    }
    return nearby.solve(circuit);
  }

  private static Optional<Setting> setting(
      List<Tube> set, double position, DoubleFunction<Optional<OperatingPoint>> solve) {
    return solve.apply(position).map(solved -> hottest(set, position, solved));
  }

  private static Setting hottest(List<Tube> set, double position, OperatingPoint solved) {
    Setting hottest = null;
    for (Tube tube : set) {
      SectionPoint at = solved.at(tube.section);
      double share = at.plateWatts() / tube.section.type().ratings().plateWattsMax();
      Setting setting =
          new Setting(position, tube.section.name(), solved.volts(tube.section.grid()), at, share);
      if (hottest == null || at.plateWatts() > hottest.at.plateWatts()) {
        hottest = setting;
      }
    }
    if (hottest == null) {
      throw new IllegalArgumentException("no tube");
    }
    return hottest;
  }

  /**
   * Returns the setting between two positions where the hottest tube stands at {@code target}: a
   * scan for a change of sign, then regula falsi with the weight of a stuck end halved.
   */
  private static Optional<Setting> root(
      double from, double to, double target, DoubleFunction<Optional<Setting>> setting) {
    Setting left = null;
    for (int i = 0; i <= SCAN_STEPS; i++) {
      Optional<Setting> right = setting.apply(from + (to - from) * i / SCAN_STEPS);
      if (right.isEmpty()) {
        left = null;
        continue;
      }
      if (left != null && (left.share - target) * (right.get().share - target) <= 0) {
        return between(left, right.get(), target, setting);
      }
      left = right.get();
    }
    return Optional.empty();
  }

  private static Optional<Setting> between(
      Setting first, Setting second, double target, DoubleFunction<Optional<Setting>> setting) {
    double a = first.controlShare;
    double b = second.controlShare;
    double valueA = first.share - target;
    double valueB = second.share - target;
    Setting best = Math.abs(valueA) < Math.abs(valueB) ? first : second;
    for (int i = 0; i < MOST_STEPS && Math.abs(best.share - target) > CLOSE; i++) {
      double at = (a * valueB - b * valueA) / (valueB - valueA);
      Optional<Setting> middle = setting.apply(at);
      if (middle.isEmpty()) {
        return Optional.empty();
      }
      best = middle.get();
      double value = best.share - target;
      if (value * valueB < 0) {
        a = b;
        valueA = valueB;
      } else {
        valueA /= 2;
      }
      b = at;
      valueB = value;
    }
    return Optional.of(best);
  }
}
