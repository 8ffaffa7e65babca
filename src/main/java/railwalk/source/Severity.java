package railwalk.source;

/** How much a diagnostic matters: an error means that no solution is possible. */
public enum Severity {
  ERROR,
  WARNING,
  NOTE;

  /** Returns the word in lower case, as printed. */
  public String word() {
    return switch (this) {
      case ERROR -> "error";
      case WARNING -> "warning";
      case NOTE -> "note";
    };
  }
}
