package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.fit.GivenTubeFit;
import railwalk.fit.TypeSheet;
import railwalk.source.Diagnostic;
import railwalk.source.DiagnosticPrinter;

/** Short ways to read a netlist in a test. */
final class Reading {
  /** Fits types that a netlist gives, as the program does. */
  static final LawFitter FITTER =
      file -> {
        DataFile fitted = GivenTubeFit.fitted(file);
        return new LawFitter.Fitted(fitted, TypeSheet.of(fitted).worstErrorShare());
      };

  private Reading() {}

  /** Returns what comes of these lines below a title. */
  static NetlistResult read(String... lines) {
    return NetlistReader.readText(
        "test.cir", "* test\n" + String.join("\n", lines) + "\n", Catalogue.standard(), FITTER);
  }

  /** Returns the circuit of these lines; there must be no error. */
  static Circuit circuit(String... lines) {
    NetlistResult result = read(lines);
    assertThat(result.circuit())
        .as(() -> DiagnosticPrinter.print(result.diagnostics()))
        .isPresent();
    return result.circuit().orElseThrow();
  }

  /** Returns the part of that name and kind. */
  static <E extends Element> E part(Circuit circuit, String name, Class<E> kind) {
    Element element = circuit.element(name).orElseThrow(() -> new AssertionError("no " + name));
    assertThat(element).isInstanceOf(kind);
    return kind.cast(element);
  }

  /** Returns the codes of what was said, in order. */
  static List<String> codes(NetlistResult result) {
    return result.diagnostics().stream().map(Diagnostic::code).toList();
  }

  /** Returns the names of nodes. */
  static List<String> names(List<Node> nodes) {
    return nodes.stream().map(Node::name).toList();
  }
}
