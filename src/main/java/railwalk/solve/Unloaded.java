package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Line;
import railwalk.circuit.StandIn;
import railwalk.circuit.Winding;
import railwalk.walk.Walk;

/**
 * An amplifier on a high line before its tubes warm up: none of them draws current yet, rectifiers
 * and regulators work, bleeders and heaters load the supply.
 */
public final class Unloaded {
  /**
   * The high line over the one charted: 10 % (common practice; rating systems allow for as much).
   */
  public static final double LINE_SHARE = 1.10;

  private Unloaded() {}

  /** Returns the operating point; empty where it would not settle. */
  public static Optional<OperatingPoint> of(Circuit circuit) {
    Circuit cold = cold(circuit);
    return OperatingPointSolver.solve(cold, Walk.of(cold)) instanceof SolveOutcome.Solved solved
        ? Optional.of(solved.point())
        : Optional.empty();
  }

  private static Circuit cold(Circuit circuit) {
    Line line = circuit.line();
    List<Element> left = new ArrayList<>();
    for (Element element : circuit.elements()) {
      if (element instanceof Winding winding && !line.stated()) {
        left.add(asWritten(winding));
      } else if (!(element instanceof AmplifierSection || element instanceof StandIn)) {
        left.add(element);
      }
    }
    Line high =
        line.stated()
            ? new Line(LINE_SHARE * line.volts(), line.hertz(), line.designVolts())
            : new Line(LINE_SHARE, line.hertz(), 1);
    return circuit.withElements(left).withLine(high);
  }

  /** Returns the winding without a line of its own: where none is stated it holds as written. */
  private static Winding asWritten(Winding winding) {
    return new Winding(
        winding.name(),
        winding.sections(),
        Double.NaN,
        winding.transformer(),
        winding.wall(),
        winding.ratedAmps());
  }
}
