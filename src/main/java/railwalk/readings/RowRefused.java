package railwalk.readings;

import java.util.Objects;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;

/** A row that does not count, with what is to be said about it. */
final class RowRefused extends Exception {
  private static final long serialVersionUID = 1L;

  private final transient Diagnostic diagnostic;

  RowRefused(SheetProblem problem, SourceSpan span, Object... words) {
    super(problem.code());
    this.diagnostic = problem.at(span, words);
  }

  /** Returns what is wrong and where. */
  Diagnostic diagnostic() {
    return Objects.requireNonNull(diagnostic, "lost in serialization");
  }
}
