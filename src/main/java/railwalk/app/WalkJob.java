package railwalk.app;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import railwalk.chart.WalkTarget;
import railwalk.chart.WalkText;
import railwalk.circuit.Circuit;
import railwalk.solve.OperatingPoint;
import railwalk.walk.Walk;

/** The DC paths of an amplifier in words and sums. */
public final class WalkJob {
  private WalkJob() {}

  /** Returns the walk down the supplies of {@code netlist}, resistor by resistor. */
  public static String supplies(Path netlist) throws CannotDo {
    return text(WalkText.ladder(solved(netlist)));
  }

  /**
   * Returns why one point stands where it does: a node, a pin (V2.3) or an electrode (V2.plate).
   */
  public static String to(Path netlist, String point) throws CannotDo {
    OperatingPoint solved = solved(netlist);
    Optional<WalkTarget> target = WalkTarget.find(solved.circuit(), point);
    if (target.isEmpty()) {
      throw new CannotDo(
          "no node, pin or electrode called "
              + point
              + ": name a node of the netlist, a wired pin such as V1.6, or an electrode such as"
              + " V1A.plate");
    }
    return text(WalkText.to(solved, target.get()));
  }

  private static OperatingPoint solved(Path netlist) throws CannotDo {
    Circuit circuit = TracedAmplifier.read(netlist).allKnown().circuit();
    return SolvedColumns.solve("", circuit, Walk.of(circuit));
  }

  private static String text(List<String> lines) {
    return String.join("\n", lines) + "\n";
  }
}
