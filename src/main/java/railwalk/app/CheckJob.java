package railwalk.app;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Objects;
import java.util.Set;
import railwalk.chart.Column;
import railwalk.circuit.Circuit;
import railwalk.findings.Findings;
import railwalk.netlist.NetlistResult;
import railwalk.source.Diagnostic;
import railwalk.source.DiagnosticPrinter;
import railwalk.source.Severity;
import railwalk.walk.Walk;

/**
 * What is wrong or doubtful in a netlist and in the amplifier it describes, in all its states,
 * without a chart.
 *
 * @param report the diagnostics with their places, and a line that counts them
 * @param errors how many of them make a chart impossible
 */
public record CheckJob(String report, long errors) {

  /** Checks {@code netlist}. Refuses when it cannot be read or has no operating point. */
  public static CheckJob of(Path netlist) throws CannotDo {
    NetlistResult result = TracedAmplifier.result(netlist);
    Set<Diagnostic> found = new LinkedHashSet<>(result.diagnostics());
    if (result.circuit().isPresent()) {
      found.addAll(findings(result, result.circuit().get(), netlist));
    }
    List<Diagnostic> sorted = new ArrayList<>(found);
    sorted.sort(Diagnostic.IN_FILE_ORDER);
    return new CheckJob(
        DiagnosticPrinter.print(sorted) + summary(netlist, sorted), count(sorted, Severity.ERROR));
  }

  private static List<Diagnostic> findings(NetlistResult result, Circuit circuit, Path netlist)
      throws CannotDo {
    if (!result.origins().unknowns().isEmpty()) {
      return SolvedColumns.placed(Findings.of(circuit, Walk.of(circuit), null), result.origins());
    }
    List<Column> columns = SolvedColumns.of(TracedAmplifier.of(netlist, result, circuit));
    List<Diagnostic> found = new ArrayList<>(columns.get(0).findings());
    for (Column state : columns.subList(1, columns.size())) {
      for (Diagnostic finding : state.findings()) {
        if (found.stream().noneMatch(f -> isSame(f, finding))) {
          found.add(inState(state.state(), finding));
        }
      }
    }
    return found;
  }

  /** Returns whether two findings say the same of one part, whatever their figures. */
  private static boolean isSame(Diagnostic one, Diagnostic other) {
    return one.code().equals(other.code()) && Objects.equals(one.span(), other.span());
  }

  private static Diagnostic inState(String state, Diagnostic finding) {
    return new Diagnostic(
        finding.severity(),
        finding.code(),
        "in state " + state + ": " + finding.message(),
        finding.hint(),
        finding.span());
  }

  private static String summary(Path netlist, List<Diagnostic> all) {
    return netlist.getFileName()
        + ": "
        + counted(count(all, Severity.ERROR), "error")
        + ", "
        + counted(count(all, Severity.WARNING), "warning")
        + ", "
        + counted(count(all, Severity.NOTE), "note")
        + "\n";
  }

  private static long count(List<Diagnostic> all, Severity severity) {
    return all.stream().filter(d -> d.severity() == severity).count();
  }

  private static String counted(long count, String word) {
    return count == 1 ? "1 " + word : (count == 0 ? "no " : count + " ") + word + "s";
  }
}
