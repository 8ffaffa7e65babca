package railwalk.chart;

import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;
import railwalk.device.Electrode;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;
import railwalk.walk.DcPath;
import railwalk.walk.DcPaths;
import railwalk.walk.DcStep;
import railwalk.walk.SupplyNode;

/**
 * The walk in words and sums: down the supply ladder resistor by resistor, or to one point and back
 * to the winding. Lines are at most 80 characters; every sum adds up as printed.
 */
public final class WalkText {
  private final OperatingPoint point;
  private final Circuit circuit;
  private final Wording wording;
  private final WalkLadder ladder;
  private final WalkLines lines = new WalkLines();

  private WalkText(OperatingPoint point) {
    this.point = point;
    this.circuit = point.circuit();
    this.wording = new Wording(circuit.words());
    this.ladder = new WalkLadder(point, wording);
  }

  /** Returns the supply ladder, each supply's lines after an empty one. */
  public static List<String> ladder(OperatingPoint point) {
    WalkText text = new WalkText(point);
    if (point.map().supplyNodes().isEmpty()) {
      text.lines.add(
          text.wording.say("No supply node found: no rectifier or source feeds the {tubes}."));
    }
    text.ladder.addAll(text.lines);
    return text.lines.lines();
  }

  /** Returns the walk to one point. */
  public static List<String> to(OperatingPoint point, WalkTarget target) {
    WalkText text = new WalkText(point);
    text.walkTo(target);
    return text.lines.lines();
  }

  private void walkTo(WalkTarget target) {
    Node node = target.node();
    if (node.equals(circuit.reference())) {
      lines.add(target.name() + " is the reference: 0 V, where the black lead sits.");
      return;
    }
    lines.add(heading(target));
    if (point.map().undefined().contains(node)) {
      lines.add("No DC path to the reference: its volts are not predictable.");
      return;
    }
    lines.gap();
    Optional<SupplyNode> supply = point.map().supplyNode(node);
    boolean byName = target.name().equalsIgnoreCase(node.name());
    if (supply.isPresent() && byName) {
      lines.add("Way: " + way(new DcPaths(point.map(), circuit).to(node)));
      lines.gap();
      ladder.addDownTo(supply.get(), lines);
      addSupply(supply.get());
      lines.gap();
      lines.add(new WalkMeter(point).line(node));
      return;
    }
    lines.add("Way: " + way(path(target)));
    lines.gap();
    if (target.section() != null && target.electrode() != null) {
      new WalkTube(point, wording, ladder, target.section()).add(target.electrode(), lines);
    } else {
      point
          .map()
          .supplyOf(node)
          .flatMap(point.map()::supplyNode)
          .ifPresent(s -> ladder.addDownTo(s, lines));
      if (isAlternating(node, path(target))) {
        addAlternating(node);
        return;
      }
      new WalkBranch(point).add(path(target), lines);
    }
    lines.gap();
    lines.add(new WalkMeter(point).line(node));
  }

  /** Returns whether a winding swings {@code node}, or what a winding drives before a rectifier. */
  private boolean isAlternating(Node node, DcPath path) {
    return point.map().supplyOf(node).isEmpty()
        && path.there().stream().anyMatch(step -> step.element() instanceof Winding);
  }

  /** Adds the alternating volts of windings that end at {@code node}. */
  private void addAlternating(Node node) {
    for (Winding winding : circuit.elements(Winding.class)) {
      double scale = circuit.line().scale(winding.atLineVolts());
      for (Winding.Section section : winding.sections()) {
        if (section.a().equals(node) || section.b().equals(node)) {
          lines.add(
              "Alternating: "
                  + winding.name()
                  + " gives "
                  + Quantity.volts(section.openRmsVolts() * scale)
                  + " rms between "
                  + section.a().name()
                  + " and "
                  + section.b().name()
                  + " at no load.");
        }
      }
    }
    lines.add(
        "An alternating point: a DC meter shows its mean, "
            + Quantity.volts(point.volts(node))
            + ".");
  }

  private DcPath path(WalkTarget target) {
    return target.section() != null && target.electrode() != null
        ? new DcPaths(point.map(), circuit).to(target.section(), target.electrode())
        : new DcPaths(point.map(), circuit).to(target.node());
  }

  private String heading(WalkTarget target) {
    String name = target.name();
    AmplifierSection section = target.section();
    Electrode electrode = target.electrode();
    if (section != null && electrode != null) {
      String owner = section.name() + " " + wording.electrode(electrode);
      name += name.equals(owner) ? "" : ", " + owner;
      name += circuit.bottle(section.bottle()).map(b -> " (" + b.type().name() + ")").orElse("");
      name +=
          target.name().equalsIgnoreCase(target.node().name())
              ? ""
              : ", node " + target.node().name();
    } else if (!name.equalsIgnoreCase(target.node().name())) {
      name += ", node " + target.node().name();
    }
    return name
        + ": "
        + Quantity.volts(point.volts(target.node()))
        + " against "
        + circuit.reference().name();
  }

  /** Returns the parts and nodes of a path in order: "0 > VHT > ht1 > V3 > b1". */
  private static String way(DcPath path) {
    String there = way(path.there());
    String back = way(path.back());
    if (there.isEmpty()) {
      return path.target().name() + (back.isEmpty() ? "" : " " + back);
    }
    return there + (back.isEmpty() ? "" : "; back " + back);
  }

  private static String way(List<DcStep> steps) {
    return steps.isEmpty()
        ? ""
        : steps.get(0).from().name()
            + steps.stream()
                .map(step -> " > " + step.element().name() + " > " + step.to().name())
                .collect(Collectors.joining());
  }

  private void addSupply(SupplyNode supply) {
    WalkLoads loads = new WalkLoads(point, wording);
    List<WalkLoads.Share> shares = loads.of(supply.node());
    double amps = Math.abs(shares.stream().mapToDouble(WalkLoads.Share::amps).sum());
    lines.gap();
    lines.add(
        supply.node().name() + " gives " + WalkLoads.text(WalkAmps.of(amps).finer(1), shares));
    if (supply.parent() == null) {
      new WalkRectifier(point).explain(supply, lines);
    }
  }
}
