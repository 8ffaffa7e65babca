package railwalk.readings;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.Map;
import railwalk.circuit.Circuit;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;

/** The netlists that sheets of the tests were read on. */
final class Amps {
  private static final Map<String, Circuit> KNOWN = new HashMap<>();

  private Amps() {}

  /** Returns the circuit of a file below {@code test-netlists}. */
  static Circuit of(String file) {
    return KNOWN.computeIfAbsent(file, Amps::read);
  }

  static Circuit millrace() {
    return of("amps/millrace.cir");
  }

  static Circuit towpath() {
    return of("amps/towpath.cir");
  }

  private static Circuit read(String file) {
    try {
      return NetlistReader.read(Path.of("test-netlists", file), Catalogue.standard())
          .circuit()
          .orElseThrow();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
