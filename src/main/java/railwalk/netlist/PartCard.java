package railwalk.netlist;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Node;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;
import railwalk.units.Measure;
import railwalk.units.ValueReader;

/**
 * The line of one part while it is taken to pieces: whatever a reader has not asked for is reported
 * at the end.
 */
final class PartCard {
  private final Card card;
  private final Frame frame;
  private final Draft draft;
  private final String name;
  private final List<Word> words;
  private final List<Field.Option> options;
  private final List<Field.Call> calls = new ArrayList<>();
  private final List<String> asked = new ArrayList<>();

  PartCard(Card card, Frame frame, Draft draft) {
    this(card, frame, draft, card.head().text());
  }

  PartCard(Card card, Frame frame, Draft draft, String chartName) {
    this.card = card;
    this.frame = frame;
    this.draft = draft;
    this.name = card.isDot() ? chartName.toLowerCase(Locale.ROOT) : frame.part(chartName);
    this.words = new ArrayList<>(card.words());
    this.options = new ArrayList<>(card.options());
    for (Field field : card.fields()) {
      if (field instanceof Field.Call call) {
        calls.add(call);
      }
    }
  }

  /** Returns the name as charts print it. */
  String name() {
    return name;
  }

  /** Returns where the line starts: its name. */
  SourceSpan span() {
    return card.head().span();
  }

  Frame frame() {
    return frame;
  }

  Draft draft() {
    return draft;
  }

  Report report() {
    return draft.report();
  }

  /** Returns the bare words not taken yet. */
  List<Word> words() {
    return words;
  }

  /** Returns the next bare word and takes it; null when there is none. */
  @Nullable Word next() {
    return words.isEmpty() ? null : words.remove(0);
  }

  /** Returns the next bare word; null when there is none. */
  @Nullable Word peek() {
    return words.isEmpty() ? null : words.get(0);
  }

  /** Takes the next bare word if it is {@code keyword}. */
  boolean accept(String keyword) {
    Word word = peek();
    if (word == null || !word.is(keyword)) {
      return false;
    }
    words.remove(0);
    return true;
  }

  /** Returns and takes the call of that name, such as SIN(…); null when there is none. */
  Field.@Nullable Call call(String... names) {
    for (String wanted : names) {
      for (Field.Call call : calls) {
        if (call.name().is(wanted)) {
          calls.remove(call);
          return call;
        }
      }
    }
    return null;
  }

  /**
   * Puts lists in parentheses in line with the bare words: {@code E1 a b (c d) 10} is {@code E1 a b
   * c d 10}.
   */
  void unwrapLists() {
    words.clear();
    calls.clear();
    for (Field field : card.fields()) {
      if (field instanceof Field.Bare bare) {
        words.add(bare.word());
      } else if (field instanceof Field.Call call) {
        if (!call.name().text().isEmpty()) {
          words.add(call.name());
        }
        call.arguments().stream()
            .filter(Field.Bare.class::isInstance)
            .forEach(argument -> words.add(argument.first()));
      }
    }
  }

