package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import java.util.stream.Collectors;
import railwalk.device.PublishedPoint;
import railwalk.fit.Comparison;
import railwalk.fit.FigureKind;
import railwalk.units.Quantity;

/**
 * The published points of a type by number: each figure as the sheet has it, how far the law is off
 * there, and who prints it.
 */
final class PointTable {
  private static final int LETTERS = 26;

  private final List<NumberedPoint> points;
  private final List<FigureKind> kinds;
  private final Map<String, String> letters = new LinkedHashMap<>();

  /**
   * @param sources texts of all sources of the type
   */
  PointTable(List<NumberedPoint> points, List<String> sources) {
    this.points = points;
    this.kinds =
        List.copyOf(
            points.stream()
                .flatMap(point -> point.rows().stream())
                .map(Comparison::measure)
                .collect(Collectors.toCollection(TreeSet::new)));
    sources.forEach(text -> letters.computeIfAbsent(text, key -> letter(letters.size())));
  }

  /** Returns a, b … z, aa, ab …. */
  private static String letter(int index) {
    String last = Character.toString('a' + index % LETTERS);
    return index < LETTERS ? last : letter(index / LETTERS - 1) + last;
  }

  /**
   * @param title above the table
   * @param outside numbers of points that stand on no plot, in words; empty for none
   */
  Table table(String title, String outside) {
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("No.", Table.Use.KEY_FIGURES));
    columns.add(new Table.Column("Published at", Table.Use.WORDS));
    for (FigureKind kind : kinds) {
      columns.add(new Table.Column(head(kind), unit(kind), Table.Use.FIGURES));
      columns.add(new Table.Column(head(kind), "off %", Table.Use.FIGURES));
    }
    columns.add(new Table.Column("Source", Table.Use.WORDS));
    List<String> notes = new ArrayList<>();
    if (!outside.isEmpty()) {
      notes.add(outside);
    }
    if (points.stream().flatMap(p -> p.credits().stream()).anyMatch(PointTable::remembered)) {
      notes.add("* taken from memory of that sheet.");
    }
    List<Table.Row> rows = points.stream().map(this::row).toList();
    return new Table(title, columns, List.of(new Table.Group("", "", rows, notes)));
  }

  /** Returns the list of sources with the letters that the table uses. */
  Paragraph sources() {
    return new Paragraph(
        letters.entrySet().stream()
                .map(e -> e.getValue() + "\u00A0" + e.getKey())
                .collect(Collectors.joining("; "))
            + ".");
  }

  private Table.Row row(NumberedPoint numbered) {
    List<String> cells = new ArrayList<>();
    cells.add(Integer.toString(numbered.number()));
    cells.add(numbered.rows().isEmpty() ? "" : words(numbered.rows().get(0)));
    for (FigureKind kind : kinds) {
      Comparison found = null;
      for (Comparison row : numbered.rows()) {
        found = row.measure() == kind ? row : found;
      }
      cells.add(found == null ? "" : Quantity.plainVolts(scale(kind) * found.published()));
      cells.add(found == null ? "" : found.errorWords());
    }
    cells.add(
        numbered.credits().stream()
            .map(credit -> letters.getOrDefault(credit.source(), "") + star(credit))
            .distinct()
            .collect(Collectors.joining(" ")));
    return new Table.Row(cells, "");
  }

  /** Returns the point in a few words: volts, or the current at which a drop is published. */
  static String words(Comparison row) {
    return row.measure() == FigureKind.DROP
        ? Quantity.amps(row.point().published().plateAmps())
        : row.pointWords();
  }

  private static String star(PublishedPoint.Credit credit) {
    return remembered(credit) ? "*" : "";
  }

  private static boolean remembered(PublishedPoint.Credit credit) {
    return credit.provenance().equals("memory");
  }

  private static String head(FigureKind kind) {
    return switch (kind) {
      case PLATE_CURRENT -> "Plate";
      case SCREEN_CURRENT -> "Screen";
      case CATHODE_CURRENT -> "Cathode";
      case BIAS -> "Bias for it";
      case PLATE_VOLTS -> "Plate volts";
      case MUTUAL_CONDUCTANCE -> "gm";
      case AMPLIFICATION -> "mu";
      case SCREEN_AMPLIFICATION -> "Screen mu";
      case PLATE_RESISTANCE -> "rp";
      case DROP -> "Drop";
    };
  }

  private static String unit(FigureKind kind) {
    return switch (kind) {
      case PLATE_CURRENT, SCREEN_CURRENT, CATHODE_CURRENT -> "mA";
      case BIAS, PLATE_VOLTS, DROP -> "V";
      case MUTUAL_CONDUCTANCE -> "mS";
      case AMPLIFICATION, SCREEN_AMPLIFICATION -> "sheet";
      case PLATE_RESISTANCE -> "kΩ";
    };
  }

  private static double scale(FigureKind kind) {
    return switch (kind) {
      case PLATE_CURRENT, SCREEN_CURRENT, CATHODE_CURRENT, MUTUAL_CONDUCTANCE -> 1e3;
      case PLATE_RESISTANCE -> 1e-3;
      case BIAS, PLATE_VOLTS, DROP, AMPLIFICATION, SCREEN_AMPLIFICATION -> 1;
    };
  }
}
