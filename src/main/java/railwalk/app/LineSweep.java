package railwalk.app;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.circuit.Line;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;
import railwalk.walk.Walk;

/** An amplifier solved at line volts from a tenth below to a tenth above. */
final class LineSweep {
  private static final double[] SHARES = {0.90, 0.95, 1, 1.05, 1.10};

  private LineSweep() {}

  /** Returns the operating points, volts rising; refuses where one would not settle. */
  static List<OperatingPoint> of(Circuit circuit) throws CannotDo {
    Line line = circuit.line();
    if (!line.stated()) {
      throw new CannotDo(
          "--line-sweep needs a .line in the netlist that says at which line its windings hold, such"
              + " as .line 120 60 design=117");
    }
    List<OperatingPoint> points = new ArrayList<>();
    for (double share : SHARES) {
      double volts = share * line.volts();
      Circuit there = circuit.withLine(new Line(volts, line.hertz(), line.designVolts()));
      points.add(SolvedColumns.solve("at " + Quantity.volts(volts), there, Walk.of(there)));
    }
    return points;
  }
}
