package railwalk.chart;

import java.util.List;

/**
 * A table, its rows in groups. No row is cut in two by a sheet's end, and the head is repeated on
 * the next sheet.
 *
 * @param title set above it, and again after a break; may be empty
 */
public record Table(String title, List<Column> columns, List<Group> groups) implements Block {

  /** What a column holds. */
  public enum Use {
    /** Words, flush left; they wrap where the column is narrow. */
    WORDS,
    /** Figures, flush right. */
    FIGURES,
    /** The figures one looks for first: flush right, bold. */
    KEY_FIGURES,
    /** Nothing: room to write by hand. */
    WRITING
  }

  /**
   * One column.
   *
   * @param group a heading that neighbouring columns with the same group share; empty for none
   */
  public record Column(String group, String head, Use use) {
    /** Makes a column outside any group. */
    public Column(String head, Use use) {
      this("", head, use);
    }
  }

  /**
   * Rows that belong together, such as those of one tube. A group stays on one sheet where it fits
   * on one.
   *
   * @param title may be empty
   * @param subtitle in a lighter hand beside the title; may be empty
   * @param notes lines below the rows, across all columns
   */
  public record Group(String title, String subtitle, List<Row> rows, List<String> notes) {
    public Group {
      rows = List.copyOf(rows);
      notes = List.copyOf(notes);
    }
  }

  /**
   * One row.
   *
   * @param cells one for each column
   * @param remark set small below the cells; empty for none
   */
  public record Row(List<String> cells, String remark) {
    public Row {
      cells = List.copyOf(cells);
    }

    /** Makes a row without remark. */
    public Row(String... cells) {
      this(List.of(cells), "");
    }
  }

  public Table {
    columns = List.copyOf(columns);
    groups = List.copyOf(groups);
    for (Group group : groups) {
      for (Row row : group.rows()) {
        if (row.cells().size() != columns.size()) {
          throw new IllegalArgumentException(
              row.cells().size() + " cells under " + columns.size() + " heads");
        }
      }
    }
  }

  /** Returns a table of one nameless group. */
  public static Table of(String title, List<Column> columns, List<Row> rows) {
    return new Table(title, columns, List.of(new Group("", "", rows, List.of())));
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
