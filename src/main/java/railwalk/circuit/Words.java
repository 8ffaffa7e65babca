package railwalk.circuit;

import java.util.Map;

/**
 * Which of the trade's two vocabularies the output speaks. Sentences are written with the words
 * that differ in braces, {@code "the {plate} of each {tube}"}.
 */
public enum Words {
  AMERICAN,
  BRITISH;

  private static final Map<String, String> IN_BRITISH =
      Map.of(
          "plate", "anode",
          "plates", "anodes",
          "tube", "valve",
          "tubes", "valves",
          "line", "mains",
          "ground", "earth");

  /** Returns {@code sentence} with the words in braces said in this vocabulary. */
  public String say(String sentence) {
    StringBuilder out = new StringBuilder();
    int from = 0;
    for (int open = sentence.indexOf('{'); open >= 0; open = sentence.indexOf('{', from)) {
      int close = sentence.indexOf('}', open);
      out.append(sentence, from, open).append(word(sentence.substring(open + 1, close)));
      from = close + 1;
    }
    return out.append(sentence.substring(from)).toString();
  }

  private String word(String american) {
    String key = Character.toLowerCase(american.charAt(0)) + american.substring(1);
    String word = this == BRITISH ? IN_BRITISH.getOrDefault(key, key) : key;
    return key.equals(american) ? word : Character.toUpperCase(word.charAt(0)) + word.substring(1);
  }
}
