package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.UnaryOperator;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.readings.Reading;
import railwalk.solve.NearbySolver;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.walk.Walk;

/**
 * A healthy amplifier at the bench, solved in the states that were read, ready to have faults tried
 * on it. The state {@link #COLD} is the unplugged amplifier of an ohmmeter.
 */
final class Amplifier {
  /** State of readings in ohms. */
  static final String COLD = "\u0000cold";

  private final Circuit circuit;
  private final Map<String, NearbySolver> solvers = new LinkedHashMap<>();
  private final Map<String, OperatingPoint> healthy = new LinkedHashMap<>();
  private final Map<String, Circuit> circuits = new LinkedHashMap<>();

  /**
   * Solves {@code circuit} in {@code states}, the first always the amplifier as its netlist stands.
   *
   * @throws NoOperatingPoint when one of them does not settle
   */
  Amplifier(Circuit circuit, Set<String> states) throws NoOperatingPoint {
    this.circuit = circuit;
    add("");
    for (String state : states) {
      if (!circuits.containsKey(state)) {
        add(state);
      }
    }
  }

  private void add(String state) throws NoOperatingPoint {
    Circuit inState = inState(circuit, state);
    SolveOutcome outcome = OperatingPointSolver.solve(inState, Walk.of(inState));
    if (!(outcome instanceof SolveOutcome.Solved solved)) {
      SolveOutcome.NotSolved failure = (SolveOutcome.NotSolved) outcome;
      throw new NoOperatingPoint(state, failure.worstNode(), failure.reason());
    }
    circuits.put(state, inState);
    healthy.put(state, solved.point());
    solvers.put(state, new NearbySolver(solved.point()));
  }

  /** Returns {@code circuit} in a state of its own, with the tubes out, or unplugged. */
  static Circuit inState(Circuit circuit, String state) {
    if (state.isEmpty()) {
      return circuit;
    }
    if (state.equals(COLD)) {
      return ColdAmplifier.of(circuit);
    }
    for (State own : circuit.states()) {
      if (own.name().equalsIgnoreCase(state)) {
        return circuit.inState(own);
      }
    }
    List<StateChange> pulled = new ArrayList<>();
    for (Bottle bottle : circuit.bottles()) {
      boolean amplifies =
          circuit.elements(AmplifierSection.class).stream()
              .anyMatch(s -> s.bottle().equals(bottle.name()));
      boolean meant =
          state.equalsIgnoreCase(Reading.TUBES_OUT)
              ? amplifies
              : state.equals(Reading.pulled(bottle.name()));
      if (meant) {
        pulled.add(new StateChange.TubeOut(bottle.name()));
      }
    }
    if (pulled.isEmpty()) {
      throw new IllegalArgumentException("no state " + state);
    }
    return circuit.inState(new State(state, pulled));
  }

  /** Takes over from {@code all} what is solved in {@code states}. */
  private Amplifier(Amplifier all, Set<String> states) {
    circuit = all.circuit;
    for (String state : all.circuits.keySet()) {
      Circuit inState = all.circuits.get(state);
      OperatingPoint point = all.healthy.get(state);
      NearbySolver solver = all.solvers.get(state);
      if (states.contains(state) && inState != null && point != null && solver != null) {
        circuits.put(state, inState);
        healthy.put(state, point);
        solvers.put(state, solver);
      }
    }
  }

  /** Returns this amplifier as its netlist stands only. */
  Amplifier asItStands() {
    return new Amplifier(this, Set.of(""));
  }

  /** Returns this amplifier solved in {@code states} too. */
  Amplifier also(Set<String> states) throws NoOperatingPoint {
    Amplifier more = new Amplifier(this, circuits.keySet());
    for (String state : states) {
      if (!more.circuits.containsKey(state)) {
        more.add(state);
      }
    }
    return more;
  }

  Circuit circuit() {
    return circuit;
  }

  /** Returns the healthy amplifier in all states. */
  Map<String, OperatingPoint> healthy() {
    return healthy;
  }

  /** Returns the healthy amplifier in one of its states. */
  OperatingPoint healthy(String state) {
    OperatingPoint point = healthy.get(state);
    if (point == null) {
      throw new IllegalArgumentException("not solved in state " + state);
    }
    return point;
  }

  /** Returns the amplifier with a fault in it, in all states; empty when one does not settle. */
  Optional<Map<String, OperatingPoint>> with(Fault fault, double severity) {
    return with(List.of(fault), List.of(severity));
  }

  /** Returns the amplifier with all faults in it, in all states; the healthy one without any. */
  Optional<Map<String, OperatingPoint>> with(List<Fault> faults, List<Double> severities) {
    if (faults.isEmpty()) {
      return Optional.of(healthy);
    }
    return changed(
        circuit -> {
          Circuit faulted = circuit;
          for (int f = 0; f < faults.size(); f++) {
            faulted = faults.get(f).applyTo(faulted, severities.get(f));
          }
          return faulted;
        });
  }

  /** Returns the amplifier with a change made in all states; empty when one does not settle. */
  Optional<Map<String, OperatingPoint>> changed(UnaryOperator<Circuit> change) {
    Map<String, OperatingPoint> points = new LinkedHashMap<>();
    for (Map.Entry<String, Circuit> state : circuits.entrySet()) {
      NearbySolver solver = solvers.get(state.getKey());
      if (solver == null) {
        throw new IllegalStateException(state.getKey());
      }
      Optional<OperatingPoint> point = solver.solve(change.apply(state.getValue()));
      if (point.isEmpty()) {
        return Optional.empty();
      }
      points.put(state.getKey(), point.get());
    }
    return Optional.of(points);
  }
}
