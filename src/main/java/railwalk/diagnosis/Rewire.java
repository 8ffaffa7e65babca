package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import java.util.function.UnaryOperator;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;

/** Changes of a circuit's parts. */
final class Rewire {
  /** What stands for an open part: far above any resistance of a bench or a board, ohm. */
  static final double OPEN_OHMS = 1e9;

  /** What stands for a shorted part, ohm. */
  static final double SHORT_OHMS = 0.1;

  private Rewire() {}

  /** Returns {@code circuit} with every part of one kind and name changed. */
  static <E extends Element> Circuit change(
      Circuit circuit, Class<E> kind, String name, UnaryOperator<E> by) {
    return replace(
        circuit,
        e -> kind.isInstance(e) && e.name().equals(name),
        e -> List.of(by.apply(kind.cast(e))));
  }

  /** Returns {@code circuit} with other parts in the places of those that are {@code meant}. */
  static Circuit replace(Circuit circuit, Predicate<Element> meant, Replacement by) {
    List<Element> elements = new ArrayList<>(circuit.elements().size() + 2);
    for (Element element : circuit.elements()) {
      if (meant.test(element)) {
        elements.addAll(by.of(element));
      } else {
        elements.add(element);
      }
    }
    return circuit.withElements(elements);
  }

  /** Returns {@code circuit} with one part more. */
  static Circuit add(Circuit circuit, Element more) {
    List<Element> elements = new ArrayList<>(circuit.elements());
    elements.add(more);
    return circuit.withElements(elements);
  }

  /** What stands in a part's place. */
  @FunctionalInterface
  interface Replacement {
    /** Returns the parts in place of {@code element}. */
    List<Element> of(Element element);
  }
}
