package railwalk.netlist;

import java.util.List;

/** One piece of a netlist line between blanks. */
sealed interface Field {
  /** Returns its first word, where messages point. */
  Word first();

  /**
   * A word by itself.
   *
   * @param afterComma whether a comma stands before it
   */
  record Bare(Word word, boolean afterComma) implements Field {
    @Override
    public Word first() {
      return word;
    }
  }

  /** {@code key=value} or {@code key=value,value}. */
  record Option(Word key, List<Word> values) implements Field {
    public Option {
      values = List.copyOf(values);
    }

    @Override
    public Word first() {
      return key;
    }

    /** Returns the first value. */
    Word value() {
      return values.get(0);
    }
  }

  /**
   * {@code NAME(argument argument)}, or the bare parentheses of a list.
   *
   * @param name empty text for bare parentheses
   */
  record Call(Word name, List<Field> arguments) implements Field {
    public Call {
      arguments = List.copyOf(arguments);
    }

    @Override
    public Word first() {
      return name;
    }
  }
}
