package railwalk.netlist;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Bottle;
import railwalk.circuit.Lead;
import railwalk.circuit.Node;
import railwalk.device.Electrode;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

/** Reads a tube wired by position: {@code XV1A plate grid cathode 12AX7}. */
final class TubeByPosition {
  private static final int MOST_HEATER_NODES = 3;
  private static final int NODES_OF_TWO_TRIODES = 6;

  private final PartCard part;
  private final TubeType type;
  private final TubeSections sections;
  private final @Nullable List<Electrode> givenOrder;

  private TubeByPosition(PartCard part, TubeType type, Word typeWord) {
    this.part = part;
    this.type = type;
    this.sections = new TubeSections(part, type);
    this.givenOrder = ElectrodeOrder.given(part.draft(), typeWord, type);
  }

  /** Reads the nodes, which are the words left on the line. */
  static void read(PartCard part, TubeType type, Word typeWord) {
    new TubeByPosition(part, type, typeWord).read(typeWord);
  }

  private void read(Word typeWord) {
    List<SectionType> spokenOf = spokenOf(typeWord);
    TubeRack.Entry entry =
        spokenOf.isEmpty()
            ? null
            : part.draft().tubes().entry(sections.tube(), type, Bottle.Wiring.BY_POSITION, part);
    if (entry == null) {
      return;
    }
    for (SectionType section : spokenOf) {
      if (!wire(entry, section)) {
        entry.spoil();
        return;
      }
    }
    extraNodes();
    if (sections.main().size() > 1 && !type.pins().isEmpty()) {
      part.report().gather(Problem.PINS_BY_CUSTOM, part.span(), part.name());
    }
    part.done();
  }

  /** Returns the section that the line is about, both of a twin with six nodes; else none. */
  private List<SectionType> spokenOf(Word typeWord) {
    List<SectionType> main = sections.main();
    boolean wholeTwin =
        sections.tube().section().isEmpty()
            && givenOrder == null
            && main.size() == 2
            && main.stream().allMatch(s -> s.kind() == SectionKind.TRIODE)
            && part.words().size() == NODES_OF_TWO_TRIODES;
    if (wholeTwin) {
      part.report().add(Problem.TWIN_BY_POSITION, part.span(), part.name(), type.name());
      return main;
    }
    SectionType section = sections.choose(type.sections(), typeWord);
    return section == null ? List.of() : List.of(section);
  }

  private boolean wire(TubeRack.Entry entry, SectionType section) {
    int count = part.words().size();
    List<Electrode> order =
        givenOrder == null ? ElectrodeOrder.usual(section, type, count) : givenOrder;
    if (count < order.size()) {
      boolean triodeNodes = section.kind() == SectionKind.PENTODE && count == 3;
      part.report()
          .add(
              triodeNodes ? Problem.PENTODE_WITH_THREE_NODES : Problem.TUBE_NODES_MISSING,
              part.span(),
              part.name(),
              type.name(),
              order.size(),
              ElectrodeOrder.words(order),
              count);
      return false;
    }
    for (Electrode electrode : order) {
      Word word = part.words().remove(0);
      Node node = part.draft().nodes().node(word, part.frame());
      sections.leads(section, electrode, node).forEach(entry::wireLead);
      boolean strapped =
          electrode == Electrode.PLATE
              && section.kind() == SectionKind.PENTODE
              && !order.contains(Electrode.SCREEN);
      if (strapped) {
        entry.wireLead(new Lead(section.id(), Electrode.SCREEN, node));
        part.report().add(Problem.TRIODE_CONNECTED, part.span(), part.name());
      }
    }
    entry.names(section.id(), part);
    return true;
  }

  private void extraNodes() {
    List<Word> extra = new ArrayList<>(part.words());
    part.words().clear();
    if (extra.size() > MOST_HEATER_NODES) {
      part.report().add(Problem.TOO_MANY_NODES, extra.get(0).span(), part.name(), type.name());
    } else if (!extra.isEmpty()) {
      part.report().gather(Problem.HEATER_NODES_IGNORED, extra.get(0).span(), part.name());
    }
  }
}
