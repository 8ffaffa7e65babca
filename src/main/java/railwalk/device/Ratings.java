package railwalk.device;

/**
 * Published limits of one section; NaN where the sheet gives none.
 *
 * @param system the rating system in the sheet's word: "design-centre", "design-maximum",
 *     "absolute", "maker limit", or empty
 */
public record Ratings(
    String system,
    double plateVoltsMax,
    double screenVoltsMax,
    double plateWattsMax,
    double screenWattsMax,
    double cathodeAmpsMax,
    double heaterCathodeVoltsMax,
    double gridLeakCathodeBiasOhmsMax,
    double gridLeakFixedBiasOhmsMax) {

  /** No limits known. */
  public static final Ratings NONE =
      new Ratings(
          "",
          Double.NaN,
          Double.NaN,
          Double.NaN,
          Double.NaN,
          Double.NaN,
          Double.NaN,
          Double.NaN,
          Double.NaN);
}
