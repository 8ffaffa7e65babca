package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Line;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Winding;
import railwalk.device.SectionKind;
import railwalk.device.SiliconLaw;
import railwalk.device.TwoPoleLaw;

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
                    c, RectifierSection.class, rectifier.name(), r -> withEmission(r, share))));
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
                    r -> withLaw(r, SiliconLaw.generic()))));
  }

  static RectifierSection withEmission(RectifierSection r, double share) {
    return withLaw(r, r.law().withEmission(share));
  }

  private static RectifierSection withLaw(RectifierSection r, TwoPoleLaw law) {
    return new RectifierSection(
        r.name(),
        r.bottle(),
        r.section(),
        TubeFaults.withLaw(r.type(), law),
        r.plates(),
        r.cathode());
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
                e -> List.of(TubeFaults.leak(diode.name(), diode.anode(), diode.cathode(), ohms))));
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
                  Rewire.change(c, Winding.class, winding.name(), w -> opened(w, section))));
    }
    if (!winding.wall()) {
      faults.add(
          new Fault(
              FaultKind.TURNS_SHORTED,
              winding.name(),
              "",
              TURNS_LEFT,
              (c, share) ->
                  Rewire.change(c, Winding.class, winding.name(), w -> scaled(w, share))));
    }
  }

  private static Winding opened(Winding w, int number) {
    List<Winding.Section> sections = new ArrayList<>(w.sections());
    Winding.Section s = sections.get(number);
    sections.set(number, new Winding.Section(s.a(), s.b(), s.openRmsVolts(), Rewire.OPEN_OHMS));
    return new Winding(w.name(), sections, w.atLineVolts(), w.transformer(), w.wall());
  }

  private static Winding scaled(Winding w, double share) {
    List<Winding.Section> sections = new ArrayList<>();
    for (Winding.Section s : w.sections()) {
      sections.add(new Winding.Section(s.a(), s.b(), s.openRmsVolts() * share, s.ohms()));
    }
    return new Winding(w.name(), sections, w.atLineVolts(), w.transformer(), w.wall());
  }

  private static Fault line(Line line) {
    return new Fault(
        FaultKind.LINE_OFF,
        "line",
        "",
        new Range(LINE_LOW * line.volts(), LINE_HIGH * line.volts(), "V"),
        (c, volts) -> c.withLine(new Line(volts, c.line().hertz(), c.line().designVolts())));
  }

  /** Returns whether {@code element} is a part of a supply's rectifying side. */
  static boolean isRectifying(Element element) {
    return element instanceof Winding
        || element instanceof Diode
        || (element instanceof RectifierSection r && r.type().kind() == SectionKind.RECTIFIER);
  }
}
