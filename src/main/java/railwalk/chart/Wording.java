package railwalk.chart;

import java.util.Map;
import railwalk.circuit.Words;
import railwalk.device.Electrode;

/**
 * The two vocabularies of the trade. Sentences are written with the words that differ in braces,
 * {@code "the {plate} of each {tube}"}, and come out in the vocabulary asked for.
 */
final class Wording {
  private static final Map<String, String> BRITISH =
      Map.of(
          "plate", "anode",
          "plates", "anodes",
          "tube", "valve",
          "tubes", "valves",
          "line", "mains",
          "ground", "earth");

  private final boolean british;

  Wording(Words words) {
    british = words == Words.BRITISH;
  }

  /** Returns {@code sentence} with the words in braces said in this vocabulary. */
  String say(String sentence) {
    StringBuilder out = new StringBuilder();
    int from = 0;
    for (int open = sentence.indexOf('{'); open >= 0; open = sentence.indexOf('{', from)) {
      int close = sentence.indexOf('}', open);
      out.append(sentence, from, open).append(word(sentence.substring(open + 1, close)));
      from = close + 1;
    }
    return out.append(sentence.substring(from)).toString();
  }

  /** Returns the name of an electrode. */
  String electrode(Electrode electrode) {
    return switch (electrode) {
      case PLATE -> word("plate");
      case PLATE1 -> word("plate") + " 1";
      case PLATE2 -> word("plate") + " 2";
      case DIODE1 -> "diode 1";
      case DIODE2 -> "diode 2";
      case HEATER1, HEATER2 -> "heater";
      case HEATER_TAP -> "heater tap";
      case SCREEN, SUPPRESSOR, GRID, CATHODE -> electrode.word();
    };
  }

  private String word(String american) {
    String key = Character.toLowerCase(american.charAt(0)) + american.substring(1);
    String said = british ? BRITISH.getOrDefault(key, key) : key;
    return key.equals(american) ? said : Character.toUpperCase(said.charAt(0)) + said.substring(1);
  }
}
