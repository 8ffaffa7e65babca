package railwalk.chart;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import railwalk.chart.Table.Use;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.circuit.State;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/** The states beside the netlist as it stands: supply nodes, pins and currents. */
final class StatesPage {
  /** States that fit beside each other on a sheet. */
  private static final int STATES_ABREAST = 2;

  /** Below this a tube is cut off for all that a meter can tell. */
  private static final double NO_AMPS = 1e-9;

  private static final String FIRST = "As it stands";

  private final ChartInput input;
  private final List<Figures> figures;
  private final Circuit whole;
  private final List<PointCells> cellsByColumn = new ArrayList<>();
  private final List<List<Socket>> socketsByColumn = new ArrayList<>();
  private final Wording wording;

  StatesPage(ChartInput input, List<Figures> figures, Wording wording) {
    this.input = input;
    this.figures = figures;
    this.whole = input.first().circuit();
    for (int i = 0; i < input.columns().size(); i++) {
      cellsByColumn.add(new PointCells(input.columns().get(i), figures.get(i)));
      socketsByColumn.add(Socket.in(input.columns().get(i).circuit(), whole));
    }
    this.wording = wording;
  }

  Page page() {
    List<Block> blocks = new ArrayList<>();
    blocks.add(new KeyFigures(whole.states().stream().flatMap(this::entry).toList()));
    for (int from = 1; from < input.columns().size(); from += STATES_ABREAST) {
      int to = Math.min(from + STATES_ABREAST, input.columns().size());
      blocks.add(volts(from, to));
      blocks.add(currents(from, to));
    }
    return new Page("States side by side", blocks);
  }

  private Stream<KeyFigures.Entry> entry(State state) {
    return input.states().stream()
        .filter(c -> c.state().equals(state.name()))
        .map(
            c ->
                new KeyFigures.Entry(
                    state.name(), new StateWords(whole, wording).changes(state), false));
  }

