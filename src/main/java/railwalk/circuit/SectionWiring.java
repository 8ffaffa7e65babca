package railwalk.circuit;

import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import railwalk.device.Electrode;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

/** One piece of {@link Socket}: a section of the tube between the nodes of its electrodes. */
final class SectionWiring {
  private static final List<Electrode> PLATES =
      List.of(
          Electrode.PLATE, Electrode.PLATE1, Electrode.PLATE2, Electrode.DIODE1, Electrode.DIODE2);

  private final String bottle;
  private final TubeType type;
  private final Socket.Lookup lookup;
  private final HeaterWiring heater;
  private final Socket.NodeMaker nodes;
  private final List<Fitting.Remark> remarks;

  SectionWiring(
      String bottle,
      TubeType type,
      Socket.Lookup lookup,
      HeaterWiring heater,
      Socket.NodeMaker nodes,
      List<Fitting.Remark> remarks) {
    this.bottle = bottle;
    this.type = type;
    this.lookup = lookup;
    this.heater = heater;
    this.nodes = nodes;
    this.remarks = remarks;
  }

  /** Returns the section as a part; empty when nothing of it is wired but what it shares. */
  Optional<Element> build(SectionType section) {
    boolean wired =
        Stream.concat(PLATES.stream(), Stream.of(Electrode.GRID, Electrode.SCREEN))
            .anyMatch(electrode -> lookup.node(section.id(), electrode) != null);
    if (!wired) {
      return Optional.empty();
    }
    return Optional.<Element>of(
            switch (section.kind()) {
              case TRIODE, PENTODE -> amplifier(section);
              case RECTIFIER, DIODE -> rectifier(section);
              case REGULATOR -> regulator(section);
            })
        .filter(element -> !isStrapped(element));
  }

  /** Returns whether it is a detector diode that is tied to its own cathode: out of use. */
  private static boolean isStrapped(Element element) {
    return element instanceof RectifierSection section
        && section.type().kind() == SectionKind.DIODE
        && section.plates().stream().allMatch(plate -> plate.equals(section.cathode()));
  }

  private AmplifierSection amplifier(SectionType section) {
    Node plate = node(section, Electrode.PLATE);
    Node screen = section.kind() == SectionKind.PENTODE ? node(section, Electrode.SCREEN) : null;
    Node grid = node(section, Electrode.GRID);
    Node cathode = cathode(section);
    Node suppressor = suppressor(section, cathode);
    return new AmplifierSection(
        bottle + section.id(),
        bottle,
        section.id(),
        section,
        plate,
        screen,
        grid,
        cathode,
        suppressor);
  }

  private @Nullable Node suppressor(SectionType section, Node cathode) {
    Node wired = lookup.node(section.id(), Electrode.SUPPRESSOR);
    if (wired == null && !type.pinsOf(section.id(), Electrode.SUPPRESSOR).isEmpty()) {
      remark(Fitting.Kind.SUPPRESSOR_TIED, section, Electrode.SUPPRESSOR);
    }
    return cathode.equals(wired) ? null : wired;
  }

  private RectifierSection rectifier(SectionType section) {
    List<Node> plates =
        PLATES.stream()
            .map(electrode -> lookup.node(section.id(), electrode))
            .flatMap(Stream::ofNullable)
            .toList();
    String name = bottle + section.id();
    if (plates.isEmpty()) {
      plates = List.of(open(section, Electrode.PLATE));
    }
    return new RectifierSection(name, bottle, section.id(), section, plates, cathode(section));
  }

  private RegulatorSection regulator(SectionType section) {
    String name = bottle + section.id();
    Node anode = node(section, Electrode.PLATE);
    return new RegulatorSection(name, bottle, section.id(), section, anode, cathode(section));
  }

  private Node cathode(SectionType section) {
    Node apart = lookup.node(section.id(), Electrode.CATHODE);
    Node cathode = apart == null ? heater.cathode() : apart;
    return cathode == null ? open(section, Electrode.CATHODE) : cathode;
  }

  private Node node(SectionType section, Electrode electrode) {
    Node wired = lookup.node(section.id(), electrode);
    return wired == null ? open(section, electrode) : wired;
  }

  private Node open(SectionType section, Electrode electrode) {
    remark(Fitting.Kind.ELECTRODE_OPEN, section, electrode);
    return nodes.inside(bottle + section.id() + ":" + electrode.word());
  }

  private void remark(Fitting.Kind kind, SectionType section, Electrode electrode) {
    List<Integer> pins = type.pinsOf(section.id(), electrode);
    remarks.add(new Fitting.Remark(kind, bottle + section.id(), electrode, pins));
  }
}
