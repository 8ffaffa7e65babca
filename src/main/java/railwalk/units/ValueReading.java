package railwalk.units;

import java.util.Set;

/** What {@link ValueReader} makes of a written value. */
public sealed interface ValueReading {
  /**
   * It was read.
   *
   * @param amount in the SI unit
   * @param tolerance as a share where a code letter after the value gives it (4k7J); else NaN
   * @param remarks what a careful reader should be told
   */
  record Value(double amount, double tolerance, Set<Remark> remarks) implements ValueReading {
    public Value {
      remarks = Set.copyOf(remarks);
    }
  }

  /**
   * It was not.
   *
   * @param stated what the unit letters say it measures; the wanted measure when they say nothing
   * @param hint how to write it; empty when there is nothing to suggest
   */
  record Refused(Refusal reason, Measure stated, String hint) implements ValueReading {}

  /** Readings that rest on a convention. */
  enum Remark {
    /** Capital M on a resistance: mega. */
    CAPITAL_M_IS_MEGA,
    /** {@code mfd}, {@code mf}: microfarad, as old parts are marked. */
    OLD_MARK_IS_MICRO,
    /** {@code mmf}, {@code mmfd}, {@code uuF}: picofarad, as old parts are marked. */
    OLD_MARK_IS_PICO,
    /** A capacitance of a millifarad and more by the letter m. */
    MILLIFARAD,
    /** A capacitance without any letter, small enough to be farads. */
    BARE_FARADS,
    /** Letters after the number that are no unit. */
    LETTERS_IGNORED
  }

  /** Why a value is refused. */
  enum Refusal {
    /** It does not look like a number at all. */
    NOT_A_NUMBER,
    /** A letter O or l stands where a digit should. */
    LETTER_FOR_DIGIT,
    /** Its unit belongs to another measure. */
    WRONG_UNIT,
    /** Lower-case m on a resistance: milliohm is never meant. */
    SMALL_M_ON_RESISTANCE,
    /** A bare capacitance too large to be farads. */
    BARE_CAPACITANCE,
    /** In an expression a code such as 1M5 is milli to one reader and mega to another. */
    M_CODE_IN_EXPRESSION,
    /** Beyond what a double holds. */
    OUT_OF_RANGE
  }
}
