package railwalk.netlist;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.device.Catalogue;
import railwalk.source.FileBytes;
import railwalk.source.SourceText;

/**
 * The door: a netlist file or text in, a {@link NetlistResult} out. Bad text never makes it throw;
 * everything wrong with it comes back at once, as diagnostics.
 */
public final class NetlistReader {
  private static final int LONGEST_LINE = 20_000;
  private static final String FAR_TOO_LARGE = "a file far too large for one";

  private NetlistReader() {}

  /**
   * Reads a netlist and the files it includes; types that it gives by points stay without a law.
   *
   * @throws IOException when {@code file} itself cannot be read
   */
  public static NetlistResult read(Path file, Catalogue catalogue) throws IOException {
    return read(file, catalogue, LawFitter.NONE);
  }

  /**
   * Reads a netlist and the files it includes.
   *
   * @param fitter makes the laws of types that the netlist gives
   * @throws IOException when {@code file} itself cannot be read
   */
  public static NetlistResult read(Path file, Catalogue catalogue, LawFitter fitter)
      throws IOException {
    String name = String.valueOf(file.getFileName());
    if (Files.size(file) > FileBytes.LARGEST_BYTES) {
      return refused(Problem.NOT_A_NETLIST, name, FAR_TOO_LARGE);
    }
    SourceText text = SourceText.of(name, FileBytes.decode(Files.readAllBytes(file)));
    return read(new SourceFile(text, file.toRealPath()), Includes.of(file), catalogue, fitter);
  }

  /** Reads netlist text that stands alone: an include in it is noted and passed over. */
  public static NetlistResult readText(String fileName, String text, Catalogue catalogue) {
    return readText(fileName, text, catalogue, LawFitter.NONE);
  }

  /** Reads netlist text that stands alone, with what makes the laws of types that it gives. */
  public static NetlistResult readText(
      String fileName, String text, Catalogue catalogue, LawFitter fitter) {
    if (text.length() > FileBytes.LARGEST_BYTES) {
      return refused(Problem.NOT_A_NETLIST, fileName, FAR_TOO_LARGE);
    }
    String plain = text.startsWith("\ufeff") ? text.substring(1) : text;
    SourceText source = SourceText.of(fileName, plain);
    return read(new SourceFile(source, null), Includes.none(), catalogue, fitter);
  }

  private static NetlistResult read(
      SourceFile file, Includes includes, Catalogue catalogue, LawFitter fitter) {
    String name = file.text().fileName();
    Optional<String> foreign = FileBytes.foreignKind(String.join("\n", file.text().lines()));
    if (foreign.isPresent()) {
      return refused(Problem.NOT_A_NETLIST, name, foreign.get());
    }
    if (file.text().lines().stream().allMatch(String::isBlank)) {
      return refused(Problem.EMPTY_FILE, name, "");
    }
    if (file.text().lines().stream().anyMatch(line -> line.length() > LONGEST_LINE)) {
      return refused(Problem.NOT_A_NETLIST, name, "one endless line");
    }
    Report report = new Report();
    Deck deck = DeckReader.read(file, includes, report);
    Catalogue types = GivenTypes.before(catalogue, deck, fitter, report);
    CircuitAssembler.Assembled assembled = CircuitAssembler.assemble(deck, types, report);
    return new NetlistResult(
        assembled.circuit(), assembled.origins(), assembled.report().inOrder(deck.files()));
  }

  private static NetlistResult refused(Problem problem, String fileName, String kind) {
    return new NetlistResult(
        Optional.empty(),
        new Origins(Map.of(), Map.of(), Map.of(), Map.of(), List.of()),
        List.of(problem.at(null, fileName, kind)));
  }
}
