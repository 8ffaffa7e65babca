package railwalk.cli;

import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Callable;
import railwalk.chart.Chart;
import railwalk.chart.ChartBuilder;
import railwalk.chart.ChartInput;
import railwalk.chart.Column;
import railwalk.circuit.Circuit;
import railwalk.circuit.State;
import railwalk.device.Catalogue;
import railwalk.findings.Findings;
import railwalk.netlist.NetlistReader;
import railwalk.netlist.NetlistResult;
import railwalk.render.pdf.Paper;
import railwalk.render.pdf.PdfRenderer;
import railwalk.render.text.TextRenderer;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.spread.Bands;
import railwalk.spread.FirstOrderBands;
import railwalk.walk.SupplyMap;
import railwalk.walk.Walk;

/**
 * Where the time of one cold {@code railwalk chart} goes, phase by phase: processor time of the one
 * thread that does the work, class loading included, compiler threads left out. Not a test.
 *
 * <pre>java -cp target/railwalk.jar:target/test-classes railwalk.cli.ColdStart NETLIST</pre>
 */
final class ColdStart {
  private final List<String> phases = new ArrayList<>();
  private long lastNanos;

  private ColdStart() {}

  /** Prints a line for each phase. */
  public static void main(String[] args) throws Exception {
    ColdStart start = new ColdStart();
    start.run(Path.of(args[0]));
    start.phases.forEach(System.out::println);
  }

  private void run(Path file) throws Exception {
    phase("virtual machine", () -> "");
    phase("command line", () -> CommandTree.build("chart").parseArgs("chart", file.toString()));
    NetlistResult result = phase("read", () -> NetlistReader.read(file, Catalogue.standard()));
    List<Circuit> circuits = new ArrayList<>();
    Circuit first = result.circuit().orElseThrow();
    circuits.add(first);
    for (State state : first.states()) {
      circuits.add(first.inState(state));
    }
    List<SupplyMap> maps = phase("walk", () -> circuits.stream().map(Walk::of).toList());
    List<OperatingPoint> points = new ArrayList<>();
    for (int i = 0; i < circuits.size(); i++) {
      Circuit circuit = circuits.get(i);
      SupplyMap map = maps.get(i);
      points.add(phase("solve column " + (i + 1), () -> solved(circuit, map)));
    }
    List<Bands> bands = phase("bands", () -> points.stream().map(FirstOrderBands::of).toList());
    phase(
        "findings", () -> points.stream().map(p -> Findings.of(p.circuit(), p.map(), p)).toList());
    List<Column> columns = new ArrayList<>();
    for (int i = 0; i < points.size(); i++) {
      columns.add(new Column("s" + i, points.get(i), bands.get(i), List.of()));
    }
    ChartInput input = new ChartInput("cold.cir", columns, List.of());
    Chart chart = phase("chart", () -> new ChartBuilder().build(input));
    phase("PDF", () -> new PdfRenderer().render(chart, Paper.A4));
    phase("text", () -> new TextRenderer().render(chart));
  }

  private static OperatingPoint solved(Circuit circuit, SupplyMap map) {
    return ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, map)).point();
  }

  private <T> T phase(String name, Callable<T> work) throws Exception {
    T done = work.call();
    long nanos = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
    phases.add(String.format(Locale.ROOT, "%-16s %6.0f ms", name, (nanos - lastNanos) / 1e6));
    lastNanos = nanos;
    return done;
  }
}
