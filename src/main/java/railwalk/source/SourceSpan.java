package railwalk.source;

/**
 * A run of characters on one line of a {@link SourceText}: where a diagnostic points.
 *
 * @param line from 1
 * @param column of the first character, from 1
 * @param length in characters, at least 1
 */
public record SourceSpan(SourceText text, int line, int column, int length) {
  public SourceSpan {
    length = Math.max(1, length);
  }
}
