package railwalk.netlist;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import railwalk.circuit.Node;
import railwalk.source.NearNames;

/** Puts a sub-circuit's lines where it is used. */
final class Expansion {
  private static final int DEEPEST = 20;

  private final Draft draft;
  private final PartLines lines;

  Expansion(Draft draft, PartLines lines) {
    this.draft = draft;
    this.lines = lines;
  }

  /** Reads the lines of {@code subcircuit} as used by {@code card} on {@code nodes}. */
  void expand(Card card, Frame frame, List<Word> nodes, Subcircuit subcircuit) {
    String name = subcircuit.name().text().toLowerCase(Locale.ROOT);
    if (frame.open().contains(name) || frame.open().size() >= DEEPEST) {
      draft.report().add(Problem.SUBCKT_CIRCLE, card.head().span(), subcircuit.name().text());
      return;
    }
    List<Word> ports = subcircuit.ports();
    if (ports.size() != nodes.size()) {
      draft
          .report()
          .add(
              Problem.SUBCKT_NODES,
              card.head().span(),
              subcircuit.name().text(),
              ports.size(),
              nodes.size(),
              String.join(" ", ports.stream().map(Word::text).toList()));
      return;
    }
    Map<String, Node> connections = new HashMap<>();
    for (int i = 0; i < ports.size(); i++) {
      connections.put(
          ports.get(i).text().toLowerCase(Locale.ROOT), draft.nodes().node(nodes.get(i), frame));
    }
    List<String> open = new ArrayList<>(frame.open());
    open.add(name);
    Frame inner =
        new Frame(
            frame.part(card.head().text()),
            connections,
            scope(card, frame, subcircuit),
            lines.plainNames(subcircuit.cards()),
            open);
    lines.read(subcircuit.cards(), inner);
  }

  private Scope scope(Card card, Frame frame, Subcircuit subcircuit) {
    Scope scope = draft.globalScope().inner();
    Set<String> known = new HashSet<>();
    for (Field.Option option : subcircuit.defaults()) {
      scope.define(option.key().text(), option.value(), scope);
      known.add(option.key().text().toLowerCase(Locale.ROOT));
    }
    for (Card line : subcircuit.cards()) {
      if (line.isDot(".param") || line.isDot(".params")) {
        for (Word word : line.words()) {
          draft.report().add(Problem.PARAMETER_SHAPE, word.span(), word.text());
        }
        for (Field.Option option : line.options()) {
          scope.define(option.key().text(), option.value(), scope);
          known.add(option.key().text().toLowerCase(Locale.ROOT));
        }
      }
    }
    for (Field.Option option : card.options()) {
      String key = option.key().text();
      if (!known.contains(key.toLowerCase(Locale.ROOT))) {
        draft
            .report()
            .add(
                Problem.SUBCKT_PARAMETER,
                option.key().span(),
                subcircuit.name().text(),
                key,
                NearNames.hint(key, known));
      }
      scope.define(key, option.value(), frame.scope());
    }
    return scope;
  }
}
