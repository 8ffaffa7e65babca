package railwalk.app;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.netlist.NetlistResult;
import railwalk.netlist.Origins;
import railwalk.source.Diagnostic;
import railwalk.source.DiagnosticPrinter;
import railwalk.source.Severity;

/**
 * A netlist read without error: the circuit, where its parts are written, and what the text itself
 * gave rise to. The first stage of every job.
 *
 * @param diagnostics warnings and notes, in file order
 */
record TracedAmplifier(
    String fileName, Circuit circuit, Origins origins, List<Diagnostic> diagnostics) {
  TracedAmplifier {
    diagnostics = List.copyOf(diagnostics);
  }

  /** Returns what the netlist at {@code file} says; its errors are printed into the refusal. */
  static TracedAmplifier read(Path file) throws CannotDo {
    NetlistResult result = result(file);
    List<Diagnostic> errors = result.diagnostics().stream().filter(Diagnostic::isError).toList();
    Circuit circuit =
        result.circuit().orElseThrow(() -> new CannotDo(DiagnosticPrinter.print(errors)));
    return of(file, result, circuit);
  }

  /** Returns the amplifier at {@code file}, all its values known, under the bench's conditions. */
  static TracedAmplifier under(BenchConditions conditions, Path file) throws CannotDo {
    TracedAmplifier traced = read(file).allKnown();
    return traced.with(conditions.applyTo(traced.circuit()));
  }

  /** Returns what reading {@code file} came to when it came to a circuit. */
  static TracedAmplifier of(Path file, NetlistResult result, Circuit circuit) {
    return new TracedAmplifier(
        String.valueOf(file.getFileName()), circuit, result.origins(), result.diagnostics());
  }

  /** Returns what reading the netlist at {@code file} comes to, errors included. */
  static NetlistResult result(Path file) throws CannotDo {
    if (Files.isDirectory(file)) {
      throw new CannotDo(file + " is a folder, not a netlist");
    }
    try {
      return NetlistReader.read(file, Catalogue.standard(), new GivenTubes());
    } catch (IOException failure) {
      throw new CannotDo("cannot read " + file + ": " + WholeFile.reason(failure));
    }
  }

  /** Returns this amplifier; refuses while a value is still written as a question mark. */
  TracedAmplifier allKnown() throws CannotDo {
    List<Diagnostic> open = origins.unknowns().stream().map(TracedAmplifier::open).toList();
    if (!open.isEmpty()) {
      throw new CannotDo(DiagnosticPrinter.print(open));
    }
    return this;
  }

  /** Returns the same amplifier under other conditions. */
  TracedAmplifier with(Circuit changed) {
    return new TracedAmplifier(fileName, changed, origins, diagnostics);
  }

  private static Diagnostic open(Origins.Unknown unknown) {
    return new Diagnostic(
        Severity.ERROR,
        "value-unknown",
        "the " + unknown.what() + " of " + unknown.element() + " is not known",
        "measure the part, or put in the value that its marking or a like amplifier suggests",
        unknown.span());
  }
}
