package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.solve.AcLoads;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SupplyPoint;
import railwalk.walk.RippleGroup;
import railwalk.walk.RippleGroups;

/**
 * A choke between a full-wave rectifier and its first capacitor. As long as current flows in it all
 * through the period the output is the mean of the rectified volts, 2/π of their peak; below its
 * critical current the output rises towards the peak.
 *
 * <p>The critical inductance of full-wave rectification into a resistance R on a line of f hertz is
 * {@code L = R / (6·π·f)} (F. E. Terman, "Radio Engineers' Handbook", 1943, section 8, also "R /
 * 1130 at 60 cycles"), so that the critical current of a choke is {@code E / (6·π·f·L)}, E being
 * the mean of the rectified volts.
 *
 * @param output the node behind it
 * @param drawnAmps mean current through it
 * @param criticalAmps current below which it runs dry
 */
public record ChokeInput(Inductor choke, Node output, double drawnAmps, double criticalAmps) {

  /** Returns the critical current in ampere of a choke behind a full-wave rectifier. */
  public static double criticalAmps(double peakVolts, double henries, double hertz) {
    return 2 / Math.PI * peakVolts / (6 * Math.PI * hertz * henries);
  }

  /** Returns the choke inputs of a solved amplifier. */
  public static List<ChokeInput> of(OperatingPoint point) {
    List<ChokeInput> found = new ArrayList<>();
    for (RippleGroup group : point.map().groups()) {
      for (int o = 0; o < group.outputs().size(); o++) {
        String arrangement = group.arrangements().get(o);
        if (arrangement.contains("choke input") && !arrangement.startsWith("half-wave")) {
          add(point, group, group.outputs().get(o), found);
        }
      }
    }
    return found;
  }

  private static void add(
      OperatingPoint point, RippleGroup group, Node output, List<ChokeInput> found) {
    double drawn = 0;
    for (SupplyPoint supply : point.supplies()) {
      drawn = supply.node().equals(output) ? Math.abs(supply.dcAmps()) : drawn;
    }
    for (Element feeder : group.feeders()) {
      if (feeder instanceof Inductor choke && choke.nodes().contains(output)) {
        Node before = choke.a().equals(output) ? choke.b() : choke.a();
        AcLoads.Range range = point.range(before);
        double peak = Math.max(Math.abs(range.lowestVolts()), Math.abs(range.highestVolts()));
        double henries =
            Double.isNaN(choke.henries()) ? RippleGroups.USUAL_CHOKE_HENRIES : choke.henries();
        double critical = criticalAmps(peak, henries, point.circuit().line().hertz());
        found.add(new ChokeInput(choke, output, drawn, critical));
      }
    }
  }

  /** Returns whether the current does not flow all through the period. */
  public boolean isBelow() {
    return drawnAmps < criticalAmps;
  }
}
