package railwalk.device;

import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * One type of the catalogue: what is inside the bottle and on which pin, with the law of each
 * section. Handed out by {@link Catalogue}.
 *
 * @param name the name charts print, such as "12AX7"
 * @param aliases other names of the same tube, electrically and mechanically
 * @param summary a few words: "high-mu twin triode"
 * @param base the base code of the sheets, such as "9A"
 * @param family the kind of socket: "noval", "octal", "miniature-7" and so on
 * @param sections in bench order
 * @param pins socket pins by number; 0 stands for the top cap. Empty when no source for them is
 *     known: then only use by electrode makes sense
 * @param care what to mind about its pins and its look-alikes
 */
public record TubeType(
    String name,
    List<String> aliases,
    String summary,
    String base,
    String family,
    Heater heater,
    List<SectionType> sections,
    SortedMap<Integer, PinUse> pins,
    Care care) {

  /**
   * What to mind.
   *
   * @param cautions why use by pin deserves a second look, such as sheets that disagree
   * @param straps pins to be wired together at the socket, since it is not known whether they are
   *     joined inside
   * @param lookAlikes types that are easily taken for this one
   */
  public record Care(
      List<String> cautions, List<List<Integer>> straps, List<LookAlike> lookAlikes) {
    /** Nothing to mind. */
    public static final Care NONE = new Care(List.of(), List.of(), List.of());

    public Care {
      cautions = List.copyOf(cautions);
      straps = List.copyOf(straps);
      lookAlikes = List.copyOf(lookAlikes);
    }
  }

  /**
   * A type that is easily taken for another but does not replace it.
   *
   * @param type its name
   * @param difference what differs, in a few words
   */
  public record LookAlike(String type, String difference) {}

  /** A type with nothing to mind. */
  public TubeType(
      String name,
      List<String> aliases,
      String summary,
      String base,
      String family,
      Heater heater,
      List<SectionType> sections,
      SortedMap<Integer, PinUse> pins) {
    this(name, aliases, summary, base, family, heater, sections, pins, Care.NONE);
  }

  public TubeType {
    aliases = List.copyOf(aliases);
    sections = List.copyOf(sections);
    pins = Collections.unmodifiableSortedMap(new TreeMap<>(pins));
  }

  /** Returns the section with {@code id}. */
  public Optional<SectionType> section(String id) {
    return sections.stream().filter(s -> s.id().equals(id)).findFirst();
  }

  /**
   * Returns the pins that lead to {@code electrode} of section {@code id}, rising; an electrode
   * that all sections share counts for each.
   */
  public List<Integer> pinsOf(String id, Electrode electrode) {
    return pins.entrySet().stream()
        .filter(e -> e.getValue().electrode() == electrode)
        .filter(e -> e.getValue().section().equals(id) || e.getValue().section().isEmpty())
        .map(Map.Entry::getKey)
        .toList();
  }
}
