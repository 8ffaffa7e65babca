package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import railwalk.units.Quantity;

/**
 * One line of a walk: the volts of a node, what is dropped or gained on the way, the volts of the
 * next node. It is printed with so many digits that whoever adds it up gets the printed result.
 *
 * @param from words before the first volts, such as "b1"; empty where the sum starts from nothing
 * @param to words before the last volts; may be empty
 */
record WalkSum(String from, double fromVolts, List<Term> terms, String to, double toVolts) {
  private static final int MOST_DECIMALS = 3;

  WalkSum {
    terms = List.copyOf(terms);
  }

  /**
   * One part on the way.
   *
   * @param label the part's value or name
   * @param ohms its resistance; NaN for a part that is no resistor
   * @param amps current in the direction of the walk
   * @param dropVolts what is lost along the walk; negative where it is gained
   */
  record Term(String label, double ohms, double amps, double dropVolts) {
    boolean ohmic() {
      return !Double.isNaN(ohms);
    }
  }

  /** The sum as printed. */
  record Printed(String text, WalkAmps amps) {}

  /** Returns the line with the fewest digits that add up. */
  Printed printed() {
    for (int to = 0; to <= MOST_DECIMALS; to++) {
      for (int from = to; from <= to + 2; from++) {
        for (int amps = 0; amps <= 3; amps++) {
          if (addsUp(from, to, amps)) {
            return print(from, to, amps);
          }
        }
      }
    }
    return print(MOST_DECIMALS, MOST_DECIMALS, 3);
  }

  private static int places(double volts, int least) {
    return Math.max(least, Quantity.decimals(volts));
  }

  private static double round(double value, int decimals) {
    double step = Math.pow(10, -decimals);
    return Math.rint(value / step) * step;
  }

  private boolean addsUp(int from, int to, int amps) {
    int fromPlaces = fromVolts == 0 ? places(toVolts, to) : places(fromVolts, from);
    int toPlaces = places(toVolts, to);
    double sum = round(fromVolts, fromPlaces);
    for (Term term : terms) {
      if (term.ohmic()) {
        double printed = WalkAmps.of(Math.abs(term.amps)).finer(amps).printed();
        sum -= Math.signum(term.dropVolts) * term.ohms * printed;
      } else {
        sum -= round(term.dropVolts, places(term.dropVolts, to));
      }
    }
    double tolerance = 0.5 * Math.pow(10, -toPlaces);
    return Math.abs(sum - round(toVolts, toPlaces)) <= tolerance * (1 + 1e-9);
  }

  private Printed print(int fromDecimals, int toDecimals, int ampDecimals) {
    List<String> words = new ArrayList<>();
    boolean fromNothing = from.isEmpty();
    if (!fromNothing) {
      words.add(from + " " + Quantity.fixed(fromVolts, places(fromVolts, fromDecimals)) + " V");
    }
    WalkAmps last = WalkAmps.of(0);
    for (Term term : terms) {
      boolean gained = term.dropVolts < 0;
      boolean silent = fromNothing && words.isEmpty() && gained;
      String sign = silent ? "" : gained ? "+ " : "− ";
      if (term.ohmic()) {
        last = WalkAmps.of(Math.abs(term.amps)).finer(ampDecimals);
        words.add(sign + term.label + " × " + last.text());
      } else {
        double drop = Math.abs(term.dropVolts);
        words.add(sign + term.label + " " + Quantity.fixed(drop, places(drop, toDecimals)) + " V");
      }
    }
    String result =
        "= "
            + (to.isEmpty() ? "" : to + " ")
            + Quantity.fixed(toVolts, places(toVolts, toDecimals));
    words.add(result + " V");
    return new Printed(words.stream().collect(Collectors.joining(" ")), last);
  }
}
