package railwalk.netlist;

import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Element;
import railwalk.circuit.Line;
import railwalk.circuit.Node;
import railwalk.circuit.Transformer;
import railwalk.device.Catalogue;
import railwalk.source.SourceSpan;

/** A circuit while it is being put together, line by line: what every reader of lines adds to. */
final class Draft {
  /** More parts than any amplifier has: a sub-circuit has run away. */
  private static final int MOST_PARTS = 20_000;

  private final Catalogue catalogue;
  private final Deck deck;
  private final Report report;
  private final Values values;
  private final NodeTable nodes;
  private final TubeRack tubes;
  private final Map<String, Element> elements = new LinkedHashMap<>();
  private final Map<String, SourceSpan> spans = new HashMap<>();
  private final Map<String, Transformer> transformers = new LinkedHashMap<>();
  private final Map<String, Integer> places = new HashMap<>();
  private final List<Origins.Unknown> unknowns = new ArrayList<>();
  private final List<Runnable> checks = new ArrayList<>();
  private final Scope globalScope;
  private Line line = Line.NOT_STATED;
  private @Nullable Word referenceWord;
  private double sineHertz = Double.NaN;
  private int cards;

  Draft(Catalogue catalogue, Deck deck, boolean chassisIsReference, Report report) {
    this.catalogue = catalogue;
    this.deck = deck;
    this.report = report;
    this.values = new Values(report);
    this.nodes = new NodeTable(chassisIsReference, deck.globals(), report);
    this.tubes = new TubeRack(this);
    this.globalScope = new Scope(values);
  }

  Catalogue catalogue() {
    return catalogue;
  }

  Deck deck() {
    return deck;
  }

  Report report() {
    return report;
  }

  Values values() {
    return values;
  }

  NodeTable nodes() {
    return nodes;
  }

  TubeRack tubes() {
    return tubes;
  }

  /** Returns the parameters outside sub-circuits. */
  Scope globalScope() {
    return globalScope;
  }

  /** Returns the line that the netlist states. */
  Line line() {
    return line;
  }

  void setLine(Line stated) {
    line = stated;
  }

  /** Returns the node that {@code .ref} names; null without one. */
  @Nullable Word referenceWord() {
    return referenceWord;
  }

  void setReferenceWord(@Nullable Word word) {
    referenceWord = word;
  }

  /** Returns whether the meter's black lead or the chassis is on {@code node}. */
  boolean isGround(Node node) {
    return nodes.isZero(node)
        || nodes.chassis().filter(node::equals).isPresent()
        || (referenceWord != null
            && nodes.find(referenceWord.text()).filter(node::equals).isPresent());
  }

  /** Counts a line of a part; returns whether there is still room. */
  boolean nextCard(SourceSpan span) {
    cards++;
    if (cards == MOST_PARTS + 1) {
      report.add(Problem.TOO_MANY_PARTS, span, MOST_PARTS);
    }
    return cards <= MOST_PARTS;
  }

  /** Returns the number of the line being read: parts stand in the circuit in this order. */
  int place() {
    return cards;
  }

  /** Adds a part from the line being read. */
  void add(Element element, SourceSpan span) {
    add(element, span, cards);
  }

  /** Adds a part that belongs at {@code place}. */
  void add(Element element, SourceSpan span, int place) {
    String name = element.name().toUpperCase(Locale.ROOT);
    SourceSpan other = spans.putIfAbsent(name, span);
    if (other != null) {
      nameTwice(element.name(), span, other);
      return;
    }
    elements.put(name, element);
    places.put(name, place);
  }

  /** Says that two lines make a part of one name. */
  void nameTwice(String name, SourceSpan span, SourceSpan first) {
    String file =
        span.text().fileName().equals(first.text().fileName())
            ? ""
            : " of " + first.text().fileName();
    report.add(Problem.NAME_TWICE, span, name, first.line() + file);
  }

  /** Returns the part called {@code name}. */
  Optional<Element> element(String name) {
    return Optional.ofNullable(elements.get(name.toUpperCase(Locale.ROOT)));
  }

  /** Returns the parts in netlist order. */
  List<Element> elements() {
    List<Element> sorted = new ArrayList<>(elements.values());
    sorted.sort(
        (a, b) ->
            Integer.compare(
                places.getOrDefault(a.name().toUpperCase(Locale.ROOT), 0),
                places.getOrDefault(b.name().toUpperCase(Locale.ROOT), 0)));
    return sorted;
  }

  /** Returns the names of the parts known so far, for suggestions. */
  Collection<String> names() {
    return elements.keySet();
  }

  /** Returns where parts stand, by name in upper case. */
  Map<String, SourceSpan> spans() {
    return spans;
  }

  /** Returns the transformers by name, upper case. */
  Map<String, Transformer> transformers() {
    return transformers;
  }

  /** Notes a value written as a question mark. */
  void unknown(String element, String what, SourceSpan span) {
    unknowns.add(new Origins.Unknown(element, what, span));
    report.add(Problem.VALUE_UNKNOWN, span, element, what);
  }

  /** Returns the values written as question marks. */
  List<Origins.Unknown> unknowns() {
    return unknowns;
  }

  /** Has {@code check} run when all parts are known. */
  void later(Runnable check) {
    checks.add(check);
  }

  /** Runs what waited for all parts to be known. */
  void runChecks() {
    checks.forEach(Runnable::run);
  }

  /** Notes the frequency of a sine that was taken as a winding. */
  void sineAt(double hertz) {
    if (Double.isNaN(sineHertz)) {
      sineHertz = hertz;
    }
  }

  /** Returns the frequency of the first sine taken as a winding; NaN without one. */
  double sineHertz() {
    return sineHertz;
  }

  /** Returns the {@code .model} line of that name. */
  @Nullable Card model(String name) {
    return deck.models().get(name.toLowerCase(Locale.ROOT));
  }
}
