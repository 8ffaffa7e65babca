package railwalk.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What the program says, and with which exit code, when it is given what it cannot use. */
class BadInputTest {
  private static final String STAGE =
      """
      one stage on a battery
      VB b 0 250
      R1 b p 100k
      XV1 12AX7 1=p 2=g 3=k
      R2 k 0 1k5
      R3 g 0 1M
      """;

  @TempDir private Path folder;

  @ParameterizedTest
  @ValueSource(strings = {"chart", "check", "walk"})
  void saysThatAFileIsMissing(String command) {
    refused(Run.of(command, "nowhere.cir"), "cannot read nowhere.cir: no such file");
  }

  @ParameterizedTest
  @ValueSource(strings = {"chart", "check", "walk"})
  void saysThatAFolderIsNoNetlist(String command) {
    refused(Run.of(command, folder.toString()), folder + " is a folder, not a netlist");
  }

  @ParameterizedTest
  @ValueSource(strings = {"chart", "check", "walk"})
  void needsANetlist(String command) {
    refused(Run.of(command), "Missing required parameter: 'NETLIST'");
  }

  @Test
  void printsTheNetlistsErrorsWithTheirPlace() throws IOException {
    Path netlist = netlist(STAGE.replace("12AX7", "12AX8"));
    Run chart = Run.in(folder, "chart", netlist.toString());
    refused(chart, "stage.cir:4:5: error[unknown-type]");
    assertThat(chart.err()).contains("    XV1 12AX8 1=p", "12AX7");
    assertThat(Run.of("check", netlist.toString()).code()).isEqualTo(1);
    assertThat(Run.of("walk", netlist.toString()).code()).isEqualTo(2);
    assertThat(files()).containsExactly("stage.cir");
  }

  @Test
  void refusesAChartWhileAValueIsUnknown() throws IOException {
    Path netlist = netlist(STAGE.replace("R2 k 0 1k5", "R2 k 0 ?"));
    refused(
        Run.in(folder, "chart", netlist.toString()),
        "stage.cir:5:8: error[value-unknown]: the resistance of R2 is not known");
    assertThat(Run.of("check", netlist.toString()).code()).isZero();
  }

  @ParameterizedTest
  @CsvSource({
    "--line, 108, '--line needs a .line in the netlist'",
    "--line, mains, '--line mains: expected line volts'",
    "--line, -5, '--line -5: expected line volts'",
    "--line, 0, '--line 0: expected line volts'",
    "--meter, pocket, '--meter pocket: '",
    "--as, html, 'Invalid value for option ''--as'': expected one of pdf, text, csv, json'",
    "--paper, a3, 'Invalid value for option ''--paper'': expected one of a4, letter'",
    "--colour, red, 'Unknown option'",
  })
  void explainsABadOption(String option, String value, String message) throws IOException {
    Path netlist = netlist(STAGE);
    refused(Run.in(folder, "chart", netlist.toString(), option, value), message);
    assertThat(files()).containsExactly("stage.cir");
  }

  @Test
  void takesAGoodLineAndMeter() throws IOException {
    Path netlist =
        netlist(STAGE.replace("VB b 0 250", ".line 120 60 design=117\n.meter 10M\nVB b 0 250"));
    Run plain = Run.in(folder, "chart", netlist.toString(), "--as", "text");
    Run other =
        Run.in(
            folder,
            "chart",
            netlist.toString(),
            "--as",
            "text",
            "--line",
            "108V",
            "--meter",
            "20k/V 10 50 250");
    assertThat(plain.code()).isZero();
    assertThat(plain.out()).contains("120 V").doesNotContain("108 V");
    assertThat(other.code()).isZero();
    assertThat(other.out()).contains("108 V").doesNotContain("120 V");
  }

  @Test
  void walkNamesWhatAPointCanBe() throws IOException {
    Path netlist = netlist(STAGE);
    refused(Run.of("walk", netlist.toString(), "V9"), "no node, pin or electrode called V9");
    for (String point : List.of("p", "V1.1", "V1A.plate", "v1.plate")) {
      Run run = Run.of("walk", netlist.toString(), point);
      assertThat(run.code()).as(point).isZero();
      assertThat(run.out()).contains("there a 12AX7 passes");
    }
  }

  @Test
  void saysWhereItCannotWrite() throws IOException {
    Path netlist = netlist(STAGE);
    String target = folder.resolve("nowhere").resolve("chart.pdf").toString();
    Run run = Run.in(folder, "chart", netlist.toString(), "-o", target);
    refused(run, "cannot write " + target + ": there is no folder");
    assertThat(run.out()).isEmpty();
    refused(Run.in(folder, "chart", netlist.toString(), "-o", folder.toString()), "it is a folder");
  }

  @Test
  void willNotPutAPdfIntoACsvFile() throws IOException {
    Path netlist = netlist(STAGE);
    refused(
        Run.in(folder, "chart", netlist.toString(), "-o", "stage.csv"),
        "without --as the file is a PDF: for stage.csv add --as csv");
    assertThat(files()).containsExactly("stage.cir");
  }

  /** Noise, a drawing, a saved page: one clear refusal each, never a trace. */
  @Test
  void refusesWhatIsNoNetlist() throws IOException {
    byte[] noise = new byte[5000];
    new Random(1958).nextBytes(noise);
    Path binary = Files.write(folder.resolve("noise.cir"), noise);
    refused(Run.of("chart", binary.toString()), "noise.cir");
    Path markup = Files.writeString(folder.resolve("page.cir"), "<!DOCTYPE html><html></html>");
    refused(Run.of("chart", markup.toString()), "page.cir");
    Path empty = Files.writeString(folder.resolve("empty.cir"), "");
    refused(Run.of("chart", empty.toString()), "empty.cir");
  }

  private static void refused(Run run, String message) {
    assertThat(run.err()).contains(message).doesNotContain("\tat ", "Exception");
    assertThat(run.code()).isEqualTo(2);
    assertThat(run.out()).isEmpty();
  }

  private Path netlist(String text) throws IOException {
    return Files.writeString(folder.resolve("stage.cir"), text);
  }

  private List<String> files() throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(f -> f.getFileName().toString()).toList();
    }
  }
}
