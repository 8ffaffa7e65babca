package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.chart.Table.Use;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;
import railwalk.solve.WarmUpCourse;
import railwalk.solve.WarmUpOutcome;
import railwalk.solve.WarmUpPeak;
import railwalk.units.Quantity;
import railwalk.walk.SupplyNode;

/** Highest volts of supply nodes and when, for each way of switching on. */
final class WarmUpTable {
  /** Above its running volts by this share a node is worth a remark. */
  private static final double HIGH_SHARE = 1.05;

  private final List<WarmUpCase> cases;

  WarmUpTable(List<WarmUpCase> cases) {
    this.cases = cases;
  }

  Table table() {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Node", Use.WORDS),
            new Table.Column("Running V", Use.FIGURES),
            new Table.Column("Highest V", Use.KEY_FIGURES),
            new Table.Column("After", Use.FIGURES),
            new Table.Column("Capacitor", Use.WORDS),
            new Table.Column("Rated V", Use.FIGURES),
            new Table.Column("Verdict", Use.WORDS));
    List<Table.Group> groups = new ArrayList<>();
    for (WarmUpCase way : cases) {
      groups.add(group(way, groups.isEmpty()));
    }
    return new Table("Highest volts from switch-on", columns, groups);
  }

  /**
   * @param whole whether every supply node is shown; else the first ones, and those above a rating
   */
  private static Table.Group group(WarmUpCase way, boolean whole) {
    if (way.outcome() instanceof WarmUpOutcome.Lost lost) {
      String note =
          "Not followed beyond "
              + seconds(lost.seconds())
              + ": node "
              + lost.node()
              + ": "
              + lost.reason()
              + ".";
      return new Table.Group(way.title(), way.circumstances(), List.of(), List.of(note));
    }
    WarmUpCourse course = ((WarmUpOutcome.Followed) way.outcome()).course();
    List<Table.Row> rows = new ArrayList<>();
    List<String> notes = new ArrayList<>();
    for (SupplyNode supply : way.running().map().supplyNodes()) {
      boolean first = supply.parent() == null;
      boolean over = isOver(course, NodeRating.of(course.circuit(), supply.node()));
      if (whole || first || over) {
        rows.add(row(way.running(), course, supply.node()));
      }
      if (first) {
        highSpell(way.running(), course, supply.node(), notes);
      }
    }
    return new Table.Group(way.title(), way.circumstances(), rows, notes);
  }

  private static Table.Row row(OperatingPoint running, WarmUpCourse course, Node node) {
    WarmUpPeak peak = WarmUpPeak.of(course.seconds(), course.volts(node));
    NodeRating rating = NodeRating.of(course.circuit(), node);
    return new Table.Row(
        node.name(),
        Quantity.plainVolts(running.volts(node)),
        Quantity.plainVolts(peak.volts()),
        seconds(peak.seconds()),
        rating.names(),
        rating.isKnown() ? Quantity.plainVolts(rating.volts()) : "",
        verdict(course, rating));
  }

  /** Returns whether any capacitor of the stack passes its own rating. */
  private static boolean isOver(WarmUpCourse course, NodeRating rating) {
    for (Capacitor capacitor : rating.capacitors()) {
      WarmUpPeak peak = WarmUpPeak.of(course.seconds(), course.across(capacitor));
      if (Math.abs(peak.volts()) > capacitor.ratedVolts()) {
        return true;
      }
    }
    return false;
  }

  private static String verdict(WarmUpCourse course, NodeRating rating) {
    if (!rating.isKnown()) {
      return "";
    }
    double above = 0;
    boolean stays = false;
    for (Capacitor capacitor : rating.capacitors()) {
      double[] across = course.across(capacitor);
      above =
          Math.max(
              above, WarmUpPeak.secondsAbove(course.seconds(), across, capacitor.ratedVolts()));
      stays |= Math.abs(across[across.length - 1]) > capacitor.ratedVolts();
    }
    if (stays) {
      return "stays over";
    }
    return above > 0 ? "over for " + seconds(above) : "within";
  }

  private static void highSpell(
      OperatingPoint running, WarmUpCourse course, Node node, List<String> notes) {
    double limit = HIGH_SHARE * Math.abs(running.volts(node));
    double[] at = course.seconds();
    double[] volts = course.volts(node);
    int first = -1;
    int last = -1;
    for (int i = 0; i < at.length; i++) {
      if (Math.abs(volts[i]) > limit && limit > 0) {
        first = first < 0 ? i : first;
        last = i;
      }
    }
    if (first >= 0) {
      boolean stays = last == at.length - 1;
      notes.add(
          node.name()
              + " stands more than 5 % above its running volts from "
              + seconds(at[first])
              + (stays ? " on." : " to " + seconds(at[last]) + "."));
    }
  }

  /** Returns a sentence on the highest volts of any supply node; empty without one. */
  String highest() {
    double most = 0;
    String sentence = "";
    for (WarmUpCase way : cases) {
      if (way.outcome() instanceof WarmUpOutcome.Followed followed) {
        WarmUpCourse course = followed.course();
        for (SupplyNode supply : way.running().map().supplyNodes()) {
          double volts = WarmUpPeak.of(course.seconds(), course.volts(supply.node())).volts();
          if (Math.abs(volts) > most) {
            most = Math.abs(volts);
            sentence =
                "The highest on these pages is "
                    + Quantity.volts(volts)
                    + " at "
                    + supply.node().name()
                    + ", after "
                    + way.occasion()
                    + ".";
          }
        }
      }
    }
    return sentence;
  }

  /** Returns a time as people read it off a watch: tenths up to ten seconds. */
  static String seconds(double seconds) {
    return Quantity.fixed(seconds, seconds < 9.95 ? 1 : 0) + " s";
  }
}
