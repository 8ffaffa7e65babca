package railwalk.netlist;

import java.util.List;
import java.util.Optional;
import railwalk.circuit.Circuit;
import railwalk.source.Diagnostic;

/**
 * What reading a netlist hands on.
 *
 * @param circuit present if and only if no diagnostic is an error
 * @param origins where in the text each part stands
 * @param diagnostics all of them, in file order
 */
public record NetlistResult(
    Optional<Circuit> circuit, Origins origins, List<Diagnostic> diagnostics) {
  public NetlistResult {
    diagnostics = List.copyOf(diagnostics);
  }
}
