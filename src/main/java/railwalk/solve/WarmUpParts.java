package railwalk.solve;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.StandIn;
import railwalk.device.Electrode;
import railwalk.device.SectionKind;
import railwalk.device.TwoPoleLaw;
import railwalk.device.WarmUpLaw;
import railwalk.device.WarmUpTimes;
import railwalk.device.WarmingLaw;
import railwalk.walk.RippleGroup;

/**
 * A circuit written so that the solver for direct current can follow it as it warms up: sections at
 * a share of their current; capacitors outside the ripple groups as a resistor and a current source
 * (what an implicit step in time makes of them); fixed currents as resistors that draw as much at
 * the running volts, since nothing draws from a dead supply.
 */
final class WarmUpParts {
  /** Smaller capacitors are charged before anything else moves. */
  private static final double HOLDING_FARADS = 0.5e-6;

  /** What a cold cathode is taken to pass: nodes that only tubes lead to keep their volts. */
  private static final double LEAST_EMISSION = 1e-6;

  /** A section outside the groups, by its place among the elements. */
  private record Heated(int place, WarmUpLaw law) {}

  /**
   * A capacitor outside the groups.
   *
   * @param place among the elements
   * @param source the place of its current source
   */
  record Store(Capacitor capacitor, int place, int source) {}

  private final Circuit circuit;
  private final List<Element> elements = new ArrayList<>();
  private final List<Heated> heated = new ArrayList<>();
  private final List<Store> stores = new ArrayList<>();
  private final WarmUpTimes times;
  private final boolean hot;

  /**
   * @param groups as the running point was solved by
   * @param hot whether all cathodes are hot from the start
   */
  WarmUpParts(OperatingPoint running, List<RippleGroup> groups, WarmUpTimes times, boolean hot) {
    this.circuit = running.circuit();
    this.times = times;
    this.hot = hot;
    Set<Element> inGroups = new HashSet<>();
    Set<Node> hidden = new HashSet<>();
    for (RippleGroup group : groups) {
      inGroups.addAll(group.elements());
      hidden.addAll(group.nodes());
    }
    groups.forEach(group -> group.ports().forEach(hidden::remove));
    hidden.remove(circuit.reference());
    List<CurrentSource> sources = new ArrayList<>();
    List<Integer> held = new ArrayList<>();
    for (Element element : circuit.elements()) {
      if (inGroups.contains(element)) {
        elements.add(element);
      } else if (element instanceof StandIn standIn) {
        resistors(standIn, running).forEach(r -> addHeated(r, times.law()));
      } else if (element instanceof CurrentSource source) {
        Resistor resistor = resistor(source.name(), source.a(), source.b(), source.amps(), running);
        addHeated(resistor == null ? source : resistor, times.law());
      } else if (element instanceof AmplifierSection section) {
        addHeated(section, law(section));
      } else if (element instanceof RectifierSection section) {
        addHeated(section, law(section));
      } else if (element instanceof Capacitor c
          && c.farads() >= HOLDING_FARADS
          && c.nodes().stream().noneMatch(hidden::contains)) {
        held.add(elements.size());
        sources.add(new CurrentSource(c.name() + ":charge", c.a(), c.b(), 0));
        elements.add(leaking(c, 1 / c.leakOhms() + c.farads()));
      } else {
        elements.add(element);
      }
    }
    for (int s = 0; s < sources.size(); s++) {
      stores.add(new Store(capacitorAt(held.get(s)), held.get(s), elements.size()));
      elements.add(sources.get(s));
    }
  }

  private Capacitor capacitorAt(int place) {
    String name = elements.get(place).name();
    return circuit.elements(Capacitor.class).stream()
        .filter(c -> c.name().equals(name))
        .findFirst()
        .orElseThrow();
  }

  private void addHeated(Element element, WarmUpLaw law) {
    heated.add(new Heated(elements.size(), law));
    elements.add(element);
  }

