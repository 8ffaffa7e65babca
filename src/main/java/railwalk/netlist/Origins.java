package railwalk.netlist;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import railwalk.source.SourceSpan;

/**
 * Where in the text the circuit's parts stand: kept beside the model, so that two circuits are
 * equal when they mean the same. Names are taken in any case.
 */
public final class Origins {
  private final Map<String, SourceSpan> elements;
  private final Map<String, SourceSpan> nodes;
  private final Map<String, SourceSpan> bottles;
  private final Map<String, SourceSpan> states;
  private final List<Unknown> unknowns;

  /**
   * A value written as "?", to be solved from readings: no chart can be made until it is known.
   *
   * @param element the part's name
   * @param what such as "resistance" or "winding resistance"
   * @param span the question mark
   */
  public record Unknown(String element, String what, SourceSpan span) {}

  /** Keeps copies; keys in upper case. */
  Origins(
      Map<String, SourceSpan> elements,
      Map<String, SourceSpan> nodes,
      Map<String, SourceSpan> bottles,
      Map<String, SourceSpan> states,
      List<Unknown> unknowns) {
    this.elements = Map.copyOf(elements);
    this.nodes = Map.copyOf(nodes);
    this.bottles = Map.copyOf(bottles);
    this.states = Map.copyOf(states);
    this.unknowns = List.copyOf(unknowns);
  }

  /** Returns where the part called {@code elementName} is written. */
  public Optional<SourceSpan> of(String elementName) {
    return find(elements, elementName);
  }

  /** Returns where the node is first named. */
  public Optional<SourceSpan> ofNode(String nodeName) {
    return find(nodes, nodeName);
  }

  /** Returns where the tube is first written. */
  public Optional<SourceSpan> ofBottle(String bottleName) {
    return find(bottles, bottleName);
  }

  /** Returns where the state's line stands. */
  public Optional<SourceSpan> ofState(String stateName) {
    return find(states, stateName);
  }

  /** Returns the values written as "?", in file order. */
  public List<Unknown> unknowns() {
    return unknowns;
  }

  private static Optional<SourceSpan> find(Map<String, SourceSpan> map, String name) {
    return Optional.ofNullable(map.get(name.toUpperCase(Locale.ROOT)));
  }
}
