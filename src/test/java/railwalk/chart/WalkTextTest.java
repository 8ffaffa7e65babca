package railwalk.chart;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.math.BigDecimal;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.walk.Walk;

/** The walk's sums are checked by reading them back from the text and adding them up again. */
class WalkTextTest {
  private static final Path AMPS = Path.of("test-netlists", "amps");

  private static final Map<String, BigDecimal> PREFIXES =
      Map.of(
          "", BigDecimal.ONE,
          "k", new BigDecimal("1e3"),
          "M", new BigDecimal("1e6"),
          "m", new BigDecimal("1e-3"),
          "µ", new BigDecimal("1e-6"));

  private static final String NUMBER = "−?[0-9]+(?:\\.[0-9]+)?";

  /** "b1 348 V − 1.0 kΩ × 5.1 mA = b2 343 V", the first volts left out where it starts from 0. */
  private static final Pattern SUM =
      Pattern.compile(
          "(?:(\\S+) (" + NUMBER + ") V )?((?:[^=(]*?))= (?:\\S+ )?(" + NUMBER + ") V.*");

  private static final Pattern OHMIC =
      Pattern.compile("([−+]?) ?(" + NUMBER + ") ([kM]?)Ω × (" + NUMBER + ") ([mµ]?)A");

  private static final Pattern FIXED = Pattern.compile("([−+]) [^×−+]*? (" + NUMBER + ") V");

  private static final Pattern SHARES = Pattern.compile("\\((" + NUMBER + ") [mµ]?A: ([^)]*)\\)");