  /** Returns the next {@code count} words as nodes; null when there are too few, reported. */
  @Nullable List<Node> nodes(int count) {
    if (words.size() < count) {
      report().add(Problem.NODES_MISSING, span(), name, count, words.size());
      return null;
    }
    List<Node> nodes = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      nodes.add(draft.nodes().node(words.remove(0), frame));
    }
    return nodes;
  }

  /** Returns the value of the first of these keys that the line has, and takes it. */
  @Nullable Word option(String... keys) {
    asked.addAll(List.of(keys));
    for (String key : keys) {
      for (int i = 0; i < options.size(); i++) {
        Field.Option option = options.get(i);
        if (option.key().is(key)) {
          options.remove(i);
          extraValues(option);
          return option.value();
        }
      }
    }
    return null;
  }

  /** Returns the comma-separated values of a key; empty when the line has it not. */
  List<Word> optionList(String... keys) {
    asked.addAll(List.of(keys));
    for (String key : keys) {
      for (int i = 0; i < options.size(); i++) {
        Field.Option option = options.get(i);
        if (option.key().is(key)) {
          options.remove(i);
          return option.values();
        }
      }
    }
    return List.of();
  }

  /** Returns all keys left and takes them. */
  List<Field.Option> takeOptions() {
    List<Field.Option> taken = List.copyOf(options);
    options.clear();
    return taken;
  }

  private void extraValues(Field.Option option) {
    if (option.values().size() > 1) {
      Word second = option.values().get(1);
      report().add(Problem.DECIMAL_COMMA, second.span(), option.value().text(), second.text());
    }
  }

  /**
   * Returns the word that is the part's value: the next bare one, or that of a key; null when there
   * is none or a rating stands in its place, which is reported.
   */
  @Nullable Word valueWord(Measure measure, String... keys) {
    Word keyed = option(keys);
    if (keyed != null) {
      return keyed;
    }
    Word word = peek();
    if (word == null) {
      report().add(Problem.VALUE_MISSING, end(), name, measure.words(), measure.example());
      return null;
    }
    boolean rating =
        !word.isExpression()
            && ValueReader.statedMeasure(word.text())
                .filter(stated -> stated != measure)
                .filter(stated -> isRating(stated))
                .isPresent();
    if (rating) {
      report()
          .add(
              Problem.RATING_FOR_VALUE,
              word.span(),
              name,
              word.text(),
              measure.words(),
              measure.example());
      return null;
    }
    return next();
  }

  private static boolean isRating(Measure stated) {
    return stated == Measure.VOLTAGE || stated == Measure.POWER || stated == Measure.SHARE;
  }

  /** Returns a value; NaN when it cannot be read, which is reported. */
  double read(Word word, Measure measure) {
    return draft.values().read(word, measure, name, frame.scope());
  }

  /** Returns a value that must not be negative; NaN when it is or cannot be read, reported. */
  double readPositive(Word word, Measure measure) {
    double amount = read(word, measure);
    if (amount < 0) {
      report().add(Problem.NEGATIVE_VALUE, word.span(), word.text(), measure.words());
      return Double.NaN;
    }
    return amount;
  }

  /** Returns a resistance by key: NaN when the key is absent, unreadable or a question mark. */
  double ohmsOption(String what, String... keys) {
    Word word = option(keys);
    return word == null ? Double.NaN : ohms(word, what);
  }

  /** Returns a resistance that may be a question mark: then NaN, noted as unknown. */
  double ohms(Word word, String what) {
    if (word.isUnknown()) {
      draft.unknown(name, what, word.span());
      return Double.NaN;
    }
    return readPositive(word, Measure.RESISTANCE);
  }

  /** Returns the place just after the line's last word. */
  SourceSpan end() {
    Word last = card.head();
    for (Field field : card.fields()) {
      last = lastWord(field);
    }
    SourceSpan span = last.span();
    return new SourceSpan(span.text(), span.line(), span.column() + span.length(), 1);
  }

  private static Word lastWord(Field field) {
    if (field instanceof Field.Option option) {
      return option.values().get(option.values().size() - 1);
    }
    return field.first();
  }

  /** Reports what nobody asked for. */
  void done() {
    for (Word word : words) {
      report().add(Problem.WORD_PASSED_OVER, word.span(), word.text(), name);
    }
    for (Field.Call call : calls) {
      report().add(Problem.WORD_PASSED_OVER, call.first().span(), call.name().text() + "()", name);
    }
    for (Field.Option option : options) {
      String key = option.key().text();
      String near = NearNames.hint(key, asked);
      String known = asked.isEmpty() ? "" : "it takes " + String.join(", ", asked);
      report()
          .add(
              Problem.OPTION_PASSED_OVER,
              option.key().span(),
              key + "=",
              name,
              near.isEmpty() ? known : near);
    }
  }
}
