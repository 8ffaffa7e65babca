package railwalk.readings;

import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Winding;
import railwalk.device.Electrode;
import railwalk.device.PinUse;
import railwalk.readings.Terminals.Ends;
import railwalk.source.Diagnostic;

/** Where the meter's leads stand for a point and a kind of reading. */
final class Placing {
  private final Circuit circuit;

  Placing(Circuit circuit) {
    this.circuit = circuit;
  }

  /** Returns where {@code kind} is read at {@code point}; {@code notes} takes what was assumed. */
  MeasuredAt at(Point point, ReadingKind kind, Cell cell, List<Diagnostic> notes)
      throws RowRefused {
    if (kind == ReadingKind.MA) {
      return through(point, cell);
    }
    if (point instanceof Point.OfPart part) {
      return ofPart(part.element(), kind, cell);
    }
    if (point instanceof Point.OfTube tube) {
      return kind == ReadingKind.AC ? acOfTube(tube, cell, notes) : atNode(tube.node());
    }
    return atNode(((Point.OfNode) point).node());
  }

  private static MeasuredAt atNode(Node node) {
    return new MeasuredAt.AtNode(node);
  }

  private MeasuredAt ofPart(Element element, ReadingKind kind, Cell cell) throws RowRefused {
    if (element instanceof Winding winding) {
      if (kind != ReadingKind.AC) {
        throw new RowRefused(SheetProblem.WINDING_NEEDS_AC, cell.span(), winding.name());
      }
      return new MeasuredAt.OnWinding(winding);
    }
    Optional<Ends> found = element.accept(new Terminals());
    if (found.isEmpty()) {
      throw new RowRefused(SheetProblem.NO_TWO_ENDS, cell.span(), element.name());
    }
    Ends ends = found.get();
    if (kind == ReadingKind.DC || kind == ReadingKind.AC) {
      return new MeasuredAt.Across(element, ends.a(), ends.b());
    }
    boolean first = ends.a().equals(circuit.reference());
    boolean second = ends.b().equals(circuit.reference());
    if (first == second) {
      throw new RowRefused(
          SheetProblem.NOT_AGAINST_REFERENCE,
          cell.span(),
          element.name(),
          kind.word(),
          first ? "" : ", such as node:" + ends.a().name());
    }
    return atNode(first ? ends.b() : ends.a());
  }

  /** A heater pin is read against the heater's other end, where both are the ends of a winding. */
  private MeasuredAt acOfTube(Point.OfTube tube, Cell cell, List<Diagnostic> notes) {
    Electrode electrode = tube.electrode();
    Bottle bottle = tube.bottle();
    if (electrode == null || bottle == null || !electrode.isHeater()) {
      return atNode(tube.node());
    }
    Set<Node> heater = heaterNodes(bottle);
    for (Winding winding : circuit.elements(Winding.class)) {
      Node first = winding.sections().get(0).a();
      Node last = winding.sections().get(winding.sections().size() - 1).b();
      boolean own = tube.node().equals(first) || tube.node().equals(last);
      if (own && heater.contains(first) && heater.contains(last)) {
        notes.add(SheetProblem.HEATER_ON_WINDING.at(cell.span(), cell.text(), winding.name()));
        return new MeasuredAt.OnWinding(winding);
      }
    }
    notes.add(SheetProblem.HEATER_AGAINST_REFERENCE.at(cell.span(), cell.text()));
    return atNode(tube.node());
  }

  private static Set<Node> heaterNodes(Bottle bottle) {
    boolean joined =
        bottle.type().heater().cathodeJoined() || bottle.type().heater().directlyHeated();
    Set<Node> nodes = new HashSet<>();
    for (Map.Entry<Integer, PinUse> pin : bottle.type().pins().entrySet()) {
      Electrode electrode = pin.getValue().electrode();
      Node node = bottle.pins().get(pin.getKey());
      boolean heats =
          electrode != null && (electrode.isHeater() || (joined && electrode == Electrode.CATHODE));
      if (heats && node != null) {
        nodes.add(node);
      }
    }
    return nodes;
  }

  private static MeasuredAt through(Point point, Cell cell) throws RowRefused {
    if (point instanceof Point.OfTube tube) {
      Electrode electrode = tube.electrode();
      if (electrode != null && tube.sections().size() == 1) {
        return new MeasuredAt.Through(tube.sections().get(0), electrode);
      }
      if (electrode != null && tube.sections().size() > 1) {
        List<String> choice =
            tube.sections().stream().map(s -> s.name() + "." + electrode.word()).toList();
        throw new RowRefused(
            SheetProblem.SECTION_NEEDED,
            cell.span(),
            cell.text(),
            electrode.word(),
            String.join(", ", choice));
      }
    }
    Element element = point instanceof Point.OfPart part ? part.element() : null;
    if (element == null || !isInSeries(element)) {
      throw new RowRefused(SheetProblem.CURRENT_PLACE, cell.span(), cell.text());
    }
    return new MeasuredAt.Through(element, null);
  }

  /** Returns whether one current flows in at one end of a part and out at the other. */
  private static boolean isInSeries(Element element) {
    if (element instanceof Potentiometer pot) {
      return pot.wiper().equals(pot.a()) || pot.wiper().equals(pot.b());
    }
    return element.accept(new Terminals()).isPresent();
  }
}
