package railwalk.source;

import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;

/** Names that a mistyped one may have meant. */
public final class NearNames {
  private static final int MOST = 3;

  private NearNames() {}

  /** Returns {@code did you mean A, B?} or an empty string when nothing is near. */
  public static String hint(String name, Collection<String> known) {
    return question(near(name, known));
  }

  /** Returns {@code did you mean A, B?} or an empty string for no names. */
  public static String question(List<String> names) {
    return names.isEmpty() ? "" : "did you mean " + String.join(", ", names) + "?";
  }

  /** Returns up to three of {@code known} within a mistake or two of {@code name}, best first. */
  public static List<String> near(String name, Collection<String> known) {
    String wanted = name.toLowerCase(Locale.ROOT);
    int allowed = wanted.length() <= 3 ? 1 : 2;
    return known.stream()
        .distinct()
        .filter(k -> Math.abs(k.length() - wanted.length()) <= allowed)
        .filter(k -> distance(wanted, k.toLowerCase(Locale.ROOT)) <= allowed)
        .sorted(
            Comparator.<String>comparingInt(k -> distance(wanted, k.toLowerCase(Locale.ROOT)))
                .thenComparing(Comparator.naturalOrder()))
        .limit(MOST)
        .toList();
  }

  /**
   * Returns how many signs must be changed, added, dropped or swapped with their neighbour to turn
   * one word into the other (optimal string alignment; Damerau 1964).
   */
  static int distance(String one, String other) {
    int[][] table = new int[one.length() + 1][other.length() + 1];
    for (int i = 0; i <= one.length(); i++) {
      for (int j = 0; j <= other.length(); j++) {
        if (i == 0 || j == 0) {
          table[i][j] = i + j;
          continue;
        }
        int change = one.charAt(i - 1) == other.charAt(j - 1) ? 0 : 1;
        int least =
            Math.min(table[i - 1][j - 1] + change, Math.min(table[i - 1][j], table[i][j - 1]) + 1);
        boolean swapped =
            i > 1
                && j > 1
                && one.charAt(i - 1) == other.charAt(j - 2)
                && one.charAt(i - 2) == other.charAt(j - 1);
        table[i][j] = swapped ? Math.min(least, table[i - 2][j - 2] + 1) : least;
      }
    }
    return table[one.length()][other.length()];
  }
}
