package railwalk.source;

import java.util.List;

/**
 * Diagnostics as text: {@code file:line:column: severity[code]: message}, the source line, a caret
 * under the place, and the hint.
 */
public final class DiagnosticPrinter {
  private DiagnosticPrinter() {}

  /** Returns all of {@code diagnostics} in the order given, each block ending in a newline. */
  public static String print(List<Diagnostic> diagnostics) {
    StringBuilder out = new StringBuilder();
    diagnostics.forEach(diagnostic -> append(out, diagnostic));
    return out.toString();
  }

  private static void append(StringBuilder out, Diagnostic diagnostic) {
    SourceSpan span = diagnostic.span();
    if (span != null) {
      out.append(span.text().fileName())
          .append(':')
          .append(span.line())
          .append(':')
          .append(span.column())
          .append(": ");
    }
    out.append(diagnostic.severity().word())
        .append('[')
        .append(diagnostic.code())
        .append("]: ")
        .append(diagnostic.message())
        .append('\n');
    if (span != null) {
      String line = span.text().line(span.line());
      out.append("    ").append(line.replace('\t', ' ')).append('\n');
      int start = Math.min(span.column() - 1, line.length());
      int length = Math.max(1, Math.min(span.length(), line.length() - start));
      out.append("    ").append(" ".repeat(start)).append("^".repeat(length)).append('\n');
    }
    if (!diagnostic.hint().isEmpty()) {
      out.append("    hint: ").append(diagnostic.hint()).append('\n');
    }
  }
}
