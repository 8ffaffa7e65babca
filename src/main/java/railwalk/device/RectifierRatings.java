package railwalk.device;

/** Published limits of a rectifier; NaN where the sheet gives none. */
public record RectifierRatings(
    double peakInverseVoltsMax,
    double peakPlateAmpsMax,
    double dcAmpsMax,
    double firstCapacitorFaradsMax,
    double plateRmsVoltsMax) {

  /** No limits known. */
  public static final RectifierRatings NONE =
      new RectifierRatings(Double.NaN, Double.NaN, Double.NaN, Double.NaN, Double.NaN);
}
