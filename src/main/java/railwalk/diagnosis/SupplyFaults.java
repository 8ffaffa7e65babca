package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Line;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.Winding;
import railwalk.device.SectionKind;
import railwalk.device.SiliconLaw;

/** What goes wrong between the wall and the reservoirs. */
final class SupplyFaults {
  private static final Range WEAK = new Range(0.05, 0.6, "");
  private static final Range TURNS_LEFT = new Range(0.4, 0.92, "");
  private static final double LINE_LOW = 0.8;
  private static final double LINE_HIGH = 1.15;

  private SupplyFaults() {}

  static List<Fault> of(Circuit circuit) {
    List<Fault> faults = new ArrayList<>();
    for (RectifierSection rectifier : circuit.elements(RectifierSection.class)) {
      if (rectifier.type().kind() == SectionKind.RECTIFIER) {
        rectifier(rectifier, faults);
      }
    }
    for (Diode diode : circuit.elements(Diode.class)) {
      faults.add(diode(FaultKind.DIODE_OPEN, diode, Rewire.OPEN_OHMS));
      faults.add(diode(FaultKind.DIODE_SHORTED, diode, Rewire.SHORT_OHMS));
    }
    circuit.elements(Winding.class).forEach(w -> winding(w, faults));
    if (circuit.line().stated()) {
      faults.add(line(circuit.line()));
    }
    return faults;
  }

  private static void rectifier(RectifierSection rectifier, List<Fault> faults) {
    faults.add(
        new Fault(
            FaultKind.RECTIFIER_WEAK,
            rectifier.name(),
            "",
            WEAK,
            (c, share) ->
                Rewire.change(
                    c,
                    RectifierSection.class,
                    rectifier.name(),
                    r -> r.withLaw(r.law().withEmission(share)))));
    if (rectifier.plates().size() > 1) {
      for (int plate = 0; plate < rectifier.plates().size(); plate++) {
        faults.add(halfDead(rectifier, plate));
      }
    }
    faults.add(
        new Fault(
            FaultKind.SILICON_FITTED,
            rectifier.name(),
            "",
            Range.NONE,
            (c, none) ->
                Rewire.change(
                    c,
                    RectifierSection.class,
                    rectifier.name(),
                    r -> r.withLaw(SiliconLaw.generic()))));
  }

  private static Fault halfDead(RectifierSection rectifier, int dead) {
    List<Node> alive = new ArrayList<>(rectifier.plates());
    Node lost = alive.remove(dead);
    return new Fault(
        FaultKind.RECTIFIER_HALF,
        rectifier.name(),
        lost.name(),
        Range.NONE,
        (c, none) ->
            Rewire.change(
                c,
                RectifierSection.class,
                rectifier.name(),
                r ->
                    new RectifierSection(
                        r.name(), r.bottle(), r.section(), r.type(), alive, r.cathode())));
  }

  private static Fault diode(FaultKind kind, Diode diode, double ohms) {
    return new Fault(
        kind,
        diode.name(),
        "",
        Range.NONE,
        (c, none) ->
            Rewire.replace(
                c,
                e -> e.name().equals(diode.name()),
                e -> List.of(new Resistor(diode.name(), diode.anode(), diode.cathode(), ohms))));
  }

  private static void winding(Winding winding, List<Fault> faults) {
    for (int s = 0; s < winding.sections().size(); s++) {
      int section = s;
      Winding.Section open = winding.sections().get(s);
      faults.add(
          new Fault(
              FaultKind.WINDING_OPEN,
              winding.name(),
              open.a().name() + " to " + open.b().name(),
              Range.NONE,
              (c, none) ->
                  Rewire.change(
                      c,
                      Winding.class,
                      winding.name(),
                      w -> w.withOhms(section, Rewire.OPEN_OHMS))));
    }
    if (!winding.wall()) {
      faults.add(
          new Fault(
              FaultKind.TURNS_SHORTED,
              winding.name(),
              "",
              TURNS_LEFT,
              (c, share) -> Rewire.change(c, Winding.class, winding.name(), w -> w.scaled(share))));
    }
  }

  private static Fault line(Line line) {
    return new Fault(
        FaultKind.LINE_OFF,
        "line",
        "",
        new Range(LINE_LOW * line.volts(), LINE_HIGH * line.volts(), "V"),
        (c, volts) -> c.withLine(new Line(volts, c.line().hertz(), c.line().designVolts())));
  }
}
