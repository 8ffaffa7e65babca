package railwalk.readings;

import java.util.List;
import railwalk.source.Diagnostic;

/**
 * What reading a sheet comes to: the rows that could be read, and what is to be said about others.
 *
 * @param diagnostics in file order; an error concerns one row, which is then missing in the sheet
 */
public record SheetReading(ReadingSheet sheet, List<Diagnostic> diagnostics) {
  public SheetReading {
    diagnostics = List.copyOf(diagnostics);
  }
}
