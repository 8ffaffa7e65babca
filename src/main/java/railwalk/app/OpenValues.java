package railwalk.app;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import railwalk.circuit.Circuit;
import railwalk.diagnosis.FoundValue;
import railwalk.diagnosis.NoOperatingPoint;
import railwalk.diagnosis.UnknownValues;
import railwalk.netlist.Origins;
import railwalk.readings.SheetReading;

/** An amplifier whose open values were solved from readings; none were open in most. */
final class OpenValues {
  private final Path netlist;
  private final TracedAmplifier amplifier;
  private final List<FoundValue> values;

  private OpenValues(Path netlist, TracedAmplifier amplifier, List<FoundValue> values) {
    this.netlist = netlist;
    this.amplifier = amplifier;
    this.values = values;
  }

  /**
   * Reads {@code netlist} and solves what it leaves open.
   *
   * @param sheet reads the readings against a circuit
   */
  static OpenValues solve(
      Path netlist, Function<Circuit, SheetReading> sheet, BenchConditions conditions)
      throws CannotDo {
    TracedAmplifier traced = TracedAmplifier.read(netlist);
    List<Origins.Unknown> open = traced.origins().unknowns();
    SheetReading read = open.isEmpty() ? null : sheet.apply(traced.circuit());
    if (read == null || read.sheet().readings().isEmpty()) {
      return new OpenValues(netlist, traced, List.of());
    }
    try {
      Circuit benched = conditions.over(read.sheet()).applyTo(traced.circuit());
      List<String> names = open.stream().map(Origins.Unknown::element).toList();
      UnknownValues found = UnknownValues.of(benched, read.sheet(), names);
      TracedAmplifier known = traced.with(found.applyTo(traced.circuit()));
      return new OpenValues(netlist, known, found.values());
    } catch (NoOperatingPoint failure) {
      throw new CannotDo(String.valueOf(failure.getMessage()));
    }
  }

  /** Returns the amplifier with all its values known. */
  TracedAmplifier amplifier() {
    return amplifier;
  }

  /** Returns the values found; empty when none were open. */
  List<FoundValue> values() {
    return values;
  }

  /** Writes the netlist with the values found to {@code target}, whole or not at all. */
  void learn(Path target) throws CannotDo {
    if (values.isEmpty()) {
      throw new CannotDo("--learn: " + netlist + " has no value written as ?");
    }
    if (CompareJob.isSame(target, netlist)) {
      throw new CannotDo(
          "--learn " + target + ": this is the netlist that was read; name another file");
    }
    Optional<FoundValue> undetermined = values.stream().filter(v -> !v.determined()).findFirst();
    if (undetermined.isPresent()) {
      throw new CannotDo(
          "--learn: the readings do not determine "
              + undetermined.get().element()
              + "; the report says what to read");
    }
    WholeFile.write(target, LearnedNetlist.bytes(netlist, amplifier.origins().unknowns(), values));
  }
}
