package railwalk.diagnosis;

import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** Numbers spread factors by name, so that all states of an amplifier share them. */
final class FactorIndex {
  private final Map<String, Integer> numbers = new HashMap<>();

  /** Returns the numbers of {@code names}, new ones for names not seen before. */
  int[] of(List<String> names) {
    int[] found = new int[names.size()];
    for (int i = 0; i < found.length; i++) {
      Integer known = numbers.putIfAbsent(names.get(i), numbers.size());
      found[i] = known == null ? numbers.size() - 1 : known;
    }
    return found;
  }

  int size() {
    return numbers.size();
  }
}
