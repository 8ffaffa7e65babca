package railwalk.chart;

import java.util.List;

/**
 * A bench report at full precision, in SI units; NaN where a figure is not known, an empty text
 * where there is none.
 *
 * @param suspects likeliest first
 * @param nextProbe one, or none
 * @param values found from the readings; empty when the netlist leaves none open
 */
public record BenchFigures(
    Figures.Conditions conditions,
    List<Point> points,
    List<Suspect> suspects,
    List<NextProbe> nextProbe,
    List<Value> values) {

  /**
   * One reading.
   *
   * @param expected at the actual line, no meter connected
   * @param low of the healthy band as the meter shows it
   * @param meter what the meter shows of a healthy amplifier
   */
  public record Point(
      String point,
      String kind,
      String state,
      double read,
      double expected,
      double low,
      double high,
      double meter,
      String verdict) {}

  /**
   * One explanation.
   *
   * @param element empty for a healthy amplifier and for another one
   * @param unit of the estimate; empty for a share
   * @param group number of those that no reading tells apart
   */
  public record Suspect(
      String element,
      String fault,
      double estimate,
      String unit,
      double probability,
      List<String> supporting,
      List<String> against,
      int group) {
    public Suspect {
      supporting = List.copyOf(supporting);
      against = List.copyOf(against);
    }
  }

  /** What to read next. */
  public record NextProbe(
      String point, String kind, String action, String why, List<Outcome> outcomes) {
    public NextProbe {
      outcomes = List.copyOf(outcomes);
    }
  }

  /** One outcome: about this reading, and the suspect it speaks for. */
  public record Outcome(double reading, String suspect) {}

  /**
   * A value that the netlist leaves open.
   *
   * @param ohms NaN when not determined
   * @param logDeviation one standard deviation of the natural logarithm
   * @param nearest preferred value; NaN for windings and coils
   * @param readPoint the point that would tell most; empty when determined
   */
  public record Value(
      String element,
      boolean determined,
      double ohms,
      double logDeviation,
      double nearest,
      List<String> toldBy,
      String readPoint,
      String readKind) {
    public Value {
      toldBy = List.copyOf(toldBy);
    }
  }

  public BenchFigures {
    values = List.copyOf(values);
    points = List.copyOf(points);
    suspects = List.copyOf(suspects);
    nextProbe = List.copyOf(nextProbe);
  }
}
