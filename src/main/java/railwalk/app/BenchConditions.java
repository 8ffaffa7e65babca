package railwalk.app;

import java.util.Optional;
import railwalk.circuit.Circuit;
import railwalk.circuit.Line;
import railwalk.circuit.Meter;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.netlist.NetlistResult;
import railwalk.readings.ReadingSheet;
import railwalk.source.Diagnostic;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/**
 * What holds at this bench in place of what the netlist says.
 *
 * @param line line volts as typed
 * @param meter as {@code .meter} takes it
 */
public record BenchConditions(Optional<String> line, Optional<String> meter) {

  /** Returns these conditions, those that a sheet gives where these leave them open. */
  BenchConditions over(ReadingSheet sheet) {
    Optional<String> sheetLine =
        Double.isNaN(sheet.lineVolts())
            ? Optional.empty()
            : Optional.of(Double.toString(sheet.lineVolts()));
    Optional<String> sheetMeter =
        sheet.meter().isEmpty() ? Optional.empty() : Optional.of(sheet.meter());
    return new BenchConditions(line.or(() -> sheetLine), meter.or(() -> sheetMeter));
  }

  /** Returns {@code circuit} under these conditions. */
  Circuit applyTo(Circuit circuit) throws CannotDo {
    Circuit changed = circuit;
    if (line.isPresent()) {
      changed = changed.withLine(line(line.get(), circuit.line()));
    }
    if (meter.isPresent()) {
      changed = changed.withMeter(meter(meter.get()));
    }
    return changed;
  }

  private static Line line(String typed, Line written) throws CannotDo {
    if (!(ValueReader.read(typed, Measure.VOLTAGE) instanceof ValueReading.Value volts)
        || !(volts.amount() > 0)) {
      throw new CannotDo("--line " + typed + ": expected line volts, such as 117");
    }
    if (!written.stated()) {
      throw new CannotDo(
          "--line needs a .line in the netlist that says at which line its windings hold, such as"
              + " .line 120 60 design=117");
    }
    return new Line(volts.amount(), written.hertz(), written.designVolts());
  }

  /** Has the netlist reader take {@code typed} as a netlist's own {@code .meter} line. */
  private static Meter meter(String typed) throws CannotDo {
    String text = "meter\n.meter " + typed.replaceAll("\\R", " ") + "\nR1 a 0 1k\n";
    NetlistResult result = NetlistReader.readText("--meter", text, Catalogue.standard());
    Optional<Diagnostic> error =
        result.diagnostics().stream().filter(Diagnostic::isError).findFirst();
    if (error.isPresent()) {
      throw new CannotDo("--meter " + typed + ": " + error.get().message());
    }
    return result.circuit().map(Circuit::meter).orElse(Meter.TEN_MEGOHM);
  }
}