  private static OperatingPoint solve(Path netlist) throws IOException {
    Circuit circuit = NetlistReader.read(netlist, Catalogue.standard()).circuit().orElseThrow();
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, Walk.of(circuit));
    return ((SolveOutcome.Solved) outcome).point();
  }

  private static List<Path> amps() throws IOException {
    try (Stream<Path> files = Files.list(AMPS)) {
      return files.filter(f -> f.toString().endsWith(".cir")).sorted().toList();
    }
  }

  /** Returns the lines with what was wrapped joined again. */
  private static List<String> unwrapped(List<String> lines) {
    List<String> whole = new ArrayList<>();
    for (String line : lines) {
      if (line.startsWith("  ")) {
        whole.set(whole.size() - 1, whole.get(whole.size() - 1) + " " + line.strip());
      } else {
        whole.add(line);
      }
    }
    return whole;
  }

  private static BigDecimal number(String text) {
    return new BigDecimal(text.replace('−', '-'));
  }

  /** Adds up one line; returns whether it held a sum. */
  private static boolean addsUp(String line) {
    Matcher sum = SUM.matcher(line.replaceFirst("^(Cathode|Screen): ", ""));
    if (!line.contains("×")) {
      return false;
    }
    assertThat(sum.matches()).as(line).isTrue();
    BigDecimal total = sum.group(2) == null ? BigDecimal.ZERO : number(sum.group(2));
    String terms = sum.group(3);
    Matcher ohmic = OHMIC.matcher(terms);
    while (ohmic.find()) {
      BigDecimal drop =
          number(ohmic.group(2))
              .multiply(PREFIXES.get(ohmic.group(3)))
              .multiply(number(ohmic.group(4)))
              .multiply(PREFIXES.get(ohmic.group(5)));
      total = ohmic.group(1).equals("−") ? total.subtract(drop) : total.add(drop);
    }
    Matcher fixed = FIXED.matcher(ohmic.replaceAll(""));
    while (fixed.find()) {
      BigDecimal drop = number(fixed.group(2));
      total = fixed.group(1).equals("−") ? total.subtract(drop) : total.add(drop);
    }
    BigDecimal result = number(sum.group(4));
    BigDecimal half = BigDecimal.ONE.movePointLeft(result.scale()).multiply(new BigDecimal("0.5"));
    assertThat(total.subtract(result).abs()).as(line).isLessThanOrEqualTo(half);
    return true;
  }

  private static boolean sharesAddUp(String line) {
    Matcher shares = SHARES.matcher(line);
    if (!shares.find()) {
      return false;
    }
    BigDecimal total = BigDecimal.ZERO;
    for (String share : shares.group(2).split(", ", -1)) {
      total = total.add(number(share.substring(share.lastIndexOf(' ') + 1)));
    }
    assertThat(total).as(line).isEqualByComparingTo(number(shares.group(1)));
    return true;
  }

  @Test
  void everySumOfEveryWalkAddsUpAsPrinted() throws IOException {
    int sums = 0;
    int shares = 0;
    int walks = 0;
    for (Path amp : amps()) {
      OperatingPoint point = solve(amp);
      List<List<String>> texts = new ArrayList<>();
      texts.add(WalkText.ladder(point));
      for (Node node : point.circuit().nodes()) {
        WalkTarget target = WalkTarget.find(point.circuit(), node.name()).orElseThrow();
        texts.add(WalkText.to(point, target));
      }
      for (AmplifierSection section : point.circuit().elements(AmplifierSection.class)) {
        for (String electrode : List.of("plate", "grid", "cathode")) {
          WalkTarget target =
              WalkTarget.find(point.circuit(), section.name() + " " + electrode).orElseThrow();
          texts.add(WalkText.to(point, target));
        }
      }
      for (List<String> text : texts) {
        walks++;
        assertThat(text).allSatisfy(line -> assertThat(line.length()).isLessThanOrEqualTo(80));
        for (String line : unwrapped(text)) {
          sums += addsUp(line) ? 1 : 0;
          shares += sharesAddUp(line) ? 1 : 0;
        }
      }
    }
    System.out.println(walks + " walks, " + sums + " sums and " + shares + " lists add up");
    assertThat(sums).isGreaterThan(300);
    assertThat(shares).isGreaterThan(50);
  }

  @Test
  void theLadderRunsFromTheRectifierDown() throws IOException {
    List<String> ladder = unwrapped(WalkText.ladder(solve(AMPS.resolve("millrace.cir"))));
    ladder.forEach(System.out::println);
    assertThat(ladder.get(0)).startsWith("VHT ").contains("V6 (GZ34)", ": b0 ", "b1 ");
    assertThat(ladder.get(1)).startsWith("b0 ").contains(" through S1 = b1 ", "bo ", "b2 ");
    assertThat(ladder.get(3))
        .matches("b2 \\d+(\\.\\d)? V − 8\\.2 kΩ × \\S+ mA = b3 \\d+ V \\(\\S+ mA: b4 .*\\)");
    assertThat(ladder).anyMatch(line -> line.startsWith("n0 −") && line.contains(" + 6.8 kΩ × "));
  }

  @Test
  void aPlateIsExplainedByItsCathodeItsTubeAndAMeter() throws IOException {
    OperatingPoint point = solve(AMPS.resolve("weirside.cir"));
    List<String> walk =
        unwrapped(WalkText.to(point, WalkTarget.find(point.circuit(), "V1.1").orElseThrow()));
    walk.forEach(System.out::println);
    assertThat(walk.get(0)).startsWith("V1.1, V1A plate (12AX7), node p1: ");
    assertThat(walk.get(2))
        .isEqualTo(
            "Way: 0 > VHT > ht1 > V3 > b1 > R12 > b2 > R13 > b3 > R3 > p1; back p1 > V1A > k1 >"
                + " R4 > 0");
    assertThat(walk).anyMatch(line -> line.matches("b3 .* V − 120 kΩ × .* mA = p1 .* V"));
    assertThat(walk).anyMatch(line -> line.matches("Cathode: 1\\.8 kΩ × .* mA = k1 .* V"));
    assertThat(walk)
        .anyMatch(line -> line.matches("So grid to cathode −.* there a 12AX7 passes .* mA\\."));
    assertThat(walk)
        .anyMatch(line -> line.matches("Were it .* mA, the cathode would rise .* only .* mA\\."));
    assertThat(walk.get(walk.size() - 1))
        .startsWith("Meter: the source is about ")
        .contains("10 MΩ reads", "20 kΩ/V on its 250 V range", "1 kΩ/V on its 250 V range")
        .contains("so an old chart may say");
  }

  @Test
  void pointsAreFoundByNodePinAndElectrode() throws IOException {
    Circuit circuit = solve(AMPS.resolve("lockgate.cir")).circuit();
    assertThat(WalkTarget.find(circuit, "P1").orElseThrow().node().name()).isEqualTo("p1");
    assertThat(WalkTarget.find(circuit, "v3.screen").orElseThrow().node().name()).isEqualTo("sa");
    assertThat(WalkTarget.find(circuit, "V2B anode").orElseThrow().node().name()).isEqualTo("p4");
    assertThat(WalkTarget.find(circuit, "V2.7").orElseThrow().node().name()).isEqualTo("g4");
    assertThat(WalkTarget.find(circuit, "V9.1")).isEmpty();
    assertThat(WalkTarget.find(circuit, "V3.flap")).isEmpty();
  }

  @Test
  void theCircuitsOwnWordsAreSpoken() throws IOException {
    OperatingPoint point = solve(AMPS.resolve("lockgate.cir"));
    List<String> walk =
        WalkText.to(point, WalkTarget.find(point.circuit(), "V2A plate").orElseThrow());
    assertThat(String.join(" ", walk)).contains("anode", "valve").doesNotContain("plate", "tube");
  }
}
