package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Node;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;
import railwalk.walk.DcPath;
import railwalk.walk.DcStep;

/** The last part of a path: from the supply node, or from the reference, to the point itself. */
final class WalkBranch {
  /** A drop that no meter shows. */
  private static final double NO_DROP_VOLTS = 1e-3;

  private final OperatingPoint point;
  private final WalkTerms terms;

  WalkBranch(OperatingPoint point) {
    this.point = point;
    this.terms = new WalkTerms(point);
  }

  /**
   * Adds the sum from the supply node to the path's target, if there is anything between. A point
   * below a tube gets two: down to the plate, and up from where the current goes.
   */
  void add(DcPath path, WalkLines lines) {
    List<DcStep> steps = afterSupply(path);
    List<DcStep> load = beforeTube(steps);
    if (!load.isEmpty()) {
      lines.add(sum(load));
    }
    if (load.size() < steps.size()) {
      lines.add(steps.get(load.size()).element().name() + " passes it on.");
      List<DcStep> up = upFrom(path.back());
      if (!up.isEmpty()) {
        lines.add(sum(up));
      }
    }
  }

  /** Returns the steps as far as a tube's plate. */
  static List<DcStep> beforeTube(List<DcStep> steps) {
    return steps.stream().takeWhile(step -> !(step.element() instanceof AmplifierSection)).toList();
  }

  /**
   * Returns the way back of a path as far as the reference or a supply below it, turned round;
   * empty when another tube stands in it.
   */
  List<DcStep> upFrom(List<DcStep> back) {
    List<DcStep> up = new ArrayList<>();
    for (DcStep step : back) {
      Node from = step.from();
      boolean home = from.equals(point.circuit().reference());
      if (home || point.map().supplyNode(from).isPresent()) {
        break;
      }
      if (step.element() instanceof AmplifierSection) {
        return List.of();
      }
      up.add(0, new DcStep(step.to(), step.element(), step.from()));
    }
    return up;
  }

  /** Returns the steps that follow on the supply node, or all of them when there is none. */
  static List<DcStep> afterSupply(DcPath path) {
    List<DcStep> there = path.there();
    int from = 0;
    for (int k = 0; k < there.size(); k++) {
      if (there.get(k).to().equals(path.supply())) {
        from = k + 1;
      }
    }
    return there.subList(from, there.size());
  }

  /** Returns whether no meter shows a drop along some steps. */
  boolean drawsNothing(List<DcStep> steps) {
    double first = point.volts(steps.get(0).from());
    double last = point.volts(steps.get(steps.size() - 1).to());
    return Math.abs(first - last) < NO_DROP_VOLTS;
  }

  /** Returns the sum along some steps, or a word on why nothing drops. */
  String sum(List<DcStep> steps) {
    Node from = steps.get(0).from();
    Node to = steps.get(steps.size() - 1).to();
    double fromVolts = point.volts(from);
    double toVolts = point.volts(to);
    List<WalkSum.Term> all = terms.of(steps);
    if (drawsNothing(steps)) {
      String parts = String.join(", ", steps.stream().map(s -> s.element().name()).toList());
      boolean contacts = all.isEmpty();
      return from.name()
          + (fromVolts == 0 ? "" : " " + Quantity.volts(fromVolts))
          + " through "
          + parts
          + (contacts ? " = " : ", no current to speak of: ")
          + to.name()
          + " "
          + Quantity.volts(toVolts);
    }
    String first = from.equals(point.circuit().reference()) ? "" : from.name();
    return new WalkSum(first, fromVolts, all, to.name(), toVolts).printed().text();
  }
}
