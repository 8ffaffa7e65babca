package railwalk.device;

import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** All names of the catalogue, and how a name that a person typed finds one of them. */
final class TypeNames {
  /** Suffixes that tell an issue, a bulb or a maker's selection, not another tube. */
  private static final Set<String> SUFFIXES =
      Set.of(
          "A", "B", "C", "G", "M", "S", "W", "EH", "GT", "GA", "WA", "WB", "WC", "GTA", "GTB",
          "GTY", "WGT", "WGTA", "WXT");

  private final Map<String, String> typeByName = new LinkedHashMap<>();

  /** Adds {@code name} as a name of {@code type}. */
  void put(String name, String type) {
    String other = typeByName.put(name.toUpperCase(Locale.ROOT), type);
    if (other != null) {
      throw new IllegalStateException(name + " names both " + other + " and " + type);
    }
  }

  /**
   * Returns the type that {@code typed} stands for: as it is; without its tag or hyphens; without
   * suffixes; or as the short form of a name in GT.
   */
  Optional<String> find(String typed) {
    String name = typed.strip().toUpperCase(Locale.ROOT);
    int underscore = name.indexOf('_');
    String untagged = (underscore > 0 ? name.substring(0, underscore) : name).replace("-", "");
    if (typeByName.containsKey(name)) {
      return Optional.of(typeByName.get(name));
    }
    for (int cut = untagged.length(); cut > 0; cut--) {
      String type = typeByName.get(untagged.substring(0, cut));
      String suffix = untagged.substring(cut);
      if (type != null && (suffix.isEmpty() || SUFFIXES.contains(suffix))) {
        return Optional.of(type);
      }
    }
    return shortForm(untagged);
  }

  /** Returns the GT type of that name without a bulb letter: 6V6 and 6V6G for 6V6GT. */
  private Optional<String> shortForm(String name) {
    String stem = name.endsWith("G") ? name : name + "G";
    return Optional.ofNullable(typeByName.get(stem + "T"));
  }

  /** Returns up to three names near {@code typed}, nearest first. */
  List<String> near(String typed) {
    String name = typed.strip().toUpperCase(Locale.ROOT);
    record Near(String name, int distance) {}
    int limit = Math.max(2, name.length() / 2);
    return typeByName.keySet().stream()
        .map(known -> new Near(known, distance(name, known)))
        .filter(near -> near.distance <= limit)
        .sorted(Comparator.comparingInt(Near::distance).thenComparing(Near::name))
        .limit(3)
        .map(Near::name)
        .toList();
  }

  /** Returns how many letters must be put in, taken out or exchanged (Levenshtein 1966). */
  private static int distance(String a, String b) {
    int[] row = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      row[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      int diagonal = row[0];
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int exchange = diagonal + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        diagonal = row[j];
        row[j] = Math.min(exchange, 1 + Math.min(row[j], row[j - 1]));
      }
    }
    return row[b.length()];
  }
}
