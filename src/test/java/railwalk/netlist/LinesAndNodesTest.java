package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static railwalk.netlist.Reading.circuit;
import static railwalk.netlist.Reading.codes;
import static railwalk.netlist.Reading.names;
import static railwalk.netlist.Reading.part;
import static railwalk.netlist.Reading.read;

import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import railwalk.circuit.Circuit;
import railwalk.circuit.Line;
import railwalk.circuit.Meter;
import railwalk.circuit.Resistor;
import railwalk.circuit.Words;
import railwalk.device.Catalogue;
import railwalk.source.FileBytes;
import railwalk.source.SourceSpan;

class LinesAndNodesTest {
  private static Circuit text(String text) {
    return NetlistReader.readText("t.cir", text, Catalogue.standard()).circuit().orElseThrow();
  }

  @Test
  void lineOneIsTheTitle() {
    assertThat(text("* My amp\nR1 a 0 1k").title()).isEqualTo("My amp");
    assertThat(text("R1 a 0 2k\nR1 a 0 1k").title()).isEqualTo("R1 a 0 2k");
    assertThat(text("R1 a 0 2k\nR1 a 0 1k").elements()).hasSize(1);
    assertThat(text("\nR1 a 0 1k").title()).isEmpty();
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "R1 is a fine amplifier",
        "Deluxe 20 W, rev 3",
        "* R1 a 0 2k",
        "V6 engine test amp",
        ". . ."
      })
  void ordinaryTitlesRaiseNoWarning(String title) {
    NetlistResult result =
        NetlistReader.readText("t", title + "\nR1 a 0 1k\n", Catalogue.standard());
    assertThat(codes(result)).doesNotContain("title-like-element");
  }

  @Test
  void commentsContinuationsAndEndAreRead() {
    Circuit circuit =
        circuit(
            "R1 a 0 ; the plate load",
            "* a comment in between",
            "",
            "+ 100k ; its value",
            "  + 2W",
            "   * an indented comment",
            "\tR2\ta\t0\t47k",
            ".END",
            "R3 a 0 rubbish");
    assertThat(part(circuit, "R1", Resistor.class).ohms()).isEqualTo(100e3);
    assertThat(part(circuit, "R1", Resistor.class).ratedWatts()).isEqualTo(2);
    assertThat(circuit.elements()).hasSize(2);
  }

  @Test
  void anyEncodingAndLineEndIsRead() {
    String text = "* Öl\r\nR1 a 0 4.7kΩ\r\nC1 a 0 22µF";
    Circuit utf8 = text(text);
    assertThat(utf8.title()).isEqualTo("Öl");
    assertThat(text("\ufeff" + text).title()).isEqualTo("Öl");
    assertThat(text("* t\rR1 a 0 1k\rR2 a 0 2k").elements()).hasSize(2);
    byte[] latin = "* Öl\nC1 a 0 22µF".getBytes(StandardCharsets.ISO_8859_1);
    assertThat(FileBytes.decode(latin)).isEqualTo("* Öl\nC1 a 0 22µF");
    byte[] wide = "* Öl\nC1 a 0 22µF".getBytes(StandardCharsets.UTF_16);
    assertThat(FileBytes.decode(wide)).isEqualTo("* Öl\nC1 a 0 22µF");
  }

  @Test
  void nodesKeepTheirFirstSpellingAndOrder() {
    Circuit circuit = circuit("R1 B+ b- 1k", "R2 b+ ht_1 1k", "R3 HT_1 0 1k", "R4 B- GND 1k");
    assertThat(names(circuit.nodes())).containsExactly("B+", "b-", "ht_1", "0");
    assertThat(circuit.reference().name()).isEqualTo("0");
    assertThat(circuit.nodes().get(2).index()).isEqualTo(2);
  }

  @Test
  void theReferenceExistsEvenIfNeverNamed() {
    Circuit circuit = circuit("R1 a b 1k", "R2 a b 2k");
    assertThat(circuit.reference().name()).isEqualTo("0");
    assertThat(circuit.nodes()).contains(circuit.reference());
  }

  @Test
  void refMovesTheReference() {
    Circuit circuit = circuit(".ref ct", "R1 ct a 1k", "R2 a ct 2k");
    assertThat(circuit.reference().name()).isEqualTo("ct");
    assertThat(names(circuit.nodes())).containsExactly("ct", "a");
  }

  @Test
  void theChassisIsTheReferenceUntilAPartJoinsThem() {
    Circuit same = circuit("R1 a 0 1k", "R2 a chassis 1k");
    assertThat(names(same.nodes())).containsExactly("a", "0");
    Circuit apart = circuit("R1 a 0 1k", "C1 0 chassis 47n", "R2 a chassis 1k");
    assertThat(names(apart.nodes())).containsExactly("a", "0", "chassis");
    Circuit alone = circuit("R1 a chassis 1k", "R2 a chassis 1k");
    assertThat(alone.reference().name()).isEqualTo("chassis");
    Circuit referred = circuit(".ref bm", "R1 a bm 1k", "R2 a chassis 1k", "R3 bm chassis 1k");
    assertThat(referred.node("chassis")).isPresent();
  }

  @Test
  void settingsAreRead() {
    Circuit circuit =
        circuit(
            ".mains 240V 50Hz design=230",
            ".meter 1k/V 300 30 3",
            ".spread resistor=5% tube=25%",
            ".words british",
            "R1 a 0 1k");
    assertThat(circuit.line()).isEqualTo(new Line(240, 50, 230));
    assertThat(circuit.meter()).isEqualTo(new Meter(Double.NaN, 1000, List.of(3.0, 30.0, 300.0)));
    assertThat(circuit.spread().resistor()).isEqualTo(0.05);
    assertThat(circuit.spread().winding()).isEqualTo(0.03);
    assertThat(circuit.words()).isEqualTo(Words.BRITISH);
  }

  @Test
  void withoutSettingsTheUsualOnesHold() {
    Circuit circuit = circuit("R1 a 0 1k");
    assertThat(circuit.line().stated()).isFalse();
    assertThat(circuit.meter()).isEqualTo(Meter.TEN_MEGOHM);
    assertThat(circuit.words()).isEqualTo(Words.AMERICAN);
    assertThat(circuit(".meter 20k/V", "R1 a 0 1k").meter().rangesVolts())
        .isEqualTo(Meter.USUAL_RANGES_VOLTS);
  }

  @Test
  void commandBlocksAndAnalysisLinesArePassedOver() {
    NetlistResult result =
        read(".tran 1m 1", ".control", "let x = { ( '", ".endc", "R1 a 0 1k", "R2 a 0 1k", ".op");
    assertThat(result.circuit()).isPresent();
    assertThat(codes(result)).containsExactly("dot-lines-passed-over");
  }

  @Test
  void originsTellWhereThingsStand() {
    NetlistResult result =
        read("R1 a 0 1k", "XV1 12AX7 1=a 2=g 3=k", "R2 g k 1k", ".state off V1=out");
    Origins origins = result.origins();
    assertThat(origins.of("r2").map(SourceSpan::line)).contains(4);
    assertThat(origins.of("V1A").map(SourceSpan::line)).contains(3);
    assertThat(origins.ofBottle("v1").map(SourceSpan::line)).contains(3);
    assertThat(origins.ofNode("G").map(SourceSpan::column)).contains(17);
    assertThat(origins.ofState("off").map(SourceSpan::line)).contains(5);
    assertThat(origins.of("R9")).isEmpty();
  }

  @Test
  void remarksComeInFileOrder() {
    NetlistResult result = read("R1 a 0 x", "R2 a 0 y 1", "XQ a b c NOSUCH", "R3 a");
    List<Integer> lines =
        result.diagnostics().stream()
            .map(d -> d.span())
            .filter(s -> s != null)
            .map(SourceSpan::line)
            .toList();
    assertThat(lines).isSorted().hasSizeGreaterThanOrEqualTo(4);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "%PDF-1.7 ...",
        "\u0089PNG\r\n",
        "<!DOCTYPE html><html></html>",
        "<svg xmlns='x'><path/></svg>",
        "{\"parts\": []}",
        "(list (version 2)\n  (a)\n  (b)\n)",
        "Sheet 1\nWIRE 1 2 3 4\nWIRE 5 6 7 8\n",
        "abc\u0000def"
      })
  void otherFilesAreNamedForWhatTheyAre(String start) {
    NetlistResult result = NetlistReader.readText("x", start, Catalogue.standard());
    assertThat(codes(result)).containsExactly("not-a-netlist");
  }
}
