package railwalk.netlist;

import java.util.ArrayList;
import java.util.List;

/**
 * A {@code .subckt} block.
 *
 * @param name as written
 * @param ports its nodes in order
 * @param defaults its parameters with their usual values
 * @param cards the lines inside, {@code .param} lines among them
 */
record Subcircuit(Word name, List<Word> ports, List<Field.Option> defaults, List<Card> cards) {
  /** Takes the header apart; the lines are added as they come. */
  static Subcircuit of(Card header) {
    List<Word> words = new ArrayList<>(header.words());
    Word name = words.isEmpty() ? header.head() : words.remove(0);
    words.removeIf(w -> w.is("params:") || w.is("params"));
    return new Subcircuit(name, List.copyOf(words), header.options(), new ArrayList<>());
  }
}
