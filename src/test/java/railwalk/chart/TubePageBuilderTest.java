package railwalk.chart;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;

/** What a tube's page says, before it is drawn. */
class TubePageBuilderTest {
  static Stream<String> types() {
    return Catalogue.standard().types().stream().map(TubeType::name);
  }

  @ParameterizedTest
  @MethodSource("types")
  void curvesAndMarksStayInsideTheAxes(String type) {
    for (Plot plot : plots(page(type))) {
      Stream.concat(
              plot.curves().stream().flatMap(curve -> curve.spots().stream()),
              plot.marks().stream().map(Plot.Mark::at))
          .forEach(spot -> assertThat(isInside(plot, spot)).as(plot.title() + spot).isTrue());
      assertThat(plot.x().ticks()).hasSizeBetween(4, 9);
      assertThat(plot.y().ticks()).hasSizeBetween(4, 9);
      assertThat(plot.curves()).isNotEmpty();
    }
  }

  /** The 12AX7's point of 250 V, −2 V, 1.2 mA as RCA (10-60), GE, Sylvania and Philips print it. */
  @Test
  void marksThePublishedPointWhereTheSheetHasIt() {
    List<Plot> plots = plots(page("12AX7"));
    Plot.Spot onPlate = spot(plots.get(0), "1");
    assertThat(onPlate.x()).isEqualTo(250);
    assertThat(onPlate.y()).isCloseTo(1.2, within(1e-9));
    Plot.Spot onTransfer = spot(plots.get(1), "1");
    assertThat(onTransfer.x()).isEqualTo(-2);
    assertThat(onTransfer.y()).isCloseTo(1.2, within(1e-9));
  }

  /**
   * A resistance-coupled stage of Philips' ECC83 sheet (5-1960), 200 V through 100 kΩ, 1.8 kΩ and
   * 0.65 mA: by Ohm's law 133.83 V plate to cathode and −1.17 V of bias.
   */
  @Test
  void worksElectrodeVoltsOutOfAStage() {
    List<Plot> plots = plots(page("12AX7"));
    Plot.Spot onPlate = spot(plots.get(0), "3");
    assertThat(onPlate.x()).isCloseTo(133.83, within(1e-6));
    assertThat(spot(plots.get(1), "3").x()).isCloseTo(-1.17, within(1e-9));
  }

  /** Base 7AC of the 6V6GT: GE's sheet ET-T914; eight places of an octal ring around the key. */
  @Test
  void drawsTheBaseFromBelow() {
    BaseDrawing base = base("6V6GT");
    assertThat(base.mark()).isEqualTo(BaseDrawing.Mark.KEY);
    assertThat(base.contacts())
        .extracting(BaseDrawing.Contact::leadsTo)
        .containsExactly(
            "nothing", "heater", "plate", "screen", "grid", "nothing", "heater", "cathode");
    assertThat(base.contacts().get(0).degrees()).isEqualTo(22.5);
    assertThat(base.contacts().get(7).degrees()).isEqualTo(337.5);
    assertThat(base.contacts().get(0).live()).isFalse();
    BaseDrawing noval = base("12AX7");
    assertThat(noval.mark()).isEqualTo(BaseDrawing.Mark.GAP);
    assertThat(noval.contacts().get(0).degrees()).isEqualTo(36);
    assertThat(noval.contacts().get(8).degrees()).isEqualTo(324);
    assertThat(base("5Y3GT").contacts().get(1).leadsTo()).isEqualTo("filament");
  }

  /** 12 W over the plate volts: 48 mA at 250 V. */
  @Test
  void drawsTheWattsLimit() {
    Plot plot = plots(page("6V6GT")).get(0);
    Plot.Curve limit = plot.curves().get(0);
    assertThat(limit.label()).isEqualTo("12 W");
    assertThat(limit.line()).isEqualTo(Plot.Line.DASHED);
    assertThat(limit.spots())
        .allSatisfy(s -> assertThat(s.x() * s.y()).isCloseTo(12_000, within(1e-6)));
  }

  @Test
  void picksRoundTicks() {
    assertThat(Ticks.step(350, 7)).isEqualTo(50);
    assertThat(Ticks.step(4.2, 7)).isEqualTo(1);
    assertThat(Ticks.step(0.012, 6)).isCloseTo(0.002, within(1e-15));
    assertThat(Ticks.axis("x", 330, 7).to()).isEqualTo(350);
    assertThat(Ticks.axis("x", -4.6, 7).from()).isEqualTo(-5);
    assertThat(Ticks.word(-2.5, 2.5)).isEqualTo("−2.5");
    assertThat(Ticks.word(100, 50)).isEqualTo("100");
  }

  @Test
  void aRegulatorHasNoCurves() {
    assertThat(plots(page("0A2"))).isEmpty();
  }

  private static TubePage page(String type) {
    return TubePageBuilder.of(Catalogue.standard().file(type).orElseThrow());
  }

  private static BaseDrawing base(String type) {
    return inside(page(type))
        .filter(BaseDrawing.class::isInstance)
        .map(BaseDrawing.class::cast)
        .findFirst()
        .orElseThrow();
  }

  private static List<Plot> plots(TubePage page) {
    return inside(page).filter(Plot.class::isInstance).map(Plot.class::cast).toList();
  }

  private static Stream<Block> inside(TubePage page) {
    return page.blocks().stream()
        .filter(Abreast.class::isInstance)
        .map(Abreast.class::cast)
        .flatMap(pair -> Stream.concat(pair.left().stream(), pair.right().stream()));
  }

  private static Plot.Spot spot(Plot plot, String number) {
    return plot.marks().stream()
        .filter(mark -> mark.number().equals(number))
        .findFirst()
        .orElseThrow()
        .at();
  }

  private static boolean isInside(Plot plot, Plot.Spot spot) {
    double slack = 1e-9 * plot.y().to();
    return spot.x() >= plot.x().from()
        && spot.x() <= plot.x().to()
        && spot.y() >= plot.y().from()
        && spot.y() <= plot.y().to() + slack;
  }
}
