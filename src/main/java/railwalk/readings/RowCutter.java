package railwalk.readings;

import java.util.ArrayList;
import java.util.List;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;

/**
 * Cuts a sheet into rows and cells as RFC 4180 (2005) has them: a cell in double quotes holds
 * separators, line ends and, written twice, quotes. Beyond it: blanks around cells and quotes,
 * quotes as plain signs in a cell that does not start with one, other separators, and lines that
 * are passed over: empty ones and those that start with # or *.
 */
final class RowCutter {
  /** A quote that is not closed within so many lines was never meant to be closed there. */
  private static final int MOST_LINES_OF_A_CELL = 20;

  private static final char QUOTE = '"';

  private final SourceText text;
  private final Separator separator;

  /** Where the cutter stands: line from 1, column from 0. */
  private int line;

  private int at;
  private String signs = "";

  RowCutter(SourceText text, Separator separator) {
    this.text = text;
    this.separator = separator;
  }

  /** Returns whether a line that starts a row is to be passed over. */
  static boolean isRemark(String line) {
    String stripped = Cell.strip(line);
    return stripped.isEmpty() || stripped.startsWith("#") || stripped.startsWith("*");
  }

  /** Returns all rows in order. */
  List<SheetRow> rows() {
    List<SheetRow> rows = new ArrayList<>();
    for (int next = 1; next <= text.lines().size(); next++) {
      if (!isRemark(text.line(next))) {
        SheetRow row = row(next);
        rows.add(row);
        next = row.flaw() == null ? line : next;
      }
    }
    return rows;
  }

  /** Returns the row that starts on {@code first}. */
  SheetRow row(int first) {
    moveTo(first);
    List<Cell> cells = new ArrayList<>();
    try {
      cells.add(cell());
      while (at < signs.length()) {
        at++;
        cells.add(cell());
      }
      return new SheetRow(cells, null);
    } catch (RowRefused refused) {
      SourceSpan place = refused.diagnostic().span();
      Diagnostic flaw =
          place != null && place.line() == first
              ? refused.diagnostic()
              : SheetProblem.QUOTE_OPEN.at(
                  span(first, 0, text.line(first).length()), separator.word());
      return new SheetRow(List.of(new Cell("", false, span(first, 0, 1))), flaw);
    }
  }

  private void moveTo(int number) {
    line = number;
    at = 0;
    signs = text.line(number);
  }

  private Cell cell() throws RowRefused {
    int from = at;
    skipBlanks();
    if (at < signs.length() && signs.charAt(at) == QUOTE) {
      return quoted();
    }
    int end = signs.indexOf(separator.sign(), at);
    end = end < 0 ? signs.length() : end;
    String written = Cell.strip(signs.substring(at, end));
    SourceSpan span = span(line, written.isEmpty() ? from : at, written.length());
    at = end;
    return new Cell(written, false, span);
  }

  private Cell quoted() throws RowRefused {
    int openLine = line;
    int openAt = at;
    SourceSpan open = span(openLine, openAt, 1);
    StringBuilder held = new StringBuilder();
    at++;
    while (true) {
      if (at >= signs.length()) {
        if (line >= text.lines().size() || line - openLine >= MOST_LINES_OF_A_CELL) {
          throw new RowRefused(SheetProblem.QUOTE_OPEN, open, separator.word());
        }
        moveTo(line + 1);
        held.append('\n');
        continue;
      }
      char sign = signs.charAt(at++);
      if (sign != QUOTE) {
        held.append(sign);
      } else if (at < signs.length() && signs.charAt(at) == QUOTE) {
        held.append(QUOTE);
        at++;
      } else {
        break;
      }
    }
    SourceSpan close = span(line, at - 1, 1);
    int end = at;
    skipBlanks();
    if (at < signs.length() && signs.charAt(at) != separator.sign()) {
      throw line == openLine
          ? new RowRefused(SheetProblem.QUOTE_STRAY, close)
          : new RowRefused(SheetProblem.QUOTE_OPEN, open, separator.word());
    }
    int length = line == openLine ? end - openAt : text.line(openLine).length() - openAt;
    return new Cell(Cell.strip(held.toString()), true, span(openLine, openAt, length));
  }

  private void skipBlanks() {
    while (at < signs.length()
        && signs.charAt(at) != separator.sign()
        && Cell.isBlank(signs.charAt(at))) {
      at++;
    }
  }

  private SourceSpan span(int onLine, int from, int length) {
    return new SourceSpan(text, onLine, from + 1, length);
  }
}
