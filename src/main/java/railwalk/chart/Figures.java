package railwalk.chart;

import java.util.List;

/**
 * The results of one state at full precision, in SI units; NaN where a figure is not known.
 *
 * @param conditions under which they hold
 * @param points one for each node in netlist order, except the reference and what lies inside a
 *     tube
 * @param alternating windings under load, then ripple at the supply nodes
 * @param tubes one for each section, tubes in V order
 * @param supplies one for each rectifier output
 * @param findings most urgent first
 */
public record Figures(
    Conditions conditions,
    List<Point> points,
    List<Alternating> alternating,
    List<Tube> tubes,
    List<Supply> supplies,
    List<Finding> findings) {

  /**
   * What the figures hold for.
   *
   * @param lineVolts rms; NaN when the netlist gives none
   * @param meter as {@code .meter} takes it: "10M", "20k/V 10 50 250 500 1000"
   * @param state empty for the netlist as it stands
   * @param reference name of the node that volts are against
   */
  public record Conditions(
      double lineVolts, double lineHertz, String meter, String state, String reference) {}

  /**
   * One node.
   *
   * @param meterVolts what the meter reads there
   * @param pins wired to it, rising: "V1.6"
   */
  public record Point(
      String node,
      double volts,
      double lowVolts,
      double highVolts,
      double meterVolts,
      List<String> pins) {
    public Point {
      pins = List.copyOf(pins);
    }
  }

  /**
   * Volts that alternate.
   *
   * @param node a supply node, or the name of a winding
   * @param kind "ac": from end to end of a winding under load; "ripple": what is left of a supply
   *     node's volts when the mean is taken off
   */
  public record Alternating(String node, String kind, double rmsVolts) {}

  /**
   * One section of a tube: volts against its cathode (filament middle), currents into the electrode
   * positive.
   *
   * @param section its letter; empty when the tube has only one
   */
  public record Tube(
      String tube,
      String section,
      String type,
      double plateVolts,
      double screenVolts,
      double gridVolts,
      double plateAmps,
      double screenAmps,
      double gridAmps,
      double plateWatts,
      double screenWatts,
      double plateWattsMax) {}

  /** One rectifier output; a negative supply's current is negative. */
  public record Supply(String node, double dcAmps, double peakAmps, double rippleVoltsRms) {}

  /**
   * Something to know.
   *
   * @param line of the file, from 1; 0 when it concerns the file as a whole
   */
  public record Finding(String severity, String code, String message, String file, int line) {}

  public Figures {
    points = List.copyOf(points);
    alternating = List.copyOf(alternating);
    tubes = List.copyOf(tubes);
    supplies = List.copyOf(supplies);
    findings = List.copyOf(findings);
  }
}
