package railwalk.chart;

/** One thing that stands on a page, in words and figures ready to print. */
public sealed interface Block
    permits Heading, Paragraph, Caution, KeyFigures, Table, Ladder, Remarks, FillIn {
  /** Calls the visitor's method for this kind of block. */
  void accept(BlockVisitor visitor);
}
