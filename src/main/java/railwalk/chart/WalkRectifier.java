package railwalk.chart;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.circuit.Bottle;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SupplyPoint;
import railwalk.units.Quantity;
import railwalk.walk.DcPaths;
import railwalk.walk.DcStep;
import railwalk.walk.RippleGroup;
import railwalk.walk.SupplyNode;

/** What the rectifier makes of the winding's volts, in words. */
final class WalkRectifier {
  /** A supply that gives this much feeds plates; one that gives less, grids. */
  private static final double MUCH_AMPS = 0.01;

  private final OperatingPoint point;

  WalkRectifier(OperatingPoint point) {
    this.point = point;
  }

  /** Returns where the volts of a first supply node come from, in one line. */
  String line(SupplyNode supply) {
    if (supply.group() < 0) {
      return source(supply.node());
    }
    RippleGroup group = point.map().groups().get(supply.group());
    List<DcStep> steps = new DcPaths(point.map(), point.circuit()).to(supply.node()).there();
    double rms = windingRms(steps);
    if (rms == 0) {
      return group.outputs().contains(supply.node())
          ? rectifiersAt(group, supply.node())
              + arrangement(group, supply.node())
              + ": "
              + standing(supply.node())
          : returnLead(supply.node());
    }
    String behind = supply.droppers().stream().map(Element::name).collect(Collectors.joining(", "));
    return windings(steps)
        + " "
        + Quantity.volts(rms)
        + " rms, peak "
        + Quantity.volts(rms * Math.sqrt(2))
        + ", through "
        + rectifiers(steps)
        + arrangement(group, supply.node())
        + (behind.isEmpty() ? "" : ", then " + behind)
        + ": "
        + standing(supply.node());
  }

  private String standing(Node node) {
    return node.name() + " " + Quantity.volts(point.volts(node));
  }

  /** Returns the sum that lifts the winding's return off the reference. */
  private String returnLead(Node node) {
    List<DcStep> lead =
        DcPaths.at(point.circuit(), node).stream()
            .filter(step -> step.to().equals(point.circuit().reference()))
            .map(step -> new DcStep(step.to(), step.element(), step.from()))
            .limit(1)
            .toList();
    double volts = point.volts(node);
    return (volts > 0 ? "Tap of the winding: " : "Return to the winding: ")
        + (lead.isEmpty()
            ? standing(node)
            : new WalkSum("", 0, new WalkTerms(point).of(lead), node.name(), volts)
                .printed()
                .text());
  }

  private static String arrangement(RippleGroup group, Node output) {
    int index = group.outputs().indexOf(output);
    return index < 0 ? "" : ", " + group.arrangements().get(index);
  }

  private String source(Node node) {
    Optional<VoltageSource> source =
        point.circuit().elements(VoltageSource.class).stream()
            .filter(v -> v.nodes().contains(node))
            .findFirst();
    return source.map(v -> v.name() + ", a fixed source: ").orElse("fixed source: ")
        + standing(node);
  }

  /** Returns the volts rms of the turns that charge a reservoir, at no load on this line. */
  double windingRms(List<DcStep> steps) {
    double rms = 0;
    for (DcStep step : steps) {
      if (step.element() instanceof Winding winding) {
        rms += rms(winding, step.from(), step.to());
      }
    }
    return rms;
  }

  private double rms(Winding winding, Node from, Node to) {
    double scale = point.circuit().line().scale(winding.atLineVolts());
    return winding.sections().stream()
            .filter(s -> Set.of(s.a(), s.b()).equals(Set.of(from, to)))
            .mapToDouble(Winding.Section::openRmsVolts)
            .findFirst()
            .orElse(0)
        * scale;
  }

  private static String windings(List<DcStep> steps) {
    return steps.stream()
        .map(DcStep::element)
        .filter(Winding.class::isInstance)
        .map(Element::name)
        .distinct()
        .collect(Collectors.joining(", "));
  }

  private String rectifiers(List<DcStep> steps) {
    return steps.stream()
        .map(DcStep::element)
        .filter(e -> e instanceof RectifierSection || e instanceof Diode)
        .map(this::named)
        .collect(Collectors.joining(", "));
  }

  private String rectifiersAt(RippleGroup group, Node output) {
    return group.elements().stream()
        .filter(e -> e instanceof RectifierSection || e instanceof Diode)
        .filter(e -> e.nodes().contains(output))
        .map(this::named)
        .collect(Collectors.joining(", "));
  }

  private String named(Element rectifier) {
    if (rectifier instanceof RectifierSection section) {
      Optional<Bottle> bottle = point.circuit().bottle(section.bottle());
      return section.name() + bottle.map(b -> " (" + b.type().name() + ")").orElse("");
    }
    return rectifier.name();
  }

  /** Adds what an output's volts and its load have to do with each other. */
  void explain(SupplyNode supply, WalkLines lines) {
    Optional<SupplyPoint> output = WalkLadder.output(point, supply.node());
    List<DcStep> steps = new DcPaths(point.map(), point.circuit()).to(supply.node()).there();
    double volts = point.volts(supply.node());
    double sign = Math.signum(volts);
    double peak = windingRms(steps) * Math.sqrt(2) * sign;
    if (output.isEmpty() || peak == 0) {
      return;
    }
    String name = supply.node().name();
    double amps = Math.abs(output.get().dcAmps());
    lines.add(
        "Its reservoir is filled in short peaks of "
            + Quantity.amps(output.get().peakAmps())
            + " and gives "
            + Quantity.amps(amps)
            + " all the time; in between it falls: "
            + Quantity.of(output.get().rippleVoltsRms(), "V")
            + " rms of ripple.");
    if (sign * (peak - volts) > 0) {
      WalkSum.Term lost =
          new WalkSum.Term("winding, rectifier and ripple", Double.NaN, 0, peak - volts);
      lines.add(new WalkSum("Peak", peak, List.of(lost), name, volts).printed().text());
    }
    double ohms =
        Double.parseDouble(String.format(Locale.ROOT, "%.2e", point.sourceOhms(supply.node())));
    double more = amps >= MUCH_AMPS ? 0.01 : 0.001;
    double gained = sign * ohms * amps;
    WalkSum.Term source = new WalkSum.Term(WalkTerms.value(ohms), ohms, amps, -gained);
    lines.add(
        new WalkSum(name, volts, List.of(source), "", volts + gained).printed().text()
            + ": near this load it is like that many volts behind "
            + WalkTerms.value(ohms)
            + "; "
            + Quantity.amps(more)
            + " more take "
            + Quantity.volts(more * ohms)
            + " off it.");
  }
}
