package railwalk.readings;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatCode;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashSet;
import java.util.List;
import java.util.Objects;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import railwalk.circuit.Circuit;
import railwalk.source.Diagnostic;
import railwalk.source.DiagnosticPrinter;
import railwalk.source.SourceSpan;

/** Good sheets damaged at random: reading them never throws, hangs or loses a row in silence. */
class SheetMutationTest {
  private static final int MUTATIONS = 2000;
  private static final String SIGNS =
      "+-*/=(){}',;.:?\"#%_ \t\n\r0123456789abkmMuRVXLC~\u00b5\u03a9\u2212\u0000\u0007\ufeff\ud83d";

  private static final List<String> SEEDS =
      List.of(
          """
          point,volts,kind,state,range,note
          line,118
          meter,20k/V
          b1,452,,,500,
          V1.6,171,,,250,"hot, after an ""hour""\"
          V4.k,35,ma,,,
          R2,41.5 V,,,,
          R16,1k5,ohms,,,
          VHT,702,ac,,,
          b1,0.4,ripple,,,
          b1,480,,tubes out,,
          V2A.plate,212,,standby,,
          bias,-42,dc,,,
          """,
          """
          Point;Volts;Note
          b1;452,5;
          b2;440,1;"one
          two"
          V4.g1;\u221242 V;
          XV1.1;168;
          node:v1;0,02;
          P1;21;track
          """
              .replace("\n", "\r\n"),
          "\ufeffb1\t452\nb2\t440\ndc\nR38\t35mV\nV5.8\t0.036A\n# end\n");

  @Test
  @Timeout(120)
  void damagedSheetsAreReadCalmly() {
    Random random = new Random(20_260_102);
    int readings = 0;
    int errors = 0;
    int most = 0;
    for (int i = 0; i < MUTATIONS; i++) {
      String text = SEEDS.get(i % SEEDS.size());
      int hits = 1 + random.nextInt(5);
      for (int hit = 0; hit < hits; hit++) {
        text = damaged(text, random);
      }
      SheetReading read = readCalmly(text, Amps.millrace(), i);
      readings += read.sheet().readings().size();
      int found = (int) read.diagnostics().stream().filter(Diagnostic::isError).count();
      errors += found;
      most = Math.max(most, found);
    }
    System.out.println(
        MUTATIONS
            + " mutations of "
            + SEEDS.size()
            + " sheets: "
            + readings
            + " readings, "
            + errors
            + " errors, at most "
            + most
            + " in one");
    assertThat(readings).isGreaterThan(3 * MUTATIONS);
    assertThat(errors).isGreaterThan(MUTATIONS / 2);
  }

  /** Readings and errors stand in the sheet, are finite, and no row is both. */
  private static SheetReading readCalmly(String text, Circuit circuit, int number) {
    List<SheetReading> results = new ArrayList<>();
    assertThatCode(
            () -> {
              SheetReading read = SheetReader.read("mutation.csv", text, circuit);
              DiagnosticPrinter.print(read.diagnostics());
              results.add(read);
              results.add(SheetReader.ofWords(text.lines().toList(), circuit));
            })
        .as("mutation %d:%n%s", number, text)
        .doesNotThrowAnyException();
    SheetReading read = results.get(0);
    Set<Integer> counted = new HashSet<>();
    for (Reading reading : read.sheet().readings()) {
      assertThat(reading.value()).as("%d: %s", number, text).isNotNaN();
      boolean open = reading.kind() == ReadingKind.OHMS;
      assertThat(Double.isFinite(reading.value()) || open).isTrue();
      counted.add(Objects.requireNonNull(reading.span(), "no place").line());
    }
    for (Diagnostic diagnostic : read.diagnostics()) {
      SourceSpan span = diagnostic.span();
      if (diagnostic.isError() && span != null) {
        assertThat(counted).as("%d: %s", number, text).doesNotContain(span.line());
        assertThat(span.line()).isBetween(1, span.text().lines().size());
      }
    }
    return read;
  }

  private static String damaged(String text, Random random) {
    if (text.isEmpty()) {
      return "b1";
    }
    int at = random.nextInt(text.length());
    String sign = String.valueOf(SIGNS.charAt(random.nextInt(SIGNS.length())));
    return switch (random.nextInt(7)) {
      case 0 -> text.substring(0, at) + text.substring(at + 1);
      case 1 -> text.substring(0, at) + sign + text.substring(at);
      case 2 -> text.substring(0, at) + sign + text.substring(at + 1);
      case 3 -> rowsChanged(text, random);
      case 4 -> cellsSwapped(text, random);
      case 5 -> text.substring(0, at);
      default -> text.substring(0, at) + sign.repeat(1 + random.nextInt(40)) + text.substring(at);
    };
  }

  private static String rowsChanged(String text, Random random) {
    List<String> rows = new ArrayList<>(List.of(text.split("\n", -1)));
    int one = random.nextInt(rows.size());
    int other = random.nextInt(rows.size());
    if (random.nextBoolean()) {
      Collections.swap(rows, one, other);
    } else {
      rows.add(other, rows.get(one));
    }
    return String.join("\n", rows);
  }

  private static String cellsSwapped(String text, Random random) {
    String[] cells = text.split(",", -1);
    int one = random.nextInt(cells.length);
    int other = random.nextInt(cells.length);
    String cell = cells[one];
    cells[one] = cells[other];
    cells[other] = cell;
    return String.join(",", cells);
  }

  /** Inputs made to tire a reader out. */
  @Test
  @Timeout(60)
  void exhaustingSheetsAreReadCalmly() {
    List<String> inputs =
        List.of(
            "point,volts\nb1,\"" + "\"\"".repeat(9_000),
            "point,volts\n" + "b1,\"\n".repeat(20_000),
            "\"\n".repeat(50_000),
            ",".repeat(19_000),
            "point,volts\nb1," + "1,".repeat(9_000),
            "point;volts\nb1;" + "1.".repeat(9_000),
            "point;volts\nb1;1" + ".111".repeat(4_000),
            "point,volts\nb1,\"1" + ",111".repeat(4_000) + "\"",
            "point;volts\nb1;" + "1 ".repeat(9_000) + "x",
            "point,volts\nb1," + "(".repeat(15_000),
            "(".repeat(15_000) + ",volts\nb1,1",
            "point,volts\n" + "V".repeat(15_000) + ".1,12",
            "point,volts\nb1,1" + "p".repeat(15_000),
            "point,volts\n" + "b1,452\n".repeat(20_000));
    for (String input : inputs) {
      readCalmly(input, Amps.towpath(), -1);
    }
  }
}
