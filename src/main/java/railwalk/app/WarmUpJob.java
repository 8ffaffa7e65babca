package railwalk.app;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import railwalk.chart.ChartInput;
import railwalk.chart.WarmUpCase;
import railwalk.chart.WarmUpChart;
import railwalk.circuit.Circuit;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.findings.WarmUpLoads;
import railwalk.solve.OperatingPoint;
import railwalk.solve.WarmUp;
import railwalk.solve.WarmUpCourse;
import railwalk.solve.WarmUpOutcome;
import railwalk.walk.Walk;

/** Follows an amplifier from switch-on, in all the ways it can be switched on. */
public final class WarmUpJob {
  private static final double END_SECONDS = 60;

  /** When a switch that was left in a state's position is thrown. */
  private static final double SWITCHED_SECONDS = 30;

  private WarmUpJob() {}

  /** Returns what {@code netlist} does from switch-on; refuses where that cannot be followed. */
  public static BenchPaper of(Path netlist, BenchConditions conditions) throws CannotDo {
    TracedAmplifier amplifier = TracedAmplifier.under(conditions, netlist);
    ChartInput input =
        new ChartInput(
            amplifier.fileName(), List.of(SolvedColumns.first(amplifier)), amplifier.diagnostics());
    OperatingPoint running = input.first().point();
    List<WarmUpCase> cases = new ArrayList<>();
    WarmUpCase cold = cold("Cold switch-on", "a cold switch-on", running);
    followed(cold);
    cases.add(cold);
    Circuit circuit = amplifier.circuit();
    for (State state : circuit.states()) {
      addState(circuit, state, running, cases);
    }
    WarmUpCase hot =
        new WarmUpCase(
            "Hot restart",
            "all cathodes hot, capacitors empty",
            "a hot restart",
            running,
            WarmUp.of(List.of(new WarmUp.Stretch(running, END_SECONDS)), true));
    cases.add(hot);
    return new BenchPaper(
        WarmUpChart.of(
            input,
            cases,
            followed(hot),
            SolvedColumns.placed(WarmUpLoads.of(courses(cases)), amplifier.origins())));
  }

  private static WarmUpCase cold(String title, String occasion, OperatingPoint running) {
    WarmUpOutcome outcome = WarmUp.of(List.of(new WarmUp.Stretch(running, END_SECONDS)), false);
    return new WarmUpCase(title, "all cathodes cold, capacitors empty", occasion, running, outcome);
  }

  /** Adds a state from cold, and where it differs in switches only, leaving it after a while. */
  private static void addState(
      Circuit circuit, State state, OperatingPoint running, List<WarmUpCase> cases)
      throws CannotDo {
    Circuit there = circuit.inState(state);
    OperatingPoint point = SolvedColumns.solve(state.name(), there, Walk.of(there));
    String inState = " in state " + state.name();
    cases.add(cold("Cold switch-on" + inState, "a cold switch-on" + inState, point));
    boolean switched =
        !state.changes().isEmpty()
            && state.changes().stream().allMatch(StateChange.SwitchPosition.class::isInstance);
    if (switched) {
      WarmUpOutcome outcome =
          WarmUp.of(
              List.of(
                  new WarmUp.Stretch(point, SWITCHED_SECONDS),
                  new WarmUp.Stretch(running, END_SECONDS)),
              false);
      String name = state.name();
      cases.add(
          new WarmUpCase(
              name + " left after 30 s",
              "cold switch-on in state " + name + ", then as the netlist stands",
              "a cold switch-on whose " + name + " ends after 30 s",
              running,
              outcome));
    }
  }

  private static WarmUpCourse followed(WarmUpCase way) throws CannotDo {
    if (way.outcome() instanceof WarmUpOutcome.Lost lost) {
      throw new CannotDo(
          way.title()
              + " cannot be followed: node "
              + lost.node()
              + " after "
              + Math.round(lost.seconds())
              + " s: "
              + lost.reason());
    }
    return ((WarmUpOutcome.Followed) way.outcome()).course();
  }

  private static Map<String, WarmUpCourse> courses(List<WarmUpCase> cases) {
    Map<String, WarmUpCourse> courses = new LinkedHashMap<>();
    for (WarmUpCase way : cases) {
      if (way.outcome() instanceof WarmUpOutcome.Followed followed) {
        courses.put(way.occasion(), followed.course());
      }
    }
    return courses;
  }
}
