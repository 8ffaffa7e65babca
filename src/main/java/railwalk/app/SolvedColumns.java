package railwalk.app;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Column;
import railwalk.circuit.Circuit;
import railwalk.circuit.State;
import railwalk.findings.Finding;
import railwalk.findings.Findings;
import railwalk.netlist.Origins;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.solve.Unloaded;
import railwalk.source.Diagnostic;
import railwalk.spread.Bands;
import railwalk.spread.FirstOrderBands;
import railwalk.spread.SampledBands;
import railwalk.walk.SupplyMap;
import railwalk.walk.Walk;

/** The columns of a chart: the amplifier as its netlist stands, then each of its states, solved. */
final class SolvedColumns {
  private SolvedColumns() {}

  /** Returns the amplifier as its netlist stands, solved. */
  static Column first(TracedAmplifier amplifier) throws CannotDo {
    return column("", amplifier.circuit(), amplifier.origins(), BandKind.FIRST_ORDER);
  }

  /** Returns all columns of {@code amplifier}; refuses where one would not settle. */
  static List<Column> of(TracedAmplifier amplifier) throws CannotDo {
    return of(amplifier, BandKind.FIRST_ORDER);
  }

  /** Returns all columns of {@code amplifier}, their bands found in the way asked for. */
  static List<Column> of(TracedAmplifier amplifier, BandKind kind) throws CannotDo {
    Circuit circuit = amplifier.circuit();
    Origins origins = amplifier.origins();
    List<Column> columns = new ArrayList<>();
    columns.add(column("", circuit, origins, kind));
    for (State state : circuit.states()) {
      columns.add(column(state.name(), circuit.inState(state), origins, kind));
    }
    return columns;
  }

  /** Only the netlist as it stands is looked at before its tubes warm up. */
  private static Column column(String state, Circuit circuit, Origins origins, BandKind kind)
      throws CannotDo {
    SupplyMap map = Walk.of(circuit);
    OperatingPoint point = solve(state, circuit, map);
    OperatingPoint unloaded = state.isEmpty() ? Unloaded.of(circuit).orElse(null) : null;
    Bands bands = kind == BandKind.SAMPLED ? SampledBands.of(point) : FirstOrderBands.of(point);
    List<Diagnostic> findings = placed(Findings.of(circuit, map, point, unloaded), origins);
    return new Column(state, point, bands, findings, unloaded);
  }

  /** Returns the operating point of {@code circuit}, or a refusal that names the node. */
  static OperatingPoint solve(String state, Circuit circuit, SupplyMap map) throws CannotDo {
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, map);
    if (outcome instanceof SolveOutcome.Solved solved) {
      return solved.point();
    }
    SolveOutcome.NotSolved failure = (SolveOutcome.NotSolved) outcome;
    String which = state.isEmpty() ? "" : " in state " + state;
    throw new CannotDo(
        "no operating point" + which + ": node " + failure.worstNode() + ": " + failure.reason());
  }

  /** Returns {@code findings} with the line of the part each is about. */
  static List<Diagnostic> placed(List<Finding> findings, Origins origins) {
    return findings.stream().map(finding -> placed(finding, origins)).toList();
  }

  private static Diagnostic placed(Finding finding, Origins origins) {
    return new Diagnostic(
        finding.severity(),
        finding.code(),
        finding.message(),
        finding.hint(),
        origins
            .of(finding.elementName())
            .or(() -> origins.ofBottle(finding.elementName()))
            .orElse(null));
  }
}
