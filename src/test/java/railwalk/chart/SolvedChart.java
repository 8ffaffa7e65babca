package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.circuit.State;
import railwalk.device.Catalogue;
import railwalk.findings.Findings;
import railwalk.netlist.NetlistReader;
import railwalk.netlist.NetlistResult;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.source.Diagnostic;
import railwalk.spread.FirstOrderBands;
import railwalk.walk.SupplyMap;
import railwalk.walk.Walk;

/** Charts of netlists written into a test, solved for real. */
final class SolvedChart {
  private SolvedChart() {}

  /** Returns the chart of {@code lines}, the first being the title. */
  static Chart of(String... lines) {
    return new ChartBuilder().build(input(lines));
  }

  /** Returns what the chart of {@code lines} is made from. */
  static ChartInput input(String... lines) {
    NetlistResult read =
        NetlistReader.readText("test.cir", String.join("\n", lines), Catalogue.standard());
    Circuit circuit =
        read.circuit().orElseThrow(() -> new AssertionError("not read: " + read.diagnostics()));
    List<Column> columns = new ArrayList<>();
    columns.add(column("", circuit));
    for (State state : circuit.states()) {
      columns.add(column(state.name(), circuit.inState(state)));
    }
    return new ChartInput("test.cir", columns, read.diagnostics());
  }

  private static Column column(String state, Circuit circuit) {
    SupplyMap map = Walk.of(circuit);
    if (OperatingPointSolver.solve(circuit, map) instanceof SolveOutcome.Solved solved) {
      OperatingPoint point = solved.point();
      List<Diagnostic> findings =
          Findings.of(circuit, map, point).stream()
              .map(f -> new Diagnostic(f.severity(), f.code(), f.message(), f.hint(), null))
              .toList();
      return new Column(state, point, FirstOrderBands.of(point), findings);
    }
    throw new AssertionError("not solved: " + circuit.title());
  }

  /** Returns every text on the chart, a line each. */
  static String textOf(Chart chart) {
    List<String> texts = new ArrayList<>();
    texts.add(chart.conditionsLine());
    for (Page page : chart.pages()) {
      texts.add(page.title());
      page.blocks().forEach(block -> block.accept(new Gatherer(texts)));
    }
    return String.join("\n", texts);
  }

  /** Returns the tables on the page called {@code title}. */
  static List<Table> tables(Chart chart, String title) {
    return chart.pages().stream()
        .filter(page -> page.title().equals(title))
        .flatMap(page -> page.blocks().stream())
        .filter(Table.class::isInstance)
        .map(Table.class::cast)
        .toList();
  }

  /** Returns the cells under {@code head} of all rows of a table. */
  static List<String> cells(Table table, String head) {
    int index = table.columns().stream().map(Table.Column::head).toList().indexOf(head);
    return table.groups().stream()
        .flatMap(group -> group.rows().stream())
        .map(row -> row.cells().get(index))
        .toList();
  }

  private record Gatherer(List<String> texts) implements BlockVisitor {
    @Override
    public void visit(Heading heading) {
      texts.add(heading.text());
    }

    @Override
    public void visit(Paragraph paragraph) {
      texts.add(paragraph.text());
    }

    @Override
    public void visit(Caution caution) {
      texts.add(caution.title());
      texts.addAll(caution.points());
    }

    @Override
    public void visit(KeyFigures keyFigures) {
      keyFigures.entries().forEach(entry -> texts.add(entry.label() + ": " + entry.text()));
    }

    @Override
    public void visit(Table table) {
      texts.add(table.title());
      table.columns().forEach(column -> texts.add(column.head()));
      for (Table.Group group : table.groups()) {
        texts.add(group.title() + " " + group.subtitle());
        for (Table.Row row : group.rows()) {
          texts.add(String.join(" | ", row.cells()) + " | " + row.remark());
        }
        texts.addAll(group.notes());
      }
    }

    @Override
    public void visit(Ladder ladder) {
      ladder.feeds().forEach(feed -> texts.add(feed.toString()));
    }

    @Override
    public void visit(Remarks remarks) {
      remarks.remarks().forEach(r -> texts.add(r.mark() + ": " + r.text() + " " + r.hint()));
    }

    @Override
    public void visit(FillIn fillIn) {
      texts.addAll(fillIn.labels());
    }

    @Override
    public void visit(Plot plot) {
      texts.add(plot.title());
      plot.curves().forEach(curve -> texts.add(curve.label()));
    }

    @Override
    public void visit(BaseDrawing base) {
      texts.add(base.title());
      base.contacts().forEach(contact -> texts.add(contact.leadsTo()));
    }

    @Override
    public void visit(Abreast abreast) {
      abreast.left().forEach(block -> block.accept(this));
      abreast.right().forEach(block -> block.accept(this));
    }

    @Override
    public void visit(SmallPrint smallPrint) {
      smallPrint.blocks().forEach(block -> block.accept(this));
    }
  }
}
