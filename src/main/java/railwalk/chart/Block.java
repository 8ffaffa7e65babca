package railwalk.chart;

/** One thing that stands on a page, in words and figures ready to print. */
public sealed interface Block
    permits Heading,
        Paragraph,
        Caution,
        KeyFigures,
        Table,
        Ladder,
        Remarks,
        FillIn,
        Plot,
        BaseDrawing,
        Abreast,
        SmallPrint {
  /** Calls the visitor's method for this kind of block. */
  void accept(BlockVisitor visitor);
}
