package railwalk.chart;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.chart.SampleAmp.Order;
import railwalk.source.Diagnostic;
import railwalk.source.Severity;

/** What a chart says and in which order, on amplifiers solved for real and made up by number. */
class ChartBuilderTest {
  private static final String[] STAGE = {
    "One stage and its supply",
    ".line 120 60 design=117",
    ".meter 20k/V",
    "VHT ht1 0 ht2 RMS 250-0-250 rdc=120,120",
    "XV2 6X4 1=ht1 6=ht2 7=b1",
    "C1 b1 0 20u 450V",
    "XS1 b1 bs SWITCH closed",
    "R1 bs b2 10k 1W",
    "R9 bs b2 10k 1W",
    "C2 b2 0 20u 450V",
    "R2 b2 p1 100k 1/2W",
    "R3 g1 0 1M",
    "R4 k1 0 1k5",
    "XP1 p1 w 0 POT 10M set=0.3",
    "XV1 12AX7 1=p1 2=g1 3=k1",
    ".state standby S1=open",
    ".state bare V1=out",
    ".end"
  };

  static Stream<Order> orders() {
    return SampleAmp.orders().stream();
  }

  @Test
  void pagesComeInTheOrderOfTheBench() {
    Chart chart = SolvedChart.of(STAGE);
    assertThat(chart.pages())
        .extracting(Page::title)
        .containsExactly(
            "",
            "Supply",
            "Tubes by pin",
            "Drops and what they tell of currents",
            "Supply parts and heaters against their limits",
            "States side by side",
            "Findings and notes");
    assertThat(chart.pages().get(0).blocks())
        .extracting(block -> block.getClass().getSimpleName())
        .containsExactly("Heading", "KeyFigures", "FillIn", "Caution");
    assertThat(chart.pages().get(1).blocks().get(0)).isInstanceOf(Ladder.class);
  }

  @Test
  void conditionsAreStated() {
    String text = SolvedChart.textOf(SolvedChart.of(STAGE));
    assertThat(text)
        .contains(
            "Line: 120 V rms, 60 Hz; windings are given for 117 V",
            "Meter: 20 kΩ/V; ranges 10, 50, 250, 500, 1000 V",
            "Black lead on: 0",
            "P1 10 MΩ at 30 % from 0 to p1",
            "Switch: S1 closed, joins b1 to bs",
            "Tubes in: all: V1 12AX7, V2 6X4",
            "State: standby: S1 open",
            "State: bare: V1 out of its socket",
            "±1.645 standard deviations",
            "resistors ±10 %");
  }

  @ParameterizedTest
  @MethodSource("orders")
  void everyWiredPinStandsOnceInEveryColumn(Order order) {
    ChartInput input = SampleAmp.input(order);
    Chart chart = new ChartBuilder().build(input);
    List<String> wired = new ArrayList<>();
    input.first().circuit().bottles().stream()
        .sorted((a, b) -> NaturalOrder.INSTANCE.compare(a.name(), b.name()))
        .forEach(b -> b.pins().keySet().forEach(pin -> wired.add(b.name() + "." + pin)));
    System.out.println(order.tubes() + " tubes: " + wired.size() + " wired pins");
    assertThat(pinsByTube(chart)).containsExactlyElementsOf(wired);
    if (order.states() > 0) {
      List<Table> volts =
          SolvedChart.tables(chart, "States side by side").stream()
              .filter(table -> table.title().equals("Volts"))
              .toList();
      assertThat(volts).hasSize((order.states() + 1) / 2);
      for (Table table : volts) {
        List<String> points = SolvedChart.cells(table, "Point");
        assertThat(points.subList(points.size() - wired.size(), points.size()))
            .containsExactlyElementsOf(wired);
      }
    }
    for (Figures figures : chart.figures()) {
      assertThat(figures.points().stream().flatMap(point -> point.pins().stream()))
          .containsExactlyInAnyOrderElementsOf(wired);
    }
  }

  private static List<String> pinsByTube(Chart chart) {
    String title = chart.pages().get(2).title();
    assertThat(title).endsWith("by pin");
    Table table = SolvedChart.tables(chart, title).get(0);
    int pin = table.columns().stream().map(Table.Column::head).toList().indexOf("Pin");
    return table.groups().stream()
        .flatMap(g -> g.rows().stream().map(row -> g.title() + "." + row.cells().get(pin)))
        .toList();
  }

  @Test
  void aPulledTubesSocketIsStillCharted() {
    Chart chart = SolvedChart.of(STAGE);
    Figures bare = chart.figures().get(2);
    assertThat(bare.tubes()).extracting(Figures.Tube::tube).containsExactly("V2");
    Figures.Point plate =
        bare.points().stream().filter(p -> p.node().equals("p1")).findFirst().orElseThrow();
    assertThat(plate.pins()).containsExactly("V1.1");
    assertThat(plate.volts()).isGreaterThan(300);
  }

  @Test
  void partsSideBySideAreOneRungOfTheLadder() {
    Ladder ladder = (Ladder) SolvedChart.of(STAGE).pages().get(1).blocks().get(0);
    assertThat(ladder.feeds()).hasSize(1);
    Ladder.Feed feed = ladder.feeds().get(0);
    assertThat(feed.name()).isEqualTo("V2");
    assertThat(feed.lines()).containsExactly("6X4", "256-0-256 V rms", "full-wave, centre tap");
    List<Ladder.Part> parts = new ArrayList<>();
    Ladder.Stop stop = feed.rail().to();
    while (!stop.spans().isEmpty()) {
      parts.addAll(stop.spans().get(0).parts());
      stop = stop.spans().get(0).to();
    }
    assertThat(stop.node()).isEqualTo("b2");
    assertThat(parts).extracting(Ladder.Part::name).containsExactly("S1", "R1 || R9");
    assertThat(parts.get(1).value()).isEqualTo("10 kΩ || 10 kΩ");
  }

