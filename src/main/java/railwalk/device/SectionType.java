package railwalk.device;

/**
 * One section of a tube type.
 *
 * @param id "A" and "B" of like twins (bench custom: A is the half with the lower pins), "T" and
 *     "P" of unlike ones, "D" for detector diodes, empty for the only section
 * @param spreadLow plate current of a new tube at fixed volts, as a share of the published one:
 *     lower limit at two standard deviations; NaN when it does not amplify
 * @param spreadHigh its upper limit
 */
public record SectionType(
    String id,
    SectionKind kind,
    SectionLaw law,
    Ratings ratings,
    RectifierRatings rectifierRatings,
    double spreadLow,
    double spreadHigh) {
  /** Returns this section with another law. */
  public SectionType withLaw(SectionLaw changed) {
    return new SectionType(id, kind, changed, ratings, rectifierRatings, spreadLow, spreadHigh);
  }
}
