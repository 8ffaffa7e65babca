package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

/** What {@code railwalk tubes} says of types that could stand in, and of unknown sockets. */
class ReplacementsTest {
  private static final String WEIRSIDE = "test-netlists/amps/weirside.cir";
  private static final String LOCKGATE = "test-netlists/amps/lockgate.cir";

  /** Solving with the type itself gives the chart's own figures. */
  @Test
  void triesAlternativesInAnAmplifier() {
    Run run = Run.of("tubes", "6V6GT", "--in", WEIRSIDE);
    assertThat(run.code()).isZero();
    String idle = run.out().substring(run.out().indexOf("-- Idling in weirside.cir"));
    List<String> rows = idle.lines().filter(line -> line.contains(" V2 ")).toList();
    assertThat(rows.get(0)).startsWith("6V6GT ");
    String current = rows.get(0).replaceAll("^6V6GT +V2 +([0-9.]+ mA).*", "$1");
    assertThat(Run.of("chart", WEIRSIDE, "--as", "text").out()).contains("plate " + current);
    assertThat(rows).hasSizeGreaterThan(1);
    assertThat(idle).contains("Fitted electrode for electrode");
  }

  @Test
  void refusesAnAmplifierWithoutThatType() {
    Run run = Run.of("tubes", "EL84", "--in", WEIRSIDE);
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.out()).isEmpty();
    assertThat(run.err()).contains("weirside.cir has no EL84: its types are 5Y3GT, 12AX7, 6V6GT");
    assertThat(Run.of("tubes", "--in", WEIRSIDE).err())
        .contains("--in goes with the name of a type");
    assertThat(Run.of("tubes", "EL84", "--in", "none.cir").err()).contains("none.cir");
  }

  /** Bases 9A, 7AC and 5T after the makers' sheets: these types share their pins. */
  @Test
  void findsTypesByTheWiresOfASocket() {
    assertThat(matches(WEIRSIDE, "V1"))
        .contains("12AX7", "12AU7", "12AT7")
        .doesNotContain("EF86", "EL84", "EZ81");
    assertThat(matches(WEIRSIDE, "V2"))
        .contains("6V6GT", "6L6GC")
        .doesNotContain("6SN7GT", "5Y3GT");
    assertThat(matches(WEIRSIDE, "V3")).contains("5Y3GT", "5U4GB").doesNotContain("6V6GT");
    assertThat(matches(LOCKGATE, "7=pa", "9=sa", "2=ga1", "3=kk", "4=h1", "5=h2"))
        .contains("EL84")
        .doesNotContain("EF86", "12AX7");
  }

  /**
   * The heater of a 12AX7 in series wants 12.6 V: on 6.3 V between pins 4 and 5 it is ruled out.
   */
  @Test
  void heaterVoltsRuleATypeOut() {
    List<String> found =
        matches(LOCKGATE, "1=p2", "2=g2", "3=k2", "6=p4", "7=g4", "8=k4", "4=h1", "5=h2");
    assertThat(found).doesNotContain("12AX7", "12AU7");
    assertThat(matches(LOCKGATE, "1=p2", "2=g2", "3=k2", "4=h1", "5=h1", "9=h2"))
        .contains("12AX7", "12AU7");
  }

  /** A follower's grid straight on a plate, and a rectifier fed by the line, are usual practice. */
  @Test
  void knowsUsualCircuits() {
    assertThat(matches("test-netlists/amps/millrace.cir", "V2")).contains("12AX7");
    assertThat(matches("test-netlists/amps/towpath.cir", "V3")).contains("35W4");
    assertThat(matches("test-netlists/amps/towpath.cir", "V2")).contains("50C5");
    assertThat(matches("test-netlists/amps/towpath.cir", "V1")).contains("12AV6");
    assertThat(matches(WEIRSIDE, "V2", "--kind", "pentode"))
        .contains("EL34")
        .doesNotContain("6V6GT");
  }

  @Test
  void saysWhatTheWiresLookLike() {
    assertThat(Run.of("tubes", "--socket", WEIRSIDE, "V2").out())
        .startsWith("== Types for V2 in weirside.cir ==")
        .containsPattern("\n +2  h1 +on the heater winding\n")
        .containsPattern("\n +3  p3 +fed from a supply\n")
        .containsPattern("\n +6  g3 +to chassis through many ohms\n")
        .containsPattern("\n +8  k3 +to chassis through few ohms\n");
    assertThat(Run.of("tubes", "--socket", "test-netlists/amps/millrace.cir", "V4").out())
        .containsPattern("\n +5  g4s +on a negative supply\n");
  }

  @Test
  void refusesASocketItCannotRead() {
    refused("no tube V9: there are V3, V1, V2", WEIRSIDE, "V9");
    refused("V1 is not wired by pin: give its wires instead", LOCKGATE, "V1");
    refused("--socket needs the tube (V2) or its wires", WEIRSIDE);
    refused("--socket takes one tube at a time", WEIRSIDE, "V1", "V2");
    refused("the netlist has no node nowhere", WEIRSIDE, "1=nowhere");
    refused("pin 1 stands twice", WEIRSIDE, "1=p1", "1=p2");
    refused("expected a pin and its node", WEIRSIDE, "1=p1", "plate=p2");
    refused("--socket makes a list: leave out", WEIRSIDE, "V1", "--all", "pages");
    refused("no kind lamp", WEIRSIDE, "V1", "--kind", "lamp");
  }

  private static void refused(String message, String... words) {
    Run run = socket(words);
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.out()).isEmpty();
    assertThat(run.err()).contains(message);
  }

  /** Returns the types that are listed. */
  private static List<String> matches(String... words) {
    Run run = socket(words);
    assertThat(run.code()).isZero();
    assertThat(run.out().lines()).allMatch(line -> line.codePointCount(0, line.length()) <= 80);
    int start = run.out().indexOf("-- Types whose pins agree");
    if (start < 0) {
      assertThat(run.out()).contains("No type of the catalogue goes with these wires.");
      return List.of();
    }
    String types = run.out().substring(start);
    return types.lines().map(line -> line.split(" ", 2)[0]).toList();
  }

  private static Run socket(String... words) {
    String[] args = new String[words.length + 2];
    args[0] = "tubes";
    args[1] = "--socket";
    System.arraycopy(words, 0, args, 2, words.length);
    return Run.of(args);
  }
}
