package railwalk.app;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Alternative;
import railwalk.chart.StageIdle;
import railwalk.chart.StagesIdle;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.device.TubeType;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SectionPoint;
import railwalk.solve.SolveOutcome;
import railwalk.walk.Walk;

/** Solves an amplifier with other types in the sockets of one. */
final class Substitutes {
  private final TubeType wanted;
  private final Circuit circuit;
  private final List<Bottle> sockets;
  private final List<StageIdle> found = new ArrayList<>();

  private Substitutes(TubeType wanted, Circuit circuit, List<Bottle> sockets) {
    this.wanted = wanted;
    this.circuit = circuit;
    this.sockets = sockets;
  }

  /**
   * Returns how the sections of the tubes of type {@code wanted} in {@code netlist} idle, as they
   * are and with each alternative in all of those sockets.
   */
  static StagesIdle of(TubeType wanted, List<Alternative> alternatives, Path netlist)
      throws CannotDo {
    TracedAmplifier amplifier = TracedAmplifier.read(netlist).allKnown();
    Circuit circuit = amplifier.circuit();
    List<Bottle> sockets =
        circuit.bottles().stream()
            .filter(bottle -> bottle.type().name().equals(wanted.name()))
            .toList();
    if (sockets.isEmpty()) {
      List<String> types = circuit.bottles().stream().map(b -> b.type().name()).distinct().toList();
      throw new CannotDo(
          amplifier.fileName()
              + " has no "
              + wanted.name()
              + (types.isEmpty()
                  ? ": no tube at all"
                  : ": its types are " + String.join(", ", types)));
    }
    Substitutes substitutes = new Substitutes(wanted, circuit, sockets);
    substitutes.add(wanted);
    for (Alternative alternative : alternatives) {
      substitutes.add(alternative.inPlaceOf(wanted));
    }
    return new StagesIdle(amplifier.fileName(), substitutes.found);
  }

  private void add(TubeType fitted) {
    List<StateChange> changes = new ArrayList<>();
    if (!fitted.equals(wanted)) {
      for (Bottle socket : sockets) {
        changes.add(new StateChange.TubeFitted(socket.name(), fitted));
      }
    }
    Circuit changed = circuit.inState(new State(fitted.name(), changes));
    SolveOutcome outcome = OperatingPointSolver.solve(changed, Walk.of(changed));
    for (AmplifierSection section : changed.elements(AmplifierSection.class)) {
      if (isMeant(section.bottle())) {
        SectionPoint at =
            outcome instanceof SolveOutcome.Solved s ? s.point().at(section) : NOWHERE;
        double watts = section.type().ratings().plateWattsMax();
        add(fitted, section.name(), at, watts);
      }
    }
    for (RectifierSection section : changed.elements(RectifierSection.class)) {
      if (isMeant(section.bottle()) && outcome instanceof SolveOutcome.Solved solved) {
        add(fitted, section.name(), point(solved.point(), section), Double.NaN);
      }
    }
  }

  private static SectionPoint point(OperatingPoint point, RectifierSection section) {
    return point.at(section);
  }

  private static final SectionPoint NOWHERE =
      new SectionPoint(Double.NaN, Double.NaN, Double.NaN, Double.NaN, Double.NaN, Double.NaN);

  private boolean isMeant(String bottle) {
    return sockets.stream().anyMatch(socket -> socket.name().equals(bottle));
  }

  private void add(TubeType fitted, String section, SectionPoint at, double wattsMax) {
    found.add(
        new StageIdle(
            fitted.name(), section, at.plateAmps(), at.plateVolts(), at.plateWatts(), wattsMax));
  }
}
