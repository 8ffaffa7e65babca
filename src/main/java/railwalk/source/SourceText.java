package railwalk.source;

import java.util.List;

/**
 * One file's text, cut into lines, with the name that diagnostics show. Lines and columns count
 * from 1; a column counts characters, not bytes.
 */
public record SourceText(String fileName, List<String> lines) {
  public SourceText {
    lines = List.copyOf(lines);
  }

  /** Returns the text of {@code fileName} cut at LF, CRLF or lone CR. */
  public static SourceText of(String fileName, String text) {
    return new SourceText(fileName, List.of(text.split("\r\n|\n|\r", -1)));
  }

  /** The hash is the name's: a text goes with every place in it, and is long. */
  @Override
  public int hashCode() {
    return fileName.hashCode();
  }

  /** Returns line {@code number} (from 1), or an empty string past the end. */
  public String line(int number) {
    return number >= 1 && number <= lines.size() ? lines.get(number - 1) : "";
  }
}
