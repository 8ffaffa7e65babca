package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

/**
 * A type that could stand in for another that is not at hand.
 *
 * @param type the one at hand
 * @param distance how much would change, 0 for nothing; only good for putting them in order
 * @param changes what would change, a few words each
 */
public record Alternative(TubeType type, double distance, List<String> changes) {
  public Alternative {
    changes = List.copyOf(changes);
  }

  /**
   * Returns this type with its sections on the pins of {@code wanted}: electrode for electrode, as
   * if the socket were wired for it and its heater fed as it should be.
   */
  public TubeType inPlaceOf(TubeType wanted) {
    List<SectionType> sections = new ArrayList<>();
    for (SectionType section : wanted.sections()) {
      sections.add(inPlaceOf(section, wanted));
    }
    return new TubeType(
        type.name(),
        type.aliases(),
        type.summary(),
        wanted.base(),
        wanted.family(),
        wanted.heater(),
        sections,
        wanted.pins());
  }

  private SectionType inPlaceOf(SectionType section, TubeType wanted) {
    if (section.kind() == SectionKind.DIODE) {
      return section;
    }
    SectionType own = counterpart(section, wanted, type);
    return new SectionType(
        section.id(),
        own.kind(),
        own.law(),
        own.ratings(),
        own.rectifierRatings(),
        own.spreadLow(),
        own.spreadHigh());
  }

  /** Returns the section of {@code type} that does the work of {@code section}. */
  static SectionType counterpart(SectionType section, TubeType wanted, TubeType type) {
    List<SectionType> own = ofKind(type, section.kind());
    int place = ofKind(wanted, section.kind()).indexOf(section);
    return own.get(Math.min(place, own.size() - 1));
  }

  static List<SectionType> ofKind(TubeType type, SectionKind kind) {
    return type.sections().stream().filter(s -> s.kind() == kind).toList();
  }
}
