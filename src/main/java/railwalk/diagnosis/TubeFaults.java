package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.device.Electrode;
import railwalk.device.Heater;
import railwalk.device.PinUse;
import railwalk.device.SectionKind;
import railwalk.device.TubeType;

/** What goes wrong with amplifying tubes and regulators. */
final class TubeFaults {
  /** Space current that is left of a section that does not conduct, as a share. */
  private static final double DEAD = 1e-7;

  private static final Range WEAK = new Range(0.08, 0.72, "");

  /** Grid current of a gassy tube or a coated grid, out of the grid, ampere (common practice). */
  private static final Range GAS = new Range(0.05e-6, 40e-6, "A");

  private static final Range HEATER_LEAK = new Range(3e3, 3e6, "Ω");
  private static final Range SCREEN_SHORT = new Range(30, 300e3, "Ω");
  private static final double SAME_HEATER = 0.05;

  private final Circuit circuit;
  private final List<TubeType> types;
  private final List<Fault> faults = new ArrayList<>();

  private TubeFaults(Circuit circuit, List<TubeType> types) {
    this.circuit = circuit;
    this.types = types;
  }

  /**
   * Returns the faults of the tubes in {@code circuit}.
   *
   * @param types those that might have been fitted by mistake
   */
  static List<Fault> of(Circuit circuit, List<TubeType> types) {
    TubeFaults found = new TubeFaults(circuit, types);
    circuit.elements(AmplifierSection.class).forEach(found::section);
    circuit.elements(RegulatorSection.class).forEach(found::regulator);
    circuit.bottles().forEach(found::bottle);
    return found.faults;
  }

  private void section(AmplifierSection section) {
    if (sections(section.bottle()) > 1) {
      faults.add(emission(FaultKind.SECTION_DEAD, section, new Range(DEAD, DEAD, "")));
    }
    faults.add(emission(FaultKind.SECTION_WEAK, section, WEAK));
    if (!isReference(section.grid())) {
      faults.add(gridCurrent(section));
    }
    if (!isReference(section.cathode())) {
      faults.add(heaterLeak(section));
    }
    Node screen = section.screen();
    if (screen != null) {
      faults.add(screenShort(section, screen));
    }
  }

  private long sections(String bottle) {
    return circuit.elements(AmplifierSection.class).stream()
        .filter(s -> s.bottle().equals(bottle))
        .count();
  }

  private boolean isReference(Node node) {
    return node.equals(circuit.reference());
  }

  private static Fault emission(FaultKind kind, AmplifierSection section, Range range) {
    return new Fault(
        kind,
        section.name(),
        "",
        range,
        (c, share) ->
            Rewire.change(
                c,
                AmplifierSection.class,
                section.name(),
                s -> s.withLaw(s.law().withEmission(share))));
  }

  /** Returns whether the tube of {@code section} is in its socket. */
  private static boolean isIn(Circuit c, Element section) {
    for (Element element : c.elements()) {
      if (element.name().equals(section.name())) {
        return true;
      }
    }
    return false;
  }

  private static Fault gridCurrent(AmplifierSection section) {
    return new Fault(
        FaultKind.GRID_CURRENT,
        section.name(),
        "",
        GAS,
        (c, amps) ->
            isIn(c, section)
                ? Rewire.add(
                    c,
                    new CurrentSource(
                        section.name() + ":gas", section.cathode(), section.grid(), amps))
                : c);
  }

  private Fault heaterLeak(AmplifierSection section) {
    Node heater = heaterNode(section.bottle());
    return new Fault(
        FaultKind.HEATER_LEAK,
        section.name(),
        "",
        HEATER_LEAK,
        (c, ohms) ->
            isIn(c, section)
                ? Rewire.add(
                    c, new Resistor(section.name() + ":heater", section.cathode(), heater, ohms))
                : c);
  }

  /** Returns a node of the tube's heater; the reference where the netlist has none. */
  private Node heaterNode(String bottle) {
    for (Filament filament : circuit.elements(Filament.class)) {
      if (filament.bottle().equals(bottle)) {
        return filament.a();
      }
    }
    Optional<Bottle> found = circuit.bottle(bottle);
    if (found.isPresent()) {
      for (int pin : found.get().type().pinsOf("", Electrode.HEATER1)) {
        Node node = found.get().pins().get(pin);
        if (node != null) {
          return node;
        }
      }
    }
    return circuit.reference();
  }

