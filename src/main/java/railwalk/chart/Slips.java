package railwalk.chart;

import java.util.Optional;
import railwalk.diagnosis.JudgedReading;
import railwalk.diagnosis.Verdict;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;

/** Readings that look like slips of the hand: a sign, a decimal point, the range switch. */
final class Slips {
  /** Ten times a reading, or a tenth, this near to the expected one is no accident. */
  private static final double DECIMAL_NEARNESS = 0.12;

  private static final double LEAST_VOLTS = 0.2;

  private Slips() {}

  /** Returns the question to ask about a reading; empty when it looks like none. */
  static Optional<String> question(JudgedReading judged) {
    Reading r = judged.reading();
    if (judged.verdict() != Verdict.QUESTIONED && !judged.verdict().outside()) {
      return Optional.empty();
    }
    String why = why(r.value(), judged.meter(), judged.verdict() == Verdict.QUESTIONED);
    if (why.isEmpty() || r.kind() == ReadingKind.OHMS) {
      return Optional.empty();
    }
    return Optional.of(
        BenchWords.place(r)
            + " reads "
            + BenchWords.figure(r.kind(), r.value())
            + ", expected "
            + BenchWords.figure(r.kind(), judged.meter())
            + ": "
            + why);
  }

  private static String why(double read, double expected, boolean questioned) {
    if (isDecimal(read, expected)) {
      return "a decimal point, or the range?";
    }
    if (!questioned) {
      return "";
    }
    return read * expected < 0 ? "the sign, or the leads exchanged?" : "the range switch?";
  }

  private static boolean isDecimal(double read, double expected) {
    if (!(Math.abs(expected) >= LEAST_VOLTS)) {
      return false;
    }
    double ratio = read / expected;
    return Math.abs(ratio * 10 - 1) < DECIMAL_NEARNESS
        || Math.abs(ratio / 10 - 1) < DECIMAL_NEARNESS;
  }
}
