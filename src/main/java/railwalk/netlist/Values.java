package railwalk.netlist;

import java.util.Locale;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/** Reads the words of a line as values and says what is doubtful about them. */
final class Values {
  /** A resistance below this that comes out of an expression was meant in megohms. */
  private static final double LEAST_LIKELY_OHMS = 0.01;

  private final Report report;

  Values(Report report) {
    this.report = report;
  }

  /** A value and the tolerance that its code letter gives, NaN without one. */
  record Figure(double amount, double tolerance) {}

  /** Returns where this reader reports to. */
  Report report() {
    return report;
  }

  /** Returns a plain number by SPICE's rule; NaN when it cannot be read, which is reported. */
  double number(Word word, Scope scope) {
    return read(word, Measure.NUMBER, "", scope);
  }

  /** Returns the value of {@code word}; NaN when it cannot be read, which is reported. */
  double read(Word word, Measure measure, String part, Scope scope) {
    return figure(word, measure, part, scope).amount();
  }

  /**
   * Returns the value of {@code word} with its tolerance; NaN when it cannot be read, which is
   * reported.
   *
   * @param part the part that it belongs to, for gathered notes
   */
  Figure figure(Word word, Measure measure, String part, Scope scope) {
    if (word.isExpression()) {
      return new Figure(
          likely(Expressions.evaluate(word, scope, report), measure, word), Double.NaN);
    }
    ValueReading reading = ValueReader.read(word.text(), measure);
    if (reading instanceof ValueReading.Value value) {
      value.remarks().forEach(remark -> remark(remark, word, part));
      return new Figure(value.amount(), value.tolerance());
    }
    if (scope.knows(word.text())) {
      return new Figure(likely(scope.value(word.text(), word), measure, word), Double.NaN);
    }
    refuse((ValueReading.Refused) reading, measure, word, scope);
    return new Figure(Double.NaN, Double.NaN);
  }

  private double likely(double amount, Measure measure, Word word) {
    if (measure == Measure.RESISTANCE && amount > 0 && amount < LEAST_LIKELY_OHMS) {
      report.add(Problem.RESISTANCE_TINY, word.span(), word.text());
    }
    return amount;
  }

  private void remark(ValueReading.Remark remark, Word word, String part) {
    SourceSpan span = word.span();
    switch (remark) {
      case CAPITAL_M_IS_MEGA -> report.gather(Problem.CAPITAL_M_IS_MEGA, span, part);
      case OLD_MARK_IS_MICRO -> report.gather(Problem.OLD_MARK_IS_MICRO, span, part);
      case OLD_MARK_IS_PICO -> report.gather(Problem.OLD_MARK_IS_PICO, span, part);
      case MILLIFARAD -> report.add(Problem.MILLIFARAD, span, word.text());
      case BARE_FARADS -> report.add(Problem.BARE_FARADS, span, word.text());
      case LETTERS_IGNORED -> report.add(Problem.LETTERS_IGNORED, span, word.text());
    }
  }

  private void refuse(ValueReading.Refused refused, Measure measure, Word word, Scope scope) {
    SourceSpan span = word.span();
    String text = word.text();
    switch (refused.reason()) {
      case NOT_A_NUMBER ->
          report.add(Problem.NOT_A_VALUE, span, text, measure.words(), hint(text, measure, scope));
      case LETTER_FOR_DIGIT -> report.add(Problem.LETTER_FOR_DIGIT, span, text, refused.hint());
      case WRONG_UNIT ->
          report.add(
              Problem.WRONG_UNIT,
              span,
              text,
              refused.stated().words(),
              measure.words(),
              measure.example());
      case SMALL_M_ON_RESISTANCE ->
          report.add(Problem.SMALL_M_ON_RESISTANCE, span, text, refused.hint());
      case BARE_CAPACITANCE -> report.add(Problem.BARE_CAPACITANCE, span, text, refused.hint());
      case M_CODE_IN_EXPRESSION ->
          report.add(Problem.M_CODE_IN_EXPRESSION, span, text, refused.hint());
      case OUT_OF_RANGE -> report.add(Problem.OUT_OF_RANGE, span, text);
    }
  }

  private static String hint(String text, Measure measure, Scope scope) {
    String near = NearNames.hint(text.toLowerCase(Locale.ROOT), scope.names());
    return near.isEmpty() ? "write it like " + measure.example() : near;
  }
}
