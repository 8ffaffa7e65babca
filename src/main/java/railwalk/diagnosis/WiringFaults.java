package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.walk.SupplyMap;
import railwalk.walk.SupplyNode;

/** Leakage between neighbours, and slips of whoever wired the amplifier last. */
final class WiringFaults {
  private static final Range LEAK = new Range(300e3, 100e6, "Ω");

  private final Circuit circuit;
  private final SupplyMap map;
  private final List<Fault> faults = new ArrayList<>();

  private WiringFaults(Circuit circuit, SupplyMap map) {
    this.circuit = circuit;
    this.map = map;
  }

  static List<Fault> of(Circuit circuit, SupplyMap map) {
    WiringFaults found = new WiringFaults(circuit, map);
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      found.boardLeak(section);
      found.exchanges(section);
    }
    circuit.elements(Resistor.class).forEach(found::wrongSupply);
    return found.faults;
  }

  /** High tension that creeps over the socket or board to the grid beside it. */
  private void boardLeak(AmplifierSection section) {
    Node grid = section.grid();
    Optional<Node> supply = map.supplyOf(section.plate());
    if (grid.equals(circuit.reference()) || supply.isEmpty() || supply.get().equals(grid)) {
      return;
    }
    Node from = supply.get();
    faults.add(
        new Fault(
            FaultKind.BOARD_LEAK,
            section.name(),
            from.name() + " to " + grid.name(),
            LEAK,
            (c, ohms) -> Rewire.add(c, new Resistor(section.name() + ":board", from, grid, ohms))));
  }

  /** Two wires of a section on each other's pins. */
  private void exchanges(AmplifierSection section) {
    Node screen = section.screen();
    exchange(section, "plate", section.plate(), "grid", section.grid());
    exchange(section, "plate", section.plate(), "cathode", section.cathode());
    exchange(section, "grid", section.grid(), "cathode", section.cathode());
    if (screen != null) {
      exchange(section, "plate", section.plate(), "screen", screen);
      exchange(section, "screen", screen, "grid", section.grid());
    }
    for (AmplifierSection other : circuit.elements(AmplifierSection.class)) {
      boolean twin =
          other.bottle().equals(section.bottle())
              && other.name().compareTo(section.name()) > 0
              && other.type().kind() == section.type().kind();
      if (twin) {
        between(section, other, "plates", section.plate(), other.plate());
        between(section, other, "grids", section.grid(), other.grid());
        between(section, other, "cathodes", section.cathode(), other.cathode());
      }
    }
  }

  private void exchange(AmplifierSection section, String a, Node na, String b, Node nb) {
    if (na.equals(nb)) {
      return;
    }
    faults.add(
        new Fault(
            FaultKind.PINS_EXCHANGED,
            section.name(),
            a + " and " + b,
            Range.NONE,
            (c, none) ->
                Rewire.change(c, AmplifierSection.class, section.name(), s -> swapped(s, na, nb))));
  }

  private void between(AmplifierSection one, AmplifierSection other, String what, Node a, Node b) {
    if (a.equals(b)) {
      return;
    }
    faults.add(
        new Fault(
            FaultKind.PINS_EXCHANGED,
            one.bottle(),
            what,
            Range.NONE,
            (c, none) ->
                Rewire.replace(
                    c,
                    e ->
                        e instanceof AmplifierSection s
                            && (s.name().equals(one.name()) || s.name().equals(other.name())),
                    e -> List.of(swapped((AmplifierSection) e, a, b, what)))));
  }

  private static AmplifierSection swapped(AmplifierSection s, Node a, Node b) {
    Node screen = s.screen();
    return s.wired(
        swapped(s.plate(), a, b),
        screen == null ? null : swapped(screen, a, b),
        swapped(s.grid(), a, b),
        swapped(s.cathode(), a, b));
  }

  private static AmplifierSection swapped(AmplifierSection s, Node a, Node b, String what) {
    return s.wired(
        what.equals("plates") ? swapped(s.plate(), a, b) : s.plate(),
        s.screen(),
        what.equals("grids") ? swapped(s.grid(), a, b) : s.grid(),
        what.equals("cathodes") ? swapped(s.cathode(), a, b) : s.cathode());
  }

  private static Node swapped(Node node, Node a, Node b) {
    return node.equals(a) ? b : node.equals(b) ? a : node;
  }

  /** A plate or screen resistor fed from the supply node before or after its own. */
  private void wrongSupply(Resistor resistor) {
    Set<Node> electrodes = new LinkedHashSet<>();
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      electrodes.add(section.plate());
      if (section.screen() != null) {
        electrodes.add(section.screen());
      }
    }
    boolean fromA = map.supplyNode(resistor.a()).isPresent();
    Node supply = fromA ? resistor.a() : resistor.b();
    Node load = fromA ? resistor.b() : resistor.a();
    Optional<SupplyNode> own = map.supplyNode(supply);
    if (own.isEmpty() || map.supplyNode(load).isPresent() || !electrodes.contains(load)) {
      return;
    }
    for (SupplyNode other : map.supplyNodes()) {
      boolean next = other.node().equals(own.get().parent()) || supply.equals(other.parent());
      if (next) {
        faults.add(
            new Fault(
                FaultKind.WRONG_SUPPLY,
                resistor.name(),
                other.node().name(),
                Range.NONE,
                (c, none) ->
                    Rewire.change(
                        c,
                        Resistor.class,
                        resistor.name(),
                        r ->
                            new Resistor(
                                r.name(),
                                other.node(),
                                load,
                                r.ohms(),
                                r.ratedWatts(),
                                r.tolerance()))));
      }
    }
  }
}
