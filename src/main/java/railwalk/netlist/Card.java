package railwalk.netlist;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;

/**
 * One logical line of a netlist, continuation lines joined.
 *
 * @param head its first word: a part's name or a dot word
 * @param flaw what keeps the line from being read; null when nothing does. It is reported when the
 *     line is used, so that lines of a sub-circuit nobody uses stay silent
 */
record Card(Word head, List<Field> fields, @Nullable Diagnostic flaw) {
  Card {
    fields = List.copyOf(fields);
  }

  /** Returns the bare words after the head. */
  List<Word> words() {
    return fields.stream()
        .filter(Field.Bare.class::isInstance)
        .map(f -> ((Field.Bare) f).word())
        .toList();
  }

  /** Returns the {@code key=value} fields. */
  List<Field.Option> options() {
    return fields.stream()
        .filter(Field.Option.class::isInstance)
        .map(Field.Option.class::cast)
        .toList();
  }

  /** Returns the line without the bare word {@code keyword}. */
  Card without(String keyword) {
    List<Field> kept =
        fields.stream()
            .filter(field -> !(field instanceof Field.Bare bare && bare.word().is(keyword)))
            .toList();
    return new Card(head, kept, flaw);
  }

  /** Returns whether it is a dot line. */
  boolean isDot() {
    return head.text().startsWith(".");
  }

  /** Returns whether it is the dot line {@code name} (with its dot), in any case. */
  boolean isDot(String name) {
    return head.is(name);
  }
}
