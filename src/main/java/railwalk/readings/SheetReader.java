package railwalk.readings;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.source.Diagnostic;
import railwalk.source.FileBytes;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;

/**
 * The door: a sheet's text, or words from the command line, in; a {@link SheetReading} out. Bad
 * text never makes it throw: every bad row is missing in the sheet and has its own message.
 *
 * <p>A sheet is CSV as RFC 4180 has it, or with semicolons or tabs, where a comma in a figure is
 * the decimal sign. Columns are found by the header {@code point,volts,kind,state,range,note}, in
 * any order and case; without one they are taken in that order. Rows {@code line} and {@code meter}
 * set the conditions. Empty lines and those that start with # or * are passed over, and so are rows
 * whose volts are empty: a sheet need not be filled in all over.
 *
 * <p>Figures are volts against the reference unless the kind or their unit says otherwise; bare
 * figures of kind ohms are ohm, of kind ma milliampere.
 */
public final class SheetReader {
  private static final String WORDS_NAME = "readings";
  private static final int LONGEST_LINE = 20_000;

  private SheetReader() {}

  /** Reads the sheet {@code text}; a byte order mark at its start does no harm. */
  public static SheetReading read(String fileName, String text, Circuit circuit) {
    String plain = text.startsWith("\ufeff") ? text.substring(1) : text;
    if (plain.length() > FileBytes.LARGEST_BYTES) {
      return refused(SheetProblem.NOT_A_SHEET, fileName, "a file far too large for one");
    }
    Optional<String> foreign = FileBytes.foreignKind(plain);
    if (foreign.isPresent()) {
      return refused(SheetProblem.NOT_A_SHEET, fileName, foreign.get());
    }
    if (plain.isBlank()) {
      return refused(SheetProblem.SHEET_EMPTY, fileName);
    }
    SourceText source = SourceText.of(fileName, plain);
    if (source.lines().stream().anyMatch(line -> line.length() > LONGEST_LINE)) {
      return refused(SheetProblem.NOT_A_SHEET, fileName, "one endless line");
    }
    return read(source, circuit);
  }

  /**
   * Reads words such as {@code V1.6=171}, {@code R38=35mV}, {@code V4.k=35mA}, {@code line=118} or
   * {@code meter=20k/V}: a point, its value, and where it takes them a kind and a state with commas
   * between ({@code b1=2.1,ripple}). In diagnostics each word is a line of its own.
   */
  public static SheetReading ofWords(List<String> words, Circuit circuit) {
    List<String> lines = new ArrayList<>();
    for (String word : words) {
      lines.add(word.replaceAll("\\R", " "));
    }
    SourceText source = new SourceText(WORDS_NAME, lines);
    SheetBuilder builder = new SheetBuilder(circuit, SheetBuilder.Form.WORDS, Separator.COMMA);
    for (int i = 1; i <= lines.size(); i++) {
      String word = source.line(i);
      int equals = word.indexOf('=');
      if (Cell.strip(equals < 0 ? "" : word.substring(0, equals)).isEmpty()) {
        SourceSpan span = new SourceSpan(source, i, 1, word.length());
        builder.said().add(SheetProblem.WORD_SHAPE.at(span, word.isBlank() ? "\"\"" : word));
      } else {
        builder.take(row(source, i, equals), Columns.usual());
      }
    }
    return builder.done();
  }

  private static SheetRow row(SourceText source, int line, int equals) {
    String word = source.line(line);
    List<Cell> cells = new ArrayList<>();
    cells.add(cell(source, line, 0, equals));
    int from = equals + 1;
    while (from <= word.length()) {
      int comma = word.indexOf(Separator.COMMA.sign(), from);
      int end = comma < 0 ? word.length() : comma;
      cells.add(cell(source, line, from, end));
      from = end + 1;
    }
    return new SheetRow(cells, null);
  }

  private static Cell cell(SourceText source, int line, int from, int end) {
    String text = Cell.strip(source.line(line).substring(from, end));
    return new Cell(text, false, new SourceSpan(source, line, from + 1, end - from));
  }

  private static SheetReading read(SourceText source, Circuit circuit) {
    Separator separator = Separator.of(source);
    SheetBuilder builder = new SheetBuilder(circuit, SheetBuilder.Form.SHEET, separator);
    List<SheetRow> rows = new RowCutter(source, separator).rows();
    Columns columns = Columns.usual();
    boolean headed = false;
    for (SheetRow row : rows) {
      if (row.flaw() == null && Columns.isHeader(row)) {
        columns = Columns.of(row, builder.said());
        headed = true;
        continue;
      }
      Diagnostic lacking = headed || !builder.isEmpty() ? null : lackingColumn(row);
      if (lacking != null) {
        return new SheetReading(new ReadingSheet(List.of(), Double.NaN, ""), List.of(lacking));
      }
      builder.take(row, columns);
    }
    Optional<SourceSpan> first = builder.firstReading();
    if (!headed && builder.likeReadings() * 2 < rows.size() && first.isEmpty()) {
      return refused(SheetProblem.NO_ROW_READABLE, source.fileName());
    }
    if (!headed && first.isPresent()) {
      builder.said().add(SheetProblem.HEADER_MISSING.at(first.get()));
    }
    if (first.isEmpty() && builder.said().stream().noneMatch(Diagnostic::isError)) {
      builder.said().add(SheetProblem.NOTHING_FILLED_IN.at(null, source.fileName()));
    }
    return builder.done();
  }

  private static @Nullable Diagnostic lackingColumn(SheetRow row) {
    Optional<Column> lacking = row.flaw() == null ? Columns.lacking(row) : Optional.empty();
    return lacking
        .map(column -> SheetProblem.COLUMN_MISSING.at(row.cell(0).span(), column.word()))
        .orElse(null);
  }

  private static SheetReading refused(SheetProblem problem, Object... words) {
    return new SheetReading(
        new ReadingSheet(List.of(), Double.NaN, ""), List.of(problem.at(null, words)));
  }
}
