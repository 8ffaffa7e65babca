package railwalk.device;

import java.util.List;
import java.util.Objects;
import railwalk.source.Diagnostic;
import railwalk.source.DiagnosticPrinter;

/** A type's data file that cannot be used, with the place and what was expected. */
public final class DataFileException extends IllegalArgumentException {
  private static final long serialVersionUID = 1L;

  private final transient Diagnostic diagnostic;

  DataFileException(Diagnostic diagnostic) {
    super(DiagnosticPrinter.print(List.of(diagnostic)).strip());
    this.diagnostic = diagnostic;
  }

  /** Returns what is wrong and where. */
  public Diagnostic diagnostic() {
    return Objects.requireNonNull(diagnostic, "lost in serialization");
  }
}