  private static Fault screenShort(AmplifierSection section, Node screen) {
    return new Fault(
        FaultKind.SCREEN_SHORT,
        section.name(),
        "",
        SCREEN_SHORT,
        (c, ohms) ->
            isIn(c, section)
                ? Rewire.add(
                    c, new Resistor(section.name() + ":g2-g1", screen, section.grid(), ohms))
                : c);
  }

  private void regulator(RegulatorSection regulator) {
    faults.add(
        new Fault(
            FaultKind.REGULATOR_DARK,
            regulator.name(),
            "",
            Range.NONE,
            (c, none) ->
                Rewire.replace(
                    c,
                    e -> e instanceof RegulatorSection && e.name().equals(regulator.name()),
                    e ->
                        List.of(
                            new Resistor(
                                regulator.name(),
                                regulator.anode(),
                                regulator.cathode(),
                                Rewire.OPEN_OHMS)))));
  }

  private void bottle(Bottle bottle) {
    boolean amplifies =
        circuit.elements(AmplifierSection.class).stream()
            .anyMatch(s -> s.bottle().equals(bottle.name()));
    boolean rectifies = isRectifier(bottle.type());
    if (amplifies || rectifies) {
      faults.add(dark(bottle));
    }
    if (amplifies || rectifies) {
      for (TubeType type : types) {
        if (mayStandIn(bottle, type)) {
          faults.add(otherType(bottle, type));
        }
      }
    }
  }

  private static boolean isRectifier(TubeType type) {
    return type.sections().stream().anyMatch(s -> s.kind() == SectionKind.RECTIFIER);
  }

  private static Fault dark(Bottle bottle) {
    return new Fault(
        FaultKind.TUBE_DARK,
        bottle.name(),
        "",
        Range.NONE,
        (c, none) ->
            Rewire.replace(
                c,
                e -> e.bottle().equals(bottle.name()),
                e -> {
                  if (e instanceof AmplifierSection s) {
                    return List.of(s.withLaw(s.law().withEmission(DEAD)));
                  }
                  return e instanceof RectifierSection r
                      ? List.of(r.withLaw(r.law().withEmission(DEAD)))
                      : List.of(e);
                }));
  }

  /**
   * Returns whether a hand could put {@code type} into the socket of {@code bottle} and it heats.
   */
  private static boolean mayStandIn(Bottle bottle, TubeType type) {
    TubeType own = bottle.type();
    return !type.name().equals(own.name())
        && type.family().equalsIgnoreCase(own.family())
        && !type.pins().isEmpty()
        && samePins(own, type)
        && sameHeater(own.heater(), type.heater());
  }

  private static boolean samePins(TubeType a, TubeType b) {
    return electrodes(a).equals(electrodes(b));
  }

  private static SortedMap<Integer, String> electrodes(TubeType type) {
    SortedMap<Integer, String> pins = new TreeMap<>();
    for (Map.Entry<Integer, PinUse> pin : type.pins().entrySet()) {
      Electrode electrode = pin.getValue().electrode();
      if (electrode != null && electrode != Electrode.HEATER_TAP) {
        String use = electrode.isHeater() ? "heater" : pin.getValue().section() + electrode;
        pins.put(pin.getKey(), use);
      }
    }
    return pins;
  }

  private static boolean sameHeater(Heater a, Heater b) {
    for (Heater.Connection one : a.connections()) {
      for (Heater.Connection other : b.connections()) {
        if (Math.abs(one.volts() / other.volts() - 1) < SAME_HEATER) {
          return true;
        }
      }
    }
    return false;
  }

  private static Fault otherType(Bottle bottle, TubeType type) {
    return new Fault(
        FaultKind.OTHER_TYPE,
        bottle.name(),
        type.name(),
        Range.NONE,
        (c, none) ->
            isOut(c, bottle)
                ? c
                : c.inState(
                    new State(
                        type.name(), List.of(new StateChange.TubeFitted(bottle.name(), type)))));
  }

  private static boolean isOut(Circuit c, Bottle bottle) {
    return c.elements().stream().noneMatch(e -> e.bottle().equals(bottle.name()));
  }
}
