package railwalk.device;

import java.util.Comparator;
import java.util.HashSet;
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
  private final Set<String> others = new HashSet<>();

  /** Keeps {@code name} from being taken for an issue of the type that its stem names. */
  void exclude(String name) {
    others.add(name.toUpperCase(Locale.ROOT));
  }

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
    if (others.contains(untagged)) {
      return Optional.empty();
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

  /**
   * Returns how many letters must be put in, taken out, exchanged for another or with their
   * neighbour (F. J. Damerau, Communications of the ACM 7/3, 1964).
   */
  private static int distance(String a, String b) {
    int[] before = new int[b.length() + 1];
    int[] last = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      last[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      int[] row = new int[b.length() + 1];
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int exchange = last[j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        row[j] = Math.min(exchange, 1 + Math.min(row[j - 1], last[j]));
        boolean swapped =
            i > 1
                && j > 1
                && a.charAt(i - 1) == b.charAt(j - 2)
                && a.charAt(i - 2) == b.charAt(j - 1);
        if (swapped) {
          row[j] = Math.min(row[j], before[j - 2] + 1);
        }
      }
      before = last;
      last = row;
    }
    return last[b.length()];
  }
}
