package railwalk.chart;

/** One method per kind of block: the compiler lists every renderer that a new kind concerns. */
public interface BlockVisitor {
  void visit(Heading heading);

  void visit(Paragraph paragraph);

  void visit(Caution caution);

  void visit(KeyFigures keyFigures);

  void visit(Table table);

  void visit(Ladder ladder);

  void visit(Remarks remarks);

  void visit(FillIn fillIn);

  void visit(Plot plot);

  void visit(BaseDrawing base);

  void visit(Abreast abreast);

  void visit(SmallPrint smallPrint);
}
