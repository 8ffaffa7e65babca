package railwalk.chart;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import railwalk.source.Diagnostic;
import railwalk.source.Severity;
import railwalk.source.SourceSpan;

/** The last page: findings, then the assumptions that were made. */
final class NotesPage {
  private final ChartInput input;
  private final List<Diagnostic> all;

  /**
   * @param all of the first column, most urgent first
   */
  NotesPage(ChartInput input, List<Diagnostic> all) {
    this.input = input;
    this.all = all;
  }

  Page page() {
    List<Block> blocks = new ArrayList<>();
    blocks.add(new Heading("Findings"));
    List<Remarks.Remark> findings = findings();
    blocks.add(findings.isEmpty() ? new Paragraph("None.") : new Remarks(findings));
    List<Remarks.Remark> notes =
        all.stream().filter(d -> d.severity() == Severity.NOTE).map(d -> remark("", d)).toList();
    if (!notes.isEmpty()) {
      blocks.add(new Heading("Notes: what was assumed"));
      blocks.add(new Remarks(notes));
    }
    return new Page("Findings and notes", blocks);
  }

  /** Returns whether {@code diagnostic} is a finding rather than a note of an assumption. */
  static boolean isFinding(Diagnostic diagnostic) {
    return diagnostic.severity() != Severity.NOTE;
  }

  /** Returns the findings of all columns, each that is said of several once. */
  List<Remarks.Remark> findings() {
    List<Remarks.Remark> findings = new ArrayList<>();
    Set<String> said = new HashSet<>();
    for (Diagnostic diagnostic : all) {
      if (isFinding(diagnostic)) {
        said.add(diagnostic.code() + diagnostic.message());
        findings.add(remark(diagnostic.severity().word(), diagnostic));
      }
    }
    for (Column state : input.states()) {
      for (Diagnostic diagnostic : state.findings()) {
        if (isFinding(diagnostic) && said.add(diagnostic.code() + diagnostic.message())) {
          findings.add(
              remark(diagnostic.severity().word() + " in state " + state.state(), diagnostic));
        }
      }
    }
    return findings;
  }

  private static Remarks.Remark remark(String mark, Diagnostic diagnostic) {
    SourceSpan span = diagnostic.span();
    String place = span == null ? "" : span.text().fileName() + " line " + span.line();
    return new Remarks.Remark(mark, place, diagnostic.message(), diagnostic.hint());
  }
}
