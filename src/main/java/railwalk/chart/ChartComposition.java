package railwalk.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import railwalk.circuit.Circuit;
import railwalk.source.Diagnostic;

/** Composes one chart: pages in the order in which they are wanted at the bench. */
final class ChartComposition {
  /** Hot chassis first, then by weight, then as in the file. */
  private static final Comparator<Diagnostic> MOST_URGENT_FIRST =
      Comparator.<Diagnostic, Boolean>comparing(d -> !d.code().equals(Cautions.HOT_CHASSIS))
          .thenComparing(Diagnostic::severity)
          .thenComparing(Diagnostic.IN_FILE_ORDER);

  private final ChartInput input;
  private final Column first;
  private final Circuit circuit;
  private final Wording wording;

  ChartComposition(ChartInput input) {
    this.input = input;
    this.first = input.first();
    this.circuit = first.circuit();
    this.wording = new Wording(circuit.words());
  }

  Chart chart() {
    List<Diagnostic> findings =
        sorted(Stream.concat(input.diagnostics().stream(), first.findings().stream()));
    List<Figures> figures = figures(findings);
    PointCells cells = new PointCells(first, figures.get(0));
    ConditionsPage conditions = new ConditionsPage(input, findings, wording);
    List<Page> pages = new ArrayList<>();
    pages.add(conditions.page());
    pages.add(new SupplyPage(first, cells, wording).page());
    pages.add(new TubesPage(first, cells, wording).page());
    List<Block> drops = new DropsTable(first, wording).blocks().toList();
    if (!drops.isEmpty()) {
      pages.add(new Page("Drops and what they tell of currents", drops));
    }
    List<Block> loads = new LoadsPage(first, wording).blocks();
    if (!loads.isEmpty()) {
      pages.add(new Page("Supply parts and heaters against their limits", loads));
    }
    if (!input.states().isEmpty()) {
      pages.add(new StatesPage(input, figures, wording).page());
    }
    if (!input.otherLines().isEmpty()) {
      pages.add(new LinePage(first, input.otherLines(), wording).page());
    }
    pages.add(new NotesPage(input, findings).page());
    return new Chart(
        circuit.title(),
        "Voltage chart of " + input.fileName(),
        conditions.inOneLine(),
        Cautions.standing(),
        pages,
        figures);
  }

  private List<Figures> figures(List<Diagnostic> findings) {
    List<Figures> figures = new ArrayList<>();
    figures.add(new FiguresBuilder(first, circuit).build(findings, input.fileName()));
    for (Column state : input.states()) {
      figures.add(
          new FiguresBuilder(state, circuit)
              .build(sorted(state.findings().stream()), input.fileName()));
    }
    return figures;
  }

  private static List<Diagnostic> sorted(Stream<Diagnostic> diagnostics) {
    return diagnostics.distinct().sorted(MOST_URGENT_FIRST).toList();
  }
}
