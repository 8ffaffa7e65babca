package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import railwalk.readings.MeasuredAt;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;

/**
 * The three steps from a chart to a verdict: solve at the actual line, count the meter in, judge
 * what is left against the band of 99 healthy amplifiers in 100, the meter's own error added.
 */
final class Judge {
  /** Under this share of the line's design volts heaters starve: only opens and shorts show. */
  static final double STARVING = 0.85;

  /** A reading so many times the highest one expected is a slip of the range switch. */
  private static final double ABSURD = 10;

  /** A reading that stands so close to the expected one turned round had its leads exchanged. */
  private static final double TURNED = 0.3;

  private static final double LEAST_TURNED_VOLTS = 3;

  private final double[] chart;
  private final Predictor onBench;
  private final Prediction bench;
  private final double[] unloaded;
  private final JudgedLimits band;
  private final boolean starving;

  /**
   * @param builds how many the limits are read off; 0 for limits of first order
   */
  Judge(Predictor onChart, Amplifier charted, Predictor onBench, Amplifier benched, int builds) {
    this.onBench = onBench;
    chart = onChart.unloaded(charted.healthy());
    unloaded = onBench.unloaded(benched.healthy());
    bench = onBench.predict(benched.healthy());
    band =
        builds == 0
            ? JudgedLimits.ofFirstOrder(bench)
            : JudgedLimits.sampled(onBench, bench, benched.healthy(), builds);
    starving = starves(benched);
  }

  static boolean starves(Amplifier benched) {
    double volts = benched.circuit().line().volts();
    double design = benched.circuit().line().designVolts();
    return volts < STARVING * design;
  }

  /** Returns the readings judged, in the sheet's order. */
  List<JudgedReading> judge(List<Reading> readings) {
    double highest = 1;
    for (double value : bench.values()) {
      highest = Math.max(highest, Double.isNaN(value) ? 0 : Math.abs(value));
    }
    double[] limits = onBench.meterLimits(bench.values());
    List<JudgedReading> judged = new ArrayList<>();
    for (int i = 0; i < readings.size(); i++) {
      double nominal = bench.values()[i] - bench.shifts()[i];
      double low = band.low(i);
      double high = band.high(i);
      double value = figure(readings.get(i));
      Verdict verdict =
          verdict(readings.get(i), value, nominal, new double[] {low, high, limits[i]}, highest);
      judged.add(
          new JudgedReading(
              readings.get(i), chart[i], unloaded[i], nominal, low, high, limits[i], verdict));
    }
    return judged;
  }

  /** Returns a reading as it is compared: drops and currents by magnitude, no end to ohms. */
  static double figure(Reading reading) {
    if (reading.kind() == ReadingKind.OHMS) {
      return Math.min(reading.value(), Predictor.OPEN_READING_OHMS);
    }
    return reading.at() instanceof MeasuredAt.AtNode && reading.kind() == ReadingKind.DC
        ? reading.value()
        : Math.abs(reading.value());
  }

  private Verdict verdict(
      Reading reading, double value, double expected, double[] band, double highest) {
    if (Double.isNaN(expected)) {
      return Verdict.NOT_JUDGED;
    }
    boolean volts = reading.kind() != ReadingKind.OHMS && reading.kind() != ReadingKind.MA;
    boolean absurd = volts && Math.abs(value) > ABSURD * highest;
    boolean turned =
        volts
            && Math.abs(expected) > LEAST_TURNED_VOLTS
            && Math.abs(value + expected) < TURNED * Math.abs(expected);
    if (absurd || turned) {
      return Verdict.QUESTIONED;
    }
    double below = band[0] - band[2] - value;
    double above = value - band[1] - band[2];
    double far = band[1] - band[0];
    Verdict verdict = Verdict.WITHIN;
    if (below > 0) {
      verdict = below > far ? Verdict.FAR_LOW : Verdict.LOW;
    } else if (above > 0) {
      verdict = above > far ? Verdict.FAR_HIGH : Verdict.HIGH;
    }
    boolean counts = verdict == Verdict.FAR_LOW || verdict == Verdict.FAR_HIGH;
    return starving && !counts && verdict != Verdict.WITHIN ? Verdict.NOT_JUDGED : verdict;
  }
}
