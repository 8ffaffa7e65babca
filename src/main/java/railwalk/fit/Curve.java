package railwalk.fit;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.function.Function;
import railwalk.device.AmplifierLaw;
import railwalk.device.GridLaw;
import railwalk.device.PentodeLaw;
import railwalk.device.TriodeLaw;

/**
 * A family of curves: which constants its law has, and what is known of them before any point of a
 * type is read, as Gaussian priors. They carry a type with fewer points than constants; a type with
 * many points hardly feels them.
 *
 * <p>Centres and widths are the spread among the tubes that N. Koren fitted by hand (Glass Audio
 * 8/5, 1996, from memory: exponents 1.3 to 1.4; kp 3.6 to 6 times mu; kvb 300 of triodes) and, for
 * what that law does not have, among the fits of types with many points.
 *
 * @param word kind of section in a data file
 * @param form makes the law of the constants, in their order
 */
record Curve(String word, List<Constant> constants, Function<double[], AmplifierLaw> form) {
  /**
   * One constant and its prior.
   *
   * @param name key word in the data file; "kp" stands for kp / mu here
   * @param logarithmic whether {@code width} is of its natural logarithm
   * @param width standard deviation
   */
  record Constant(String name, boolean logarithmic, double centre, double width) {}

  /** The grid's perveance as a share of the space current's, 2 / kg: common practice. */
  private static final double GRID_SHARE = 0.4;

  /**
   * Where an oxide cathode's grid begins to draw current in earnest. With 0.1 V per factor e below
   * it a 10 Mohm grid leak settles near −0.6 V (common practice: −0.5 to −1 V).
   */
  private static final double GRID_START_VOLTS = 0;

  private static final double GRID_SLOPE_VOLTS = 0.1;

  private static final MathContext DIGITS = new MathContext(7);

  private static final Curve TRIODE =
      new Curve(
          "triode",
          List.of(
              scale("mu", 20, 2),
              scale("exponent", 1.4, 0.08),
              scale("kg", 1000, 3),
              scale("kp", 5, 0.3),
              scale("kvb", 300, 0.7),
              shift("contact", 0.2, 0.3)),
          c -> new TriodeLaw(c[0], c[1], c[2], c[3] * c[0], c[4], c[5], grid(c[2])));

  private static final Curve PENTODE =
      screenGrid(
          "pentode",
          shift("contact", 0.2, 0.5),
          scale("lambda", 30, 1),
          scale("screenshare", 0.1, 0.6),
          scale("screenrise", 0.05, 0.6));

  private static final Curve BEAM =
      screenGrid(
          "beam",
          shift("contact", 0.2, 0.3),
          scale("lambda", 20, 0.7),
          scale("screenshare", 0.02, 0.6),
          scale("screenrise", 0.2, 0.6));

  private static Curve screenGrid(
      String word, Constant contact, Constant lambda, Constant screenShare, Constant screenRise) {
    return new Curve(
        word,
        List.of(
            scale("mu", 10, 2),
            scale("exponent", 1.4, 0.08),
            scale("kg", 1000, 3),
            scale("kp", 4, 0.4),
            scale("kvb", 300, 0.7),
            contact,
            lambda,
            scale("knee", 0.07, 0.2),
            screenShare,
            screenRise),
        c ->
            new PentodeLaw(
                c[0], c[1], c[2], c[3] * c[0], c[4], c[5], c[6], c[7], c[8], c[9], grid(c[2])));
  }

  private static Constant scale(String name, double centre, double width) {
    return new Constant(name, true, centre, width);
  }

  private static Constant shift(String name, double centre, double width) {
    return new Constant(name, false, centre, width);
  }

  /** Returns the family that a data file's section word names. */
  static Curve named(String word) {
    return switch (word) {
      case "triode" -> TRIODE;
      case "pentode" -> PENTODE;
      case "beam" -> BEAM;
      default -> throw new IllegalArgumentException("no family of curves for " + word);
    };
  }

  /** Returns the law with those constants. */
  AmplifierLaw law(double[] values) {
    return form.apply(values);
  }

  /** Returns the {@code name=value} words of a data file's fit line, each with a leading blank. */
  String words(double[] values) {
    StringBuilder words = new StringBuilder();
    for (int i = 0; i < values.length; i++) {
      String name = constants.get(i).name();
      append(words, name, name.equals("kp") ? values[i] * values[0] : values[i]);
    }
    GridLaw grid = grid(values[2]);
    append(words, "gridperveance", grid.perveance());
    append(words, "gridstart", grid.startVolts());
    append(words, "gridslope", grid.slopeVolts());
    return words.toString();
  }

  /** Appends {@code name=value} with seven digits. */
  static void append(StringBuilder words, String name, double value) {
    BigDecimal rounded = new BigDecimal(value).round(DIGITS).stripTrailingZeros();
    words.append(' ').append(name).append('=').append(rounded.toPlainString());
  }

  private static GridLaw grid(double kg) {
    return new GridLaw(GRID_SHARE * 2 / kg, GRID_START_VOLTS, GRID_SLOPE_VOLTS);
  }
}