  private Table volts(int from, int to) {
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column("Point", Use.WORDS));
    columns.add(new Table.Column("Electrode", Use.WORDS));
    columns.add(new Table.Column(FIRST, Use.FIGURES));
    for (Column state : input.columns().subList(from, to)) {
      columns.add(new Table.Column(state.state(), "V", Use.KEY_FIGURES));
      columns.add(new Table.Column(state.state(), "Low–high", Use.FIGURES));
      columns.add(new Table.Column(state.state(), "Reading", Use.WRITING));
    }
    List<Integer> shown = Stream.concat(Stream.of(0), range(from, to)).toList();
    List<Table.Group> groups = new ArrayList<>();
    List<Table.Row> supplies = supplyRows(shown);
    if (!supplies.isEmpty()) {
      groups.add(new Table.Group("Supply nodes", "", supplies, List.of()));
    }
    for (String tube : tubes(shown)) {
      groups.add(new Table.Group(tube, "", pinRows(tube, shown), List.of()));
    }
    return new Table("Volts", columns, groups);
  }

  private static Stream<Integer> range(int from, int to) {
    return Stream.iterate(from, i -> i < to, i -> i + 1);
  }

  private List<Table.Row> supplyRows(List<Integer> shown) {
    return input.first().map().supplyNodes().stream()
        .map(SupplyNode::node)
        .map(
            node -> {
              List<String> row = new ArrayList<>(List.of(node.name(), ""));
              shown.forEach(i -> addVolts(row, i, node.name()));
              return new Table.Row(row, "");
            })
        .toList();
  }

  private List<String> tubes(List<Integer> shown) {
    return shown.stream()
        .flatMap(i -> sockets(i).stream())
        .map(Socket::name)
        .distinct()
        .sorted(NaturalOrder.INSTANCE)
        .toList();
  }

  private List<Table.Row> pinRows(String tube, List<Integer> shown) {
    Set<String> labels = new LinkedHashSet<>();
    shown.forEach(
        i -> socket(i, tube).ifPresent(s -> s.pins().forEach(p -> labels.add(s.nameOf(p)))));
    List<Table.Row> rows = new ArrayList<>();
    for (String label : labels) {
      List<String> row = new ArrayList<>();
      row.add(label);
      row.add(shown.stream().flatMap(i -> pin(i, tube, label).stream()).findFirst().orElse(""));
      for (int i : shown) {
        addVolts(row, i, nodeAt(i, tube, label));
      }
      rows.add(new Table.Row(row, ""));
    }
    return rows;
  }

  private Optional<String> pin(int column, String tube, String label) {
    return socket(column, tube)
        .flatMap(
            s ->
                s.pins().stream()
                    .filter(p -> s.nameOf(p).equals(label))
                    .map(p -> TubesPage.electrode(s.bottle(), p, wording))
                    .findFirst());
  }

  private String nodeAt(int column, String tube, String label) {
    return socket(column, tube)
        .flatMap(
            s ->
                s.pins().stream()
                    .filter(p -> s.nameOf(p).equals(label))
                    .map(p -> p.node().name())
                    .findFirst())
        .orElse("");
  }

  private List<Socket> sockets(int column) {
    return socketsByColumn.get(column);
  }

  private Optional<Socket> socket(int column, String tube) {
    return sockets(column).stream().filter(s -> s.name().equalsIgnoreCase(tube)).findFirst();
  }

  /** Adds the cells of one column; its first column has volts only. */
  private void addVolts(List<String> row, int index, String nodeName) {
    Column column = input.columns().get(index);
    PointCells cells = cellsByColumn.get(index);
    Optional<Node> node = column.circuit().node(nodeName);
    row.add(node.map(cells::volts).orElse(""));
    if (index > 0) {
      row.add(node.map(cells::band).orElse(""));
      row.add("");
    }
  }

  private Table currents(int from, int to) {
    List<Table.Column> columns = new ArrayList<>();
    columns.add(new Table.Column(wording.say("{Tube}"), Use.WORDS));
    columns.add(new Table.Column("", Use.WORDS));
    List<Integer> shown = Stream.concat(Stream.of(0), range(from, to)).toList();
    for (int i : shown) {
      String name = i == 0 ? FIRST : input.columns().get(i).state();
      columns.add(new Table.Column(name, "Current", Use.FIGURES));
      columns.add(new Table.Column(name, "Heat", Use.FIGURES));
    }
    List<String> sections =
        shown.stream()
            .flatMap(i -> figures.get(i).tubes().stream())
            .map(StatesPage::sectionName)
            .distinct()
            .sorted(NaturalOrder.INSTANCE)
            .toList();
    List<Table.Row> rows = new ArrayList<>();
    for (String section : sections) {
      rows.add(new Table.Row(currentCells(section, false, shown), ""));
      if (shown.stream()
          .flatMap(i -> tube(i, section).stream())
          .anyMatch(t -> !Double.isNaN(t.screenAmps()))) {
        rows.add(new Table.Row(currentCells(section, true, shown), ""));
      }
    }
    return Table.of("Currents", columns, rows);
  }

  private List<String> currentCells(String section, boolean screen, List<Integer> shown) {
    List<String> row = new ArrayList<>();
    row.add(screen ? "" : section);
    row.add(screen ? "screen" : wording.say("{plate}"));
    for (int i : shown) {
      Optional<Figures.Tube> tube = tube(i, section);
      double amps = tube.map(t -> screen ? t.screenAmps() : t.plateAmps()).orElse(Double.NaN);
      double watts = tube.map(t -> screen ? t.screenWatts() : t.plateWatts()).orElse(Double.NaN);
      row.add(tube.isEmpty() ? "out" : Quantity.amps(Math.abs(amps) < NO_AMPS ? 0 : amps));
      row.add(Double.isNaN(watts) ? "" : Quantity.watts(watts));
    }
    return row;
  }

  private Optional<Figures.Tube> tube(int column, String section) {
    return figures.get(column).tubes().stream()
        .filter(t -> sectionName(t).equals(section))
        .findFirst();
  }

  private static String sectionName(Figures.Tube tube) {
    return tube.tube() + tube.section();
  }
}
