package railwalk.chart;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;

/** What would change with another type in the socket. */
class AlternativesTest {
  /** RCA's 6L6GC sheet and GE's 6V6-GT sheet: base 7AC, heaters 0.9 A and 0.45 A at 6.3 V. */
  @Test
  void comparesBeamTubesOfOneBase() {
    Alternative found = only("6V6GT", "6L6GC");
    assertThat(found.changes())
        .startsWith("same pins")
        .contains("heater 6.3 V 900 mA for 6.3 V 450 mA")
        .anyMatch(change -> change.matches("plate current \\+\\d+ % at the same volts"))
        .noneMatch(change -> change.contains("limit"));
    assertThat(only("6L6GC", "5881").changes()).contains("same pins", "plate limit 23 W for 30 W");
  }

  /** Philips' EL84 sheet: noval, 0.76 A; GE's 6V6-GT sheet: octal, 0.45 A. */
  @Test
  void namesAnotherSocket() {
    assertThat(only("EL84", "6V6GT").changes())
        .startsWith("other socket: octal")
        .contains("heater 6.3 V 450 mA for 6.3 V 760 mA");
  }

  /** Mullard's GZ34 and GE's 5U4-GB sheets: one drops 17 V, the other far more, by a filament. */
  @Test
  void comparesRectifiers() {
    assertThat(only("GZ34", "5U4GB").changes())
        .startsWith("same pins")
        .contains("filament: high tension is there before the other heaters are warm")
        .anyMatch(change -> change.matches("drops \\d\\d V for 18 V at 250 mA"));
  }

  /** The 5881 and the KT66 have the 6L6GC's base; the 5881 has its heater too (RCA, GEC sheets). */
  @Test
  void putsTheNearestFirst() {
    assertThat(of("6L6GC", "KT66", "6SN7GT", "5881"))
        .extracting(alternative -> alternative.type().name())
        .containsExactly("5881", "KT66");
  }

  @Test
  void leavesOutWhatDoesOtherWork() {
    assertThat(of("12AX7", "6V6GT", "GZ34", "0A2", "12AX7", "6AV6")).isEmpty();
    assertThat(of("EL84", "12AX7", "EF86")).isEmpty();
    assertThat(of("0A2", "0B2")).isEmpty();
    assertThat(of("GZ34", "35W4")).isEmpty();
  }

  @Test
  void takesTheWantedTypesPinsAndSections() {
    TubeType wanted = type("12AX7");
    TubeType fitted = only("12AX7", "6SL7GT").inPlaceOf(wanted);
    assertThat(fitted.name()).isEqualTo("6SL7GT");
    assertThat(fitted.pins()).isEqualTo(wanted.pins());
    assertThat(fitted.sections().get(0).law()).isEqualTo(type("6SL7GT").sections().get(0).law());
  }

  private static Alternative only(String wanted, String other) {
    List<Alternative> found = of(wanted, other);
    assertThat(found).hasSize(1);
    return found.get(0);
  }

  private static List<Alternative> of(String wanted, String... others) {
    return Alternatives.of(
        Catalogue.standard().file(wanted).orElseThrow(),
        Arrays.stream(others).map(AlternativesTest::type).toList());
  }

  private static TubeType type(String name) {
    return Catalogue.standard().find(name).orElseThrow();
  }
}
