package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Wire;

/** What goes wrong with resistors, capacitors, coils, controls and contacts. */
final class PassiveFaults {
  private static final double LEAST_DRIFT = 1.15;
  private static final double MOST_DRIFT = 12;
  private static final double LEAST_LEAK_OHMS = 300e3;
  private static final double MOST_LEAK_OHMS = 150e6;

  /** From this size up a capacitor is an electrolytic, whose leak may be far worse. */
  private static final double ELECTROLYTIC_FARADS = 1e-6;

  private static final double LEAST_ELECTROLYTIC_LEAK_OHMS = 1e3;

  private PassiveFaults() {}

  static List<Fault> of(Circuit circuit) {
    List<Fault> faults = new ArrayList<>();
    circuit.elements(Resistor.class).forEach(r -> resistor(r, faults));
    circuit.elements(Potentiometer.class).forEach(p -> potentiometer(p, faults));
    circuit.elements(Capacitor.class).forEach(c -> capacitor(c, faults));
    circuit.elements(Inductor.class).forEach(l -> coil(l, faults));
    circuit.elements(Fuse.class).forEach(f -> contact(f.name(), faults));
    circuit.elements(Lamp.class).forEach(l -> contact(l.name(), faults));
    circuit.elements(Wire.class).stream()
        .filter(w -> w.bottle().isEmpty())
        .forEach(w -> contact(w.name(), faults));
    circuit.elements(Switch.class).stream()
        .filter(s -> s.position() > 0)
        .forEach(s -> contact(s.name(), faults));
    return faults;
  }

  private static void resistor(Resistor r, List<Fault> faults) {
    double ohms = r.ohms();
    faults.add(ohms(FaultKind.RESISTOR_OPEN, r, new Range(OPEN, OPEN, "")));
    if (ohms > 0) {
      faults.add(
          ohms(FaultKind.RESISTOR_HIGH, r, new Range(LEAST_DRIFT * ohms, MOST_DRIFT * ohms, "Ω")));
      faults.add(
          ohms(FaultKind.RESISTOR_LOW, r, new Range(ohms / MOST_DRIFT, ohms / LEAST_DRIFT, "Ω")));
    }
    faults.add(ohms(FaultKind.RESISTOR_SHORTED, r, new Range(SHORT, SHORT, "")));
  }

  private static final double OPEN = Rewire.OPEN_OHMS;
  private static final double SHORT = Rewire.SHORT_OHMS;

  private static Fault ohms(FaultKind kind, Resistor resistor, Range range) {
    return new Fault(
        kind,
        resistor.name(),
        "",
        range,
        (circuit, ohms) ->
            Rewire.change(circuit, Resistor.class, resistor.name(), r -> r.withOhms(ohms)));
  }

  private static void potentiometer(Potentiometer pot, List<Fault> faults) {
    boolean wiperApart = !pot.wiper().equals(pot.a()) && !pot.wiper().equals(pot.b());
    if (!wiperApart) {
      faults.add(
          new Fault(
              FaultKind.RESISTOR_OPEN,
              pot.name(),
              "track",
              Range.NONE,
              (circuit, none) ->
                  Rewire.replace(
                      circuit,
                      e -> e.name().equals(pot.name()),
                      e -> List.of(new Resistor(pot.name(), pot.a(), pot.b(), OPEN)))));
      return;
    }
    faults.add(
        new Fault(
            FaultKind.WIPER_OPEN,
            pot.name(),
            "",
            Range.NONE,
            (circuit, none) ->
                Rewire.replace(
                    circuit,
                    e -> e.name().equals(pot.name()),
                    e ->
                        List.of(
                            new Resistor(pot.name(), pot.a(), pot.b(), pot.ohms()),
                            new Resistor(pot.name() + ":wiper", pot.wiper(), pot.b(), OPEN)))));
  }

  private static void capacitor(Capacitor c, List<Fault> faults) {
    boolean electrolytic = c.farads() >= ELECTROLYTIC_FARADS;
    double least = electrolytic ? LEAST_ELECTROLYTIC_LEAK_OHMS : LEAST_LEAK_OHMS;
    faults.add(leak(FaultKind.CAPACITOR_LEAKY, c, new Range(least, MOST_LEAK_OHMS, "Ω")));
    faults.add(leak(FaultKind.CAPACITOR_SHORTED, c, new Range(SHORT, SHORT, "")));
  }

  private static Fault leak(FaultKind kind, Capacitor capacitor, Range range) {
    return new Fault(
        kind,
        capacitor.name(),
        "",
        range,
        (circuit, ohms) ->
            Rewire.change(
                circuit,
                Capacitor.class,
                capacitor.name(),
                c ->
                    new Capacitor(
                        c.name(),
                        c.a(),
                        c.b(),
                        c.farads(),
                        c.ratedVolts(),
                        1 / (1 / ohms + 1 / c.leakOhms()),
                        c.safetyRated())));
  }

  private static void coil(Inductor coil, List<Fault> faults) {
    faults.add(coil(FaultKind.COIL_OPEN, coil, OPEN));
    if (coil.dcOhms() > 0) {
      faults.add(coil(FaultKind.COIL_SHORTED, coil, SHORT));
    }
  }

  private static Fault coil(FaultKind kind, Inductor coil, double ohms) {
    return new Fault(
        kind,
        coil.name(),
        "",
        new Range(ohms, ohms, ""),
        (circuit, none) ->
            Rewire.change(
                circuit,
                Inductor.class,
                coil.name(),
                l -> new Inductor(l.name(), l.a(), l.b(), l.henries(), ohms)));
  }

  private static void contact(String name, List<Fault> faults) {
    faults.add(
        new Fault(
            FaultKind.CONTACT_OPEN,
            name,
            "",
            Range.NONE,
            (circuit, none) ->
                Rewire.replace(
                    circuit,
                    e -> e.name().equals(name),
                    e ->
                        e instanceof Switch s
                            ? List.of(s.onPosition(0))
                            : List.of(
                                new Resistor(name, e.nodes().get(0), e.nodes().get(1), OPEN)))));
  }
}