  @Test
  void theBritishSpeakOfValves() {
    String text =
        SolvedChart.textOf(
            SolvedChart.of(
                "Output stage",
                ".words british",
                "V1 b 0 250",
                "LOT b p rdc=200",
                "R1 k 0 470",
                "R2 g 0 470k",
                "XV1 6V6GT plate=p screen=b grid=g cathode=k"));
    assertThat(text).contains("Valves by pin", "Valves in", "beam power valve", "anode", "Mains");
    assertThat(text.toLowerCase(java.util.Locale.ROOT))
        .doesNotContainPattern("\\b(tube|tubes|plate|plates)\\b");
  }

  @Test
  void aHotChassisIsPrintedLargeOnTheFirstPage() {
    Chart chart =
        SolvedChart.of(
            "Straight off the wall",
            ".line 120",
            "VWALL hot chassis RMS 120 rdc=1",
            "R1 hot pr 22",
            "XV1 35W4 5=pr 7=b1",
            "C1 b1 chassis 40u 150V",
            "R2 b1 chassis 3k 10W");
    assertThat(chart.pages().get(0).blocks().get(0))
        .isInstanceOfSatisfying(
            Caution.class,
            caution -> {
              assertThat(caution.weight()).isEqualTo(Caution.Weight.LARGE);
              assertThat(caution.title()).isEqualTo("Hot chassis");
            });
    assertThat(chart.figures().get(0).findings().get(0).code()).isEqualTo("hot-chassis");
    assertThat(SolvedChart.textOf(chart)).contains("isolating transformer", "carries AC");
  }

  /** A chart whose first page says "none" while a state has a finding would mislead. */
  @Test
  void theFirstPageCountsTheFindingsOfStatesToo() {
    ChartInput sample = SampleAmp.input(Order.of(1, 1, 1));
    Diagnostic hot = new Diagnostic(Severity.WARNING, "over-rating", "V1 runs hot", "", null);
    Column first = sample.first();
    Column state = sample.states().get(0);
    Column findingState = new Column(state.state(), state.point(), state.bands(), List.of(hot));
    Column findingFirst = new Column("", first.point(), first.bands(), List.of(hot));
    assertThat(findingsEntry(List.of(first, state))).isEqualTo("none");
    assertThat(findingsEntry(List.of(first, findingState)))
        .isEqualTo("none as it stands, 1 more in its states: listed at the end");
    assertThat(findingsEntry(List.of(findingFirst, state)))
        .isEqualTo("1 warning: listed at the end");
    assertThat(findingsEntry(List.of(findingFirst, findingState)))
        .isEqualTo("1 warning: listed at the end");
  }

  private static String findingsEntry(List<Column> columns) {
    Chart chart = new ChartBuilder().build(new ChartInput("t.cir", columns, List.of()));
    return chart.pages().get(0).blocks().stream()
        .filter(KeyFigures.class::isInstance)
        .flatMap(block -> ((KeyFigures) block).entries().stream())
        .filter(entry -> entry.label().equals("Findings"))
        .map(KeyFigures.Entry::text)
        .findFirst()
        .orElseThrow();
  }

  @Test
  void cautionsFitTheSet() {
    String plain = SolvedChart.textOf(SolvedChart.of(STAGE));
    assertThat(plain)
        .contains(
            "These volts kill",
            "VHT has 513 V AC from end to end",
            "qualified technician",
            "local rules",
            "Capacitors stay charged",
            "One hand only",
            "measurement category",
            "series lamp",
            "fuses by the same type and value",
            "never proof that a point is safe")
        .doesNotContain("selenium", "mercury", "This one is wired");
    String selenium =
        SolvedChart.textOf(
            SolvedChart.of(
                "Bias supply",
                "VB a 0 RMS 50 rdc=30",
                "D1 n a SELENIUM",
                "C1 0 n 10u 100V",
                "R1 n 0 10k"));
    assertThat(selenium).contains("selenium");
  }

  @Test
  void windingHalvesWithoutResistanceSaySo() {
    String text =
        SolvedChart.textOf(
            SolvedChart.of(
                "Output stage",
                "V1 b 0 250",
                "LOT b p 8",
                "R1 k 0 470",
                "R2 g 0 470k",
                "XV1 6V6GT plate=p screen=b grid=g cathode=k"));
    assertThat(text).contains("resistance not given");
  }

  @Test
  void whatHasNoPathIsNotPredicted() {
    Chart chart =
        SolvedChart.of(
            "Floating", "V1 b 0 200", "R1 b 0 10k", "R2 x y 1k", "C1 y 0 1u", "C2 x b 1u");
    assertThat(SolvedChart.textOf(chart)).contains("Not predictable at DC: x, y.");
    assertThat(chart.figures().get(0).points())
        .filteredOn(point -> point.node().equals("x"))
        .singleElement()
        .satisfies(point -> assertThat(point.volts()).isNaN())
        .satisfies(point -> assertThat(point.meterVolts()).isNaN());
  }
}
