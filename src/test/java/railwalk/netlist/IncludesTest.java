package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static railwalk.netlist.Reading.codes;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import railwalk.circuit.Resistor;
import railwalk.device.Catalogue;

/** Folders: top/shelf/amp is the netlist's own; top/shelf/other is its neighbour. */
class IncludesTest {
  @TempDir Path top;
  private Path amp;

  @BeforeEach
  void folders() throws IOException {
    amp = Files.createDirectories(top.resolve("shelf/amp"));
    Files.createDirectories(amp.resolve("parts"));
    Files.createDirectories(top.resolve("shelf/other"));
    for (String file :
        new String[] {
          "shelf/amp/own.inc",
          "shelf/amp/parts/below.inc",
          "shelf/above.inc",
          "top.inc",
          "shelf/other/beside.inc"
        }) {
      String name = "R_" + file.replaceAll(".*/", "").replace(".inc", "");
      Files.writeString(top.resolve(file), name + " a 0 1k\n");
    }
  }

  private NetlistResult read(String... lines) throws IOException {
    Path file = amp.resolve("amp.cir");
    Files.writeString(file, "* amp\nR1 a 0 1k\nR2 a 0 1k\n" + String.join("\n", lines) + "\n");
    return NetlistReader.read(file, Catalogue.standard());
  }

  @Test
  void filesInTheOwnFolderBelowItAndStraightAboveAreIncluded() throws IOException {
    NetlistResult result =
        read(
            ".include own.inc",
            ".inc \"parts/below.inc\"",
            ".include ../above.inc",
            ".lib '../../top.inc'");
    assertThat(result.circuit().orElseThrow().elements(Resistor.class).stream().map(Resistor::name))
        .containsExactly("R1", "R2", "R_OWN", "R_BELOW", "R_ABOVE", "R_TOP");
  }

  @Test
  void backslashesAreReadAsSlashes() throws IOException {
    assertThat(read(".include parts\\below.inc").circuit().orElseThrow().element("R_below"))
        .isPresent();
  }

  @Test
  void neighboursAndLinksThatLeadElsewhereAreRefused() throws IOException {
    assertThat(codes(read(".include ../other/beside.inc"))).containsExactly("include-refused");
    Files.createSymbolicLink(amp.resolve("link.inc"), top.resolve("shelf/other/beside.inc"));
    assertThat(codes(read(".include link.inc"))).containsExactly("include-refused");
    Files.createSymbolicLink(amp.resolve("folder"), top.resolve("shelf/other"));
    assertThat(codes(read(".include folder/beside.inc"))).containsExactly("include-refused");
    Files.createSymbolicLink(amp.resolve("fine.inc"), amp.resolve("own.inc"));
    assertThat(read(".include fine.inc").circuit()).isPresent();
  }

  @Test
  void aNetlistReachedByALinkHasItsOwnFolderAsHome() throws IOException {
    read(".include own.inc");
    Path link = top.resolve("shelf/other/link.cir");
    Files.createSymbolicLink(link, amp.resolve("amp.cir"));
    NetlistResult result = NetlistReader.read(link, Catalogue.standard());
    assertThat(result.circuit().orElseThrow().element("R_OWN")).isPresent();
  }

  @Test
  void aMissingIncludeIsANoteAsLongAsNothingNeedsIt() throws IOException {
    NetlistResult result = read(".include lost.inc");
    assertThat(result.circuit()).isPresent();
    assertThat(codes(result)).containsExactly("include-missing");
    assertThat(codes(read(".include lost.inc", "X1 a 0 lostpart")))
        .contains("include-missing", "unknown-type");
  }

  @Test
  void anIncludedFileHasNoTitleAndItsOwnPlaces() throws IOException {
    Files.writeString(amp.resolve("bad.inc"), "Rbad a 0 l0k\n");
    NetlistResult result = read(".include bad.inc", "R3 a 0 1OOk");
    assertThat(codes(result)).containsExactly("letter-for-digit", "letter-for-digit");
    assertThat(result.diagnostics())
        .extracting(d -> d.span() == null ? "" : d.span().text().fileName())
        .containsExactly("amp.cir", "bad.inc");
  }

  @Test
  void includesThatMultiplyComeToAnEnd() throws IOException {
    for (int i = 0; i < 12; i++) {
      String next = "n" + (i + 1) + ".inc";
      Files.writeString(
          amp.resolve("n" + i + ".inc"), ".include " + next + "\n.include " + next + "\n");
    }
    assertThat(codes(read(".include n0.inc"))).contains("include-circle");
  }

  @Test
  void textThatStandsAloneIncludesNothing() {
    NetlistResult result =
        NetlistReader.readText(
            "t", "* t\n.include own.inc\nR1 a 0 1k\nR2 a 0 1k", Catalogue.standard());
    assertThat(codes(result)).containsExactly("include-missing");
  }

  @Test
  void aNetlistThatIsNotThereIsAnExceptionForTheCaller() {
    assertThatThrownBy(() -> NetlistReader.read(amp.resolve("none.cir"), Catalogue.standard()))
        .isInstanceOf(IOException.class);
  }
}
