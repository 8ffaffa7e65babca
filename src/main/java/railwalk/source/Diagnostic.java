package railwalk.source;

import java.util.Comparator;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * One thing said about the user's text: what is wrong or was assumed, where, and what to do.
 *
 * @param code short stable name such as {@code unknown-type}
 * @param message one sentence, no full stop
 * @param hint what was expected or a suggestion; empty when there is none
 * @param span where; null when it concerns the file as a whole
 */
public record Diagnostic(
    Severity severity, String code, String message, String hint, @Nullable SourceSpan span) {

  /** File order: by line, then column, then severity, then code; whole-file remarks first. */
  public static final Comparator<Diagnostic> IN_FILE_ORDER =
      Comparator.<Diagnostic>comparingInt(d -> d.span == null ? 0 : d.span.line())
          .thenComparingInt(d -> d.span == null ? 0 : d.span.column())
          .thenComparing(Diagnostic::severity)
          .thenComparing(Diagnostic::code)
          .thenComparing(Diagnostic::message);

  /** Returns the stable code of a kind of problem: its name in lower case, with hyphens. */
  public static String code(Enum<?> kind) {
    return kind.name().toLowerCase(Locale.ROOT).replace('_', '-');
  }

  /**
   * Returns the diagnostic of a kind of problem whose texts leave places for the words that differ
   * ({@code %1$s}).
   */
  public static Diagnostic of(
      Enum<?> kind,
      Severity severity,
      String message,
      String hint,
      @Nullable SourceSpan span,
      Object... words) {
    return new Diagnostic(
        severity,
        code(kind),
        String.format(Locale.ROOT, message, words),
        String.format(Locale.ROOT, hint, words),
        span);
  }

  /** Returns whether no solution is possible while this stands. */
  public boolean isError() {
    return severity == Severity.ERROR;
  }
}
