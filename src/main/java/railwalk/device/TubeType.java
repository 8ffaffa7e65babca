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
 *     known
 */
public record TubeType(
    String name,
    List<String> aliases,
    String summary,
    String base,
    String family,
    Heater heater,
    List<SectionType> sections,
    SortedMap<Integer, PinUse> pins) {

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