  private static List<Resistor> resistors(StandIn standIn, OperatingPoint running) {
    List<Resistor> resistors = new ArrayList<>();
    Node cathode = standIn.electrodes().get(Electrode.CATHODE);
    Node home = cathode == null ? running.circuit().reference() : cathode;
    for (Map.Entry<Electrode, Double> draw : standIn.draws().entrySet()) {
      Node node = standIn.electrodes().get(draw.getKey());
      if (node != null) {
        String name = standIn.name() + ":" + draw.getKey();
        Resistor resistor = resistor(name, node, home, draw.getValue(), running);
        if (resistor != null) {
          resistors.add(resistor);
        }
      }
    }
    return resistors;
  }

  /** Returns what draws {@code amps} from a to b at the running volts; null when nothing does. */
  private static @Nullable Resistor resistor(
      String name, Node a, Node b, double amps, OperatingPoint running) {
    double ohms = (running.volts(a) - running.volts(b)) / amps;
    return ohms > 0 && Double.isFinite(ohms) ? new Resistor(name, a, b, ohms) : null;
  }

  private static Capacitor leaking(Capacitor c, double siemens) {
    return new Capacitor(
        c.name(), c.a(), c.b(), c.farads(), c.ratedVolts(), 1 / siemens, c.safetyRated());
  }

  /** Returns how the cathode of a section in a tube warms up. */
  private WarmUpLaw law(Element section) {
    SectionKind kind =
        section instanceof AmplifierSection a
            ? a.type().kind()
            : ((RectifierSection) section).type().kind();
    return circuit
        .bottle(section.bottle())
        .map(Bottle::type)
        .map(type -> times.law(type, kind))
        .orElse(times.law());
  }

  /** Returns the circuit for the equations to be laid out by. */
  Circuit layout() {
    return circuit.withElements(elements);
  }

  /** Returns the capacitors outside the groups. */
  List<Store> stores() {
    return stores;
  }

  /**
   * Returns the circuit at a step in time.
   *
   * @param seconds since switch-on
   * @param leadPerSecond how each capacitor's dV/dt at the end of the step rises with its volts
   * @param carriedVoltsPerSecond what to take from that, by capacitor
   */
  Circuit at(double seconds, double leadPerSecond, double[] carriedVoltsPerSecond) {
    List<Element> changed = new ArrayList<>(elements);
    for (Heated part : heated) {
      double emission = emission(part.law, seconds);
      if (emission < 1) {
        double share = Math.max(LEAST_EMISSION, emission);
        changed.set(part.place, warming(elements.get(part.place), share));
      }
    }
    for (int s = 0; s < stores.size(); s++) {
      Store store = stores.get(s);
      Capacitor c = store.capacitor;
      changed.set(store.place, leaking(c, 1 / c.leakOhms() + c.farads() * leadPerSecond));
      double amps = -c.farads() * carriedVoltsPerSecond[s];
      changed.set(store.source, new CurrentSource(c.name() + ":charge", c.a(), c.b(), amps));
    }
    return circuit.withElements(changed);
  }

  private double emission(WarmUpLaw law, double seconds) {
    return hot ? 1 : law.emission(seconds);
  }

  private static Element warming(Element element, double share) {
    if (element instanceof AmplifierSection s) {
      return s.withLaw(s.law().withEmission(share));
    }
    if (element instanceof RectifierSection s) {
      return s.withLaw(new WarmingLaw(s.law(), share));
    }
    if (element instanceof Resistor r) {
      return r.withOhms(r.ohms() / share);
    }
    CurrentSource source = (CurrentSource) element;
    return new CurrentSource(source.name(), source.a(), source.b(), source.amps() * share);
  }

  /** Sets the rectifiers of a supply to what their cathodes give at {@code seconds}. */
  void heat(CycleNetwork net, double seconds) {
    for (int p = 0; p < net.paths.size(); p++) {
      CycleNetwork.Path path = net.paths.get(p);
      if (path.element() instanceof RectifierSection section) {
        double emission = emission(law(section), seconds);
        TwoPoleLaw law = emission < 1 ? new WarmingLaw(section.law(), emission) : section.law();
        net.paths.set(
            p,
            new CycleNetwork.Path(
                path.anode(), path.cathode(), law, path.element(), path.places()));
      }
    }
  }
}
