package railwalk.netlist;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;

/** Parts a file of types, in the catalogue's own format, at its {@code type} lines. */
final class TubesFile {
  private static final String TYPE = "type";

  /** Says how well a law fitted elsewhere met its points; the law here is fitted anew. */
  private static final String RESIDUAL = "residual";

  private TubesFile() {}

  /**
   * Returns the types in {@code file}, in its order.
   *
   * @param from the netlist's word that names the file
   */
  static List<GivenType> read(SourceText file, Word from, Report report) {
    List<GivenType> types = new ArrayList<>();
    GivenType type = null;
    for (int number = 1; number <= file.lines().size(); number++) {
      String line = file.line(number);
      String key = word(line, 0);
      if (key.isEmpty() || key.equals(RESIDUAL)) {
        continue;
      }
      if (key.equals(TYPE)) {
        type = new GivenType(name(file, number, line, from));
        types.add(type);
      } else if (type == null) {
        int column = line.indexOf(key) + 1;
        report.add(Problem.TUBES_FILE, new SourceSpan(file, number, column, key.length()), key);
        return types;
      }
      if (type != null) {
        type.copy(file, number);
      }
    }
    if (types.isEmpty()) {
      report.add(Problem.TUBES_FILE_EMPTY, from.span(), from.text());
    }
    return types;
  }

  private static Word name(SourceText file, int number, String line, Word from) {
    String name = word(line, 1);
    if (name.isEmpty()) {
      return new Word(TYPE, new SourceSpan(file, number, line.indexOf(TYPE) + 1, 4), from.form());
    }
    int column = line.indexOf(name, line.indexOf(TYPE) + TYPE.length()) + 1;
    return new Word(name, new SourceSpan(file, number, column, name.length()), Word.Form.PLAIN);
  }

  /** Returns word {@code index} of a line; empty where there is none. */
  private static String word(@Nullable String line, int index) {
    if (line == null) {
      return "";
    }
    int comment = line.indexOf('#');
    String[] words = (comment < 0 ? line : line.substring(0, comment)).strip().split("\\s+", 3);
    return index < words.length ? words[index] : "";
  }
}
