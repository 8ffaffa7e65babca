package railwalk.chart;

import railwalk.units.Quantity;

/** A current as sums print it: one unit for a whole line, and as many digits as the sum needs. */
record WalkAmps(double amps, Unit unit, int decimals) {
  private static final int MOST_DECIMALS = 4;

  /** Unit of a current. */
  enum Unit {
    AMPERE("A", 1),
    MILLIAMPERE("mA", 1e3),
    MICROAMPERE("µA", 1e6);

    private final String word;
    private final double perAmpere;

    Unit(String word, double perAmpere) {
      this.word = word;
      this.perAmpere = perAmpere;
    }
  }

  /** Returns a current with two significant digits, three from 10 mA up. */
  static WalkAmps of(double amps) {
    double size = Math.abs(amps);
    if (size >= 0.995) {
      return new WalkAmps(amps, Unit.AMPERE, 2);
    }
    Unit unit = size >= 0.0995e-3 || size == 0 ? Unit.MILLIAMPERE : Unit.MICROAMPERE;
    double value = size * unit.perAmpere;
    if (value >= 99.5) {
      return new WalkAmps(amps, unit, 0);
    }
    return new WalkAmps(amps, unit, value >= 0.995 ? 1 : 2);
  }

  /** Returns a current for a sentence: with three significant digits from 1 mA up. */
  static WalkAmps said(double amps) {
    WalkAmps coarse = of(amps);
    boolean few = Math.abs(amps) * coarse.unit.perAmpere < 9.95 && coarse.decimals == 1;
    return few ? coarse.finer(1) : coarse;
  }

  /** Returns the same with more digits; itself when there are enough. */
  WalkAmps finer(int more) {
    return new WalkAmps(amps, unit, Math.min(MOST_DECIMALS, decimals + more));
  }

  /** Returns another current in the same unit and as many places. */
  WalkAmps like(double other) {
    return new WalkAmps(other, unit, decimals);
  }

  /** Returns the current as printed, in ampere. */
  double printed() {
    double step = Math.pow(10, -decimals) / unit.perAmpere;
    return Math.rint(amps / step) * step;
  }

  /** Returns the last printed place, in ampere. */
  double place() {
    return Math.pow(10, -decimals) / unit.perAmpere;
  }

  /** Returns the number without its unit. */
  String number() {
    return Quantity.fixed(amps * unit.perAmpere, decimals);
  }

  /** Returns number and unit: "5.1 mA". */
  String text() {
    return number() + " " + unit.word;
  }
}
