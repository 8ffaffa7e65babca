package railwalk.chart;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.solve.OperatingPoint;
import railwalk.source.Diagnostic;
import railwalk.spread.Bands;
import railwalk.walk.SupplyMap;

/**
 * One column of the chart: the amplifier solved in one state.
 *
 * @param state its name; empty for the netlist as it stands
 * @param findings what was found in this state, besides what the text itself gave rise to
 * @param unloaded the same on a high line before the tubes warm up; null when not known
 */
public record Column(
    String state,
    OperatingPoint point,
    Bands bands,
    List<Diagnostic> findings,
    @Nullable OperatingPoint unloaded) {
  /** Makes a column of which nothing is known before the tubes warm up. */
  public Column(String state, OperatingPoint point, Bands bands, List<Diagnostic> findings) {
    this(state, point, bands, findings, null);
  }

  public Column {
    findings = List.copyOf(findings);
  }

  /** Returns the circuit in this state. */
  public Circuit circuit() {
    return point.circuit();
  }

  /** Returns the walk of the circuit in this state. */
  public SupplyMap map() {
    return point.map();
  }
}
