package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.units.Quantity;

/** Round numbers along an axis: steps of 1, 2, 2.5 or 5 times a power of ten. */
final class Ticks {
  private static final double[] ROUND = {1, 2, 2.5, 5, 10};
  private static final double SLACK = 1e-9;

  private Ticks() {}

  /** Returns the least round step that parts {@code span} into {@code most} pieces or fewer. */
  static double step(double span, int most) {
    double least = span / most;
    double decade = Math.pow(10, Math.floor(Math.log10(least)));
    for (double round : ROUND) {
      if (round * decade >= least * (1 - SLACK)) {
        return round * decade;
      }
    }
    return 10 * decade;
  }

  /** Returns an axis that holds 0 and {@code reach}, which may be negative. */
  static Plot.Axis axis(String title, double reach, int most) {
    double step = step(Math.abs(reach), most);
    double end = Math.ceil(Math.abs(reach) / step - SLACK) * step;
    return reach < 0 ? new Plot.Axis(title, -end, 0, step) : new Plot.Axis(title, 0, end, step);
  }

  /** Returns an axis from a round number below {@code low} to one above {@code high}. */
  static Plot.Axis around(String title, double low, double high, int most) {
    double step = step(high - low, most);
    double from = Math.floor(low / step + SLACK) * step;
    double to = Math.ceil(high / step - SLACK) * step;
    return new Plot.Axis(title, from, to, step);
  }

  /** Returns the multiples of {@code step} from {@code from} to {@code to}. */
  static List<Double> between(double from, double to, double step) {
    List<Double> ticks = new ArrayList<>();
    long first = (long) Math.ceil(from / step - SLACK);
    long last = (long) Math.floor(to / step + SLACK);
    for (long i = first; i <= last; i++) {
      ticks.add(i * step);
    }
    return ticks;
  }

  /** Returns {@code tick} with the decimals that multiples of {@code step} need. */
  static String word(double tick, double step) {
    int decimals = 0;
    double scaled = step;
    while (decimals < 6 && Math.abs(scaled - Math.rint(scaled)) > SLACK * scaled) {
      decimals++;
      scaled *= 10;
    }
    return Quantity.fixed(tick, decimals);
  }
}
