package railwalk.chart;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import railwalk.chart.Table.Use;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.units.Quantity;

/**
 * The drop across every part that carries a tube's or the supply's current: it shows the current.
 */
final class DropsTable {
  /** Parts of no particular role are listed from this heat on. */
  private static final double NOTABLE_WATTS = 0.005;

  private static final double NOTABLE_AMPS = 1e-7;

  private final Column column;
  private final Circuit circuit;
  private final Wording wording;
  private final Set<Element> droppers = new HashSet<>();
  private final Set<Element> beforeTheReservoir = new HashSet<>();

  DropsTable(Column column, Wording wording) {
    this.column = column;
    this.circuit = column.circuit();
    this.wording = wording;
    column.map().supplyNodes().forEach(s -> droppers.addAll(s.droppers()));
    Set<Node> steady = new HashSet<>(Set.of(circuit.reference()));
    column.map().supplyNodes().forEach(s -> steady.add(s.node()));
    column.map().groups().stream()
        .flatMap(g -> g.elements().stream())
        .filter(e -> !steady.containsAll(e.nodes()))
        .forEach(beforeTheReservoir::add);
    beforeTheReservoir.removeAll(droppers);
  }

  /** Returns the table; none when nothing drops. */
  Stream<Block> blocks() {
    List<Table.Group> groups = new ArrayList<>();
    for (Role role : Role.SHOWN) {
      List<Table.Row> rows =
          circuit.elements().stream()
              .filter(e -> e instanceof Resistor || e instanceof Inductor)
              .filter(e -> !beforeTheReservoir.contains(e))
              .filter(e -> roleOf(e) == role)
              .map(this::row)
              .toList();
      if (!rows.isEmpty()) {
        groups.add(new Table.Group(wording.say(role.title), "", rows, List.of()));
      }
    }
    return groups.isEmpty() ? Stream.empty() : Stream.of(new Table("", columns(), groups));
  }

  private static List<Table.Column> columns() {
    return List.of(
        new Table.Column("Part", Use.WORDS),
        new Table.Column("Value", Use.WORDS),
        new Table.Column("From", Use.WORDS),
        new Table.Column("To", Use.WORDS),
        new Table.Column("Drop V", Use.KEY_FIGURES),
        new Table.Column("Reading V", Use.WRITING),
        new Table.Column("Current", Use.FIGURES),
        new Table.Column("Heat", Use.FIGURES));
  }

  private Table.Row row(Element element) {
    PartLoad load = PartLoad.of(element, column.point());
    double ratedWatts = element instanceof Resistor r ? r.ratedWatts() : Double.NaN;
    String remark =
        element instanceof Inductor winding && Double.isNaN(winding.dcOhms())
            ? "resistance not given"
            : "";
    return new Table.Row(
        List.of(
            element.name(),
            PartFace.of(element).value(),
            load.from().name(),
            load.to().name(),
            Quantity.plainVolts(load.dropVolts()),
            "",
            Quantity.amps(load.amps()),
            Share.of(load.watts(), ratedWatts)),
        remark);
  }

  private Role roleOf(Element element) {
    PartLoad load = PartLoad.of(element, column.point());
    if (Double.isNaN(load.dropVolts())) {
      return Role.NONE;
    }
    if (droppers.contains(element)) {
      return Role.DROPPER;
    }
    if (load.amps() < NOTABLE_AMPS) {
      return Role.NONE;
    }
    boolean winding = element instanceof Inductor;
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      if (touches(element, section.plate())) {
        return winding ? Role.WINDING : Role.PLATE;
      }
    }
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      Node screen = section.screen();
      if (screen != null && touches(element, screen)) {
        return Role.SCREEN;
      }
      if (touches(element, section.cathode())) {
        return Role.CATHODE;
      }
    }
    return !winding && load.watts() >= NOTABLE_WATTS ? Role.OTHER : Role.NONE;
  }

  private boolean touches(Element element, Node node) {
    return !node.equals(circuit.reference()) && element.nodes().contains(node);
  }

  /** Why a part is listed. */
  private enum Role {
    DROPPER("Droppers and chokes"),
    WINDING("Output transformer windings"),
    PLATE("{Plate} resistors"),
    SCREEN("Screen resistors"),
    CATHODE("Cathode resistors"),
    OTHER("Bleeders and others"),
    NONE("");

    private static final List<Role> SHOWN =
        List.of(DROPPER, WINDING, PLATE, SCREEN, CATHODE, OTHER);

    private final String title;

    Role(String title) {
      this.title = title;
    }
  }
}
