package railwalk.netlist;

import java.util.List;
import java.util.Map;
import railwalk.source.SourceText;

/**
 * A netlist sorted: parts apart from the lines that set something, sub-circuits apart from both,
 * includes already in their place.
 *
 * @param parts the lines of parts, in file order
 * @param settings {@code .line}, {@code .state} and the like, in file order
 * @param parameters {@code .param} lines outside sub-circuits
 * @param subcircuits by name, lower case
 * @param models {@code .model} lines by the model's name, lower case
 * @param orders {@code .order} lines by the tube type's name, lower case
 * @param types tube types that the netlist gives, in file order
 * @param globals names of nodes that sub-circuits share, lower case
 * @param files every text read, in order of reading
 */
record Deck(
    String title,
    List<Card> parts,
    List<Card> settings,
    List<Card> parameters,
    Map<String, Subcircuit> subcircuits,
    Map<String, Card> models,
    Map<String, Card> orders,
    List<TypeSource> types,
    List<String> globals,
    List<SourceText> files) {

  /** Where tube types come from. */
  sealed interface TypeSource {
    /** A {@code .tube} line. */
    record Line(Card card) implements TypeSource {}

    /**
     * A file of types.
     *
     * @param word the netlist's word that names it
     */
    record File(SourceText file, Word word) implements TypeSource {}
  }
}
