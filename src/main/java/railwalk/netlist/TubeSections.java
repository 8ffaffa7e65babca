package railwalk.netlist;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Lead;
import railwalk.circuit.Node;
import railwalk.device.Electrode;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

/** Which section of its type a tube's line speaks of, and which electrodes that section has. */
final class TubeSections {
  private final PartCard part;
  private final TubeType type;
  private final ChartName.Tube tube;

  TubeSections(PartCard part, TubeType type) {
    this.part = part;
    this.type = type;
    this.tube = ChartName.tube(part.name(), type);
  }

  /** Returns the line's tube: bottle and section letter. */
  ChartName.Tube tube() {
    return tube;
  }

  /** Returns the sections that are no mere detector diodes. */
  List<SectionType> main() {
    return type.sections().stream().filter(s -> s.kind() != SectionKind.DIODE).toList();
  }

  /**
   * Returns the section that the line's name says, or the only candidate, or A of like twins; null
   * when it must be named, which is reported.
   */
  @Nullable SectionType choose(List<SectionType> candidates, Word where) {
    for (SectionType section : candidates) {
      if (!tube.section().isEmpty() && section.id().equals(tube.section())) {
        return section;
      }
    }
    List<SectionType> main =
        candidates.stream().filter(s -> s.kind() != SectionKind.DIODE).toList();
    List<SectionType> left = main.isEmpty() ? candidates : main;
    return left.size() == 1 ? left.get(0) : assumed(left, where);
  }

  private @Nullable SectionType assumed(List<SectionType> candidates, Word where) {
    SectionType first = candidates.get(0);
    boolean alike =
        candidates.stream().allMatch(s -> s.kind() == first.kind() && s.law().equals(first.law()));
    if (!alike) {
      String letters = String.join(", ", candidates.stream().map(SectionType::id).toList());
      part.report().add(Problem.SECTION_NEEDED, where.span(), type.name(), letters, part.name());
      return null;
    }
    part.report().gather(Problem.SECTION_ASSUMED, part.span(), part.name());
    return first;
  }

  /** Returns the sections that have {@code electrode}. */
  List<SectionType> having(Electrode electrode) {
    return type.sections().stream().filter(section -> has(section, electrode)).toList();
  }

  private boolean has(SectionType section, Electrode electrode) {
    return switch (electrode) {
      case CATHODE -> true;
      case PLATE -> section.kind() != SectionKind.DIODE;
      case GRID -> section.kind() == SectionKind.TRIODE || section.kind() == SectionKind.PENTODE;
      case SCREEN, SUPPRESSOR -> section.kind() == SectionKind.PENTODE;
      case PLATE1, PLATE2 ->
          section.kind() == SectionKind.RECTIFIER && ElectrodeOrder.hasTwoPlates(type);
      case DIODE1, DIODE2 -> section.kind() == SectionKind.DIODE;
      case HEATER1, HEATER2, HEATER_TAP -> false;
    };
  }

  /** Returns what a node at an electrode means: "plate" of a rectifier with two stands for both. */
  List<Lead> leads(SectionType section, Electrode electrode, Node node) {
    boolean bothPlates =
        electrode == Electrode.PLATE
            && section.kind() == SectionKind.RECTIFIER
            && ElectrodeOrder.hasTwoPlates(type);
    return bothPlates
        ? List.of(
            new Lead(section.id(), Electrode.PLATE1, node),
            new Lead(section.id(), Electrode.PLATE2, node))
        : List.of(new Lead(electrode.isHeater() ? "" : section.id(), electrode, node));
  }
}
